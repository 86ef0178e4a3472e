assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part arm of aluminium_6061_t6 { width = 30 ±0.1 }
part hub of steel_c45 { width = 29.6 ±0.1 }
gap left = arm.width - hub.width { require >= 0.05 for 99.9 of assemblies }
