* inv_lo at one and a half times the scale, on a grid of whole units.
* Sizing: P 3/2, N 3/2 rounds to P 2, N 2: the ratio stays 1 and so does g, 4/3
* up and 2/3 down.  This grid keeps the skew and costs a third more load.
.subckt inv_lo_grid a y vdd vss
mp_a y a vdd vdd pfet w={2*wunit} l={lgate}
mn_a y a vss vss nfet w={2*wunit} l={lgate}
.ends inv_lo_grid
