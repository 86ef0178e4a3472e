part housing of alloy {
  bore = 42 ±0.1

part shaft of alloy {
  seat = 42 ±0.1
}
