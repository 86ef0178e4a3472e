gap g = a.b { require >= 0.1 concession "D-7" accepts 0.05 approved "M. Rask" }
