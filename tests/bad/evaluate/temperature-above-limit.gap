assembly "Gear shrunk on a shaft"
lengths in mm
temperatures in degC
condition shop 20
part gear of steel_42crmo4 {
  bore    = dia 60 H7
  outside = dia 120 ±0.1
}
part shaft of steel_42crmo4 { seat = dia 60 x6 }
fit shrink = shaft.seat in gear.bore {
  joint {
    length 40
    friction 0.15
    insertion clearance 0.05
    gear outside gear.outside
    shaft solid
  }
  require "GS-1" joining temperature <= 180 degC
}
