// A café wall: a wooden counter with a tiled splash, two stools, a door to the street, a vent.
#version 3.7;
#include "room.inc"
#include "cafe-counter.inc"

#declare Cafe_Colour = <0.71, 0.66, 0.57>;

difference {
  box { <-1, -1, 0>, <Wall_Width + 1, Wall_Height + 1, 140> }
  Opening(Door_Left, 0, Door_Right, Door_Top)
  Plaster(Cafe_Colour)
}
box { <-120, 0, -5600>, <0, Wall_Height, 1> Flat_Plaster(Cafe_Colour * 0.98) }
box { <Wall_Width, 0, -5600>, <Wall_Width + 120, Wall_Height, 1> Flat_Plaster(Cafe_Colour * 0.98) }
box { <-200, 0, -5620>, <Wall_Width + 200, Wall_Height, -5600> Flat_Plaster(Cafe_Colour) }
box { <-200, Wall_Height, -5650>, <Wall_Width + 200, Wall_Height + 50, 200> Flat_Plaster(<0.78, 0.78, 0.76>) }

// Stone floor tiles with a joint.
#declare Chance = seed(31);
#declare Row = 0;
#while (Row < 14)
  #declare Column = 0;
  #while (Column < 14)
    #declare Tone = 0.9 + 0.16 * rand(Chance);
    box { <0, -20, -397>, <397, 0, 0>
      pigment { bozo turbulence 0.7 color_map { [0 rgb <0.36, 0.34, 0.31> * Tone] [1 rgb <0.43, 0.41, 0.37> * Tone] } scale 160 translate 900 * Row }
      finish { specular 0.08 roughness 0.04 }
      translate <Column * 400 - 300, 0, 60 - Row * 400> }
    #declare Column = Column + 1;
  #end
  #declare Row = Row + 1;
#end
box { <-300, -40, -5600>, <Wall_Width + 300, -3, 100> pigment { rgb 0.30 } }

// The splash: tiles in running bond, cut off at the ends.
intersection {
  union {
    #declare Row = 0;
    #while (Row < 4)
      #declare X = Tiles_Left - (mod(Row, 2) = 0 ? 0 : 76);
      #while (X < Tiles_Right)
        #declare Tone = 0.95 + 0.09 * rand(Chance);
        box { <X, Tiles_Bottom + 77.5 * Row, -Tiles_Depth>, <X + 149, Tiles_Bottom + 77.5 * Row + 74.5, 1>
          pigment { rgb <0.30, 0.42, 0.38> * Tone } finish { diffuse 0.75 specular 0.25 roughness 0.02 } }
        #declare X = X + 152;
      #end
      #declare Row = Row + 1;
    #end
    box { <Tiles_Left, Tiles_Bottom, -3>, <Tiles_Right, Tiles_Top, 1> pigment { rgb 0.55 } }
  }
  box { <Tiles_Left, Tiles_Bottom, -50>, <Tiles_Right, Tiles_Top, 0.9> }
}

// The counter: boarded front, thick top.
box { <Counter_Left, Counter_Top - 45, -Counter_Depth>, <Counter_Right, Counter_Top, -1>
  Wood(<0.40, 0.27, 0.16>, <0.29, 0.18, 0.10>, 16) }
box { <Counter_Left + 40, 0, -Counter_Depth + 90>, <Counter_Right - 40, 90, -20> Paint(<0.06, 0.06, 0.06>) }
#declare X = Counter_Left + 30;
#while (X < Counter_Right - 40)
  box { <X, 90, -Counter_Depth + 40>, <X + 90, Counter_Top - 45, -Counter_Depth + 62> Paint(<0.13, 0.21, 0.20>) }
  #declare X = X + 92.57;
#end
box { <Counter_Left + 30, 90, -Counter_Depth + 46>, <Counter_Right - 30, Counter_Top - 45, -20> Paint(<0.11, 0.18, 0.17>) }

