lengths in
