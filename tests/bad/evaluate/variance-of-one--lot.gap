assembly "Long rail on a bed"
condition hot 120
material alloy { cte 23 ±1.5 ppm/K }
part rail of alloy { length = 800.00 ±0.05 spread normal }
part bed of steel_c45 { slot = 804.00 ±0.05 spread normal }
gap end = bed.slot - rail.length { require >= 2 for 99 % of assemblies }
