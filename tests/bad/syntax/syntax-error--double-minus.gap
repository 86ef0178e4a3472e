let v = a - --b
