assembly "Plate on a base"
condition cold -40

material alloy { cte 12 ppm/K; modulus ±2, GPa { 20 210; 100 205 } }
part plate of alloy {
  size = 58 ±0.05
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
