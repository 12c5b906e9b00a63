# `place`: preparar un valle propio.

## Ayuda

help-place-command = Para preparar un valle propio: ver un registro, empezar un lugar, agregar registros.
help-place-more = Para ver las opciones de cada una: deshielo place new --help
help-place-new = Para escribir el comienzo de un lugar con lo que ya sabe y los registros que tiene.
help-place-peek = Para ver qué trae un registro o una malla de alturas, con los renglones para place.toml.
help-place-add = Para agregar días nuevos a un registro del lugar, o un registro que aún no tiene.
help-usage-new = CARPETA [OPCIONES]
help-usage-peek = ARCHIVO [OPCIONES]
help-usage-add = LUGAR ARCHIVO [OPCIONES]
help-new-dir = La carpeta del lugar nuevo.
help-new-name = El nombre del valle.
help-new-name-es = El nombre en español, si es otro.
help-new-region = Idioma y país, por ejemplo es-CL o es-MX.
help-new-latitude = Grados de latitud, el sur con signo menos: --latitude -33.4
help-new-station = La altura de la estación del tiempo, por ejemplo 1600m o 5250ft.
help-new-sharing = Cómo se reparte el río: seniority (antigüedad), proportional (a prorrata) o rotation (por turnos).
help-new-weather = El registro del tiempo: CSV, WaterML 2.0 o NetCDF clásico.
help-new-gauge = El registro de una estación de aforo.
help-new-snow = Un registro del agua en la nieve.
help-new-storage = Un registro del agua guardada.
help-new-grid = Una malla de alturas, Esri ASCII o GeoTIFF. Pide también --outline.
help-new-ask = Pregunta lo que falta aunque parezca que no hay nadie.
help-measures = Qué mide la estación de aforo: natural, computed_inflow (entrada calculada) o below_diversions (debajo de las tomas).
help-replace = Para escribir encima de los archivos que ya están.
help-peek-file = Un registro (CSV, WaterML 2.0, NetCDF clásico) o una malla de alturas (Esri ASCII, GeoTIFF).
help-peek-form = La forma de la respuesta: table (tabla) o json.
help-outline = El contorno de la cuenca en GeoJSON, para una malla de alturas.
help-coordinates = Las coordenadas de la malla, si su archivo no las dice; por ejemplo EPSG:32719.
help-height-unit = La unidad de las alturas, si el archivo no la dice: m o ft (pies).
help-bands = Cuántas zonas de altura, de 1 a 32.
help-add-place = La carpeta del lugar.
help-add-file = El registro con los días nuevos, o el registro nuevo.
help-add-as = Para qué es: weather (tiempo), gauge (aforo), snow (nieve), storage (agua guardada) o canal.
help-add-canal = La clave del canal o pueblo cuyo caudal trae.
help-add-column = Qué columna tomar, si hay más de una.
help-add-unit = La unidad de esa columna.

value-text = TEXTO
value-height = ALTURA
value-rule = REGLA
value-measures = QUÉ
value-coordinates = CÓDIGO
value-unit = UNIDAD
value-record = REGISTRO
value-key = CLAVE

place-which = Diga qué hacer: new (empezar), peek (ver) o add (agregar).
place-coordinates-unknown = Aquí no se conocen las coordenadas «{ $value }». Use grados (EPSG:4326) o una zona UTM, por ejemplo EPSG:32719.
place-outline-missing = Una malla de alturas necesita el contorno de la cuenca: --outline ARCHIVO
place-option-wrong = No se entiende el valor de { $option }. Escríbalo así: { $example }
place-file-name = { $path } no tiene un nombre que sirva en un lugar.

## new

