assembly "Cover near a furnace"
lengths in mm
temperatures in degC
condition shop 20
condition hot 60 { frame 600 K above }
part cover of pom_c { width = 80 ±0.1 }
part frame of steel_c45 { opening = 82 ±0.1 }
gap play = frame.opening - cover.width {
  require "CF-1" >= 0.2
}
