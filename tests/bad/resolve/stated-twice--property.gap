assembly "Plate on a base"
condition cold -40

material alloy { cte 12 ppm/K; expansion { -196 -2000 ppm; 20 0 ppm } }
part plate of alloy {
  size = 58 ±0.05
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
