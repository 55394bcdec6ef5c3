* nand2 b->y rise a=1, fanout 3, self drive
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
vsrc src 0 pulse(0 1 3.3e-12 3.3e-12 3.3e-12 3.667e-10 1.48e-09)
* shaping stage 1: 0.111111111 copies of nand2
ms1_1 s1_out vpwr vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=0.111111111
ms1_2 s1_out src vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=0.111111111
ms1_3 s1_out vpwr s1_n5 0 p45_n w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=6.3e-15 pd=5.6e-07 ps=2.5e-07 m=0.111111111
ms1_4 s1_n5 src 0 0 p45_n w=1.8e-07 l=4.5e-08 ad=6.3e-15 as=1.8e-14 pd=2.5e-07 ps=5.6e-07 m=0.111111111
* shaping stage 2: 0.333333333 copies of nand2
ms2_1 d_in vpwr vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=0.333333333
ms2_2 d_in s1_out vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=0.333333333
ms2_3 d_in vpwr s2_n5 0 p45_n w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=6.3e-15 pd=5.6e-07 ps=2.5e-07 m=0.333333333
ms2_4 s2_n5 s1_out 0 0 p45_n w=1.8e-07 l=4.5e-08 ad=6.3e-15 as=1.8e-14 pd=2.5e-07 ps=5.6e-07 m=0.333333333
* cell under test: 1 copies of nand2
md_1 d_out vpwr vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=1
md_2 d_out d_in vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=1
md_3 d_out vpwr d_n5 0 p45_n w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=6.3e-15 pd=5.6e-07 ps=2.5e-07 m=1
md_4 d_n5 d_in 0 0 p45_n w=1.8e-07 l=4.5e-08 ad=6.3e-15 as=1.8e-14 pd=2.5e-07 ps=5.6e-07 m=1
* load: 3 copies of nand2
ml1_1 l1_out vpwr vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=3
ml1_2 l1_out d_out vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=3
ml1_3 l1_out vpwr l1_n5 0 p45_n w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=6.3e-15 pd=5.6e-07 ps=2.5e-07 m=3
ml1_4 l1_n5 d_out 0 0 p45_n w=1.8e-07 l=4.5e-08 ad=6.3e-15 as=1.8e-14 pd=2.5e-07 ps=5.6e-07 m=3
* load on the load: 9 copies of nand2
ml2_1 l2_out vpwr vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=9
ml2_2 l2_out l1_out vpwr vpwr p45_p w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=1.8e-14 pd=5.6e-07 ps=5.6e-07 m=9
ml2_3 l2_out vpwr l2_n5 0 p45_n w=1.8e-07 l=4.5e-08 ad=1.8e-14 as=6.3e-15 pd=5.6e-07 ps=2.5e-07 m=9
ml2_4 l2_n5 l1_out 0 0 p45_n w=1.8e-07 l=4.5e-08 ad=6.3e-15 as=1.8e-14 pd=2.5e-07 ps=5.6e-07 m=9
.tran 4.625e-11 7.433e-10 0 4.625e-11
.include "MODELS/p45.sp"
.meas tran delay_rise trig v(d_in) val=0.5 fall=1 targ v(d_out) val=0.5 rise=1
.meas tran input_rise trig v(d_in) val=0.2 rise=1 targ v(d_in) val=0.8 rise=1
.meas tran output_rise trig v(d_out) val=0.2 rise=1 targ v(d_out) val=0.8 rise=1
.meas tran delay_fall trig v(d_in) val=0.5 rise=1 targ v(d_out) val=0.5 fall=1
.meas tran input_fall trig v(d_in) val=0.8 fall=1 targ v(d_in) val=0.2 fall=1
.meas tran output_fall trig v(d_out) val=0.8 fall=1 targ v(d_out) val=0.2 fall=1
.end
