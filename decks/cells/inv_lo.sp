* Drops the grant of the losers; only the falling edge is in a hurry.
* Sizing: LO-skew, the pull-up at half the drive: P 1, N 1.  g 4/3 up, 2/3 down.
.subckt inv_lo a y vdd vss
mp_a y a vdd vdd pfet w={wunit} l={lgate}
mn_a y a vss vss nfet w={wunit} l={lgate}
.ends inv_lo
