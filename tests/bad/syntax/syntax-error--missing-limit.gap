fit f = a.b in c.d { require "R-1" clearance at hot }
