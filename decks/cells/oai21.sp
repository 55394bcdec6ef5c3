* Acknowledges when either requester, a or b, meets the enable c.
* y = !((a + b) c).  Sizing: N 2, that of c at the output; P 4 in series, 2
* alone.  g 2, 2, 4/3; p 8/3.
.subckt oai21 a b c y vdd vss
mp_a y  a p1  vdd pfet w={4*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={4*wunit} l={lgate}
mp_c y  c vdd vdd pfet w={2*wunit} l={lgate}
mn_c y  c n1  vss nfet w={2*wunit} l={lgate}
mn_a n1 a vss vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
.ends oai21
