condition hot
