# Two ball bearings in a light-alloy housing. The housing grows away from the rings when it is hot
# and squeezes them when it is cold, and in service the rings run hotter than the housing.
# The question: does the outer ring stay put hot, and does the bore never crush it cold?
assembly "Two-speed gearbox, input shaft bearing seats"
drawing "GB-100" rev "D"

lengths in mm
temperatures in degC
general ISO 2768-m

condition cold_start -40
condition assembly    20
condition cruise      75 ±5 { ring 10 .. 20 K above housing; shaft 15 .. 25 K above housing }
condition hot_climb  100 ±5 { ring 15 .. 25 K above housing; shaft 20 .. 30 K above housing }

part housing of aluminium_alsi10mg {
  drawing "GB-110" rev "B"
  bore  = dia 80 P7
  depth = 21.5 ±0.05
}

part ring of steel_100cr6 {
  outside = dia 80 0/-0.013
  bore    = dia 40 0/-0.012
  width   = 18 0/-0.12
}

part shaft of steel_42crmo4 {
  drawing "GB-120" rev "C"
  seat = dia 40 m5
}

part cover of aluminium_6082_t6 { spigot = 3.3 ±0.03 }

fit outer_seat = ring.outside in housing.bore {
  require "GB-1" clearance <= 0.065
    because "a ring with more play than that creeps in the bore"
  require "GB-2" interference <= 0.100 at cold_start
    because "the seat wall is 9 mm thick"
}

fit inner_seat = shaft.seat in ring.bore {
  require "GB-3" interference 0.000 .. 0.050
}

gap end_float = housing.depth - ring.width - cover.spigot {
  require "GB-4" 0.05 .. 0.50
}
