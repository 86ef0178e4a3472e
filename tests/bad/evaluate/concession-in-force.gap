assembly "Spacer in a frame, as delivered"
lengths in mm
condition shop 20
part frame of aluminium_6082_t6 { slot = 100.10 ±0.02 }
part insert of steel_c45 { length = 100 ±0.03 }
gap play = frame.slot - insert.length {
  require "SF-1" >= 0.06
    concession "D-7" accepts 0.05 until 2026-03-31 approved "quality" because "stock on hand"
}
