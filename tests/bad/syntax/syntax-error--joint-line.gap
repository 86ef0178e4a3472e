fit f = a.b in c.d {
  joint {
    lenght 20
  }
}
