assembly "Ratio of two small steps"
lengths in mm
condition shop 20
part plate of steel_c45 {
  upper = 10.02 ±0.03
  lower = 10 ±0.03
  deep  = 12 ±0.1
}
result slope = (plate.deep - 10 mm) / (plate.upper - plate.lower) {
  require "RG-1" >= 1
}
