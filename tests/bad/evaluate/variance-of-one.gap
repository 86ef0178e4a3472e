assembly "Wedge under a stop"
lengths in mm
temperatures in degC
condition room 20
condition hot 85
part body of steel_c45 { width = 40 ±0.2; depth = 25 ±1 }
part stop of steel_c45 { size = 36 ±0.2 }
gap slack = body.width - body.depth + stop.size - 50 mm {
  require "W-1" -1.5 .. 3.5 for 99 % of assemblies
  require "W-2" >= -1.5 by Cpk 0.8
}
gap sum = body.width + body.depth - 2x stop.size + 9 mm {
  require "W-3" >= 0.4 by rss
}
