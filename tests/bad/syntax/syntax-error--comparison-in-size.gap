part housing of alloy { bore >= 42 }
