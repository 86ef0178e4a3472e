gap g = a.b - 2xlength
