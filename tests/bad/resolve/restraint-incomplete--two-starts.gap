assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part plate of aluminium_6082_t6 { thickness = 20 ±0.1 }
part bolt of steel_8_8 { grip = 20 ±0.1 }
gap left = bolt.grip - plate.thickness { require >= -0.5 }
restraint clamp {
  squeezed plate.thickness area 200 mm2
  stretched bolt.grip area 36 mm2
  preload 5 kN at day
  start gap left
  require force >= 1 kN
}
