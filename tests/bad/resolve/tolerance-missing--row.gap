assembly "Plate on a base"
lengths in inch
general { .XX ±.010; .XXX ±.005 }
condition cold -40

part plate of steel_c45 {
  size = 2.5
}
part base of steel_c45 { height = 60 ±0.1 }
gap between = base.height - plate.size { require "R-1" >= -1000 mm }
