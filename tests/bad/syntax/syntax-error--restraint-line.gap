restraint clamp {
  squeezd a.b area 160 mm2
}
