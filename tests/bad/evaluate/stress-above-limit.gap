assembly "Steel ring on a light core"
lengths in mm
temperatures in degC
condition shop 20
condition hot 100
part core of aluminium_6082_t6 { outside = dia 60 s6 }
part ring of steel_42crmo4 {
  bore    = dia 60 H7
  outside = dia 70 ±0.1
}
fit press = core.outside in ring.bore {
  joint {
    length 25
    friction 0.12
    core solid
    ring outside ring.outside
  }
  require "SR-1" stress in ring <= 40 % of yield
}
