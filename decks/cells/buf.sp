* Carries a request across the arbiter.
* Sizing: the reference inverter, then one three times its size: P 6, N 3.
.subckt buf a y vdd vss
mp_1 yn a  vdd vdd pfet w={2*wunit} l={lgate}
mn_1 yn a  vss vss nfet w={wunit}   l={lgate}
mp_2 y  yn vdd vdd pfet w={6*wunit} l={lgate}
mn_2 y  yn vss vss nfet w={3*wunit} l={lgate}
.ends buf
