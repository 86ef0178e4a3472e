assembly "Idler pulley"
lengths in mm

condition cold -20
condition day   20

part spool of aluminium_7075 { land = dia 11.95 0/-0.008 before coating 40 ±6 um build-up 50 % }
part body of aluminium_7075 { bore = dia 12.06 H6 }
fit land = spool.land in body.bore { require clearance >= 0.005 }
