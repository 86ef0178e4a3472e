assembly "Accumulator"
lengths in mm
temperatures in degC
condition filled 20
condition hot 60 { oil 5 K below body }
part body of steel_c45 {
  bore    = dia 60 H8
  outside = dia 80 ±0.1
  length  = 120 ±0.2
}
part cap of steel_c45 { outside = dia 90 ±0.1 }
gap long = body.length { require "AC-9" 119 .. 121 }
result around = cap.outside { require "AC-8" 89 .. 91 }
fill oil {
  cavity of body 340 cm3
  wall bore body.bore outside body.bore
  charge hydraulic_oil 330 cm3 at filled
  require "AC-1" pressure <= 60 MPa
}
