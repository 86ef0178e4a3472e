gap float = a.b - c.d {
  require "R-1" >= 0.1
