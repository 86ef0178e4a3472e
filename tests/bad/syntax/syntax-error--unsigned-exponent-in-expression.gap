let v = 2e10 * a.b
