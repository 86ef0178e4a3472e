assembly "Idler, preload shims"
lengths in mm
temperatures in degC
condition shop 20
condition hot  80
part case of aluminium_6082_t6 { depth = 40.35 ±0.10 }
part shaft of steel_c45 { shoulder = 24.00 ±0.03 }
part bearing of steel_100cr6 { width = 16 0/-0.05 }
part shim of stainless_304 { thickness = one of 0.10, 0.20, 0.40 ±0.005 }
gap float = case.depth - shaft.shoulder - bearing.width - shim.thickness {
  require "ID-1" 0.02 .. 0.17
}
