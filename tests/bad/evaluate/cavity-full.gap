assembly "Oil reservoir"
lengths in mm
temperatures in degC
condition fill_day 15
condition hot      95
part housing of aluminium_6082_t6 { bore = dia 60 ±0.1 }
fill oil_space {
  cavity of housing 240 cm3 ±1 %
  charge hydraulic_oil 235 cm3 at fill_day
}
result opening = housing.bore { require "OR-2" 59 .. 61 }
