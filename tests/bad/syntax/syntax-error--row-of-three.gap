material alloy {
  expansion { 20 0 5 }
}
