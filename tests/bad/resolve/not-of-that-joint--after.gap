assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 f7 }
part eye of aluminium_6061_t6 { bore = dia 10 H7; outside = dia 30 h9 }
part cap of steel_c45 { bore = dia 31 ±0.1 }
fit swing = pin.outside in eye.bore {
  joint { length 20; pin solid; eye outside eye.outside }
  require pressure <= 200 MPa
}
gap rim = (cap.bore after swing) - (eye.outside after swing) { require >= 0.5 }
