* Turns an interrupt request line round before the priority chain.
* Sizing: the reference of logical effort, P 2 and N 1, three units of gate.
.subckt inv a y vdd vss
mp_a y a vdd vdd pfet w={2*wunit} l={lgate}
mn_a y a vss vss nfet w={wunit}   l={lgate}
.ends inv
