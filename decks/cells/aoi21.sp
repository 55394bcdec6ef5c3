* Blocks a grant: two conditions together, a and b, or the lock c alone.
* y = !(a b + c).  Sizing: N 2 in series, 1 alone; P 4, that of c at the output.
* g 2, 2, 5/3; p 7/3.
.subckt aoi21 a b c y vdd vss
mp_c y  c p1  vdd pfet w={4*wunit} l={lgate}
mp_a p1 a vdd vdd pfet w={4*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={4*wunit} l={lgate}
mn_a y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
mn_c y  c vss vss nfet w={wunit}   l={lgate}
.ends aoi21
