* Withdraws a grant when one of three rivals asks.
* Sizing: LO-skew, P at half the drive: P 3 in series, N 1.  g 8/3 up, 4/3 down.
.subckt nor3_lo a b c y vdd vss
mp_a y  a p1  vdd pfet w={3*wunit} l={lgate}
mp_b p1 b p2  vdd pfet w={3*wunit} l={lgate}
mp_c p2 c vdd vdd pfet w={3*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}   l={lgate}
mn_b y  b vss vss nfet w={wunit}   l={lgate}
mn_c y  c vss vss nfet w={wunit}   l={lgate}
.ends nor3_lo
