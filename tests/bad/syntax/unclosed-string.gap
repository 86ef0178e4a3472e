part housing of alloy {
  bore = 42 ±0.1 because "seat of the bearing
  depth = 31.5 ±0.1
}
