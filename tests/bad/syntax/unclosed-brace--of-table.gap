material alloy {
  cte mean from 20 degC, ppm/K {
    100 11.5
  modulus 69 GPa
}
