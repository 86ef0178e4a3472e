assembly "Ring on a light arbor"
lengths in mm
temperatures in degC
condition shop 20
condition hot  120
part arbor of aluminium_6082_t6 { seat = dia 50 k6 }
part ring of steel_100cr6 { bore = dia 50 0/-0.012 }
fit seat = arbor.seat in ring.bore {
  joint {
    length 20
    friction 0.12
    arbor solid
    ring outside 80
  }
  require "RA-1" interference 0 .. 0.050
}
