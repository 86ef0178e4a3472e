# A fused-silica window in a steel frame with a radial seal ring. The frame may never touch the
# glass, and the ring must stay squeezed by a known share at both ends of the range.
assembly "Viewport, sealed window"
lengths in mm
temperatures in degC

condition cold -30
condition room  20
condition hot   85

part frame of stainless_304 {
  bore   = dia 80.00 +0.05/0
  groove = dia 75.60 ±0.03
}
part window of fused_silica {
  rim = dia 79.70 0/-0.05
}
part plug of stainless_304 { bore = dia 80.00 +0.05/0 }
part seal of nbr {
  section = 2.62 ±0.08
}

fit rim = window.rim in frame.bore {
  require "VP-1" radial clearance >= 0.10
    because "a binding frame breaks the glass"
}
result squeeze = (seal.section - (plug.bore - frame.groove) / 2) / seal.section {
  require "VP-2" 8 % .. 25 %
}
