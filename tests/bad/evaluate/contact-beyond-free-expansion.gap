assembly "Insert in a cold frame"
lengths in mm
temperatures in degC
condition shop 20
condition cold -60
part frame of aluminium_6082_t6 { slot = 100.05 ±0.02 }
part insert of steel_c45 { length = 100 ±0.03 }
gap play = frame.slot - insert.length {
  require "IF-1" <= 0.30
}
