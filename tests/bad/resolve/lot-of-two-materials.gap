assembly "Plate on a base"
condition cold -40

part lid of copper_ofhc lot "7"
part plate of steel_c45 lot "7" {
  size = 58 ±0.05
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
