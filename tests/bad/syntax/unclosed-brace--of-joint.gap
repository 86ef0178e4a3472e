fit seat = a.b in c.d {
  joint {
    length 20
  require "R-1" pressure >= 2 MPa
}
let half = a.b / 2
