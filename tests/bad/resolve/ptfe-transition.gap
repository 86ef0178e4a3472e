assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part seat of ptfe { thickness = 4 ±0.05 }
part body of stainless_316 { depth = 4.2 ±0.05 }
gap left = body.depth - seat.thickness { require >= 0 }
