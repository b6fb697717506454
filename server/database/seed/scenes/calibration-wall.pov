// A bare plastered wall between two corners, with checker targets pinned to it.
#version 3.7;
#include "room.inc"
#include "calibration-wall.inc"

#declare Warm_White = <0.72, 0.69, 0.63>;

box { <-1, -1, 0>, <Wall_Width + 1, Wall_Height + 1, 120> Plaster(Warm_White) }
box { <-120, 0, -3600>, <0, Wall_Height, 1> Flat_Plaster(Warm_White * 0.97) }
box { <Wall_Width, 0, -3600>, <Wall_Width + 120, Wall_Height, 1> Flat_Plaster(Warm_White * 0.97) }
box { <-200, Wall_Height, -3700>, <Wall_Width + 200, Wall_Height + 50, 200> Flat_Plaster(<0.78, 0.78, 0.76>) }
box { <-200, 0, -3720>, <Wall_Width + 200, Wall_Height, -3700> Flat_Plaster(Warm_White) }
Board_Floor(-150, Wall_Width + 150, 3600, 60, <0.42, 0.30, 0.19>, <0.28, 0.18, 0.10>, 11)

object { Skirting(0, Wall_Width, Skirting_Top, Skirting_Depth) }
object { Outlet_Plate(Outlet_Left, Outlet_Bottom, Outlet_Right, Outlet_Top, Outlet_Depth) }
All_Marks()
Daylight(<700, 1500, -3350>, 1500 * x, 1300, 0.85)
