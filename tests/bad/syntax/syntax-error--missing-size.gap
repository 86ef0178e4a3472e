part housing of alloy {
  bore =
  depth = 3 ±0.1
}
