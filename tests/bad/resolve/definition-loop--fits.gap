assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 ±0.01 }
part eye of steel_c45 { bore = dia 10.1 ±0.01 }
fit upper = pin.outside in eye.bore + play(lower) { require clearance >= 0.01 }
fit lower = pin.outside in eye.bore + play(upper) { require clearance >= 0.01 }
