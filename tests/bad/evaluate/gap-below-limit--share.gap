assembly "Bracket on two blocks"
lengths in mm
temperatures in degC
condition shop 20
part a of steel_c45 { s = 10.05 ±0.05; t = 5 ±0.05 }
part b of steel_c45 { s = 15 ±0.06 }
gap g = a.s + a.t - b.s {
  require "G" >= 0 for 99.99 % of assemblies
}
