assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 f7; length = 30 ±0.1 }
part eye of steel_c45 { bore = dia 10 H7; length = 30 ±0.1 }
fit swing = pin.outside in eye.bore { require clearance >= 0.01 }
gap left = pin.length - eye.length + swing { require >= -0.5 }
