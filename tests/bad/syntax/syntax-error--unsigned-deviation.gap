part housing of alloy { bore = 58 0.05/-0.02 }
