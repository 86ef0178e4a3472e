drawing rev "B"
