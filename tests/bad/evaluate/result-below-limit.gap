assembly "Gear box, centre distance"
lengths in mm
temperatures in degC
condition cold -40
part box of aluminium_6082_t6 { pitch = 80 ±0.02 }
result distance = box.pitch {
  require "GD-1" >= 79.90
}
