lengths in mm temperatures in degC
