assembly "Long hub on a solid shaft"
lengths in mm
temperatures in degC
condition shop 20
condition run 60 { hub 5 K above shaft }
part hub of aluminium_6082_t6 {
  bore    = dia 40 H7
  outside = dia 80 ±0.1
}
part shaft of steel_c45 { seat = dia 40 x6 }
fit seat = shaft.seat in hub.bore {
  joint {
    length 60
    friction 0.12 .. 0.18
    hub outside hub.outside
    shaft solid
  }
  require "LH-1" stress in hub <= 185 MPa
  require "LH-2" torque >= 40 N*m
}
