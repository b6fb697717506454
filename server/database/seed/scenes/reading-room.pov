// A reading room: window, sideboard with books and a vase, an armchair and a rug.
#version 3.7;
#include "room.inc"
#include "reading-room.inc"

#declare Room_Colour = <0.60, 0.64, 0.63>;

difference {
  box { <-1, -1, 0>, <Wall_Width + 1, Wall_Height + 1, 140> }
  box { <Window_Left + 60, Window_Bottom + 60, -10>, <Window_Right - 60, Window_Top - 60, 300> }
  Plaster(Room_Colour)
}
box { <-120, 0, -4900>, <0, Wall_Height, 1> Flat_Plaster(Room_Colour * 0.98) }
box { <Wall_Width, 0, -4900>, <Wall_Width + 120, Wall_Height, 1> Flat_Plaster(Room_Colour * 0.98) }
box { <-200, 0, -4920>, <Wall_Width + 200, Wall_Height, -4900> Flat_Plaster(Room_Colour) }
box { <-200, Wall_Height, -4950>, <Wall_Width + 200, Wall_Height + 50, 200> Flat_Plaster(<0.78, 0.78, 0.76>) }
Board_Floor(-150, Wall_Width + 150, 4900, 60, <0.34, 0.22, 0.13>, <0.21, 0.12, 0.06>, 8)

object { Skirting(0, Wall_Width, Skirting_Top, Skirting_Depth) }
object { Outlet_Plate(Outlet_Left, Outlet_Bottom, Outlet_Right, Outlet_Top, Outlet_Depth) }

// The window: casing, two sashes, and an overcast sky over a hedge.
#declare Sash_Left = Window_Left + 70;
#declare Sash_Right = Window_Right - 70;
#declare Sash_Bottom = Window_Bottom + 70;
#declare Sash_Top = Window_Top - 70;
#declare Sash_Middle = (Sash_Bottom + Sash_Top) / 2;
object { Casing(Window_Left, Window_Bottom, Window_Right, Window_Top, 20, 1) }
union {
  box { <Sash_Left, Sash_Bottom, 60>, <Sash_Left + 45, Sash_Top, 100> }
  box { <Sash_Right - 45, Sash_Bottom, 60>, <Sash_Right, Sash_Top, 100> }
  box { <Sash_Left, Sash_Bottom, 60>, <Sash_Right, Sash_Bottom + 60, 100> }
  box { <Sash_Left, Sash_Top - 45, 60>, <Sash_Right, Sash_Top, 100> }
  box { <Sash_Left, Sash_Middle - 25, 50>, <Sash_Right, Sash_Middle + 25, 100> }
  Paint(<0.78, 0.77, 0.73>)
}
box { <-6000, -500, 3000>, <9000, 7000, 3010> no_shadow
  pigment { gradient y color_map { [0 rgb <0.30, 0.35, 0.24>] [0.22 rgb <0.36, 0.42, 0.30>] [0.27 rgb <0.78, 0.84, 0.88>] [1 rgb <0.90, 0.95, 1.0>] }
    turbulence 0.03 scale 7500 translate -500 * y }
  finish { diffuse 0 emission 0.95 } }

// The sideboard.
#declare Bay = (Sideboard_Right - Sideboard_Left - 40) / 3;
union {
  box { <Sideboard_Left, Sideboard_Top - 28, -Sideboard_Depth>, <Sideboard_Right, Sideboard_Top, -18> }
  box { <Sideboard_Left + 12, 170, -Sideboard_Depth + 30>, <Sideboard_Right - 12, Sideboard_Top - 28, -22> }
  Wood(<0.36, 0.23, 0.13>, <0.25, 0.15, 0.08>, 16)
}
#declare I = 0;
#while (I < 3)
  box { <Sideboard_Left + 22 + Bay * I, 184, -Sideboard_Depth + 10>,
        <Sideboard_Left + 18 + Bay * (I + 1), Sideboard_Top - 38, -Sideboard_Depth + 32>
    Wood(<0.38, 0.245, 0.14>, <0.27, 0.165, 0.09>, 16) }
  sphere { <Sideboard_Left + 20 + Bay * I + (I = 0 ? Bay - 60 : 60), 560, -Sideboard_Depth - 8>, 14
    pigment { rgb <0.36, 0.29, 0.16> } finish { specular 0.5 roughness 0.03 } }
  #declare I = I + 1;
#end
#declare Leg = cone { <0, 172, 0>, 22, <0, 0, 0>, 13 Wood(<0.36, 0.23, 0.13>, <0.25, 0.15, 0.08>, 10) }
object { Leg translate <Sideboard_Left + 70, 0, -Sideboard_Depth + 80> }
object { Leg translate <Sideboard_Right - 70, 0, -Sideboard_Depth + 80> }
object { Leg translate <Sideboard_Left + 70, 0, -80> }
object { Leg translate <Sideboard_Right - 70, 0, -80> }

// On it: books, a vase with dry stems, a bowl.
Book_Row(Sideboard_Left + 130, Sideboard_Top, -70, 13, 21)
object { Vase(Sideboard_Right - 420, Sideboard_Top, -230, 230, 170, <0.58, 0.52, 0.43>) }
Stems(Sideboard_Right - 420, Sideboard_Top + 190, -230, 9, 300, 5)
lathe { linear_spline 6 <0, 8>, <70, 8>, <130, 78>, <124, 80>, <66, 14>, <0, 14>
  translate <Sideboard_Left + 980, Sideboard_Top, -240> Paint(<0.17, 0.24, 0.25>) }

// An armchair turned a little towards the room, and a rug.
#declare Chair_Leg = cone { <0, 215, 0>, 26, 0, 16 Wood(<0.30, 0.19, 0.11>, <0.21, 0.12, 0.06>, 10) }
union {
  object { Padded(<-390, 190, -400>, <390, 430, 330>, 0.18) }
  object { Padded(<-300, 400, -430>, <300, 520, 250>, 0.35) }
  object { Padded(<-380, 330, 190>, <380, 900, 400>, 0.25) }
  object { Padded(<-410, 260, -410>, <-280, 610, 360>, 0.3) }
  object { Padded(<280, 260, -410>, <410, 610, 360>, 0.3) }
  object { Chair_Leg translate <-330, 0, -340> }
  object { Chair_Leg translate <330, 0, -340> }
  object { Chair_Leg translate <-330, 0, 300> }
  object { Chair_Leg translate <330, 0, 300> }
  pigment { rgb <0.42, 0.28, 0.16> }
  normal { bumps 0.2 scale 4 }
  rotate -68 * y
  translate <640, 0, -1180>
}
union {
  box { <1100, 0, -2900>, <3700, 8, -1050> pigment { rgb <0.50, 0.45, 0.37> } }
  box { <1180, 0, -2820>, <3620, 8.6, -1130> pigment { rgb <0.22, 0.27, 0.30> } }
  box { <1230, 0, -2770>, <3570, 9.2, -1180> pigment { rgb <0.48, 0.43, 0.36> } }
  normal { bumps 0.5 scale 5 }
}

All_Marks()
Daylight(<Wall_Width - 90, 1600, -2700>, 1700 * z, 1300, 0.62)
Fill_Light(<1700, 1500, -4600>, 0.30)
Fill_Light(<Window_Left + 480, 1530, -60>, 0.16)
