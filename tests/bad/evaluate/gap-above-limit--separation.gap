assembly "Strut held at both ends, cold"
lengths in mm
temperatures in degC
condition shop 20
condition cold -60
part strut of aluminium_6082_t6 { length = 200 ±0.05 }
part bar of steel_c45 { length = 200 ±0.05 }
restraint tie {
  squeezed strut.length area 100 mm2
  stretched bar.length area 60 mm2
  preload 1 kN ±20 % at shop
  require "ST-1" separation <= 0.05
}
