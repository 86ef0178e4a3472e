assembly "Plate on a base"
condition cold -40

part plate of steel_c45 {
  size = dia 8 H7
  place = position dia 0.2 at MMC of sise
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
