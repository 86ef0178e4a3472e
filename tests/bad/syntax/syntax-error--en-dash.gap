condition service -40 – 85
