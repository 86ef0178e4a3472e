assembly "Hub on a shaft"
lengths in mm
temperatures in degC
condition shop 20
condition hot  80
part hub of aluminium_6082_t6 {
  bore    = dia 40 H7
  outside = dia 80 ±0.2
}
part shaft of steel_c45 { seat = dia 40 s6 }
fit press = shaft.seat in hub.bore {
  joint {
    length 40
    friction 0.12 .. 0.16
    hub outside hub.outside
    shaft solid
  }
  require "HS-1" torque >= 200 N·m
}
