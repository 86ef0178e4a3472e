

# A spec that was never laid out.
assembly   "Wheel"     # its title
lengths in mm;temperatures in °C
general{.X ±0.1;.XX +-0.05
  angle +/-0.5°}



condition cold -40±2
condition assembly 20 # on the bench
condition hot 120.5{moisture humid;shaft 97;bearing 5..9 K above housing}
condition warm_up from "data.csv"
condition wide 60 .. 100 {
 vessel 293 ; tabs 180±20
   lid 12°C # warm

 # the end
}
material alloy like aluminium_6061_t6{cte 23.4±0.3ppm/K over -60..150°C
expansion{-196°C -4150ppm;20°C 0ppm}
  cte along mean from 20°C , ppm/K {
100 11.5; 200 12.1
300 13
}
}
part housing of alloy lot "A" {
drawing "FW-310"rev "B"
bore=Ø42K6
seat_of_the_bearing   =   dia 20 js6   before coating 10±2µm build-up 50% # hard
depth = 31.5+0.05/0
    because"drawing"
  # the rest
let half=bore/2

width=13   0/-0.12   ;length=58.00..58.050
}
part shim of alloy{thickness=one of 0.10,  0.15 ,0.20±0.005}
part empty of alloy { }

gap end_float=
housing.depth# the hole
-2x bearing.width
# the shoulder comes next
-shaft.shoulder*-1
+ (a.b
- c.d / 2 × x^2)
{
require "R-20"0.05..0.60
require≥0.04 for 99.99% of assemblies
because"slack"
concession "D-7" accepts 0.031 until 2027-03-31 approved "M. Rask"
}
gap simple=a.b−c.d   # after the header
{ require <= 1 }
fit f=a.b+2× c.d in e.f after press{joint{length 20
friction 0.12..0.18}
require clearance -0.05 .. 0.1 at hot,cold}
restraint clamp{
squeezed cover.thickness area 160mm2
squeezed 2x washer.thickness area 150 mm2 # two
stretched screw.grip stiffness 205 kN/mm ±8% area 84.3mm2
preload 12kN±25% at assembly}
let torque = 3 N·m*2
# the end
fill  tank{cavity  of  body 240cm3;wall   bore body.bore  outside   body.outside # round
charge oil 200 cm3}