place-exists = { $path } ya existe. No se escribió nada. Con --replace se escribe encima.
place-not-folder = { $path } no es una carpeta. No se escribió nada.
place-file-twice = Dos registros se llamarían { $file } en el lugar. Póngale otro nombre a uno.
place-no-column = { $path } no tiene una columna que sirva para [{ $table }].
place-see-peek = Para ver qué trae: deshielo place peek { $path }
place-made = El comienzo del lugar está en { $path }.
place-ready = { $path } no tiene errores. Ya se puede calcular.
place-still-open = { $n ->
    [one] Falta completar o arreglar { $n } cosa:
   *[other] Falta completar o arreglar { $n } cosas:
}
place-then-check = Abra el archivo en un editor de texto. Después corra: deshielo check { $path }
ask-intro = Unas preguntas. Pulse Intro para dejar alguna para después.
ask-name = ¿Cómo se llama el valle?
ask-region = ¿Qué idioma y país? Por ejemplo es-CL, es-MX, es-US.
ask-latitude = ¿En qué latitud queda, en grados? El sur con signo menos: -33.4
ask-station = ¿A qué altura está la estación del tiempo? Por ejemplo 1600m o 5250ft.
ask-rule = ¿Cómo se reparte el río? seniority (primero el derecho más antiguo), proportional (a todos la misma parte) o rotation (por turnos).
ask-again = Aquí no se entiende «{ $text }». Escríbalo de otra manera, o pulse Intro.

## El texto de un comienzo

skeleton-head = La descripción de un valle para deshielo. La escribió «place new»; cámbiela como quiera.
skeleton-how = Una nota empieza con #. Quite el # de un renglón para que cuente. Las claves llevan su unidad. Los números van con punto decimal. PLACE.md explica cada clave.
skeleton-fill = FALTA:
skeleton-name = El nombre que ve la gente, en los dos idiomas.
skeleton-region = Idioma y país: deciden las palabras y la marca decimal en la pantalla.
skeleton-latitude = Grados de latitud. El sur va con signo menos.
skeleton-year = El calendario usual. Vale aunque no esté escrito.
skeleton-source = De dónde salen los números. La gente va a preguntar.
skeleton-station = La altura de la estación del tiempo sobre el mar.
skeleton-weather = El tiempo: una fila por día, sin saltar ninguno.
skeleton-weather-missing = FALTA: ponga el registro en esta carpeta. Con «place add» estos renglones se escriben solos.
skeleton-curve = La superficie de la cuenca debajo de cada altura, según la malla de alturas. Se corta en zonas de igual altura.
skeleton-bands = FALTA: zonas de altura, de la más baja a la más alta, sin el lago ni las parcelas. «place new --grid» las saca de una malla de alturas.
skeleton-usual = Valores usuales de la montaña. Valen aunque no estén escritos. El ajuste con una estación de aforo reemplaza la mayoría.
skeleton-reservoir = El agua guardada detrás de un muro, si la hay. La tabla va desde el fondo hacia arriba.
skeleton-minimum = Agua que debe quedar en el río, si la hay.
skeleton-sharing = Cómo se reparte el río: "seniority" (primero el derecho más antiguo), "proportional" (a todos la misma parte) o "rotation" (por turnos).
skeleton-canal = Los canales, en el orden en que los encuentra el río. Con "seniority" hacen falta «right» y «rate»; con "rotation", «turn_days».
skeleton-town = Un pueblo que toma agua.
skeleton-compare = Registros para comparar, si los hay. Con «place add» estos renglones se escriben solos.
skeleton-gauge = ¿La estación de aforo está antes de todos los canales? Entonces «natural» está bien. Si está después, escriba "below_diversions".

## peek

