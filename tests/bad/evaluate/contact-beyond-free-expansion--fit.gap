assembly "Bush on a shaft"
lengths in mm
condition shop 20
part shaft of steel_c45 { seat = dia 30 k6 }
part bush of bronze_cusn8 { bore = dia 30 H7 }
fit push = shaft.seat in bush.bore {
  require "BS-1" interference <= 0.02
}
