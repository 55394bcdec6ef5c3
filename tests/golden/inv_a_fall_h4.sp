* inv a->y fall , fanout 4, matched drive
.options reltol=0.001 chgtol=1e-17 trtol=0.3 num_threads=1
* node p45, corner typical: typical process, 1 V, 25 C
.temp 25
.param dlen=0
.param dvth_n=0
.param dvth_p=0
.param kmob_n=1
.param kmob_p=1
.param ktox=1
vpwr vpwr 0 1
vsrc src 0 pulse(0 1 3.3e-12 3.3e-12 3.3e-12 3.067e-10 1.24e-09)
* shaping stage 1: 0.0625 copies of reference inverter
ms1_1 s1_out src 0 0 p45_n w=9e-08 l=4.5e-08 ad=9e-15 as=9e-15 pd=3.8e-07 ps=3.8e-07 m=0.0625
ms1_2 s1_out src vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=0.0625
* shaping stage 2: 0.25 copies of reference inverter
ms2_1 d_in s1_out 0 0 p45_n w=9e-08 l=4.5e-08 ad=9e-15 as=9e-15 pd=3.8e-07 ps=3.8e-07 m=0.25
ms2_2 d_in s1_out vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=0.25
* cell under test: 1 copies of inv
md_1 d_out d_in vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=1
md_2 d_out d_in 0 0 p45_n w=9e-08 l=4.5e-08 ad=9e-15 as=9e-15 pd=3.8e-07 ps=3.8e-07 m=1
* load: 4 copies of inv
ml1_1 l1_out d_out vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=4
ml1_2 l1_out d_out 0 0 p45_n w=9e-08 l=4.5e-08 ad=9e-15 as=9e-15 pd=3.8e-07 ps=3.8e-07 m=4
* load on the load: 16 copies of inv
ml2_1 l2_out l1_out vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=16
ml2_2 l2_out l1_out 0 0 p45_n w=9e-08 l=4.5e-08 ad=9e-15 as=9e-15 pd=3.8e-07 ps=3.8e-07 m=16
.tran 3.875e-11 6.233e-10 0 3.875e-11
.include "MODELS/p45.sp"
.meas tran delay_rise trig v(d_in) val=0.5 fall=1 targ v(d_out) val=0.5 rise=1
.meas tran input_rise trig v(d_in) val=0.2 rise=1 targ v(d_in) val=0.8 rise=1
.meas tran output_rise trig v(d_out) val=0.2 rise=1 targ v(d_out) val=0.8 rise=1
.meas tran delay_fall trig v(d_in) val=0.5 rise=1 targ v(d_out) val=0.5 fall=1
.meas tran input_fall trig v(d_in) val=0.8 fall=1 targ v(d_in) val=0.2 fall=1
.meas tran output_fall trig v(d_out) val=0.8 fall=1 targ v(d_out) val=0.2 fall=1
.end
