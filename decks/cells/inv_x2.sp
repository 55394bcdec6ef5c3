* Drives a request into two priority cells.
* Sizing: the reference at twice the scale, P 4 and N 2: same g and p.
.subckt inv_x2 a y vdd vss
mp_a y a vdd vdd pfet w={4*wunit} l={lgate}
mn_a y a vss vss nfet w={2*wunit} l={lgate}
.ends inv_x2
