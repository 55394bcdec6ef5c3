* predictive 45 nm bulk, high performance, 1.0 V
* BSIM4 (level 54), one n and one p device.  A predictive card, not a
* foundry's: figures and sources in SOURCE.md.
* The deck sets, before the include: dvth_n dvth_p (V, positive: weaker),
* kmob_n kmob_p, ktox (factors), dlen (m, added to the channel length).

.model p45_n nmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={1.25e-9*ktox} epsrox=3.9
+ xl={-15e-9+dlen} lint=6.25e-9
+ xj=14e-9 ndep=3.2e18 ngate=2e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={0.469+dvth_n} k1=0.36 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=1.2 dvt2=0
+ dsub=0.35 eta0=0.0692 etab=0
+ voff=-0.118 nfactor=2.47 minv=0
* current
+ u0={0.054*kmob_n} ua=3.96e-10 ub=7.92e-19 uc=0
+ vsat=1.7e5 a0=1 keta=0 rdsw=155
+ pclm=0.05 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=2.36e-10 cgdo=2.36e-10 cgsl=1.41e-10 cgdl=1.41e-10
+ cf=1e-10
+ cjs=1.74e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=1.74e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=3.49e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.11 kt2=0.022 ute=-1.5 at=3.3e4

.model p45_p pmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={1.3e-9*ktox} epsrox=3.9
+ xl={-15e-9+dlen} lint=6.25e-9
+ xj=14e-9 ndep=3.2e18 ngate=2e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={-0.492-dvth_p} k1=0.36 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=1.2 dvt2=0
+ dsub=0.35 eta0=0.0809 etab=0
+ voff=-0.0908 nfactor=2.39 minv=0
* current
+ u0={0.02*kmob_p} ua=4.27e-10 ub=8.54e-19 uc=0
+ vsat=1.5e5 a0=1 keta=0 rdsw=155
+ pclm=0.05 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=2.36e-10 cgdo=2.36e-10 cgsl=1.41e-10 cgdl=1.41e-10
+ cf=1e-10
+ cjs=1.74e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=1.74e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=3.49e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.11 kt2=0.022 ute=-1.5 at=3.3e4
