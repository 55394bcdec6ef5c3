* Gates a request with its enable bit.
* Sizing: drive of the reference: N 2 in series, P 2.  g 4/3, p 2; a is next to
* the output.
.subckt nand2 a b y vdd vss
mp_a y  a vdd vdd pfet w={2*wunit} l={lgate}
mp_b y  b vdd vdd pfet w={2*wunit} l={lgate}
mn_a y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
.ends nand2
