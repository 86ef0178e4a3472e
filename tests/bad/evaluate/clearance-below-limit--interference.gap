assembly "Bronze bush on a steel shaft, cold"
lengths in mm
temperatures in degC
condition shop 20
condition cold -60
part shaft of steel_c45 { journal = dia 60 -0.01/-0.02 }
part bush of bronze_cusn8 { bore = dia 60 +0.02/0 }
fit running = shaft.journal in bush.bore {
  require "BB-1" clearance >= 0.005 at cold
}
