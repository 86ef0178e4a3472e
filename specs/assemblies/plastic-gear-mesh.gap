# A dry-running mesh of two plastics in a metal box. Heat and moisture eat the backlash; cold and
# dry air give it back.
assembly "Louvre actuator, output mesh"
lengths in mm
temperatures in degC

condition dry_cold -25 { moisture dry }
condition room      23 { moisture humid }
condition wet_hot   70 { moisture wet; wheel wet 78 }

material wheel_pa66 like pa66 {
  cte 80 ±10 ppm/K over -40 .. 100 degC
  swell { dry 0 %; humid 0.25 % ±0.05; wet 0.8 % ±0.15 }
  source "moulder's data sheet, 2.5 mm wall"
}

part box of aluminium_alsi10mg { pitch = 24.08 ±0.02 }
part pinion of pom_c {
  tooth  = 1.45 ±0.02 at 23 degC
  radius = radius 8 exact at 23 degC
}
part wheel of wheel_pa66 {
  tooth  = 1.46 ±0.03 at 23 degC
  radius = radius 16 exact at 23 degC
}

result distance = box.pitch {
  require "LA-1" 24.00 .. 24.20
}
result spread_apart = distance - pinion.radius - wheel.radius
gap backlash =
    2 * tan(20 deg) * spread_apart
  + 3.18 mm
  - pinion.tooth
  - wheel.tooth
{
  require "LA-2" 0.02 .. 0.50
}
