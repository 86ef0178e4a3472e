lengths in mm {
}
