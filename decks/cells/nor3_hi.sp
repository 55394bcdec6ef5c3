* Raises a grant when none of three rivals asks.
* Sizing: HI-skew, N at half the drive: P 6 in series, N 1/2, at twice the
* scale.  g 13/6 up, 13/3 down.
.subckt nor3_hi a b c y vdd vss
mp_a y  a p1  vdd pfet w={12*wunit} l={lgate}
mp_b p1 b p2  vdd pfet w={12*wunit} l={lgate}
mp_c p2 c vdd vdd pfet w={12*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}    l={lgate}
mn_b y  b vss vss nfet w={wunit}    l={lgate}
mn_c y  c vss vss nfet w={wunit}    l={lgate}
.ends nor3_hi
