assembly "Bolted cover, cold"
lengths in mm
temperatures in degC
condition shop 20
condition cold -60
part cover of aluminium_6082_t6 { thickness = 20 ±0.1 }
part bolt of steel_8_8 { grip = 20 ±0.1 }
restraint clamp {
  squeezed cover.thickness area 200 mm2
  stretched bolt.grip area 36 mm2
  preload 5 kN ±20 % at shop
  require "BC-1" force >= 3 kN
}
