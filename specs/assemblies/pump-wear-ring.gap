# Impeller wear ring of a hot-water pump through its warm-up: the impeller is in the water, the case
# ring is bolted into a heavy casing that lags behind. The pinch is in the transient, not at an end.
assembly "Hot-water pump, first-stage wear ring"
drawing "WP-7" rev "E"
lengths in mm
temperatures in degC

condition cold_build 20
condition steady    180 { case_ring 4 .. 8 K below impeller }
condition warm_up   from "data/pump-warm-up.csv" ±3

part impeller of stainless_316 { hub = dia 199.30 0/-0.03 }
part case_ring of stainless_420 { bore = dia 200 H7 }

fit running = impeller.hub in case_ring.bore {
  require "WP-1" clearance >= 0.30
    because "shaft sag and vibration take 0.25"
  require "WP-2" clearance <= 0.85
    because "leakage"
}
