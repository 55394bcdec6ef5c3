* Raises "bank has a request" from three active-low lines.
* Sizing: HI-skew, N at half the drive: P 2, N 3/2, at twice the scale.  g 7/6
* up, 7/3 down.
.subckt nand3_hi a b c y vdd vss
mp_a y  a vdd vdd pfet w={4*wunit} l={lgate}
mp_b y  b vdd vdd pfet w={4*wunit} l={lgate}
mp_c y  c vdd vdd pfet w={4*wunit} l={lgate}
mn_a y  a n1  vss nfet w={3*wunit} l={lgate}
mn_b n1 b n2  vss nfet w={3*wunit} l={lgate}
mn_c n2 c vss vss nfet w={3*wunit} l={lgate}
.ends nand3_hi
