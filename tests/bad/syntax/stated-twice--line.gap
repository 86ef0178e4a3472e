restraint clamp {
  squeezed a.b area 160 mm2
  preload 12 kN at cold
  preload 13 kN at hot
}
