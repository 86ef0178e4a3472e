assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part plate of aluminium_6082_t6 { thickness = 20 ±0.1 }
part bolt of steel_8_8 { grip = 20 ±0.1 }
restraint clamp {
  squeezed plate.thickness area 200 mm2
  stretched bolt.grip stiffness 200 kN/mm
  preload 5 kN at day
  require stress in bolt <= 300 MPa
}
