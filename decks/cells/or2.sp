* Says that one of two requesters asks.
* Sizing: nor2 at the drive of the reference (P 4, N 1), then an inverter of
* twice the drive: P 4, N 2.
.subckt or2 a b y vdd vss
mp_a yn a  p1  vdd pfet w={4*wunit} l={lgate}
mp_b p1 b  vdd vdd pfet w={4*wunit} l={lgate}
mn_a yn a  vss vss nfet w={wunit}   l={lgate}
mn_b yn b  vss vss nfet w={wunit}   l={lgate}
mp_y y  yn vdd vdd pfet w={4*wunit} l={lgate}
mn_y y  yn vss vss nfet w={2*wunit} l={lgate}
.ends or2
