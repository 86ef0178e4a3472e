# A hard-anodised spool in a hard-anodised body: each surface grows by half its coating, so both
# mates together cost twice what one drawing shows.
assembly "Metering spool, hard-anodised pair"
lengths in mm
temperatures in degC
condition cold -40
condition room  20
condition hot   90 { spool 5 .. 10 K above body }

part body of aluminium_7075 {
  bore = dia 14.060 H6 before coating 40 ±6 um build-up 50 %
}
part spool of aluminium_7075 {
  land = dia 13.950 0/-0.008 before coating 40 ±6 um build-up 50 %
}
fit land = spool.land in body.bore {
  require "MS-1" clearance 0.005 .. 0.065
}
