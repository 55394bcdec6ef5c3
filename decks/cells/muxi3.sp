* Picks the vector of one of three requesters, inverted.
* y = !(s1 ? d2 : s0 ? d1 : d0), driven for every input.  Sizing: N 3 and P 6
* where three are in series (d0, d1), N 2 and P 4 where two are (d2): g 3, 3, 2
* for data, p 5.  Complements of s0 and s1 inside, P 2 and N 1.
.subckt muxi3 d0 d1 d2 s0 s1 y vdd vss
mp_s0n s0n s0  vdd vdd pfet w={2*wunit} l={lgate}
mn_s0n s0n s0  vss vss nfet w={wunit}   l={lgate}
mp_s1n s1n s1  vdd vdd pfet w={2*wunit} l={lgate}
mn_s1n s1n s1  vss vss nfet w={wunit}   l={lgate}
mp_s1  y   s1  p1  vdd pfet w={6*wunit} l={lgate}
mp_s00 p1  s0  p2  vdd pfet w={6*wunit} l={lgate}
mp_d0  p2  d0  vdd vdd pfet w={6*wunit} l={lgate}
mp_s01 p1  s0n p3  vdd pfet w={6*wunit} l={lgate}
mp_d1  p3  d1  vdd vdd pfet w={6*wunit} l={lgate}
mp_s2  y   s1n p4  vdd pfet w={4*wunit} l={lgate}
mp_d2  p4  d2  vdd vdd pfet w={4*wunit} l={lgate}
mn_s1  y   s1n n1  vss nfet w={3*wunit} l={lgate}
mn_s00 n1  s0n n2  vss nfet w={3*wunit} l={lgate}
mn_d0  n2  d0  vss vss nfet w={3*wunit} l={lgate}
mn_s01 n1  s0  n3  vss nfet w={3*wunit} l={lgate}
mn_d1  n3  d1  vss vss nfet w={3*wunit} l={lgate}
mn_s2  y   s1  n4  vss nfet w={2*wunit} l={lgate}
mn_d2  n4  d2  vss vss nfet w={2*wunit} l={lgate}
.ends muxi3
