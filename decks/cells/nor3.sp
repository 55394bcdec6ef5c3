* Says that none of the three requesters above asks.
* Sizing: drive of the reference: P 6 in series, N 1.  g 7/3, p 3; a is next to
* the output.
.subckt nor3 a b c y vdd vss
mp_a y  a p1  vdd pfet w={6*wunit} l={lgate}
mp_b p1 b p2  vdd pfet w={6*wunit} l={lgate}
mp_c p2 c vdd vdd pfet w={6*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}   l={lgate}
mn_b y  b vss vss nfet w={wunit}   l={lgate}
mn_c y  c vss vss nfet w={wunit}   l={lgate}
.ends nor3
