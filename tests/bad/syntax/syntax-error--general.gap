general ISO 2769-m
