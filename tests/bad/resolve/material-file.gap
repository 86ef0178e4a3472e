assembly "Idler pulley"
use "used/broken.yaml"
condition day 20
part arm of felt { width = 30 ±0.1 }
gap left = arm.width - 29 mm { require >= 0.05 }
