* predictive 180 nm bulk, 1.8 V
* BSIM4 (level 54), one n and one p device.  A predictive card, not a
* foundry's: figures and sources in SOURCE.md.
* The deck sets, before the include: dvth_n dvth_p (V, positive: weaker),
* kmob_n kmob_p, ktox (factors), dlen (m, added to the channel length).

.model p180_n nmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={4e-9*ktox} epsrox=3.9
+ xl={-20e-9+dlen} lint=30e-9
+ xj=80e-9 ndep=3.5e17 ngate=1.5e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={0.4+dvth_n} k1=0.45 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=0.8 dvt2=0
+ dsub=0.35 eta0=0.144 etab=0
+ voff=-0.074 nfactor=1.47 minv=0
* current
+ u0={0.035*kmob_n} ua=1.29e-9 ub=2.58e-18 uc=0
+ vsat=1.38e5 a0=1 keta=0 rdsw=250
+ pclm=0.05 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=3.28e-10 cgdo=3.28e-10 cgsl=1.97e-10 cgdl=1.97e-10
+ cf=1e-10
+ cjs=2.61e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=2.61e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=5.22e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.2 kt2=0.022 ute=-1.3 at=3.3e4

.model p180_p pmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={4.2e-9*ktox} epsrox=3.9
+ xl={-20e-9+dlen} lint=20e-9
+ xj=80e-9 ndep=3.5e17 ngate=1.5e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={-0.34-dvth_p} k1=0.45 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=0.8 dvt2=0
+ dsub=0.35 eta0=0.0696 etab=0
+ voff=-0.153 nfactor=1.07 minv=0
* current
+ u0={0.008*kmob_p} ua=5.92e-11 ub=1.18e-19 uc=0
+ vsat=1.05e5 a0=1 keta=0 rdsw=450
+ pclm=0.3 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=3.28e-10 cgdo=3.28e-10 cgsl=1.97e-10 cgdl=1.97e-10
+ cf=1e-10
+ cjs=2.61e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=2.61e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=5.22e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.2 kt2=0.022 ute=-1.3 at=3.3e4
