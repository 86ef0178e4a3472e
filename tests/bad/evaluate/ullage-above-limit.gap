assembly "Oil reservoir"
lengths in mm
temperatures in degC
condition cold -20
part housing of aluminium_6082_t6 { bore = dia 60 ±0.1 }
fill oil_space {
  cavity of housing 240 cm3 ±1 %
  charge hydraulic_oil 225 cm3 at 15 degC
  require "OR-3" ullage <= 8 %
}
result opening = housing.bore { require "OR-2" 59 .. 61 }
