assembly "Idler pulley"
condition day 20
part arm of aluminium_6061_t6 { width = 30 ±0.2 }
part hub of steel_c45 { width = 29.6 ±0.1; rim = 3 ±0.1 }
gap left = arm.width - hub.width { require >= 0.1 by rss }
gap right = arm.width - hub.width - 0.1 mm {
  require "R-1" >= 0 for 90 % of assemblies
  require "R-2" >= 0 by Cpk 0.5
}
gap none = hub.rim - 2 mm { require >= 0.5 }
