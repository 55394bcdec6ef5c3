* Says that none of the four requesters above asks.
* Sizing: drive of the reference: P 8 in series, N 1.  g 3, p 4; a is next to
* the output.
.subckt nor4 a b c d y vdd vss
mp_a y  a p1  vdd pfet w={8*wunit} l={lgate}
mp_b p1 b p2  vdd pfet w={8*wunit} l={lgate}
mp_c p2 c p3  vdd pfet w={8*wunit} l={lgate}
mp_d p3 d vdd vdd pfet w={8*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}   l={lgate}
mn_b y  b vss vss nfet w={wunit}   l={lgate}
mn_c y  c vss vss nfet w={wunit}   l={lgate}
mn_d y  d vss vss nfet w={wunit}   l={lgate}
.ends nor4
