gap g = a.b { require >= 0.1 at hot cold }
