part housing of alloy { bore = 42 H7 "seat" }
