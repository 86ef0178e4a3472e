assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part arm of aluminium_6061_t6 { width = 30 ±0.1 }
part hub of steel_c45 { width = 29.6 ±0.1 }
let a0 = arm.width - hub.width
let a1 = a0 + a0
let a2 = a1 + a1
let a3 = a2 + a2
let a4 = a3 + a3
let a5 = a4 + a4
let a6 = a5 + a5
let a7 = a6 + a6
let a8 = a7 + a7
let a9 = a8 + a8
let a10 = a9 + a9
let a11 = a10 + a10
let a12 = a11 + a11
gap left = a12 { require >= 0.05 }
