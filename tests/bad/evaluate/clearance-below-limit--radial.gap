assembly "Rotor in a ring"
lengths in mm
condition shop 20
part ring of steel_c45 { bore = dia 40 +0.04/0 }
part rotor of steel_c45 { outside = dia 40 -0.04/-0.08 }
fit running = rotor.outside in ring.bore {
  require "RR-1" radial clearance >= 0.03
}
