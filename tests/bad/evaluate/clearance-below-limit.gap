assembly "Guide pin in a plastic block"
lengths in mm
temperatures in degC
condition shop 20
condition hot  60
part block of pom_c { bore = dia 12 +0.02/0 }
part pin of steel_c45 { diameter = dia 12 -0.01/-0.02 }
fit guide = pin.diameter in block.bore {
  require "GP-1" clearance >= 0.02
}
