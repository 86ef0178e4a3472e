# Every word of the language, each form once; no sensible assembly.
assembly "Every word of the language"
drawing "EW-1" rev "A"
drawing "EW-2"

lengths in mm
temperatures in degC
reference 20 ±0.5 degC
general ISO 2768-mK
general {
  X     ±0.5
  .X    ±0.1
  .XX   ±0.05
  .XXX  +0.01/-0.02
  angle ±0.5 deg
}
use "materials.yaml"
note "not for \"manufacture\", see C:\\drawings"

condition assembly 20
condition cold -40 ±2 spread normal
condition service -40 .. 85 degC
condition hot 85 ±3 K spread uniform {
  moisture humid
  shaft 97 ±2 degC
  gear wet 75
  pinion dry
  bearing 5 .. 9 K above housing spread triangular
  cover 12 K below
  lid 3 above
  speed 18000 rpm ±2 % of core, magnets, sleeve
  speed 60
}
condition warm_up from "data/warm-up.csv" ±2

material alloy like aluminium_6061_t6 {
  cte 23.4 ±0.3 ppm/K over -60 .. 150 degC spread normal
  modulus 69 GPa ±2 %
  bulk modulus 1.4 .. 1.6 GPa
  poisson 0.33
  yield, MPa { 20 276; 100 262; 150 degC 214 MPa }
  density 2.70 g/cm3
  limit 150 degC
  source "mill certificate, heat 7714"
  extrapolate
}
material tables {
  over -196 .. 300 degC
  cte along mean from 20 degC, ppm/K ±3 % over 20 .. 300 degC {
    100 11.5
    200 12.1 ±0.2
  }
  cte across instantaneous, ppm/K {
    -100 9
    100 10.5
  }
  expansion {
    -196 degC -4150 ppm
    20 degC 0 ppm
  }
  swell { dry 0 %; wet 0.8 % ±0.15 }
}

part housing of alloy lot "A" {
  drawing "EW-3" rev "B"
  bore = dia 42 K6
  bore_glued = dia 42K6
  open = dia 42 ?
  length = 58 +0.05/-0.02
  lower = 58 -0.02/-0.05 mm
  zero = 58 0/-0.011
  limits = 58.00 .. 58.05
  pitch = 58 exact
  inch = 2.500 in ±0.001
  angle = 30 deg ±0.5
  plain = .125
  slot = internal 8 ±0.02
  seat = external radius 4 ±0.01
  part = 3
  at = 4
  let half = bore / 2
}
part second like housing
part changed like housing { bore = dia 40 ? }
part shim of stainless_304 {
  thickness = one of 0.10, 0.15, 0.20 ±0.005
  flat = flatness 0.02
  where = position dia 0.2 at MMC of housing.bore
  wobble = total runout 0.03
  outer = Ø 20 js6 before coating 10 ±2 um build-up 50 % on both sides
  inner = ⌀12 H7 after coating 8 .. 12 um on one side
  web = 5 ±0.1 spread normal Cpk 1.33 shift +0.01 at 23 degC along
    basis measured
    because "gauge report"
  rib = 6 ±0.1 spread sorted across basis assumed
  arm = 7 ±0.1 spread from "arm.csv" load -12 kN ±1 kN spread uniform over 350 mm2 at hot, cold
    strain 0.09 % ±0.01 at hot
    load 1 kN over 20 mm2 at cold
}

fit press = core.outside + 2x magnets.radial in sleeve.bore after seat {
  joint {
    length 20
    friction 0.12 .. 0.18 spread uniform
    insertion clearance 0.02
    inner core
    outer sleeve
    sleeve outside 60 ±0.1
    bush bore bush.bore
    shaft solid
    sleeve Rz 6 um
  }
  require "P-1" pressure >= 0.2 MPa at cold
  require "P-2" stress in sleeve <= 80 % of yield at hot
  require "P-3" radial clearance 0 .. 0.030 except warm_up
  require interference <= 0.025 by rss 3 sigma
    because "the race must creep, not rattle"
    concession "D-7" accepts 0.031 until 2027-03-31 approved "M. Rask"
      because "stock"
}
gap end_float =
    housing.depth           # the hole
  - 2x bearing.width
  - -shaft.shoulder^2 / (3x shim.thickness × 1 mm)
  + change((ring.race after seat) - ring.race from cold)
  − max(1e-3 mm, .5 * clearance(press))
{
  require "R-20" 0.05 .. 0.60
  require "R-21" >= 0.04 for 99.99 % of assemblies
  require 0.3 ±0.2 by worst case
  require ≤ 0.4 by Cpk 1.33
  require <= 0.5 by rss
}
result tilt = atan2(wedge.height - 5.8 mm, wedge.travel) { require "W-2" <= 3 deg }
let area = pi/4 * body.bore^2

restraint clamp {
  squeezed  2x cover.thickness area 160 mm2
  stretched screw.grip stiffness 205 kN/mm ±8 % area 84.3 mm2
  preload 12 kN ±25 % spread normal at assembly
  require "B-1" force >= 6 kN at cold
}
restraint closing { squeezed cover.thickness area 160 mm2; start gap end_float }
fill oil_space {
  cavity of housing 240 cm3 ±1 %
  charge hydraulic_oil 225 cm3 spread uniform at 15 degC
  require ullage >= 5 %
}
fill reservoir {
  cavity of body = area * body.stroke
  wall bore body.bore outside body.outside
  charge hydraulic_oil 205 cm³ ±2 % at fill_day
}
