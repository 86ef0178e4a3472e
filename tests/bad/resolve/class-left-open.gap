assembly "Idler on a pin"
lengths in mm

condition day 20

part pin  of steel_c45 { seat = dia 12 g6 }
part idler of steel_c45 { bore = dia 12 ? }
fit running = pin.seat in idler.bore { require clearance 0.005 .. 0.040 }
