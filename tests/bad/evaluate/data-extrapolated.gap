assembly "Cover in deep cold"
lengths in mm
temperatures in degC
material pom_cold like pom_c { extrapolate }
condition shop 20
condition cold -90
part cover of pom_cold { width = 80 ±0.1 }
part frame of steel_c45 { opening = 82 ±0.1 }
gap play = frame.opening - cover.width {
  require "CC-1" 0.2 .. 4
}
