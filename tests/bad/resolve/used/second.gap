use "first.gap"
part hub of steel_c45 { width = 29.6 ±0.1 }
