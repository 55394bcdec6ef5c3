* Acknowledges when one of a, b and one of c, d ask together.
* y = !((a + b) (c + d)).  Sizing: N 2, P 4.  g 2, p 4.
.subckt oai22 a b c d y vdd vss
mp_a y  a p1  vdd pfet w={4*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={4*wunit} l={lgate}
mp_c y  c p2  vdd pfet w={4*wunit} l={lgate}
mp_d p2 d vdd vdd pfet w={4*wunit} l={lgate}
mn_c y  c n1  vss nfet w={2*wunit} l={lgate}
mn_d y  d n1  vss nfet w={2*wunit} l={lgate}
mn_a n1 a vss vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
.ends oai22
