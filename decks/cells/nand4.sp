* Detects that four requesters of a bank are idle.
* Sizing: drive of the reference: N 4 in series, P 2.  g 2, p 4; a is next to
* the output.
.subckt nand4 a b c d y vdd vss
mp_a y  a vdd vdd pfet w={2*wunit} l={lgate}
mp_b y  b vdd vdd pfet w={2*wunit} l={lgate}
mp_c y  c vdd vdd pfet w={2*wunit} l={lgate}
mp_d y  d vdd vdd pfet w={2*wunit} l={lgate}
mn_a y  a n1  vss nfet w={4*wunit} l={lgate}
mn_b n1 b n2  vss nfet w={4*wunit} l={lgate}
mn_c n2 c n3  vss nfet w={4*wunit} l={lgate}
mn_d n3 d vss vss nfet w={4*wunit} l={lgate}
.ends nand4
