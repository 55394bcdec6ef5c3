* predictive 65 nm bulk, 1.1 V
* BSIM4 (level 54), one n and one p device.  A predictive card, not a
* foundry's: figures and sources in SOURCE.md.
* The deck sets, before the include: dvth_n dvth_p (V, positive: weaker),
* kmob_n kmob_p, ktox (factors), dlen (m, added to the channel length).

.model p65_n nmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={1.85e-9*ktox} epsrox=3.9
+ xl={-25e-9+dlen} lint=7.75e-9
+ xj=20e-9 ndep=2.6e18 ngate=2e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={0.423+dvth_n} k1=0.4 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=1.2 dvt2=0
+ dsub=0.35 eta0=0.0721 etab=0
+ voff=-0.117 nfactor=2.29 minv=0
* current
+ u0={0.0491*kmob_n} ua=2.58e-10 ub=5.16e-19 uc=0
+ vsat=1.24e5 a0=1 keta=0 rdsw=165
+ pclm=0.2 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=2.84e-10 cgdo=2.84e-10 cgsl=1.7e-10 cgdl=1.7e-10
+ cf=1e-10
+ cjs=1.58e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=1.58e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=3.16e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.16 kt2=0.022 ute=-1.5 at=3.3e4

.model p65_p pmos level=54 version=4.8.0
+ mobmod=0 capmod=2 rdsmod=0 permod=1 diomod=1 tnom=27
* oxide, channel length, doping
+ toxe={1.95e-9*ktox} epsrox=3.9
+ xl={-25e-9+dlen} lint=7.75e-9
+ xj=20e-9 ndep=2.6e18 ngate=2e20
* threshold, roll-off, barrier lowering, subthreshold
+ vth0={-0.365-dvth_p} k1=0.4 k2=0 k3=0 lpe0=0
+ dvt0=0.5 dvt1=1.2 dvt2=0
+ dsub=0.35 eta0=0.0881 etab=0
+ voff=-0.094 nfactor=2.12 minv=0
* current
+ u0={0.0057*kmob_p} ua=1.48e-10 ub=2.96e-19 uc=0
+ vsat=7e4 a0=1 keta=0 rdsw=165
+ pclm=0.15 pdiblc1=0.001 pdiblc2=0.001 drout=0.5 pscbe1=1e10
* overlap, fringe and junction capacitance
+ cgso=2.84e-10 cgdo=2.84e-10 cgsl=1.7e-10 cgdl=1.7e-10
+ cf=1e-10
+ cjs=1.58e-3 mjs=0.4 pbs=0.9 jss=1e-4
+ cjsws=1.58e-10 mjsws=0.33 pbsws=0.9 jsws=1e-11
+ cjswgs=3.16e-10 mjswgs=0.33 pbswgs=0.9
* temperature
+ kt1=-0.16 kt2=0.022 ute=-1.5 at=3.3e4
