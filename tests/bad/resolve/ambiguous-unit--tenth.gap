assembly "Plate on a base"
lengths in inch
condition cold -40

part plate of steel_c45 {
  size = 2.5 ±1 tenth
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
