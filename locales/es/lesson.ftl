# Lo que se lee alrededor de los pasos de una lección, y las señales que solo leen las lecciones.

lesson-step = Paso { $step } de { $steps }
lesson-guess-first = Primero, adivine.
lesson-group = Grupo { $group }
lesson-needs-guess = Falta una respuesta. Gire y presione.
lesson-closed = El resultado ya se vio; no se admiten más respuestas.
lesson-skipped = Siguió sin responder.
lesson-over = Aquí termina la lección. Gracias.
lesson-result = El modelo dice
lesson-usual = Muchos dicen
lesson-word = Su palabra:
lesson-word-wrong = Esa palabra no va aquí. Léala otra vez.

## Señales que leen las lecciones

lesson-natural-inflow-hm3 = Agua que trajo el río
    .short = Agua del río
    .plain = Toda el agua que bajó por el río en el año.
lesson-return-flow-hm3 = Agua de retorno
    .short = Retorno
    .plain = Agua que volvió al río desde canales, parcelas y pueblo.
lesson-conveyance-loss-hm3 = Pérdida en los canales
    .short = Pérdida canal
    .plain = Agua que entró a los canales y no llegó a las parcelas.
lesson-canals-hm3 = Agua que entró a los canales
    .short = A los canales
    .plain = Toda el agua que entró por las compuertas en el año.
lesson-minimum-release-hm3 = Agua soltada para el río
    .short = Para el río
    .plain = Agua guardada que se suelta para que el río lleve lo mínimo.
lesson-river-out-hm3 = Agua que sale del valle
    .short = Sale del valle
    .plain = Agua que el río se lleva al final del valle.
lesson-years-enough = Años en que alcanzó el agua
    .short = Alcanzó
    .plain = En cuántos años del registro alcanzó el agua.
lesson-years-filled = Años en que se llena la presa
    .short = Años llena
    .plain = En cuántos años del registro se llenó la presa.
lesson-first-short-canal = Primer canal sin toda su agua
    .short = El primero
    .plain = El primer canal al que no le llega toda su agua. Se cuentan desde el derecho más antiguo.
lesson-least-supplied-canal = Canal al que menos le llega
    .short = El de menos
    .plain = El canal al que le llega la menor parte de lo que pidió. Se cuentan desde el derecho más antiguo.

## Revisar una lección

lesson-check-no-place = { $path }: la lección no se probó porque el lugar { $place } tiene errores. Revise primero el lugar.
