part housing { bore = 42 ±0.1 }
