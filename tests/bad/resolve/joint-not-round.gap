assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part key of steel_c45 { width = 10 h9; length = 30 ±0.1 }
part hub of steel_c45 { slot = 10 P9; outside = dia 60 h9 }
fit seat = key.width in hub.slot {
  joint { length key.length; key solid; hub outside hub.outside }
  require clearance >= -0.1
}
