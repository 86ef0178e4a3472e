# A crown-glass doublet element in an aluminium cell with a polymer spacer ring. Glass must never be
# squeezed cold, and may not wander hot.
assembly "Relay lens, second element in its cell"
drawing "RL-20" rev "A"

lengths in mm
temperatures in degC

condition stowed -30
condition lab     20 ±2
condition field  -10 .. 50
condition sun     70 { cell 4 K above }

part lens of glass_crown {
  rim  = dia 49.90 0/-0.02
  edge = 6.20 ±0.03
}
part cell of aluminium_6061_t6 {
  bore = dia 50 H7
  seat = 6.50 ±0.02
}
part spacer of pom_c {
  thickness = 0.25 ±0.02 at 23 degC
}

fit rim = lens.rim in cell.bore {
  require "RL-1" radial clearance >= 0.020
    because "no contact with the cell wall at any temperature"
}
result decentre = play(rim) {
  require "RL-2" -0.100 .. 0.100
}
gap axial = cell.seat - lens.edge - spacer.thickness {
  require "RL-3" >= -0.05
    because "the retainer's wave washer takes up to 0.05 mm"
  require "RL-4" <= 0.15
}