peek-text = Texto con «{ $mark }» entre las celdas. El encabezado está en el renglón { $line }.
peek-tab = tabulador
peek-comma = Los números llevan coma decimal.
peek-latin = Las letras son Latin-1, no UTF-8.
peek-exchange = Un archivo que dice él mismo dónde están sus días y sus unidades.
peek-date = Las fechas están en «{ $column }», como { $order }: { $reason }.
peek-date-only = en otro orden no salen días del calendario
peek-date-daily = solo así cada fila es el día que sigue
peek-date-usual = también cabe otro orden; revíselo
peek-date-parts = así lo dicen los nombres de las columnas
peek-date-columns = La fecha está en varias columnas: { $columns }.
peek-marks = Parece que esto marca un valor que falta: { $marks }
peek-days = { $n ->
    [one] { $n } día: { $first }.
   *[other] { $n } días, del { $first } al { $last }.
}
peek-column = columna
peek-is = parece ser
peek-unit = unidad
peek-missing = faltan
peek-lowest = mínimo
peek-mean = promedio
peek-highest = máximo
peek-why = por qué
peek-role-date = la fecha
peek-role-again = otra vez «{ $measure }»
peek-role-numbers = números que no se conocen
peek-role-text = texto
peek-unit-name = la unidad está en el nombre
peek-unit-size = la unidad se ve en los números
peek-unit-usual = nada dice la unidad: revísela
peek-months = El año promedio, mes por mes; cada columna va de su mes más bajo al más alto:
peek-years = Cuánto hay de cada año:
peek-propose = Estos renglones podrían ir en place.toml:
peek-gauge = ¿La estación de aforo está antes de todos los canales? Entonces «natural» está bien. Si está después, escriba "below_diversions".
peek-no-kind = Estas columnas no dicen solas para qué tabla de place.toml son. Dígalo con «place add --as».
peek-fine = Leído así, el registro no tiene errores.
peek-problems = { $n ->
    [one] Leído así, hay { $n } cosa que revisar:
   *[other] Leído así, hay { $n } cosas que revisar. Las primeras:
}
place-curve = La cuenca tiene { $area }, de { $low } a { $high }; en promedio, { $mean }. Celdas contadas: { $n }.
place-curve-unit = El archivo no dice la unidad de las alturas y se tomaron como metros. Si son pies, agregue --height-unit ft.
place-curve-empty = El { $percent } % de la cuenca no tiene altura en la malla. El resto vale por esa parte.

## add

place-add-no-place = En { $path } no hay un place.toml. Se escribe con «place new».
place-add-canal = Diga qué canal: --canal CLAVE
place-add-canal-only = La opción --canal va solo con --as canal.
place-add-as = Las columnas no dicen para qué es el registro. Agregue --as y una de estas: { $choices }
place-add-weather-columns = Un registro del tiempo tiene varias columnas. Nómbrelas en place.toml.
place-add-unit = El archivo no dice la unidad de esta columna. Agregue { $option }.
place-add-column = Ninguna columna sirve por su nombre. Diga cuál tomar: { $option }
place-add-columns = Sirven varias columnas: { $choices }. Diga cuál tomar: { $option }
place-add-lacks = { $path } no tiene una columna para «{ $column }» del registro.
place-add-exchange = A { $path } no se le pueden agregar días. Solo crecen los registros de texto. Nombre en place.toml el archivo más nuevo y más largo.
place-add-not-utf8 = { $path } no es UTF-8 y no se le pueden agregar renglones.
place-added-days = { $n ->
    [one] Se agregó { $n } día a { $path }: { $first }.
   *[other] Se agregaron { $n } días a { $path }, del { $first } al { $last }.
}
place-added-same = { $n ->
    [one] { $n } día ya estaba, con los mismos valores.
   *[other] { $n } días ya estaban, con los mismos valores.
}
place-added-record = { $file } ya está en el lugar. Estos renglones se agregaron a { $path }:

problem-add-nothing = Este archivo no tiene ningún día después del { $date }, el último del registro.
    .remedy = Dé un archivo con días más nuevos.
problem-add-hole = Entre el registro y este archivo faltan días: del { $first } al { $last }.
    .remedy = Agregue primero esos días, con celdas vacías donde no se midió.
problem-add-before = Este archivo empieza antes que el registro, que empieza el { $date }.
    .remedy = Solo se agregan días al final. Quite los anteriores.
problem-add-differs = El { $date } el registro tiene { $before } en «{ $column }», y este archivo { $after }.
    .remedy = Averigüe cuál es el bueno. Corríjalo en el registro o en este archivo.
