# A cell filled to the brim and closed: the oil grows many times faster than the steel, and what cannot
# grow presses. A valve relieves it at 40 MPa; up to the hottest bench that may not happen.
assembly "Hydraulic test cell, closed full"
lengths in mm
temperatures in degC

condition fill_day 20 ±2
condition run      38 ±2 { oil 2 .. 4 K above cell }
condition soak     20 .. 45

part cell of steel_42crmo4 {
  bore    = dia 60 H8
  outside = dia 110 ±0.2
  stroke  = 120 ±0.1
}

fill oil {
  cavity of cell = pi/4 * cell.bore^2 * cell.stroke
  wall bore cell.bore outside cell.outside
  charge hydraulic_oil 339 cm3 ±0.2 % at 20 degC
  require "HC-1" pressure <= 40 MPa
    because "the relief valve opens there, and must not weep before"
  require "HC-2" stress in cell <= 60 % of yield
}
