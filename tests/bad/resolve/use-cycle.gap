assembly "Idler pulley"
use "used/first.gap"
condition day 20
gap left = arm.width - hub.width { require >= 0.05 }
