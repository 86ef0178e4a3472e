part housing off alloy { bore = 42 ±0.1 }
