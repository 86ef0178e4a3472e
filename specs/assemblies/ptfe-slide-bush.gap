# A filled-PTFE bush in a steel plate, sized at 23 °C because the polymer changes its structure
# near 19 °C. The rod must slide at every temperature; the bush is held by a flange, not by its press.
assembly "Dosing slide, flanged bush"
lengths in mm
temperatures in degC

condition cold -20
condition room  23
condition warm  70

part plate of steel_c45 { bore = dia 24 H7 }
part bush of ptfe_filled {
  outside = dia 23.80 ±0.03 at 23 degC
  bore    = dia 20.40 ±0.03 at 23 degC
}
part rod of stainless_316 { diameter = dia 20 f7 }

fit seat = bush.outside in plate.bore {
  require "DB-1" clearance 0.00 .. 0.50
}
fit slide = rod.diameter in bush.bore {
  require "DB-2" clearance 0.10 .. 0.65
}
