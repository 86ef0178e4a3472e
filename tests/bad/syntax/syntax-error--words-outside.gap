This assembly is checked at every temperature.
