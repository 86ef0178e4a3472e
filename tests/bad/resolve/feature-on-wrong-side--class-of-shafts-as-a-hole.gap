assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 f7 }
part eye of aluminium_6061_t6 { bore = dia 10 h7 }
fit swing = pin.outside in eye.bore { require clearance >= 0.01 }
