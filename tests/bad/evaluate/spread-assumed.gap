assembly "Idler pulley"
condition day 20
part arm of aluminium_6061_t6 { width = 30 ±0.1; slot = 4 ±0.1 }
part hub of steel_c45 { width = 23.6 ±0.1 spread uniform; rim = 1.5 ±0.1 spread uniform }
gap left = arm.width - arm.slot - hub.width - hub.rim { require >= 0.3 for 99 % of assemblies }
