# An instrument shelf that hangs from glass-epoxy straps inside a vacuum vessel which stays warm.
# Everything inside shrinks along curves that no single coefficient describes.
assembly "Detector shelf on glass-epoxy straps"
drawing "DS-300" rev "B"

lengths in mm
temperatures in K
reference 293.15 K

condition room     293 ±3
condition soak      77 ±1 { vessel 293; straps 170 ±25 }
condition operate   60 ±2 { vessel 288 ±6; straps 150 .. 190 }
condition cool_down 60 .. 293 { vessel 293; straps 100 .. 293 }

part shelf of aluminium_6061_t6 {
  span      = 420 ±0.1
  pin_pitch = 360 ±0.02
}
part bench of stainless_304 { pin_pitch = 360 ±0.02 }
part straps of g10_cr {
  length    = 92 ±0.1 along
  thickness = 2.4 ±0.15 across
}
part vessel of stainless_304 {
  inside = dia 480 ±0.3
  ledge  = 35 ±0.1
}

gap side = vessel.inside/2 - shelf.span/2 - straps.thickness {
  require "DS-1" >= 25
}
result pin_shift = change(shelf.pin_pitch/2 - bench.pin_pitch/2 from room) {
  require "DS-2" -0.27 .. 0.02 at soak, operate
    because "flexures under the pins travel 0.27 mm"
}
result shelf_height = vessel.ledge + straps.length {
  require "DS-3" 126.55 .. 127.25
}
