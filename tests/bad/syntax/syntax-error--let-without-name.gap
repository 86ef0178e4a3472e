let = 3
