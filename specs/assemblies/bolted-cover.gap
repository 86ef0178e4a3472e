# One of six steel screws through a light-alloy cover: hot, the cover swells under the head and the
# preload climbs; cold, it fades.
assembly "Pump cover, one of six screws"
lengths in mm
temperatures in degC

condition assembly 20 ±5
condition cold    -40
condition hot     120 { screw 10 K below }

part cover of aluminium_6082_t6 { thickness = 30 ±0.1 }
part washer of steel_c45 { thickness = 1.6 ±0.2 }
part screw of steel_8_8 { grip = 31.6 ±0.3 }

restraint clamp {
  squeezed  cover.thickness  area 160 mm2
  squeezed  washer.thickness area 150 mm2
  stretched screw.grip       stiffness 205 kN/mm ±8 % area 84.3 mm2
  preload 14 kN ±20 % at assembly
  require "PC-1" force >= 6 kN at cold
  require "PC-2" stress in screw <= 85 % of yield at hot
  require "PC-3" stress in cover <= 160 MPa
}
