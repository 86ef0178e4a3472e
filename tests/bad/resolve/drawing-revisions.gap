assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part arm of aluminium_6061_t6 { drawing "IP-2" rev "A"; width = 30 ±0.1 }
part hub of steel_c45 { drawing "IP-2" rev "B"; width = 29.6 ±0.1 }
gap left = arm.width - hub.width { require >= 0.05 }
