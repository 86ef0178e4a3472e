assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part arm of aluminium_6061_t6 { width = 30 ±0.1 }
let half = arm.width / 2
gap left = arm.width - 2x half { require >= -0.05 }
