part housing of alloy { bore = 42,5 ±0.1 }
