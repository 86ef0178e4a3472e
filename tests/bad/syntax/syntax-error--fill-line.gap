fill tank {
  cavty of body 240 cm3
}
