assembly "Wheel
lengths in mm
