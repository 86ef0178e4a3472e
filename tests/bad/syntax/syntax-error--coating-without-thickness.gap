part housing of alloy { bore = dia 42 H7 before coating build-up 50 % }
