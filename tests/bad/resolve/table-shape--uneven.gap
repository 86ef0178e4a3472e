assembly "Plate on a base"
condition up from "data/uneven.csv"

part plate of steel_c45 {
  size = 58 ±0.05
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
