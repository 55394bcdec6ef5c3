* Picks the vector of one of two requesters, inverted.
* y = !(s ? d1 : d0), driven for every input.  Sizing: N 2 and P 4 in series, s
* at the output: g 2 for data, 4 for the bundle of s, p 4.  Complement of s
* inside, P 2 and N 1.
.subckt muxi2 d0 d1 s y vdd vss
mp_sn sn s  vdd vdd pfet w={2*wunit} l={lgate}
mn_sn sn s  vss vss nfet w={wunit}   l={lgate}
mp_s0 y  s  p1  vdd pfet w={4*wunit} l={lgate}
mp_d0 p1 d0 vdd vdd pfet w={4*wunit} l={lgate}
mp_s1 y  sn p2  vdd pfet w={4*wunit} l={lgate}
mp_d1 p2 d1 vdd vdd pfet w={4*wunit} l={lgate}
mn_s0 y  sn n1  vss nfet w={2*wunit} l={lgate}
mn_d0 n1 d0 vss vss nfet w={2*wunit} l={lgate}
mn_s1 y  s  n2  vss nfet w={2*wunit} l={lgate}
mn_d1 n2 d1 vss vss nfet w={2*wunit} l={lgate}
.ends muxi2
