gap g = a.b - 0x shim.thickness
