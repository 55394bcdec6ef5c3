* Gates a request, a, with a reset, b, that may be slow.
* Sizing: asymmetric with s = 1/4: N 1/(1-s) = 4/3 for a, next to the output,
* and 1/s = 4 for b; in series they drive as the reference.  P 2.  g_a 10/9,
* g_b 2.
.subckt nand2_asym a b y vdd vss
mp_a y  a vdd vdd pfet w={2*wunit}   l={lgate}
mp_b y  b vdd vdd pfet w={2*wunit}   l={lgate}
mn_a y  a n1  vss nfet w={4/3*wunit} l={lgate}
mn_b n1 b vss vss nfet w={4*wunit}   l={lgate}
.ends nand2_asym
