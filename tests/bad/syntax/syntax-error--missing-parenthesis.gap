gap g = (a.b - c.d
let v = 1
