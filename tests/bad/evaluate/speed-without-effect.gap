assembly "Turning ring on a spigot"
lengths in mm
temperatures in degC
condition run 60 {
  speed 18000 rpm of ring
  ring 10 K above
}
part ring of steel_c45 { bore = dia 60 H7 }
part spigot of steel_c45 { seat = dia 60 g6 }
fit slide = spigot.seat in ring.bore {
  require "TR-1" clearance >= 0
}
