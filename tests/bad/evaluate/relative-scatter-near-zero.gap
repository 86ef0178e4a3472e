assembly "Mirror distance"
lengths in mm
temperatures in degC
material low_alloy {
  cte 0.8 ppm/K ±10 %
  source "supplier, heat 4"
}
condition shop 20
condition hot  60
part tube of low_alloy { length = 400 ±0.01 }
result distance = tube.length {
  require "MD-1" 399.9 .. 400.1
}
