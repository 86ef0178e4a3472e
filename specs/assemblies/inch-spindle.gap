# A belt-driven spindle drawn in inches and degrees Fahrenheit, with a title block that gives
# tolerances by the decimals written.
assembly "Polishing spindle, inch drawing"
drawing "PS-12" rev "2"
lengths in inch
temperatures in degF
reference 68 degF
general { .XX ±.010; .XXX ±.005; .XXXX ±.0005; angle ±0.5 deg }

condition shop     68
condition morning  40
condition running 150 ±10 { spindle 20 .. 35 degF above head; bearing 10 .. 20 degF above head }

part head of iron_grey_250 {
  bore  = dia 2.0472 +.0007/0
  depth = 1.250
}
part bearing of steel_100cr6 {
  outside = dia 2.0472 +.0000/-.0004
  bore    = dia .9843 +.0000/-.0004
  width   = .5906 +.0000/-.0047
}
part spindle of steel_42crmo4 {
  journal  = dia .9843 +.0001/-.0003
  shoulder = .600
}

fit outer = bearing.outside in head.bore {
  require "PS-1" clearance -.0006 .. .0015
}
fit inner = spindle.journal in bearing.bore {
  require "PS-2" clearance -.0008 .. .0006
}
gap float = head.depth - bearing.width - spindle.shoulder {
  require "PS-3" .030 .. .090
}
