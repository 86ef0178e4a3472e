# A stack of two bearings, a spacer and three shims between a shoulder and a cover: each piece its
# own, all of one lot where they are cut from one strip.
assembly "Drum hub, axial stack"
drawing "DH-40" rev "C"
lengths in mm
temperatures in degC
general ISO 2768-f

condition cold -30
condition shop  20
condition hot  110 { drum 10 K above }

part drum of aluminium_6082_t6 {
  depth = 55.00 +0.03/0
}
part bearing of steel_100cr6 { width = 16 0/-0.05 }
part spacer of steel_c45 { length = 22.00 ±0.02 }
part shim of stainless_304 lot "strip 12" { thickness = 0.20 ±0.005 }
part cover of aluminium_6082_t6 { spigot = 0.20 ±0.02 }

let pack = 3x shim.thickness

gap end_float =
    drum.depth
  - 2x bearing.width
  - spacer.length
  - pack
  - cover.spigot
{
  require "DH-1" 0.05 .. 0.55
    because "the wave spring works between these"
}
