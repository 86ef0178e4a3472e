assembly "Pin in a light bracket"
lengths in mm
temperatures in degC
condition shop 20
condition hot  80
part bracket of aluminium_6082_t6 { hole = dia 10 H7 }
part pin of steel_c45 { diameter = dia 10 s6 }
fit pressed = pin.diameter in bracket.hole {
  joint {
    length 12
    friction 0.12
    bracket outside 30
    pin solid
  }
  require "PB-1" interference >= 0.005
}
