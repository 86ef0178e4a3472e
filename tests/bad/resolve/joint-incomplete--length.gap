assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 f7 }
part eye of aluminium_6061_t6 { bore = dia 10 H7; outside = dia 30 h9 }
fit swing = pin.outside in eye.bore {
  joint { pin solid; eye outside eye.outside }
  require pressure <= 200 MPa
}
gap rim = 31 mm - eye.outside { require >= 0.5 }
