# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

ledger-precipitation = Lluvia y nieve en la cuenca
    .short = Lluvia y nieve
    .plain = Lo que cayó en la sierra y el valle, sin contar el embalse ni las parcelas.
ledger-lake-rain = Lluvia en el embalse
    .short = Lluvia lago
    .plain = Lo que cayó directo sobre el embalse.
ledger-inflow = Río que entra al embalse
    .short = Entrada
    .plain = Lo que el río trajo al embalse.
ledger-lake-evaporation = Lo que el embalse da al aire
    .short = Lago al aire
    .plain = Lo que el embalse le dio al aire.
ledger-town-take = Lo que toma el pueblo
    .short = Toma pueblo
    .plain = Lo que el pueblo sacó del río o del embalse.
ledger-release = Lo que se suelta del embalse
    .short = Salida
    .plain = Lo que se soltó del embalse a propósito.
ledger-reservoir = Embalse
    .short = Embalse
    .plain = Agua en el embalse, junto con la que queda abajo de la toma.
