# Palabras de México. Las revisa una persona de allá antes de imprimir.

term-flow = gasto
    .short = Gasto
    .plain = Cuánta agua pasa cada segundo.
term-peak-flow = gasto máximo
    .short = Pico
    .plain = El gasto más alto del año.
term-low-flow = estiaje
    .short = Estiaje
    .plain = El poco gasto que queda al final del verano o en otoño.
term-baseflow = gasto base
    .short = Gasto base
    .plain = Agua que el suelo le da al río cuando no llueve ni hay deshielo.
term-instream-flow = gasto para el río
    .short = Para el río
    .plain = Agua que se deja en el río para peces y plantas.
term-stream-gauge = estación de aforo
    .short = Aforo
    .plain = Lugar donde se mide el gasto.
term-rotation = reparto por tandas
    .short = Por tandas
    .plain = Las parcelas reciben agua una tras otra.
term-turn = tanda
    .short = Tanda
    .plain = El tiempo en que a usted le toca el agua.
