assembly "Spacer in a frame"
lengths in mm
temperatures in degC
condition shop 20
condition hot  80
part frame of aluminium_6082_t6 { slot = 100.10 ±0.02 }
part insert of steel_c45 { length = 100 ±0.03 }
gap play = frame.slot - insert.length {
  require "SF-2" <= 0.20
}
