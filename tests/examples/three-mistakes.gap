assembly "Sensor in a flange"
lengths in mm

condition cold -30
condition day   20

part flange of aluminium_6061_t6 {
  depth  = 12.0 ±0.1
  recess = 8 millimetre ±0.1
}
part cover of steel_c54 { thickness = 3 ±0.05 }
part sensor of stainless_304 { height = 9 ±0.05; collar = 2 ±0.05 }

gap seat_left = flange.recess - sensor.height { require >= 0.05 }
gap cover_left = flange.depth - cover.thickness { require >= 0.05 }
gap collar_left = flange.depth - sensor.collar * sensor.collar { require >= 0.05 }
gap flange_left = flange.depth - sensor.colar { require >= 0.05 }
gap depth_left = flange.depth - sensor.height { require >= 0.05 }
