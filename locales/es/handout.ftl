# La hoja para llevar a casa, la hoja de trabajo y las respuestas de una lección, y los datos abiertos.

handout-title = { $place }: lo que muestra el modelo
handout-changed = Qué cambió
handout-numbers = El año en números
handout-season = Cómo va el año
handout-canals = A quién le llega agua y hasta cuándo
handout-years = Todos los años
handout-ledger = A dónde se fue el agua
handout-trust = Qué tanto confiar en esto
handout-always = Esto es un modelo, no un pronóstico. Antes de cambiar sus planes, pregunte en su distrito de riego.
handout-less = menos que antes
handout-half-mark = ya pasó la mitad del agua
handout-full-as-it-was = días completos de antes
handout-water-in = Entra, { $unit }
handout-water-out = Sale, { $unit }
handout-together = En total
handout-code = Este resultado como texto. Apunte la cámara del teléfono: no hace falta internet.
handout-code-alt = Un código cuadrado con este resultado como texto sencillo.
handout-season-alt = Nieve, río, agua guardada y canales a lo largo del año: con sus cambios, línea continua; como era antes, línea cortada.
handout-canals-alt = El año de cada canal como una franja, con su último día completo.
handout-years-alt = Cada año del registro: qué parte del agua pedida llegó y cuánta agua trajo el río.

handout-worksheet = Hoja de trabajo
handout-worksheet-of = Hoja de trabajo: { $name }
handout-key = Respuestas
handout-key-of = Respuestas: { $name }
handout-field-group = Grupo
handout-field-names = Nombres
handout-field-date = Fecha
handout-why = Creemos eso porque
handout-model-says = El modelo dice
handout-we-see = Lo que vemos
handout-sign-of-canal = { $canal }, { $sign }
handout-guess-value = ¿Qué cree? { $sign }
handout-guess-value-all = ¿Qué cree, en todos los años? { $sign }
handout-guess-change = ¿Cuánto cree que cambia? { $sign }
handout-guess-change-all = ¿Cuánto cree que cambia en todos los años? { $sign }

handout-no-lesson = { $path } no es una lección: no tiene pasos.
handout-lesson-unknown = No hay lección «{ $lesson }» ni archivo con ese nombre. Las incluidas: { $lessons }.
handout-sheet-of-nothing = La hoja es de una lección: diga de cuál con --lesson.
handout-lesson-alone = La lección mueve las perillas por su cuenta: quite { $option }.

handout-written = { $n ->
    [one] Hay una página en { $path }
   *[other] Hay { $n } páginas en { $path }
}
handout-fault = No se pudo escribir la página: { $reason }
handout-code-too-long = El resultado es demasiado largo para el código cuadrado: { $n } bytes.
handout-out-unknown = El nombre «{ $path }» no dice qué escribir. Debe terminar en .pdf, .svg o .png.

## Línea de órdenes

help-handout = Hace una hoja para llevar a casa, o la hoja de trabajo de una lección.
help-usage-handout = [LUGAR] [OPCIONES]
help-handout-lesson = Escribir la hoja de esta lección: un archivo o una de las incluidas
help-handout-sheet = Cuál hoja de la lección: work (trabajo), key (respuestas)
help-handout-paper = Papel: a4, letter (carta) [lo usual: el del lugar]
help-handout-out = Dónde escribirla: un nombre que termine en .pdf, .svg o .png [lo usual: deshielo-handout.pdf]
help-handout-more = Con --lang both la hoja dice todo en inglés y en español, lado a lado.
value-sheet = HOJA
value-paper = PAPEL

help-data = Guarda los días y los años de una corrida como datos abiertos.
help-usage-data = [LUGAR] [OPCIONES]
help-data-form = Qué escribir: csv (cuatro tablas; una dice qué es cada columna), netcdf (un archivo con los días, CF-1.11)
help-data-out = Con netcdf: el archivo [lo usual: deshielo-data.nc]
help-data-into = Con csv: la carpeta para las tablas [lo usual: deshielo-data]
data-title = { $place }: los días de una corrida, sin cambios y con cambios
data-written = { $n ->
    [one] Hay un archivo en { $path }
   *[other] Hay { $n } archivos en { $path }
}
data-fault = No se pudo escribir el archivo: { $reason }
