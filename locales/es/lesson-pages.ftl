# Las páginas de una lección guiada: qué hace la perilla, qué dijo cada grupo y los avisos de al lado.

lesson-list = Lecciones
lesson-minutes = Unos { $n } minutos
lesson-groups = { $n ->
    [one] Va a adivinar { $n } grupo
   *[other] Van a adivinar { $n } grupos
}
lesson-for-leader = Para quien guía
lesson-may-turn = Después les toca mover: { $dials }
lesson-nothing = No llega a pasar.
lesson-unchanged = Así fue el año, sin ningún cambio.

## Lo que se puede hacer

lesson-do-on = Seguir
lesson-do-show = Ver el resultado
lesson-do-skip = Seguir sin responder
lesson-do-guess = Seguir adivinando
lesson-do-group = Otro grupo
lesson-do-word = Escribir una palabra
lesson-do-back = Volver
lesson-do-more = Más
lesson-do-again = Empezar de nuevo
lesson-do-leave = Salir de la lección

lesson-hint-list = Gire hasta una lección. Presione para abrirla. Mantenga presionado para más.
    .short = Gire y presione. Mantenga: más.
lesson-hint-start = Gire hasta el número de grupos. Presione para empezar. Mantenga presionado para la lista.
    .short = Gire: grupos. Presione: empezar.
lesson-hint-on = Presione para tomarlo. Gire para ver otras cosas. Mantenga presionado para empezar de nuevo.
    .short = Presione: tomar. Gire: más opciones.
lesson-hint-look = Presione: seguir
lesson-hint-guess = Gire hasta su respuesta. Presione para ponerla. Mantenga presionado para más.
    .short = Gire y presione. Mantenga: más.
lesson-hint-choose = Presione para tomarlo. Gire para ver otras cosas.
    .short = Presione: tomar. Gire: más opciones.
lesson-hint-word = Gire hasta una letra. Presione para ponerla. Mantenga presionado para salir.
    .short = Gire: letra. Presione: tomar.

## Avisos

lesson-in = El grupo { $group } ya respondió.
lesson-in-word = El grupo { $group } ya respondió. Su palabra: { $word }
lesson-letter-wrong = Ninguna palabra lleva esa letra aquí.
lesson-cleared = Se borraron las respuestas. Con la Z vuelven.
lesson-not-here = Esta lección no va con este lugar.
lesson-word-ask = Escriba la palabra que muestra la otra pantalla, letra por letra.

## Lo que se adivina

lesson-of-canal = { $canal }: { $sign }
lesson-axis = { $what }, { $unit }
lesson-axis-change = { $what }: cambio, { $unit }
lesson-axis-change-only = { $what }: cambio
lesson-unit-parts = de cada 100 partes
lesson-unit-rights = 1 es el derecho más antiguo
lesson-no-change = sin cambio
lesson-same-day = el mismo día
lesson-unit-days = días
lesson-unit-years = años
lesson-days-fewer = { $n ->
    [one] { $n } día menos
   *[other] { $n } días menos
}
lesson-days-more = { $n ->
    [one] { $n } día más
   *[other] { $n } días más
}
lesson-years-fewer = { $n ->
    [one] { $n } año menos
   *[other] { $n } años menos
}
lesson-years-more = { $n ->
    [one] { $n } año más
   *[other] { $n } años más
}
lesson-parts = { $n } de cada 100
lesson-parts-fewer = { $n } de cada 100 menos
lesson-parts-more = { $n } de cada 100 más

## Las respuestas y el resultado

lesson-usual-value = Muchos dicen: { $value }
lesson-verdict = Ustedes dijeron entre { $least } y { $most }.
lesson-none-near = Nadie anduvo cerca.
lesson-near = { $n ->
    [one] Un grupo anduvo cerca.
   *[other] { $n } grupos anduvieron cerca.
}
lesson-verdict-one = Ustedes dijeron: { $guess }.
lesson-verdict-one-near = Ustedes dijeron: { $guess }. Anduvieron cerca.
lesson-none-right = Nadie nombró este canal.
lesson-right = { $n ->
    [one] { $n } de { $of } grupos nombró este canal.
   *[other] { $n } de { $of } grupos nombraron este canal.
}

## La línea de órdenes

value-lesson = ARCHIVO|NOMBRE
help-lesson = Un archivo de lección, o el nombre de una incluida, como line_the_canal.
help-groups = Cuántos grupos adivinan, de 1 a 12.
error-lesson-unknown = No hay ninguna lección «{ $lesson }». Hay: { $lessons }; o dé un archivo.
error-lesson-unknown-nearest = No hay ninguna lección «{ $lesson }». ¿Quiso decir «{ $nearest }»?
error-lesson-has-problems = La lección { $path } tiene errores en este lugar, así que no se puede dar.

## El ensayo

help-rehearse = Recorre una lección, o una lista de acciones, y guarda cada página como imagen.
help-usage-rehearse = [LUGAR] --lesson ARCHIVO|NOMBRE --into CARPETA [OPCIONES]
help-steps = Una lista de acciones: una por renglón.
help-rehearse-into = La carpeta para las imágenes. Aparece cuando ya están todas.
help-rehearse-more =
    La lista lleva una acción por renglón; lo que sigue a # es un comentario:
      turn 3            la perilla, tantos pasos; -3 hacia el otro lado
      press             el botón
      hold              el botón, presionado un rato
      key L             una tecla: una letra, o Up, Down, Left, Right, PageUp,
                        PageDown, Home, Enter, Escape, Tab, Space
      dial warming 2    la perilla propia de un cambio
      wait 500          pasan tantos milisegundos
      picture NOMBRE    se guarda una imagen; si no hay ningún renglón así,
                        se guarda una después de cada acción

    Con --lesson y --steps juntos, la lista recorre la lección.
    Ejemplo: deshielo rehearse --lesson line_the_canal --into paginas
rehearse-what = Diga qué se ensaya: --lesson o --steps.
rehearse-into = Diga a dónde van las imágenes: --into CARPETA.
rehearse-too-many = Serían más de { $most } imágenes.
rehearse-not-ours = En { $path } hay algo que no es de un ensayo: { $file }. Elija otra carpeta.
rehearse-bad-verb = «{ $text }» no es una acción.
rehearse-bad-line = A «{ $text }» le sobra o le falta una palabra.
rehearse-bad-number = «{ $text }» necesita un número entero.
rehearse-bad-key = «{ $text }» no nombra ninguna tecla.
rehearse-bad-dial = «{ $text }» no nombra ninguna perilla.
rehearse-bad-name = «{ $text }»: el nombre de una imagen lleva solo letras, cifras y guiones, 40 cuando más.
rehearse-lines = Las acciones son: turn 3, press, hold, key L, dial warming 2, wait 500, picture NOMBRE.
