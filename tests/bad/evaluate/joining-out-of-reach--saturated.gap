assembly "Stainless sleeve shrunk into a light alloy flange"
lengths in mm
temperatures in degC
condition assembly 20
part flange of aluminium_6061_t6 { bore = dia 80 H7 }
part sleeve of stainless_304 {
  seat = dia 80 +0.16/+0.14
  bore = dia 60 ±0.1
}
fit seat = sleeve.seat in flange.bore {
  joint {
    length 40
    flange outside 120
    sleeve bore sleeve.bore
    insertion clearance 0.18
  }
  require "SF-1" pressure >= 20 MPa
}
