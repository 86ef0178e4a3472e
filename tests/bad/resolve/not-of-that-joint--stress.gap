assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part pin of steel_c45 { outside = dia 10 f7 }
part eye of aluminium_6061_t6 { bore = dia 10 H7; outside = dia 30 h9 }
part lid of steel_c45 { thickness = 2 ±0.05 }
fit swing = pin.outside in eye.bore {
  joint { length 20; pin solid; eye outside eye.outside }
  require stress in lid <= 100 MPa
}
gap rim = 35 mm - eye.outside - lid.thickness { require >= 0.5 }
