assembly “Wheel”
