part housing of alloy { bore = 5. ±0.1 }
