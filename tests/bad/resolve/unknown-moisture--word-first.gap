assembly "Press"
lengths in mm
temperatures in degC
condition hot 90 { rod above 97 }
part rod of steel_c45 { outside = dia 20 h6 }
part plate of steel_c45 { bore = dia 20 H7 }
fit press = rod.outside in plate.bore {
  require clearance >= 0
}
