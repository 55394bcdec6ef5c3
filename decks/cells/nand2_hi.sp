* Raises "bank has a request" from two active-low lines; the rise is critical.
* Sizing: HI-skew, N at half the drive: P 2, N 1 in series.  g 1 up, 2 down.
.subckt nand2_hi a b y vdd vss
mp_a y  a vdd vdd pfet w={2*wunit} l={lgate}
mp_b y  b vdd vdd pfet w={2*wunit} l={lgate}
mn_a y  a n1  vss nfet w={wunit}   l={lgate}
mn_b n1 b vss vss nfet w={wunit}   l={lgate}
.ends nand2_hi
