condition hot 85 { speed 18000 rpm of }
