* Blocks a grant: two pairs of request and priority, either pair suffices.
* y = !(a b + c d).  Sizing: N 2, P 4.  g 2, p 4.
.subckt aoi22 a b c d y vdd vss
mp_c y  c p1  vdd pfet w={4*wunit} l={lgate}
mp_d y  d p1  vdd pfet w={4*wunit} l={lgate}
mp_a p1 a vdd vdd pfet w={4*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={4*wunit} l={lgate}
mn_a y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
mn_c y  c n2  vss nfet w={2*wunit} l={lgate}
mn_d n2 d vss vss nfet w={2*wunit} l={lgate}
.ends aoi22
