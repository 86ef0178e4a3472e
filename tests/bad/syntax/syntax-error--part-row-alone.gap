condition hot 85 { shaft }
