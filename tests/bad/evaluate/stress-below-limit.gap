assembly "Bush in a light plate"
lengths in mm
temperatures in degC
condition shop 20
condition hot  80
part plate of aluminium_6082_t6 {
  bore    = dia 30 H7
  outside = dia 50 ±0.1
}
part bush of steel_c45 {
  outside = dia 30 s6
  bore    = dia 20 ±0.05
}
fit press = bush.outside in plate.bore {
  joint {
    length 20
    friction 0.12 .. 0.18
    plate outside plate.outside
    bush bore bush.bore
  }
  require "BP-1" pressure >= 2 MPa
}
