assembly "Pulley hub"
lengths in mm
temperatures in degC
condition shop 20
part hub of aluminium_6061_t6 {
  bore = dia 40 H7
  outside = dia 52 exact
}
part shaft of steel_c45 { seat = dia 40 +0.260/+0.244 }
fit seat = shaft.seat in hub.bore {
  joint {
    length 30
    hub outside hub.outside
    shaft solid
  }
  require "PH-1" pressure >= 1 MPa
}
