part shim of alloy { thickness = one of 0.10,0.15 ±0.005 }
