* Raises "interrupt pending": only this rising edge is on the critical path.
* Sizing: HI-skew, the pull-down at half the drive: P 2, N 1/2, at twice the
* scale so that N is one unit.  g 5/6 up, 5/3 down.
.subckt inv_hi a y vdd vss
mp_a y a vdd vdd pfet w={4*wunit} l={lgate}
mn_a y a vss vss nfet w={wunit}   l={lgate}
.ends inv_hi
