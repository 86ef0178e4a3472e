gap end-float = a.b - c.d
