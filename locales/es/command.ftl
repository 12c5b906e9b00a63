# La línea de órdenes: textos de ayuda y lo que puede salir mal.

## Ayuda

help-about = Gire una perilla y vea qué le hace un año más cálido, más seco o con más sed a la nieve, la presa y los canales de un valle.
help-usage = Cómo se usa
help-commands = Órdenes
help-arguments = Qué se le da
help-options = Opciones
help-default = si no se indica: { $value }
help-tell = Para ver en números lo que resulta, sin cambios y con sus cambios.
help-check = Para revisar lugares y combinaciones, con cada error en su renglón.
help-weather = Para hacer un registro largo del tiempo, o alargar uno corto.
help-help = Esta ayuda.
help-version = La versión del programa.

help-place = La carpeta que describe un valle, o «demo» para el valle inventado.
help-set = Una perilla y cuánto girarla, por ejemplo warming=2. Se puede repetir.
help-setting = Un archivo con una combinación de perillas y años.
help-years = Qué años mostrar: all (todos), dry (secos), middling (regulares), wet (húmedos), un año, o un tramo como 1990..1999.
help-daily = Con todos los días, no solo con los años.
help-form = La forma de la respuesta: table (tabla), csv o json.
help-units = Unidades para la gente: metric (métricas) o us (de Estados Unidos). JSON y CSV siempre van en métricas.
help-lang = Idioma: en, es, o una etiqueta completa como es-MX.
help-locales = Una carpeta con más idiomas.
help-out = El archivo donde queda la respuesta, en lugar de la pantalla.
help-into = La carpeta donde quedan los archivos.
help-paths = Qué revisar: carpetas de lugares o archivos de combinaciones.
help-seed = El número con que empieza el azar. Con el mismo número sale el mismo tiempo.
help-length = Cuántos años hacer.
help-from = El primer año de agua que se hace.

## Perillas y combinaciones

error-dial-out-of-range = La perilla «{ $dial }» va de { $low } a { $high }. { $value } queda fuera.
error-dial-step = La perilla «{ $dial }» se mueve de { $step } en { $step }. { $value } queda entre dos pasos.
error-dial-unknown = No hay ninguna perilla «{ $dial }».
error-dial-unknown-nearest = No hay ninguna perilla «{ $dial }». ¿Quiso decir «{ $nearest }»?
error-dial-list = Las perillas son: { $dials }.
error-dial-hidden = Este lugar no tiene la perilla «{ $dial }».
error-dial-not-a-number = «{ $value }» no es un número para la perilla «{ $dial }». Escríbalo así: { $example }.
error-dial-no-equals = «{ $text }» no dice cuánto girar. Escríbalo así: { $example }.
error-dial-twice = La perilla «{ $dial }» aparece dos veces. Póngala una sola vez.
error-setting-unknown = No hay ninguna combinación «{ $setting }».
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
error-not-unicode = Este texto no se puede leer como letras: { $text }
error-see-help = Para ver la ayuda: { $command }

## Archivos

error-place-not-found = No hay ningún lugar en { $path }. Indique una carpeta que tenga un place.toml, o «demo».
error-file-not-found = No existe el archivo { $path }.
error-file-unreadable = No se puede leer el archivo { $path }: { $reason }
error-file-unwritable = No se puede escribir el archivo { $path }: { $reason }
error-file-nothing-changed = No se escribió nada; lo que había sigue como estaba.
error-folder-unwritable = No se puede hacer la carpeta { $path } o escribir en ella: { $reason }
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
check-not-known = { $path } no es un lugar ni una combinación; no hay qué revisar.

## weather

weather-made = { $n ->
    [one] Hay { $n } año de tiempo en { $path }.
   *[other] Hay { $n } años de tiempo en { $path }.
}
weather-invented = Este tiempo salió al azar, con una regla. Nunca ocurrió.
weather-from-seed = Empezó con el número { $seed }. Con el mismo número sale el mismo tiempo.
weather-fitted-to = Sigue la forma de { $n } años medidos.
weather-record-too-short = El registro tiene { $n } años completos. Para aprender su forma hacen falta al menos { $least }.
weather-length-refused = El largo tiene que ser de { $low } a { $high } años.

## Avance

progress-years = { $done } de { $n } años
progress-reading = Leyendo { $path }
progress-running = Calculando los años
progress-writing = Escribiendo { $path }
