assembly "Filling of a seal groove"
lengths in mm
condition shop 20
part plate of steel_c45 {
  width = 3.6 ±0.1
  depth = 2.0 ±0.05
}
part cord of steel_c45 { section = dia 2.62 ±0.08 }
result filling = pi / 4 * cord.section^2 / (plate.width * plate.depth) {
  require "FG-1" <= 80 %
}
