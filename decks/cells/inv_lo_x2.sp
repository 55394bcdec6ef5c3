* Drops the losers' grants across two banks of requesters.
* Sizing: inv_lo at twice the scale, P 2 and N 2: same g and p.
.subckt inv_lo_x2 a y vdd vss
mp_a y a vdd vdd pfet w={2*wunit} l={lgate}
mn_a y a vss vss nfet w={2*wunit} l={lgate}
.ends inv_lo_x2
