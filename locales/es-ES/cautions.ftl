# Palabras de España. Las revisa una persona de allá antes de imprimir.

caution-not-a-forecast = Esto es un modelo, no una predicción. No dice cómo vendrá el próximo año.
    .title = No es una predicción
    .print = Este programa es un modelo sencillo de un valle. Sirve para preguntar «¿y si…?». No sabe qué tiempo viene. Para predicciones, consulte los servicios oficiales del agua y del tiempo.
caution-not-for-floods = No avisa de avenidas. Si hay avenida, siga a protección civil o emergencias de su zona.
    .title = No es para avenidas
    .print = Este programa no ve venir una avenida ni puede decirle que está a salvo. Si sube el agua, deje las partes bajas y haga lo que indiquen protección civil o los servicios de emergencia. No cruce agua en movimiento, ni a pie ni en vehículo.
caution-reservoirs-kill = Los embalses matan: agua fría, fondo disparejo, tirón en las compuertas. No se acerque.
    .title = Los embalses matan
    .print = El agua de un embalse puede estar tan fría que vence a quien nada bien. El fondo baja de golpe y la orilla puede derrumbarse cuando baja el nivel. No se acerque a la presa, al aliviadero ni a la toma. En lancha, use siempre chaleco salvavidas.
