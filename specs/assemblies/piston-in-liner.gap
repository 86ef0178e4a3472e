# A piston of near-eutectic aluminium in an iron liner: the skirt closes on the liner as it warms
# and is hotter than it. Free sizes only: a real skirt is barrel-shaped and compliant.
assembly "Compressor piston skirt in its liner"
lengths in mm
temperatures in degC

condition cold_start -20
condition bench       20
condition load        95 ±5 { skirt 20 .. 30 K above liner }
condition overheat   115 { skirt 35 K above liner }

part liner of iron_grey_250 { bore = dia 86 +0.022/0 }
part skirt of aluminium_4032_t6 { gauge = dia 85.84 0/-0.014 }

fit skirt_in_liner = skirt.gauge in liner.bore {
  require "CP-1" clearance >= 0.008
    because "an oil film of 4 µm on each side"
  require "CP-2" clearance <= 0.240 at cold_start, bench
    because "a slapping skirt is heard"
}
