# A wedge that locks a card against a channel wall: its lift depends on the tangent of a small angle,
# so the stack is not linear, and its sign matters.
assembly "Card retainer, single wedge"
lengths in mm
temperatures in degC
condition cold -55
condition room  20
condition hot   95

part channel of aluminium_6061_t6 { width = 7.10 ±0.05 }
part wedge of aluminium_7075 {
  height = 6.30 ±0.04
  travel = 4.5 ±0.2
  ramp   = 3 deg ±0.2
}
part board of g10_cr { thickness = 0.60 ±0.05 across }

gap closing =
    channel.width
  - wedge.height
  - board.thickness
  - wedge.travel * tan(wedge.ramp)
{
  require "CW-1" -0.21 .. 0.16
}
result tilt = atan((wedge.height - 6.2 mm) / wedge.travel) {
  require "CW-2" <= 3 deg
}
