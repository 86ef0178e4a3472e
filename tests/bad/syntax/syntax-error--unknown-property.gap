material alloy {
  cet 23.4 ppm/K
}
