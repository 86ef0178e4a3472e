assembly "Pressed hub"
lengths in mm
temperatures in degC
condition shop 20
part hub of aluminium_6082_t6 {
  bore    = dia 40 H7
  outside = dia 60 ±0.1
  width   = 30 ±0.1
}
part shaft of steel_c45 { seat = dia 40 s6 }
gap wide = hub.width { require "PH-9" 29 .. 31 }
result across = hub.outside { require "PH-8" 59 .. 61 }
fit seat = shaft.seat in hub.bore {
  joint {
    length 20
    hub outside 60
    friction 0.12
    shaft solid
  }
  require "PH-1" joining temperature <= -300 degC
}
