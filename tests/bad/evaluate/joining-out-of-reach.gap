assembly "Belt pulley, shrink-fitted hub"
lengths in mm
temperatures in degC
condition assembly 20
part hub of aluminium_7075 {
  bore    = dia 40 H7
  outside = dia 80 ±0.1
}
part shaft of steel_42crmo4 {
  seat = dia 40 +0.130/+0.114
  bore = dia 15 ±0.1
}
fit seat = shaft.seat in hub.bore {
  joint {
    length 40
    hub outside hub.outside
    shaft bore shaft.bore
    insertion clearance 0.04
  }
  require "BP-3" loosening temperature >= 110 degC
}
