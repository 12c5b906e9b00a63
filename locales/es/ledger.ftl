# Las cuentas del agua: todo lo que se guarda y todo lo que corre, con su forma corta (14 letras o menos).

## Entradas

ledger-precipitation = Lluvia y nieve en la cuenca
    .short = Lluvia y nieve
    .plain = Lo que cayó en la sierra y el valle, sin contar la presa ni las parcelas.
ledger-lake-rain = Lluvia en la presa
    .short = Lluvia presa
    .plain = Lo que cayó directo sobre la presa.
ledger-field-rain = Lluvia en las parcelas
    .short = Lluvia parcela
    .plain = Lo que cayó directo sobre las parcelas de riego.
ledger-set-storage = Agua puesta por la perilla
    .short = Puesta a mano
    .plain = Agua que la perilla agregó al empezar un año. Con signo de menos, la quitó.
ledger-inflow = Río que entra a la presa
    .short = Entrada
    .plain = Lo que el río trajo a la presa.

## Salidas

ledger-evaporation = Lo que el terreno da al aire
    .short = Tierra al aire
    .plain = Lo que el suelo y las plantas de la cuenca le dieron al aire.
ledger-sublimation = Nieve que se va al aire
    .short = Nieve al aire
    .plain = Nieve que se fue al aire sin derretirse.
ledger-lake-evaporation = Lo que la presa da al aire
    .short = Presa al aire
    .plain = Lo que la presa le dio al aire.
ledger-crop-evaporation = Lo que los cultivos dan al aire
    .short = Campo al aire
    .plain = Lo que las parcelas y sus cultivos le dieron al aire.
ledger-town-use = Lo que consume el pueblo
    .short = Uso del pueblo
    .plain = Agua del pueblo que ya no vuelve al río.
ledger-deep-loss = Lo que se va a lo hondo
    .short = A lo hondo
    .plain = Lo que se metió tan hondo que ya no vuelve al río.
ledger-river-loss = Lo que se pierde en el río
    .short = Pérdida río
    .plain = Agua guardada que se pierde río abajo, antes de la compuerta.
ledger-river-out = Río que sale del valle
    .short = Río que sale
    .plain = Lo que sigue hacia los vecinos de río abajo.

## Por dentro

ledger-canal-take = Lo que toman las compuertas
    .short = En compuertas
    .plain = Lo que los canales sacaron del río.
ledger-town-take = Lo que toma el pueblo
    .short = Toma pueblo
    .plain = Lo que el pueblo sacó del río o de la presa.
ledger-seepage = Filtración de los canales
    .short = Filtración
    .plain = Lo que se metió a la tierra desde los canales.
ledger-field-delivery = Entregado a las parcelas
    .short = A parcelas
    .plain = Lo que llegó a las parcelas.
ledger-field-loss = Pérdidas en la parcela
    .short = Pérdida campo
    .plain = Lo que escurrió o se metió más abajo de las raíces.
ledger-return-flow = Agua de retorno
    .short = Retorno
    .plain = Lo que volvió al río después de usarse.
ledger-release = Lo que se suelta de la presa
    .short = Salida
    .plain = Lo que se soltó de la presa a propósito.
ledger-spill = Derrame
    .short = Derrame
    .plain = Lo que se fue por arriba porque ya no cabía.
ledger-flood-release = Soltado para dejar lugar a crecidas
    .short = Para crecidas
    .plain = Lo que se soltó para que quepa una crecida.

## Lo que se guarda

ledger-snow = Nieve
    .short = Nieve
    .plain = Agua guardada en la nieve.
ledger-soil = Suelo
    .short = Suelo
    .plain = Agua guardada en el suelo de la cuenca.
ledger-ground-quick = Bajo tierra, parte rápida
    .short = Tierra rápida
    .plain = Agua bajo tierra que llega al río en días.
ledger-ground-slow = Bajo tierra, parte lenta
    .short = Tierra lenta
    .plain = Agua bajo tierra que alimenta al río durante meses.
ledger-in-transit = Agua de río en camino
    .short = En camino
    .plain = Agua del río que todavía no llega.
ledger-reservoir = Presa
    .short = Presa
    .plain = Agua en la presa, junto con la que queda abajo de la toma.
ledger-root-zone = Donde están las raíces
    .short = Raíces
    .plain = Agua en el suelo donde los cultivos tienen sus raíces.
ledger-return-store = Retorno en camino
    .short = Por volver
    .plain = Agua debajo de canales y parcelas que vuelve después.

## La suma

ledger-title = A dónde se fue el agua
ledger-in = Agua que entra
ledger-out = Agua que sale
ledger-inside = En el camino
ledger-store-start = Guardada al empezar
ledger-store-end = Guardada al terminar
ledger-store-change = Cambio en lo guardado
ledger-residual = Sin explicar
ledger-rule = Lo que entró es igual a lo que salió más el cambio en lo guardado.
