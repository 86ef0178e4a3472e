part housing of alloy { bore = 42 ±0.1 spread gaussian }
