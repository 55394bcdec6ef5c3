* Says that a bit of the round-robin pointer equals a requester's number.
* y = !(a ^ b).  Sizing: N 2 and P 4 in series pairs: 4 for each bundle of an
* input and its complement, p 4.  The complements are made inside, P 2 and N 1.
.subckt xnor2 a b y vdd vss
mp_an an a  vdd vdd pfet w={2*wunit} l={lgate}
mn_an an a  vss vss nfet w={wunit}   l={lgate}
mp_bn bn b  vdd vdd pfet w={2*wunit} l={lgate}
mn_bn bn b  vss vss nfet w={wunit}   l={lgate}
mp_1  y  a  p1  vdd pfet w={4*wunit} l={lgate}
mp_2  p1 b  vdd vdd pfet w={4*wunit} l={lgate}
mp_3  y  an p2  vdd pfet w={4*wunit} l={lgate}
mp_4  p2 bn vdd vdd pfet w={4*wunit} l={lgate}
mn_1  y  a  n1  vss nfet w={2*wunit} l={lgate}
mn_2  n1 bn vss vss nfet w={2*wunit} l={lgate}
mn_3  y  an n2  vss nfet w={2*wunit} l={lgate}
mn_4  n2 b  vss vss nfet w={2*wunit} l={lgate}
.ends xnor2
