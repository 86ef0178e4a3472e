restraint clamp
