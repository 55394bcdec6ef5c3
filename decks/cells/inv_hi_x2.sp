* Raises "interrupt pending" for a wide processor port.
* Sizing: inv_hi at twice the scale, P 8 and N 2: same g and p.
.subckt inv_hi_x2 a y vdd vss
mp_a y a vdd vdd pfet w={8*wunit} l={lgate}
mn_a y a vss vss nfet w={2*wunit} l={lgate}
.ends inv_hi_x2
