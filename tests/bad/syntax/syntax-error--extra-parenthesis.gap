gap g = a.b - c.d)
