assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part key of steel_c45 { width = 10 h9 }
part hub of steel_c45 { slot = 10 D10 }
fit seat = key.width in hub.slot { require radial clearance >= 0 }
