# La línea de órdenes: textos de ayuda y lo que puede salir mal.

## Ayuda

help-about = Gire una perilla y vea qué le hace un año más cálido, más seco o con más sed a la nieve, la presa y los canales de un valle.
help-usage = Cómo se usa
help-commands = Órdenes
help-arguments = Qué se le da
help-options = Opciones
help-default = si no se indica: { $value }
help-tell = Dice en números lo que resulta, sin cambios y con sus cambios.
help-check = Revisa lugares, combinaciones, lecciones y archivos de placa, renglón por renglón.
help-weather = Hace un registro largo del tiempo, o alarga uno corto.
help-help = Esta ayuda.
help-version = La versión del programa.

help-place = La carpeta que describe un valle, o «demo» para el valle inventado.
help-set = Una perilla y cuánto girarla, por ejemplo warming=2. Se puede repetir. También vale un valor entre dos pasos.
help-setting = Un archivo con una combinación de perillas y años, o el nombre de una que ya trae el programa.
help-years = Qué años mostrar: all (todos), dry (secos), middling (regulares), wet (húmedos), un año, o un tramo como 1990..1999.
help-daily = Con todos los días, no solo con los años; va con --form csv o --form json.
help-form = La forma de la respuesta: table (tabla), csv o json.
help-units = Unidades para la gente: metric (métricas) o us (de Estados Unidos). JSON y CSV siempre van en métricas.
help-lang = Idioma: en, es, o una etiqueta completa como es-MX.
help-locales = Una carpeta con más idiomas.
help-out = El archivo donde queda la respuesta, en lugar de la pantalla.
help-paths = Qué revisar: carpetas de lugares, combinaciones, lecciones o archivos de placa.
help-seed = El número con que empieza el azar. Con el mismo número sale el mismo tiempo.
help-length = Cuántos años hacer.
help-from = El primer año de agua que se hace, con cuatro cifras.

## Perillas y combinaciones

error-dial-out-of-range = La perilla «{ $dial }» va de { $low } a { $high }. { $value } queda fuera.
error-dial-unknown = No hay ninguna perilla «{ $dial }».
error-dial-unknown-nearest = No hay ninguna perilla «{ $dial }». ¿Quiso decir «{ $nearest }»?
error-dial-list = Las perillas son: { $dials }.
error-dial-hidden = Este lugar no tiene la perilla «{ $dial }».
error-dial-not-a-number = «{ $value }» no es un número para la perilla «{ $dial }». Escríbalo así: { $example }.
error-dial-no-equals = «{ $text }» no dice cuánto girar. Escríbalo así: { $example }.
error-dial-twice = La perilla «{ $dial }» aparece dos veces. Póngala una sola vez.
error-setting-unknown = No hay ninguna combinación «{ $setting }». Están: { $settings }; o dé un archivo.
error-setting-unknown-nearest = No hay ninguna combinación «{ $setting }». ¿Quiso decir «{ $nearest }»?
error-years-unreadable = «{ $text }» no dice qué años. Escriba all, dry, middling, wet, un año, o un tramo como 1990..1999.
error-years-outside = El registro tiene los años de agua de { $first } a { $last }. { $asked } no está.
error-years-backward = El tramo { $text } va al revés. Ponga primero el año más antiguo.
error-choice-unknown = «{ $value }» no vale para { $option }. Se puede escoger entre: { $choices }.
error-choice-unknown-nearest = «{ $value }» no vale para { $option }. ¿Quiso decir «{ $nearest }»?

## Opciones

error-command-unknown = No hay ninguna orden «{ $command }».
error-command-unknown-nearest = No hay ninguna orden «{ $command }». ¿Quiso decir «{ $nearest }»?
error-option-unknown = No hay ninguna opción { $option }.
error-option-unknown-nearest = No hay ninguna opción { $option }. ¿Quiso decir { $nearest }?
error-option-no-value = A la opción { $option } le falta su valor.
error-option-twice = La opción { $option } aparece dos veces. Póngala una sola vez.
error-option-number = La opción { $option } lleva un número entero, de { $low } a { $high }.
error-argument-extra = «{ $text }» está de más.
error-argument-missing = Falta algo: { $name }.
error-see-help = Para ver la ayuda: { $command }

## Archivos

error-place-not-found = No hay ningún lugar en { $path }. Indique una carpeta que tenga un place.toml, o «demo».
error-file-not-found = No existe el archivo { $path }.
error-file-unreadable = No se puede leer el archivo { $path }: { $reason }
error-file-unwritable = No se puede escribir el archivo { $path }: { $reason }
error-file-nothing-changed = No se escribió nada; lo que había sigue como estaba.
error-disk-full = Ya no cabe { $path } en el disco.
error-output = No se puede escribir la respuesta: { $reason }
error-place-has-problems = El lugar { $path } tiene errores y así no se puede calcular.
error-warning = Nota
error-error = Error

## check

