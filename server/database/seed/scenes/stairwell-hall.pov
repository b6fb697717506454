// A hall with a panelled door, a bench, and the first steps of a stair going up behind the wall's free end.
#version 3.7;
#include "room.inc"
#include "stairwell-hall.inc"

#declare Hall_Colour = <0.66, 0.66, 0.60>;
#declare Stair_Right = Wall_Width + 980;
#declare Stair_Top = 5200;

// The wall itself, with its doorway; its right end is an outside corner.
difference {
  box { <-1, -1, 0>, <Wall_Width, Wall_Height + 1, 120> }
  Opening(Door_Left, 0, Door_Right, Door_Top)
  Plaster(Hall_Colour)
}
box { <-120, 0, -4600>, <0, Wall_Height, 1> Flat_Plaster(Hall_Colour * 0.98) }
box { <-200, 0, -4620>, <Stair_Right + 200, Wall_Height, -4600> Flat_Plaster(Hall_Colour) }
box { <-200, Wall_Height, -4700>, <Stair_Right, Wall_Height + 50, 110> Flat_Plaster(<0.78, 0.78, 0.76>) }
Board_Floor(-150, Stair_Right + 100, 4600, 60, <0.40, 0.27, 0.16>, <0.25, 0.15, 0.08>, 4)

// The stair: risers painted, treads oak, walls either side.
#declare Step = 0;
#while (Step < 13)
  box { <Wall_Width, 180 * Step, 60 + 265 * Step>, <Stair_Right, 180 * Step + 152, 90 + 265 * Step>
    Paint(<0.74, 0.73, 0.69>) }
  box { <Wall_Width, 180 * Step + 152, 36 + 265 * Step>, <Stair_Right, 180 * (Step + 1), 360 + 265 * Step>
    Wood(<0.42, 0.29, 0.17>, <0.30, 0.19, 0.10>, 14) }
  #declare Step = Step + 1;
#end
box { <Wall_Width - 120, 0, 120>, <Wall_Width - 2, Stair_Top, 4000> Flat_Plaster(Hall_Colour) }
box { <Stair_Right, 0, -4600>, <Stair_Right + 120, Stair_Top, 4000> Flat_Plaster(Hall_Colour * 0.98) }
box { <Wall_Width - 120, 0, 4000>, <Stair_Right + 120, Stair_Top, 4100> Flat_Plaster(Hall_Colour) }
box { <Wall_Width - 120, Wall_Height, 60>, <Stair_Right + 120, Stair_Top, 112> Flat_Plaster(Hall_Colour) }
box { <Wall_Width - 200, Stair_Top, 0>, <Stair_Right + 200, Stair_Top + 50, 4100> Flat_Plaster(<0.78, 0.78, 0.76>) }
light_source { <Wall_Width + 500, 4700, 2300>, rgb <1.0, 0.98, 0.92> * 0.5
  area_light 600 * x, 600 * z, 3, 3 adaptive 0 jitter fade_distance 2600 fade_power 1.6 }

// Handrail on the far side and a newel at the foot.
#declare Oak = Wood(<0.36, 0.23, 0.13>, <0.25, 0.15, 0.08>, 10)
cylinder { <Stair_Right - 70, 1010, 40>, <Stair_Right - 70, 1010 + 180 * 9, 40 + 265 * 9>, 24 texture { Oak } }
union {
  box { <Wall_Width + 8, 0, -62>, <Wall_Width + 92, 1120, 22> }
  box { <Wall_Width, 1120, -70>, <Wall_Width + 100, 1142, 30> }
  sphere { <Wall_Width + 50, 1182, -20>, 46 }
  texture { Oak rotate 90 * z }
}

object { Casing(Door_Left, 0, Door_Right, Door_Top, Door_Depth, 0) }
object { Door_Leaf(Door_Left, Door_Right, Door_Top, <0.70, 0.69, 0.65>) }
object { Skirting(0, Door_Left, Skirting_Top, Skirting_Depth) }
object { Skirting(Skirting_Left, Skirting_Right, Skirting_Top, Skirting_Depth) }
object { Switch_Plate(Switch_Left, Switch_Bottom, Switch_Right, Switch_Top, Switch_Depth) }
object { Outlet_Plate(Outlet_Left, Outlet_Bottom, Outlet_Right, Outlet_Top, Outlet_Depth) }

// The bench, its cushion, a basket beneath and a pair of boots.
union {
  box { <Bench_Left, Bench_Top - 75, -Bench_Depth>, <Bench_Right, Bench_Top - 40, -20> }
  box { <Bench_Left + 60, 0, -Bench_Depth + 25>, <Bench_Left + 100, Bench_Top - 75, -45> }
  box { <Bench_Right - 100, 0, -Bench_Depth + 25>, <Bench_Right - 60, Bench_Top - 75, -45> }
  box { <Bench_Left + 100, 90, -230>, <Bench_Right - 100, 140, -205> }
  Wood(<0.44, 0.31, 0.19>, <0.32, 0.21, 0.12>, 14)
}
object { Padded(<Bench_Left + 15, Bench_Top - 44, -Bench_Depth + 10>, <Bench_Right - 15, Bench_Top, -28>, 0.22)
  pigment { rgb <0.24, 0.29, 0.27> } normal { bumps 0.25 scale 3 } }
lathe {
  linear_spline 6
  <0, 2>, <120, 2>, <150, 220>, <143, 220>, <114, 10>, <0, 10>
  translate <Bench_Right - 300, 0, -210>
  pigment { rgb <0.44, 0.33, 0.20> }
  normal { radial 0.9 frequency 60 sine_wave }
}
#declare Boot = union {
  object { Padded(<-45, 0, -250>, <45, 88, 20>, 0.4) }
  object { Padded(<-42, 40, -85>, <42, 250, 22>, 0.35) }
  Paint(<0.11, 0.075, 0.05>)
}
object { Boot translate <Bench_Left + 240, 0, -130> }
object { Boot rotate 7 * y translate <Bench_Left + 345, 0, -140> }

All_Marks()
Daylight(<90, 1500, -2500>, 1500 * z, 1300, 0.72)
Fill_Light(<1900, 1600, -4300>, 0.30)
