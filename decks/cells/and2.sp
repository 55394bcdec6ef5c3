* Lets a request through when its enable bit is set.
* Sizing: nand2 at the drive of the reference (N 2, P 2), then an inverter of
* twice the drive: P 4, N 2.
.subckt and2 a b y vdd vss
mp_a yn a  vdd vdd pfet w={2*wunit} l={lgate}
mp_b yn b  vdd vdd pfet w={2*wunit} l={lgate}
mn_a yn a  n1  vss nfet w={2*wunit} l={lgate}
mn_b n1 b  vss vss nfet w={2*wunit} l={lgate}
mp_y y  yn vdd vdd pfet w={4*wunit} l={lgate}
mn_y y  yn vss vss nfet w={2*wunit} l={lgate}
.ends and2
