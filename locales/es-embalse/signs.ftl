# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

sign-fill-date = Día en que se llena el embalse
    .short = Se llena
    .plain = El primer día en que el embalse está lleno, o casi.
sign-spill-hm3 = Derrame
    .short = Derrame
    .plain = Agua que se fue por arriba porque no cabía en el embalse ni en la toma.
sign-canal-stored-draw-hm3 = Agua guardada que usó
    .short = Del embalse
    .plain = Agua que este canal sacó del embalse.
