prat housing of alloy { bore = 42 ±0.1 }
