* Blocks a request when either of two masks is set.
* Sizing: drive of the reference: P 4 in series, N 1.  g 5/3, p 2; a is next to
* the output.
.subckt nor2 a b y vdd vss
mp_a y  a p1  vdd pfet w={4*wunit} l={lgate}
mp_b p1 b vdd vdd pfet w={4*wunit} l={lgate}
mn_a y  a vss vss nfet w={wunit}   l={lgate}
mn_b y  b vss vss nfet w={wunit}   l={lgate}
.ends nor2