object { Skirting(0, Counter_Left + 40, Skirting_Top, Skirting_Depth) }
object { Skirting(Counter_Right - 40, Skirting_Right, Skirting_Top, Skirting_Depth) }
object { Skirting(Door_Right, Wall_Width, Skirting_Top, Skirting_Depth) }
object { Casing(Door_Left, 0, Door_Right, Door_Top, Door_Depth, 0) }
object { Door_Leaf(Door_Left, Door_Right, Door_Top, <0.15, 0.24, 0.23>) }
object { Switch_Plate(Switch_Left, Switch_Bottom, Switch_Right, Switch_Top, Switch_Depth) }
object { Outlet_Plate(Outlet_Left, Outlet_Bottom, Outlet_Right, Outlet_Top, Outlet_Depth) }
object { Outlet_Plate(Second_Outlet_Left, Second_Outlet_Bottom, Second_Outlet_Right, Second_Outlet_Top, Second_Outlet_Depth) }
union {
  difference {
    box { <Vent_Left, Vent_Bottom, -Vent_Depth>, <Vent_Right, Vent_Top, 1> }
    box { <Vent_Left + 18, Vent_Bottom + 18, -Vent_Depth - 5>, <Vent_Right - 18, Vent_Top - 18, -1> }
  }
  #declare Y = Vent_Bottom + 26;
  #while (Y < Vent_Top - 20)
    box { <Vent_Left + 10, -6, -1.5>, <Vent_Right - 10, 6, 1.5> rotate 35 * x translate <0, Y, -5> }
    #declare Y = Y + 13;
  #end
  Paint(<0.76, 0.75, 0.71>)
}

// On the counter: stacked cups, jars, a grinder.
#declare Cup = lathe { linear_spline 6 <0, 3>, <26, 3>, <41, 66>, <38, 67>, <24, 7>, <0, 7> Paint(<0.74, 0.72, 0.67>) }
#declare I = 0;
#while (I < 6)
  object { Cup translate <760 + mod(I, 3) * 92, Counter_Top + (I > 2 ? 68 : 0), -250> }
  #declare I = I + 1;
#end
#declare I = 0;
#while (I < 3)
  cylinder { <1850 + I * 145, Counter_Top, -210>, <1850 + I * 145, Counter_Top + 190 - 25 * I, -210>, 56
    Paint((I = 1 ? <0.38, 0.25, 0.14> : <0.60, 0.56, 0.48>)) }
  cylinder { <1850 + I * 145, Counter_Top + 190 - 25 * I, -210>, <1850 + I * 145, Counter_Top + 212 - 25 * I, -210>, 59
    Wood(<0.44, 0.31, 0.19>, <0.32, 0.21, 0.12>, 6) }
  #declare I = I + 1;
#end
union {
  object { Padded(<-85, 0, -150>, <85, 60, 110>, 0.2) }
  cylinder { <0, 40, 0>, <0, 250, 0>, 62 }
  cone { <0, 250, 0>, 45, <0, 400, 0>, 92 }
  cylinder { <0, 400, 0>, <0, 414, 0>, 95 }
  object { Padded(<-24, 120, -130>, <24, 170, 0>, 0.3) }
  translate <3180, Counter_Top, -290>
  Paint(<0.16, 0.16, 0.16>)
}
object { Vase(1330, Counter_Top, -260, 150, 150, <0.50, 0.30, 0.20>) }
Stems(1330, Counter_Top + 120, -260, 8, 220, 12)

// Two stools.
#declare Stool = union {
  cylinder { <0, 640, 0>, <0, 676, 0>, 165 Wood(<0.44, 0.31, 0.19>, <0.32, 0.21, 0.12>, 8) }
  #local I = 0;
  #while (I < 4)
    cylinder { <110, 640, 0>, <185, 0, 0>, 13 rotate (45 + 90 * I) * y Paint(<0.06, 0.06, 0.06>) }
    #local I = I + 1;
  #end
  torus { 160, 8 translate 230 * y Paint(<0.06, 0.06, 0.06>) }
}
object { Stool translate <1150, 0, -880> }
object { Stool rotate 20 * y translate <2280, 0, -930> }

All_Marks()
Daylight(<90, 1600, -3200>, 2200 * z, 1500, 0.80)
Fill_Light(<3200, 1600, -5300>, 0.42)
