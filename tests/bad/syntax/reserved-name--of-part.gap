part ambient of alloy { length = 3 ±0.1 }
