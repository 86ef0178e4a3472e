general { .YY ±0.1 }
