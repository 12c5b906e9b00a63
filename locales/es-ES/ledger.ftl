# Palabras de España. Las revisa una persona de allá antes de imprimir.

ledger-set-storage = Agua puesta por el mando
    .short = Puesta a mano
    .plain = Agua que el mando agregó al empezar un año. Con signo de menos, la quitó.
ledger-river-loss = Lo que se pierde en el río
    .short = Pérdida río
    .plain = Agua guardada que se pierde río abajo, antes de la toma.
ledger-canal-take = Lo que entra por las tomas
    .short = En las tomas
    .plain = Lo que los canales sacaron del río.
ledger-flood-release = Soltado para dejar lugar a avenidas
    .short = Para avenidas
    .plain = Lo que se soltó para que quepa una avenida.
