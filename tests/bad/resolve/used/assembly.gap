assembly "An arm by itself"
part arm of aluminium_6061_t6 { width = 30 ±0.1 }
