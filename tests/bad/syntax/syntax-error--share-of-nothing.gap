gap g = a.b { require >= 0.1 for 99.9 % }
