* Parity over three grant lines, to catch a double grant.
* y = a ^ b ^ c, a self-dual function: the pull-up repeats the pull-down's tree,
* a at the rail, b crossed in the middle, c at the output.  Sizing: N 3, P 6:
* 6, 12, 6 for the bundles, p 6.  Complements inside, that of b twice as big.
.subckt xor3_rep a b c y vdd vss
mp_an an a  vdd vdd pfet w={2*wunit} l={lgate}
mn_an an a  vss vss nfet w={wunit}   l={lgate}
mp_bn bn b  vdd vdd pfet w={4*wunit} l={lgate}
mn_bn bn b  vss vss nfet w={2*wunit} l={lgate}
mp_cn cn c  vdd vdd pfet w={2*wunit} l={lgate}
mn_cn cn c  vss vss nfet w={wunit}   l={lgate}
mp_c0 y  cn p3  vdd pfet w={6*wunit} l={lgate}
mp_c1 y  c  p4  vdd pfet w={6*wunit} l={lgate}
mp_b0 p3 b  p1  vdd pfet w={6*wunit} l={lgate}
mp_b1 p3 bn p2  vdd pfet w={6*wunit} l={lgate}
mp_b2 p4 bn p1  vdd pfet w={6*wunit} l={lgate}
mp_b3 p4 b  p2  vdd pfet w={6*wunit} l={lgate}
mp_a0 p1 a  vdd vdd pfet w={6*wunit} l={lgate}
mp_a1 p2 an vdd vdd pfet w={6*wunit} l={lgate}
mn_c0 y  cn n3  vss nfet w={3*wunit} l={lgate}
mn_c1 y  c  n4  vss nfet w={3*wunit} l={lgate}
mn_b0 n3 b  n1  vss nfet w={3*wunit} l={lgate}
mn_b1 n3 bn n2  vss nfet w={3*wunit} l={lgate}
mn_b2 n4 bn n1  vss nfet w={3*wunit} l={lgate}
mn_b3 n4 b  n2  vss nfet w={3*wunit} l={lgate}
mn_a0 n1 a  vss vss nfet w={3*wunit} l={lgate}
mn_a1 n2 an vss vss nfet w={3*wunit} l={lgate}
.ends xor3_rep
