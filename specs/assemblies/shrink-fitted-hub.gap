# A light-alloy hub shrunk on a hollow steel shaft. The hub grows away from the shaft when it is hot:
# it must still carry its torque there, and must not yield where the interference is greatest. More
# heat than its temper stands would be needed to slip it on, so the shaft comes out of dry ice.
assembly "Belt pulley, shrink-fitted hub"
drawing "BP-15" rev "A"
lengths in mm
temperatures in degC

condition cold    -30
condition assembly 20
condition hot      80 { hub 5 .. 10 K above shaft }

part hub of aluminium_7075 {
  bore    = dia 40 H7
  outside = dia 80 ±0.1
}
part shaft of steel_42crmo4 {
  seat = dia 40 y6
  bore = dia 15 ±0.1
}

fit seat = shaft.seat in hub.bore {
  joint {
    length 40
    hub outside hub.outside
    shaft bore shaft.bore
    friction 0.12 .. 0.18
    hub Rz 4 um
    shaft Rz 4 um
    insertion clearance 0.02
  }
  require "BP-1" torque >= 120 N*m
    because "belt pull at start"
  require "BP-2" stress in hub <= 75 % of yield
  require "BP-3" loosening temperature >= 110 degC
}
