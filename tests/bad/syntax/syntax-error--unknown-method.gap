gap g = a.b { require >= 0.1 by luck }
