part housing of alloy { bore = 58 ± }
