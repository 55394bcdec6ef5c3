* Raises a grant when neither rival asks; the rise is critical.
* Sizing: HI-skew, N at half the drive: P 4 in series, N 1/2, at twice the
* scale.  g 3/2 up, 3 down.
.subckt nor2_hi a b y vdd vss
mp_a y  a p1  vdd pfet w={8*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={8*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}   l={lgate}
mn_b y  b vss vss nfet w={wunit}   l={lgate}
.ends nor2_hi
