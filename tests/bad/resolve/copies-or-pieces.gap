assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part arm of aluminium_6061_t6 { width = 30 ±0.1 }
part hub of steel_c45 { width = 25 ±0.1 }
part shim of stainless_304 { thickness = 2 ±0.02 }
gap left = arm.width - hub.width - 2 * shim.thickness { require >= 0.5 for 99.9 % of assemblies }
