assembly "Idler pulley"
use "used/assembly.gap"
condition day 20
gap left = arm.width - 29 mm { require >= 0.05 }
