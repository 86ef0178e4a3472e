condition hot 85 { shaft +12 K }
