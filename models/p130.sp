* predictive 130 nm bulk, 1.3 V
* BSIM4 (level 54), one n and one p device.  A predictive card, not a
* foundry's: figures and sources in SOURCE.md.
* The deck sets, before the include: dvth_n dvth_p (V, positive: weaker),
* kmob_n kmob_p, ktox (factors), dlen (m, added to the channel length).

.model p130_n nmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={2.25e-9*ktox} epsrox=3.9
+ xl={-45e-9+dlen} lint=18e-9
+ xj=40e-9 ndep=1.5e18 ngate=2e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={0.378+dvth_n} k1=0.4 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=1 dvt2=0
+ dsub=0.35 eta0=0.12 etab=0
+ voff=-0.124 nfactor=1.87 minv=0
* current
+ u0={0.0593*kmob_n} ua=3.76e-10 ub=7.52e-19 uc=0
+ vsat=1e5 a0=1 keta=0 rdsw=200
+ pclm=0.2 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=3.66e-10 cgdo=3.66e-10 cgsl=2.19e-10 cgdl=2.19e-10
+ cf=1e-10
+ cjs=1.37e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=1.37e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=2.73e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.2 kt2=0.022 ute=-1.3 at=3.3e4

.model p130_p pmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={2.35e-9*ktox} epsrox=3.9
+ xl={-45e-9+dlen} lint=18e-9
+ xj=40e-9 ndep=1.5e18 ngate=2e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={-0.321-dvth_p} k1=0.4 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=1 dvt2=0
+ dsub=0.35 eta0=0.151 etab=0
+ voff=-0.103 nfactor=1.73 minv=0
* current
+ u0={0.0084*kmob_p} ua=2.57e-10 ub=5.13e-19 uc=0
+ vsat=7e4 a0=1 keta=0 rdsw=240
+ pclm=0.05 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=3.66e-10 cgdo=3.66e-10 cgsl=2.19e-10 cgdl=2.19e-10
+ cf=1e-10
+ cjs=1.37e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=1.37e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=2.73e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.2 kt2=0.022 ute=-1.3 at=3.3e4
