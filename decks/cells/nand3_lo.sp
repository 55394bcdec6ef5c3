* Pulls the acknowledge of three conditions low.
* Sizing: LO-skew, P at half the drive: P 1, N 3 in series.  g 8/3 up, 4/3 down.
.subckt nand3_lo a b c y vdd vss
mp_a y  a vdd vdd pfet w={wunit}   l={lgate}
mp_b y  b vdd vdd pfet w={wunit}   l={lgate}
mp_c y  c vdd vdd pfet w={wunit}   l={lgate}
mn_a y  a n1  vss nfet w={3*wunit} l={lgate}
mn_b n1 b n2  vss nfet w={3*wunit} l={lgate}
mn_c n2 c vss vss nfet w={3*wunit} l={lgate}
.ends nand3_lo
