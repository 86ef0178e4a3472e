# A hard seat pressed into a light-alloy head: four thermal states, and the seat hotter than the head
# in all but one of them. The insert must stay pressed in every state.
assembly "Gas engine head, exhaust seat insert"
lengths in mm
temperatures in degC

condition assembly   20
condition idle       90 { seat 20 .. 40 K above head }
condition full_load 160 ±10 { seat 80 .. 120 K above head }
condition overrun   140 { seat 5 K below head }

part head of aluminium_a356_t6 {
  pocket = dia 36 +0.016/0
  wall   = dia 58 exact
}
part seat of steel_x40crmov5_1 {
  outside = dia 36 +0.106/+0.092
  throat  = dia 29 ±0.05
}

fit press = seat.outside in head.pocket {
  joint {
    length 6
    head outside head.wall
    seat bore seat.throat
  }
  require "GE-1" interference >= 0.02
    because "a seat that moves hammers itself loose"
  require "GE-2" pressure >= 5 MPa
}
