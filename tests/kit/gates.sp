* Gates as a kit's library has them: X lines for devices, lengths in
* micrometres, wells on pins of their own.
.subckt kit_inv a y vdd vss vnw vpw
xm1 y a vss vss kit_n w=0.42 l=0.13
xm2 y a vdd vdd kit_p w=0.84 l=0.13
.ends kit_inv

.subckt kit_nand2 a b y vdd vss vnw vpw
xm1 y  a n1  vpw kit_n w=0.84 l=0.13
xm2 n1 b vss vpw kit_n w=0.84 l=0.13
xm3 y  a vdd vnw kit_p w=0.84 l=0.13
xm4 y  b vdd vnw kit_p w=0.84 l=0.13
.ends kit_nand2

.subckt kit_nor2 a b y vdd vss vnw vpw
xm1 y  a vss vpw kit_n w=0.42 l=0.13
xm2 y  b vss vpw kit_n w=0.42 l=0.13
xm3 y  a p1  vnw kit_p w=1.68 l=0.13
xm4 p1 b vdd vnw kit_p w=1.68 l=0.13
.ends kit_nor2
