gap g = a.b { require "R-1" 0.05 }
