assembly "Ring that must not come loose"
lengths in mm
temperatures in degC
condition shop 20
part ring of aluminium_6082_t6 {
  bore    = dia 50 H7
  outside = dia 80 ±0.1
}
part shaft of steel_c45 { seat = dia 50 r6 }
fit press = shaft.seat in ring.bore {
  joint {
    length 20
    friction 0.12
    ring outside ring.outside
    shaft solid
  }
  require "RL-1" loosening temperature >= 100 degC
}
