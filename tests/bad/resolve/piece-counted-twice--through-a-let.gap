assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part arm of aluminium_6061_t6 { width = 30 ±0.1 }
part shim of stainless_304 { thickness = 0.2 ±0.01 }
let pack = 3x shim.thickness
gap left = arm.width - pack - shim.thickness { require >= 0.05 }
