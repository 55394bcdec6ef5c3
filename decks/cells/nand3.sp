* Gates a request with its enable bit and the global enable.
* Sizing: drive of the reference: N 3 in series, P 2.  g 5/3, p 3; a is next to
* the output.
.subckt nand3 a b c y vdd vss
mp_a y  a vdd vdd pfet w={2*wunit} l={lgate}
mp_b y  b vdd vdd pfet w={2*wunit} l={lgate}
mp_c y  c vdd vdd pfet w={2*wunit} l={lgate}
mn_a y  a n1  vss nfet w={3*wunit} l={lgate}
mn_b n1 b n2  vss nfet w={3*wunit} l={lgate}
mn_c n2 c vss vss nfet w={3*wunit} l={lgate}
.ends nand3
