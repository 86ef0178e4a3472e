part housing of alloy { bore = dia 42 K6 K7 }
