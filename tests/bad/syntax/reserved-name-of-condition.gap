condition reference 20
