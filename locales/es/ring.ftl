# La rueda a la que llegan una perilla y un botón, la lista de ajustes y lo que hace un dedo.

## Lo que hay en la rueda

ring-view = Vista
ring-year = Año
ring-day = Día
ring-play = Correr el año
ring-keep = Guardar al lado
ring-settings = Ajustes
ring-undo = Deshacer
ring-words = Palabras
ring-language = Idioma
ring-units = Unidades
ring-shade = Colores
ring-help = Ayuda

## Cómo está cada cosa

ring-paused = en pausa
ring-slow = despacio
ring-middling = a paso medio
ring-fast = rápido
ring-kept = hay una guardada
ring-nothing-kept = nada guardado
ring-setting-count = hay { $n } para elegir
ring-undo-turn = lo girado: { $dial }
ring-undo-reset = dejar todo sin cambios
ring-undo-recall = el ajuste
ring-nothing-to-undo = nada que deshacer
ring-word-count = { $n } explicadas
ring-metric = métricas
ring-us = Estados Unidos
ring-light = claros
ring-dark = oscuros
ring-sunlight = para el sol
ring-help-told = cómo funciona esto

## Lo que se dice al pie

ring-hint-on-ring = Gire: seguir. Presione: tomar.
ring-hint-acts = Gire: seguir. Presione: hacerlo.
ring-hint-in = Gire: cambiar. Presione: ver todo.
ring-working = Calculando la respuesta nueva …
ring-end-lowest = Aquí ya no baja más.
ring-end-highest = Aquí ya no sube más.
ring-end-first = Aquí empieza.
ring-end-last = Aquí termina.
ring-done-kept = Guardada al lado: los puntos redondos.
ring-done-let-go = Ya no hay nada al lado.
ring-done-undone = Deshecho.
ring-done-again = Hecho otra vez.
ring-done-nothing = No hay nada que deshacer.
ring-done-reset = Todo sin cambios. Deshacer lo trae otra vez.
ring-done-saved = Guardado como suyo, número { $n }.
ring-done-forgot = Se borró el último suyo.

## La lista de ajustes

setting-title = Ajustes
setting-hint = Gire: elegir. Presione: tomar.
setting-back = Volver
setting-own = Suyo, número { $n }
setting-save = Guardar lo que hay ahora
setting-forget = Borrar el último suyo

## Un dedo o el ratón

help-touch = Dedo o ratón
help-touch-dial = Toque una perilla para tomarla. Deslice el dedo sobre ella para girarla.
help-touch-day = Toque un día del año, o un año. Toque la fecha para correr el año.
help-touch-view = Toque la orilla izquierda o derecha para ver otra vista.
help-touch-ring = Toque la perilla chica del pie para llegar a todo lo demás.
help-touch-wheel = La rueda del ratón es la perilla. El botón derecho presiona.
