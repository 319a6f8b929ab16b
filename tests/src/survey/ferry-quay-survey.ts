/** The survey of Low road as a surveyor sends it: semicolons, decimal commas, a heading. */
export const FERRY_QUAY_CSV = `Chainage (m);x;y;Ground level;Surface;Clear width;Note
0;0,00;0,00;3,16;concrete;2,4;tie-in: flood wall 4.40
10;10,00;0,00;3,13;concrete;2,4;
20;20,00;0,00;3,12;concrete;2,8;
30;30,00;0,00;3,07;concrete;2,9;
40;40,00;0,00;3,03;concrete;6,0;"turn 20° right; slipway head"
45;44,70;-1,71;2,79;concrete;8,0;lowest ground
50;49,40;-3,42;2,84;concrete;8,0;
60;58,79;-6,84;2,87;turf;5,0;turn 90° left, Low road
70;62,21;2,56;2,87;turf;5,0;
80;65,63;11,95;2,88;turf;5,0;
90;69,05;21,35;2,94;turf;4,2;
95;70,76;26,05;2,95;turf;4,2;gully
100;72,47;30,75;2,95;turf;4,2;
105;74,18;35,45;2,94;turf;4,2;
110;75,89;40,14;2,96;turf;4,2;
115;77,60;44,84;2,95;turf;4,2;
120;79,32;49,54;2,98;asphalt;5,0;turn 35° left, car park
125;78,02;54,37;2,97;asphalt;5,0;
130;76,73;59,20;2,99;asphalt;5,0;
132;76,21;61,13;2,99;asphalt;5,0;old well
135;75,43;64,03;2,98;asphalt;5,0;
142;73,62;70,79;2,98;Loose gravel;5,0;parking strip
145;72,84;73,69;2,97;Loose gravel;5,0;
148;72,07;76,59;2,99;turf;5,0;
150;71,55;78,52;3,04;turf;5,0;turn 25° left
160;65,12;86,18;3,18;turf;5,0;
170;58,69;93,84;3,33;turf;5,0;
180;52,27;101,50;3,56;turf;5,0;tie-in: bank
`
