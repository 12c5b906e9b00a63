# Palabras de Chile. Las revisa una persona de allá antes de imprimir.

ledger-river-loss = Lo que se pierde en el río
    .short = Pérdida río
    .plain = Agua guardada que se pierde río abajo, antes de la bocatoma.
ledger-canal-take = Lo que toman las bocatomas
    .short = En bocatomas
    .plain = Lo que los canales sacaron del río.
