assembly "Sagitta of a shallow dish"
lengths in mm
condition shop 20
part dish of steel_c45 {
  radius = radius 20 ±0.05
  chord  = 40 ±0.05
}
gap sagitta = dish.radius - sqrt(dish.radius^2 - dish.chord^2 / 4) {
  require "SD-1" <= 22
}
