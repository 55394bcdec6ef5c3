* Counts requests: the sum bit of three, inverted, from their inverted carry.
* y = !(a b c + (a + b + c) con), a self-dual function: the pull-up repeats the
* pull-down's network.  Sizing: three in series N 3, P 6; two in series N 2,
* P 4, con at the output.  g 5, 5, 5 and 2 for con; p 5.
.subckt sum3_rep a b c con y vdd vss
mp_a1  y  a   p1  vdd pfet w={6*wunit} l={lgate}
mp_b1  p1 b   p2  vdd pfet w={6*wunit} l={lgate}
mp_c1  p2 c   vdd vdd pfet w={6*wunit} l={lgate}
mp_con y  con p3  vdd pfet w={4*wunit} l={lgate}
mp_a2  p3 a   vdd vdd pfet w={4*wunit} l={lgate}
mp_b2  p3 b   vdd vdd pfet w={4*wunit} l={lgate}
mp_c2  p3 c   vdd vdd pfet w={4*wunit} l={lgate}
mn_a1  y  a   n1  vss nfet w={3*wunit} l={lgate}
mn_b1  n1 b   n2  vss nfet w={3*wunit} l={lgate}
mn_c1  n2 c   vss vss nfet w={3*wunit} l={lgate}
mn_con y  con n3  vss nfet w={2*wunit} l={lgate}
mn_a2  n3 a   vss vss nfet w={2*wunit} l={lgate}
mn_b2  n3 b   vss vss nfet w={2*wunit} l={lgate}
mn_c2  n3 c   vss vss nfet w={2*wunit} l={lgate}
.ends sum3_rep
