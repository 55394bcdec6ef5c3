* Blocks a grant: two pairs of request and priority, or the lock e alone.
* y = !(a b + c d + e).  Sizing: N 2 in series, 1 alone; P 6, that of e at the
* output.  g 8/3 for a to d, 7/3 for e; p 11/3.
.subckt aoi221 a b c d e y vdd vss
mp_e y  e p1  vdd pfet w={6*wunit} l={lgate}
mp_c p1 c p2  vdd pfet w={6*wunit} l={lgate}
mp_d p1 d p2  vdd pfet w={6*wunit} l={lgate}
mp_a p2 a vdd vdd pfet w={6*wunit} l={lgate}
mp_b p2 b vdd vdd pfet w={6*wunit} l={lgate}
mn_a y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
mn_c y  c n2  vss nfet w={2*wunit} l={lgate}
mn_d n2 d vss vss nfet w={2*wunit} l={lgate}
mn_e y  e vss vss nfet w={wunit}   l={lgate}
.ends aoi221
