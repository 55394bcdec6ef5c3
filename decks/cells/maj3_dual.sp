* Votes on three copies of the grant; y is low when two agree on one.
* y = !(a b + c (a + b)), the pull-up the series/parallel dual, three devices
* tall.  Sizing: N 2; P 6 for the pair a, b at the rail, then c with 3 beside a
* and b in series with 6.  g 16/3, 16/3, 5/3.
.subckt maj3_dual a b c y vdd vss
mp_c  y  c p1  vdd pfet w={3*wunit} l={lgate}
mp_a1 y  a p2  vdd pfet w={6*wunit} l={lgate}
mp_b1 p2 b p1  vdd pfet w={6*wunit} l={lgate}
mp_a2 p1 a vdd vdd pfet w={6*wunit} l={lgate}
mp_b2 p1 b vdd vdd pfet w={6*wunit} l={lgate}
mn_a1 y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b1 n1 b vss vss nfet w={2*wunit} l={lgate}
mn_c  y  c n2  vss nfet w={2*wunit} l={lgate}
mn_a2 n2 a vss vss nfet w={2*wunit} l={lgate}
mn_b2 n2 b vss vss nfet w={2*wunit} l={lgate}
.ends maj3_dual