check-fine = { $path }: sin errores.
check-found = { $n ->
    [one] { $path }: { $n } error.
   *[other] { $path }: { $n } errores.
}
check-notes = { $n ->
    [one] { $path }: { $n } nota.
   *[other] { $path }: { $n } notas.
}
check-not-known = { $path } no es un lugar, ni una combinación, ni una lección, ni el archivo de una placa; no hay qué revisar.

## weather

weather-made = { $n ->
    [one] Hay { $n } año de tiempo en { $path }.
   *[other] Hay { $n } años de tiempo en { $path }.
}
weather-invented = Este tiempo salió al azar, con una regla. Nunca ocurrió.
weather-from-seed = Empezó con el número { $seed }. Con el mismo número sale el mismo tiempo.
weather-fitted-to = { $n ->
    [one] Sigue la forma de { $n } año de agua completo de { $place }.
   *[other] Sigue la forma de { $n } años de agua completos de { $place }.
}
weather-record-too-short = Años de agua completos en el registro: { $n }. Para aprender su forma hacen falta al menos { $least }.

## Avance

progress-reading = Leyendo { $path }
progress-running = Calculando los años

## Lo que está en lugar de un valor en la ayuda

value-place = LUGAR
value-set = PERILLA=VALOR
value-setting = ARCHIVO|NOMBRE
value-years = AÑOS
value-form = FORMA
value-units = UNIDADES
value-file = ARCHIVO
value-folder = CARPETA
value-path = RUTA
value-recipe = ARCHIVO|NOMBRE
value-number = NÚMERO
value-year = AÑO
value-lang = IDIOMA

help-usage-commands = ORDEN [OPCIONES]
help-usage-tell = [LUGAR] [OPCIONES]
help-usage-check = RUTA... [OPCIONES]
help-usage-weather = [LUGAR] [OPCIONES]
help-more = Para ver las opciones de una orden: deshielo ORDEN --help
help-crops = También los cultivos del lugar, con sus números y de dónde salen.
help-columns = Solo explica cada columna del CSV y cada parte del JSON.
help-tell-more =
    Perillas (si un valor se sale, se le dice hasta dónde llega en ese lugar):
      warming               más calor, en grados Celsius
      winter_precipitation  lluvia y nieve de invierno, por ciento más o menos
      summer_precipitation  lluvia de verano, por ciento más o menos
      diversion             agua que piden los canales, por ciento más o menos
      canal_lining          parte de la pérdida que se evita, por ciento
      crop_mix              parte de la tierra que cambia de cultivo, por ciento
      river_minimum         agua mínima en el río, por ciento más o menos
      reservoir_size        tamaño del lago, por ciento más o menos
      starting_storage      agua al empezar el año, por ciento de lo que cabe
      town_growth           crecimiento del pueblo, por ciento más

    Ejemplo: deshielo tell demo --set warming=2 --years dry
help-check-form = La forma de lo que se encontró: table (tabla) o json.
help-weather-place = Un lugar de cuyo registro se aprende. Si no se da, se usa una receta.
help-recipe = Cómo es el tiempo: tresnubes, south (sur), o el archivo de una receta.
help-recipe-out = El archivo donde también queda la receta.

## Por qué una perilla no tiene sobre qué actuar, y otras cosas

error-dial-lacking = Aquí la perilla «{ $dial }» no tiene sobre qué actuar: { $reason }.
place-lacks-canals = este lugar no tiene canales
place-lacks-canal-loss = los canales de este lugar no pierden agua
place-lacks-crop-swap = este lugar no dice qué cultivo puede cambiar
place-lacks-river-minimum = este lugar no pide agua mínima en el río
place-lacks-reservoir = este lugar no tiene presa
place-lacks-town = este lugar no tiene pueblo
place-lacks-nothing = este lugar la esconde
error-years-none = El registro no tiene ningún año de agua completo.
error-river-fault = El río de este lugar tiene un valor sin sentido: { $value }.
error-option-form = La opción { $option } va con { $forms }.
error-place-and-recipe = Indique un lugar o use { $option }, pero no los dos.
error-not-unicode-here = Una parte de la orden no se puede leer como letras.
error-out-is-folder = { $path } es una carpeta. Dé el nombre de un archivo.
error-recipe-unknown = No hay ninguna receta «{ $recipe }». Están: { $recipes }; o dé un archivo.
error-recipe-unknown-nearest = No hay ninguna receta «{ $recipe }». ¿Quiso decir «{ $nearest }»?
error-remedy = Qué hacer

reason-not-found = no está
reason-not-allowed = usted no tiene permiso
reason-read-only = el disco es de solo lectura
reason-is-folder = es una carpeta
reason-not-folder = una parte de la ruta no es una carpeta
reason-not-text = no es texto en UTF-8
reason-too-large = es demasiado grande
reason-full = ya no hay espacio
reason-other = el sistema dice «{ $reason }»

check-more = { $n ->
    [one] Hay { $n } más que no se muestra.
   *[other] Hay { $n } más que no se muestran.
}
