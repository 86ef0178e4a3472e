let v = a^2^3
