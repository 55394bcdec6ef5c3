* Withdraws a grant when either rival asks; the fall is critical.
* Sizing: LO-skew, P at half the drive: P 2 in series, N 1.  g 2 up, 1 down.
.subckt nor2_lo a b y vdd vss
mp_a y  a p1  vdd pfet w={2*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={2*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}   l={lgate}
mn_b y  b vss vss nfet w={wunit}   l={lgate}
.ends nor2_lo
