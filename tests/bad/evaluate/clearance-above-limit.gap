assembly "Bearing in an aluminium hub"
lengths in mm
temperatures in degC
condition shop 20
condition hot  90 ±5 { ring 10 K above hub }
part hub of aluminium_6082_t6 { bore = dia 62 N7 }
part ring of steel_100cr6 { outside = dia 62 0/-0.013 }
fit seat = ring.outside in hub.bore {
  require "BH-1" clearance <= 0.015
}
