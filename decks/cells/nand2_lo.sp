* Pulls the acknowledge low; the fall is critical.
* Sizing: LO-skew, P at half the drive: P 1, N 2 in series.  g 2 up, 1 down.
.subckt nand2_lo a b y vdd vss
mp_a y  a vdd vdd pfet w={wunit}   l={lgate}
mp_b y  b vdd vdd pfet w={wunit}   l={lgate}
mn_a y  a n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b vss vss nfet w={2*wunit} l={lgate}
.ends nand2_lo
