part housing of alloy { bore = 1e+999 ±0.1 }
