* inv_hi at one and a half times the scale, on a grid of whole units.
* Sizing: P 6, N 3/2 rounds to P 6, N 2: the ratio falls from 4 to 3 and g goes
* from 5/6 up, 5/3 down to 8/9 up, 4/3 down.  This grid breaks the skew.
.subckt inv_hi_grid a y vdd vss
mp_a y a vdd vdd pfet w={6*wunit} l={lgate}
mn_a y a vss vss nfet w={2*wunit} l={lgate}
.ends inv_hi_grid
