# A retaining sleeve over magnets on a rotor. Pressure is least at speed and cold, where the sleeve
# has not yet closed on the core; stress is greatest at speed and hot: the two worst cases lie at
# opposite ends.
assembly "Spindle motor rotor, magnet sleeve"
drawing "SM-8" rev "C"
lengths in mm
temperatures in degC

condition assembly 20
condition cold    -20 { speed 18000 rpm of core, sleeve }
condition hot     120 { speed 18000 rpm of core, sleeve; sleeve 10 K below core }

part core of steel_42crmo4 { outside = dia 60 0/-0.010 }
part sleeve of nickel_718 {
  bore    = dia 60 -0.120/-0.140
  outside = dia 66 ±0.05
}

fit grip = core.outside in sleeve.bore {
  joint {
    length 50
    core solid
    sleeve outside sleeve.outside
  }
  require "SM-1" pressure >= 5 MPa at cold, hot
    because "magnets may not lift at over-speed"
  require "SM-2" stress in sleeve <= 80 % of yield
}
