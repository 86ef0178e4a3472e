gap g = a.b - 3 x shim.thickness
