fit f = a.b - c.d
