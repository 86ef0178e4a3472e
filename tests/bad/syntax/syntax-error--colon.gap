part housing: alloy { bore = 42 ±0.1 }
