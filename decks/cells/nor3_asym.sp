* Grants on request line a; b and c are modes that change rarely.
* Sizing: asymmetric, critical input a: N 1, P 7/2, so g_a 3/2; b and c: P 28/3,
* which gives the stack the drive of the reference, N 1/2.  At twice the scale.
.subckt nor3_asym a b c y vdd vss
mp_a y  a p1  vdd pfet w={7*wunit}    l={lgate}
mp_b p1 b p2  vdd pfet w={56/3*wunit} l={lgate}
mp_c p2 c vdd vdd pfet w={56/3*wunit} l={lgate}
mn_a y  a vss vss nfet w={2*wunit}    l={lgate}
mn_b y  b vss vss nfet w={wunit}      l={lgate}
mn_c y  c vss vss nfet w={wunit}      l={lgate}
.ends nor3_asym
