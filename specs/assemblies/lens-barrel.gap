# Two lenses, a spacer and a threaded ring in a barrel. Made in thousands, so the room for the ring
# is judged by what the processes are known to do, and not with every size at its limit at once.
assembly "Camera lens barrel, axial room and centring"
drawing "LB-40" rev "C"
lengths in mm
temperatures in degC
condition cold -25
condition room  20
condition hot   55 { barrel 4 .. 8 K above }

part barrel of aluminium_6061_t6 {
  depth = 34.30 ±0.05 spread normal Cpk 1.33 shift +0.008
  seat  = dia 40 H7 spread normal Cpk 1.33
}
part front of glass_crown {
  thick = 9.50 ±0.05 spread sorted
  edge  = dia 39.97 0/-0.025 spread triangular
}
part spacer of aluminium_6061_t6 lot "bar" { length = 12.40 ±0.04 spread normal Cpk 1.5 }
part rear of glass_flint { thick = 11.20 ±0.05 spread normal Cpk 1.2 shift -0.004 }
part ring of brass_c36000 { thread = 1.00 ±0.02 spread uniform }

gap room_left = barrel.depth - front.thick - spacer.length - rear.thick - ring.thread {
  require "LB-1" 0.040 .. 0.360 by rss 3 sigma
    because "the ring has 0.5 of thread left to turn"
  require "LB-2" 0.040 .. 0.360 for 99.9 % of assemblies
}
fit centring = front.edge in barrel.seat {
  require "LB-3" clearance 0.000 .. 0.120 by Cpk 1.33
}
