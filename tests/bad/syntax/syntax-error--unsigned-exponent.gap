material alloy { modulus 69e3 MPa }
