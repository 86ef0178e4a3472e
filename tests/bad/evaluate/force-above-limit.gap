assembly "Pin to be pressed out"
lengths in mm
condition shop 20
part lever of steel_42crmo4 {
  eye     = dia 12 H7
  outside = dia 24 ±0.1
}
part pin of steel_c45 { diameter = dia 12 r6 }
fit press = pin.diameter in lever.eye {
  joint {
    length 15
    friction 0.10 .. 0.16
    lever outside lever.outside
    pin solid
  }
  require "PP-1" axial force <= 10 kN
}
