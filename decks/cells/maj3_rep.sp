* Votes on three copies of the grant; y is low when two agree on one.
* y = !(a b + c (a + b)), a self-dual function: the pull-up repeats the
* pull-down's network, two devices tall.  Sizing: N 2, P 4, c at the output.
* g 4, 4, 2; p 4.
.subckt maj3_rep a b c y vdd vss
mp_a1 y  a p1  vdd pfet w={4*wunit} l={lgate}
mp_b1 p1 b vdd vdd pfet w={4*wunit} l={lgate}
mp_c  y  c p2  vdd pfet w={4*wunit} l={lgate}
mp_a2 p2 a vdd vdd pfet w={4*wunit} l={lgate}
mp_b2 p2 b vdd vdd pfet w={4*wunit} l={lgate}
mn_a1 y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b1 n1 b vss vss nfet w={2*wunit} l={lgate}
mn_c  y  c n2  vss nfet w={2*wunit} l={lgate}
mn_a2 n2 a vss vss nfet w={2*wunit} l={lgate}
mn_b2 n2 b vss vss nfet w={2*wunit} l={lgate}
.ends maj3_rep
