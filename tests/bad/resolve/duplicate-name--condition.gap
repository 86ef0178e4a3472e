assembly "Idler pulley"
condition day 20
condition day 25
part arm of aluminium_6061_t6 { width = 30 ±0.1 }
gap left = arm.width - 29 mm { require >= 0.05 }
