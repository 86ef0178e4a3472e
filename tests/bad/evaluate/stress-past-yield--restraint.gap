assembly "Cover held by one screw"
lengths in mm
temperatures in degC
condition shop 20
condition hot 120
part flange of aluminium_6082_t6 { height = 30 ±0.1 }
part screw of stainless_304 { grip = 30 exact }
restraint clamp {
  squeezed flange.height area 600 mm2
  stretched screw.grip area 58 mm2
  preload 20 kN at shop
  require "CS-1" force >= 8 kN
}
