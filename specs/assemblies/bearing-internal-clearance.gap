# A deep groove ball bearing on the hot side of a blower. What do its two seats and its warm inner ring
# leave of its internal clearance? Too little and it seizes; too much and the impeller, which it
# locates, rubs on its casing.
#
# The clearance before mounting is put on the outer raceway, all of it. A ring is taken as plain, from
# its seat to the bottom of its groove: its shoulders, which stiffen it, are left out.
assembly "Hot-gas blower, clearance of the locating bearing"
drawing "HB-50" rev "A"

lengths in mm
temperatures in degC

condition cold    -30
condition assembly 20
condition start   -10 { shaft 10 K above; inner 3 .. 6 K above outer; ball 3 .. 6 K above outer }
condition hot      70 ±5 {
  inner 4 .. 7 K above outer
  ball 4 .. 7 K above outer
  shaft 0 .. 4 K above inner
}

material shaft_steel like steel_42crmo4 {
  cte 12.0 ±0.15 ppm/K over -60 .. 150 degC
  source "mill certificate, heat 2291"
}
material ring_steel like steel_100cr6 {
  cte 11.9 ±0.2 ppm/K over -60 .. 150 degC
  source "maker of the bearing"
}

part shaft of shaft_steel {
  drawing "HB-51" rev "A"
  seat = dia 50 k5
}
part inner of ring_steel {
  bore    = dia 50 0/-0.008
  raceway = dia 60.95 exact
  groove  = radius 9.83 ±0.02
}
part ball of ring_steel { diameter = dia 19.05 exact }
part outer of ring_steel {
  raceway = dia 99.05 +0.073/+0.045 because "clearance group C5"
  groove  = radius 10.00 ±0.02
  outside = dia 110 0/-0.010
}
part housing of iron_grey_250 {
  drawing "HB-52" rev "A"
  bore    = dia 110 J6
  outside = dia 150 ±0.5
}

fit inner_seat = shaft.seat in inner.bore {
  joint {
    length 27
    shaft solid
    inner outside inner.raceway
    insertion clearance 0.02
  }
  require "HB-1" interference >= 0 because "a ring that turns under its load creeps if it is loose"
  require "HB-2" joining temperature <= 110 degC because "the ring is stabilised for 120"
}
fit outer_seat = outer.outside in housing.bore {
  joint {
    length 27
    outer bore outer.raceway
    housing outside housing.outside
    insertion clearance 0.01
  }
}

# Both seats have closed on the rings; what the balls leave is the play across a diameter.
let play =
    (outer.raceway after outer_seat)
  - (inner.raceway after inner_seat)
  - 2 * ball.diameter

# The centres of the two grooves stand a length apart that play and contact angle share.
let apart = 2 * outer.groove + 2 * inner.groove - 2 * ball.diameter
let angle = acos(1 - play / apart)

gap radial_play = play {
  require "HB-3" 0.005 .. 0.075
}
gap axial_play = apart * sin(angle) {
  require "HB-4" <= 0.5 because "the impeller runs 0.8 from its casing"
}
result contact_angle = angle {
  require "HB-5" <= 20 deg
}
