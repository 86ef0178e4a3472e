part housing off alloy {
  bore = 42 K6
  depth == 3
}
gap end-float = housing.bore {
  require >= 0.1 at
}
