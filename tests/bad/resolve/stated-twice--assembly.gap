assembly "Idler pulley"
assembly "Tension pulley"
condition day 20
part arm of aluminium_6061_t6 { width = 30 ±0.1 }
gap left = arm.width - 29 mm { require >= 0.05 }
