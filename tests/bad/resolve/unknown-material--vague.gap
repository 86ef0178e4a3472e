assembly "Plate on a base"
condition cold -40

part plate of stainless {
  size = 58 ±0.05
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
