assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part tank of aluminium_6061_t6 { depth = 60 ±0.3 }
fill oil { charge hydraulic_oil 200 cm3; require ullage >= 5 % }
gap rim = tank.depth - 50 mm { require >= 5 }
