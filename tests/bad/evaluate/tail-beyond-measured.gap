assembly "Idler pulley"
condition day 20
part arm of aluminium_6061_t6 {
  width = 30 ±0.1 spread normal Cpk 1.33
  slot  = 4 ±0.05 spread from "data/slot.csv"
}
part hub of steel_c45 {
  width = 23.6 ±0.08 spread normal
  rim   = 1.5 ±0.05 spread normal
}
gap left = arm.width - arm.slot - hub.width - hub.rim {
  require "P-1" 0.6 .. 1.2 for 99 % of assemblies
  require "P-2" 0.6 .. 1.2 by Cpk 1
  require "P-3" 0.6 .. 1.2 for 40 % of assemblies
}
