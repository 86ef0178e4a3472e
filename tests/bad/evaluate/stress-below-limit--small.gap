assembly "Lightly pressed bush"
lengths in mm
temperatures in degC
condition shop 20
part plate of aluminium_6082_t6 { bore = dia 20 +0.0005/0 }
part bush of bronze {
  outside = dia 20 +0.00100/+0.00052
  bore    = dia 14 ±0.05
}
material bronze { cte 17.8 ppm/K; modulus 110 GPa; poisson 0.34; source "data sheet" }
fit press = bush.outside in plate.bore {
  joint {
    length 20
    plate outside 60
    bush bore bush.bore
  }
  require "LB-1" pressure >= 0.2 MPa
}
