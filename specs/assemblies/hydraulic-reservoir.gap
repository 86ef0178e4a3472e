# A closed reservoir filled by volume on a cool day: the oil grows several times faster than the
# body around it and must never fill it.
assembly "Bootstrap reservoir"
lengths in mm
temperatures in degC
condition cold    -40
condition fill_day 15
condition hot      90 { reservoir 5 K above }

part body of aluminium_6061_t6 {
  bore   = dia 60 H8
  stroke = 85 ±0.3
}

fill reservoir {
  cavity of body = pi/4 * body.bore^2 * body.stroke
  charge hydraulic_oil 205 cm3 ±2 % at fill_day
  require "BR-1" ullage >= 5 %
    because "never full of liquid"
}
