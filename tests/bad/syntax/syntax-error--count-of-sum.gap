gap g = a.b - 2x (c.d + e.f)
