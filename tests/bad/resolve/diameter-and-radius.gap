assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 f7 }
part box of aluminium_6061_t6 { corner = radius 6 ±0.1 }
gap left = box.corner - pin.outside { require >= -6 }
