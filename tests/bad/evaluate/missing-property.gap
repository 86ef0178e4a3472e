assembly "Press fit in a laminate"
lengths in mm
condition shop 20
material laminate {
  cte 14 ppm/K
  modulus 20 GPa
  poisson 0.3
  source "supplier, sheet 12"
}
part plate of laminate {
  bore    = dia 10 H7
  outside = dia 30 ±0.1
}
part pin of steel_c45 { diameter = dia 10 p6 }
fit press = pin.diameter in plate.bore {
  joint {
    length 12
    friction 0.12
    plate outside plate.outside
    pin solid
  }
  require "PL-1" stress in plate <= 80 % of yield
}
