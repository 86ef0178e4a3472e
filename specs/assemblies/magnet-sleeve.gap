# A ring of magnets on a rotor, between its core and a retaining sleeve. The magnets slide onto the core
# with little play; the sleeve, shrunk on, closes them on it. Pressure is least hot, where the
# sleeve carries most; the magnets are stressed most in the cold.
assembly "Spindle motor rotor, magnet sleeve"
drawing "SM-8" rev "D"
lengths in mm
temperatures in degC

condition assembly 20
condition cold    -20 { speed 18000 rpm of core, magnets, sleeve }
condition hot     120 { speed 18000 rpm of core, magnets, sleeve; sleeve 10 K below magnets }

material samarium_cobalt {
  cte 10.0 ±1.0 ppm/K over -60 .. 200 degC
  modulus 130 GPa ±5 %
  poisson 0.27
  density 8350 kg/m3
  source "maker of the magnets"
}

part core of steel_42crmo4 { outside = dia 50 -0.005/-0.012 }
part magnets of samarium_cobalt {
  bore    = dia 50 +0.008/0
  outside = dia 60 0/-0.010
}
part sleeve of nickel_718 {
  bore    = dia 60 -0.120/-0.140
  outside = dia 66 ±0.05
}

fit seat = core.outside in magnets.bore {
  joint {
    length 50
    core solid
    magnets outside magnets.outside
  }
}
fit grip = magnets.outside in sleeve.bore {
  joint {
    length 50
    magnets bore magnets.bore
    sleeve outside sleeve.outside
  }
  require "SM-1" pressure >= 5 MPa at cold, hot
    because "magnets may not lift at over-speed"
  require "SM-2" stress in sleeve <= 80 % of yield
  require "SM-3" stress in magnets <= 150 MPa
    because "sintered magnets are brittle: a fifth of their compressive strength"
}
