* Blocks a grant: line a with either of two masks, or the pair d and e.
* y = !(a (b + c) + d e).  Sizing: N 2; P 6 but for a, which stands beside b and
* c in series and needs 3.  g 5/3 for a, 8/3 for the others; p 16/3.
.subckt aoi22_or a b c d e y vdd vss
mp_d y  d p1  vdd pfet w={6*wunit} l={lgate}
mp_e y  e p1  vdd pfet w={6*wunit} l={lgate}
mp_a p1 a vdd vdd pfet w={3*wunit} l={lgate}
mp_b p1 b p2  vdd pfet w={6*wunit} l={lgate}
mp_c p2 c vdd vdd pfet w={6*wunit} l={lgate}
mn_a y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
mn_c n1 c vss vss nfet w={2*wunit} l={lgate}
mn_d y  d n2  vss nfet w={2*wunit} l={lgate}
mn_e n2 e vss vss nfet w={2*wunit} l={lgate}
.ends aoi22_or
