assembly "Hub that no heat slips on"
lengths in mm
temperatures in degC
condition assembly 20
material polymer {
  cte 60 ppm/K over -200 .. 90 degC
  modulus 3 GPa
  poisson 0.4
  source "data sheet"
}
part hub of polymer { bore = dia 80 ±0.01 }
part shaft of copper { seat = dia 80 +0.30/+0.28 }
material copper {
  cte 17 ppm/K over -270 .. 200 degC
  modulus 110 GPa
  poisson 0.34
  source "data sheet"
}
fit seat = shaft.seat in hub.bore {
  joint {
    length 40
    hub outside 120
    shaft solid
  }
  require "HS-1" joining temperature <= 80 degC
}
