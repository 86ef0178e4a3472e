assembly "Press"
lengths in mm
temperatures in degC
condition hot 90
part rod of steel_c45 { outside = dia h6 20 }
part plate of steel_c45 { bore = dia 20 H7 }
fit press = rod.outside in plate.bore {
  require clearance >= 0
}
