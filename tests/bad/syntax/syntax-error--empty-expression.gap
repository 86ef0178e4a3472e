gap g =
let v = 1
