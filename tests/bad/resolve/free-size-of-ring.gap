assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part bush of bronze_cusn8 { outside = dia 24 s6; bore = dia 20 H7 }
part plate of steel_c45 { bore = dia 24 H7; outside = dia 60 exact }
part rod of steel_c45 { diameter = dia 20 f7 }
fit press = bush.outside in plate.bore {
  joint { length 20; bush bore bush.bore; plate outside plate.outside }
  require interference >= 0.01
}
fit slide = rod.diameter in bush.bore { require clearance >= 0.01 }
