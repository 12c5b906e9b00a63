# Lo que puede estar mal en place.toml, en las tablas pequeñas que lo acompañan o en un ajuste de perillas. El mensaje
# dice qué está mal; su .remedy dice cómo queda bien.

## Los archivos

problem-file-missing = El archivo «{ $file }» no está en la carpeta del lugar.
    .remedy = Revise el nombre, letra por letra, y que el archivo se haya copiado también.
problem-file-outside = El archivo «{ $file }» está fuera de la carpeta del lugar.
    .remedy = Cópielo a la carpeta y escriba solo su nombre.
problem-file-large = El archivo «{ $file }» pesa más de { $most } MB.
    .remedy = Revise que sea el archivo correcto. Un siglo de días ocupa unos 5 MB.
problem-file-unreadable = No se puede abrir el archivo «{ $file }».
    .remedy = Revise que usted tenga permiso de leerlo y que otro programa no lo tenga abierto.
problem-file-no-file = «{ $file }» no es un archivo.
    .remedy = Escriba el nombre de un archivo, no el de una carpeta ni el de un aparato.
problem-utf16 = Este texto está guardado con dos bytes por letra (UTF-16).
    .remedy = En su editor de texto elija «Guardar como» y ahí la codificación UTF-8.
problem-not-utf8 = Aquí hay una letra que no está en UTF-8.
    .remedy = Guarde el archivo como UTF-8.

## Cómo está escrito el archivo

problem-syntax = Esta línea no se puede leer.
    .remedy = Escriba cada línea así: clave = valor. Las notas empiezan con #.
problem-decimal-comma = Este número lleva coma decimal.
    .remedy = En este archivo los números llevan punto decimal: 12.5.
problem-quote = Aquí hay un texto sin comillas de cierre.
    .remedy = Ponga comillas antes y después del texto, en una sola línea.
problem-text-unquoted = Este valor no es un número ni un texto entre comillas.
    .remedy = Ponga el texto entre comillas. Un número va solo: su unidad va en la clave. Sí y no se escriben true y false.
problem-bracket = Aquí se abre un corchete y no se cierra.
    .remedy = Ciérrelo. El nombre de una tabla va entre corchetes: [snow]. Una lista también: [1, 2].
problem-key-twice = «{ $key }» está dos veces.
    .remedy = Deje una de las dos.
problem-table-unknown = Este archivo no tiene una parte llamada «{ $key }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-table-missing = Falta la tabla [{ $table }].
    .remedy = Agréguela. PLACE.md muestra lo que lleva.
problem-key-unknown = En [{ $table }] no existe la clave «{ $key }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-key-unit = «{ $key }» no dice una unidad que sirva.
    .remedy = Escriba una de estas: { $choices }.
problem-two-units = «{ $key }» y «{ $other }» dicen lo mismo dos veces.
    .remedy = Deje una de las dos.
problem-key-missing = En [{ $table }] falta «{ $key }».
    .remedy = Agregue una línea: { $key } = …
problem-tables-missing = A este [{ $table }] le falta «{ $key }».
    .remedy = Empiece uno más abajo con una línea [[{ $table }.{ $key }]].
problem-key-missing-at-top = En el archivo falta «{ $key }».
    .remedy = Agregue una línea al principio: { $key } = …
problem-either = «{ $key }» y «{ $other }» responden a la misma pregunta.
    .remedy = Deje una de las dos.
problem-one-bracket = Puede haber varias tablas [{ $table }]; por eso cada una lleva corchetes dobles.
    .remedy = Escriba [[{ $table }]].
problem-not-tables = «{ $table }» debe ser una tabla.
    .remedy = Empiece cada una con una línea [[{ $table }]].
problem-not-table = «{ $key }» debe llevar varios valores con su nombre.
    .remedy = Escríbalos entre llaves y con comas: nombre = valor, nombre = valor.

## Clases de valor

problem-not-number = «{ $key }» debe ser un número.
    .remedy = Escríbalo sin comillas y con punto decimal: 12.5.
problem-not-whole = «{ $key }» debe ser un número entero. Vale { $value }.
    .remedy = Escriba un número sin decimales.
problem-not-text = «{ $key }» debe ser texto.
    .remedy = Póngalo entre comillas.
problem-text-empty = «{ $key }» no tiene nada entre las comillas.
    .remedy = Escriba el texto o quite la línea.
problem-not-flag = «{ $key }» debe ser true o false.
    .remedy = Escriba true para sí o false para no, sin comillas.
problem-not-list = «{ $key }» debe ser una lista.
    .remedy = Escriba los valores entre corchetes y con comas: [1, 2, 3].
problem-list-length = «{ $key }» tiene { $found ->
        [one] { $found } valor
       *[other] { $found } valores
    }. Lleva { $wanted }.
    .remedy = Ponga tantos valores como hacen falta, en orden.
problem-list-short = «{ $key }» lleva por lo menos dos valores.
    .remedy = Agregue los valores que faltan.
problem-number-range = «{ $key }» vale { $value }. Debe estar entre { $least } y { $most }.
    .remedy = Revise el número, su signo y su unidad.
problem-choice = { $near ->
        [0] «{ $value }» no se conoce para «{ $key }».
       *[other] «{ $value }» no se conoce para «{ $key }». ¿Quiso decir «{ $nearest }»?
    }
    .remedy = Escriba una de estas palabras: { $choices }.
problem-not-rising = «{ $key }» no va subiendo: este valor no es mayor que el anterior.
    .remedy = Ponga los valores de menor a mayor, cada uno una sola vez.

## Nombres e idiomas

problem-name-one-language = «{ $key }» está en un solo idioma.
    .remedy = Escriba los dos, entre llaves: en = "…", es = "…".
problem-name-language = A «{ $key }» le faltan las palabras en { $language ->
        [en] inglés (en)
       *[es] español (es)
    }.
    .remedy = Agréguelas: la gente puede cambiar de idioma en cualquier momento.
problem-language-tag = «{ $value }» no es un idioma. Está en «{ $key }».
    .remedy = Escriba en o es, con región si allá se dice distinto: es-CL.
problem-region = «{ $value }» no es una región.
    .remedy = Escriba idioma y país: en-US, es-MX, es-CL.
problem-key-letters = La clave «{ $value }» tiene letras que una clave no puede llevar.
    .remedy = Use solo letras minúsculas de la a a la z sin acento, números, _ y -. El nombre sí puede llevar cualquier letra.
problem-same-key = La clave «{ $key }» está dos veces.
    .remedy = Dé a cada cual su propia clave.

## Días y años

problem-month = { $near ->
        [0] «{ $value }» no es un mes, en «{ $key }».
       *[other] «{ $value }» no es un mes, en «{ $key }». ¿Quiso decir «{ $nearest }»?
    }
    .remedy = Escriba el nombre del mes o su número, de 1 a 12.
problem-month-day = «{ $key }» debe ser un mes y un día.
    .remedy = Escriba primero el mes, entre comillas: "04-15" es el 15 de abril.
problem-month-day-swapped = «{ $value }» tiene el día y el mes al revés.
    .remedy = Escriba primero el mes: "{ $right }".
problem-day-impossible = El día «{ $value }» no existe.
    .remedy = Escriba primero el mes y luego un día que ese mes tenga: "04-15" es el 15 de abril.
problem-right-date = «{ $key }» no es una fecha que un derecho pueda tener.
    .remedy = Escriba un año (1905), una fecha (1905-05-14) o "before_all".
problem-date-twice = «{ $key }» tiene el mismo día dos veces.
    .remedy = Ponga cada día una sola vez.
problem-years = { $near ->
        [0] «{ $value }» no dice qué años.
       *[other] «{ $value }» no dice qué años. ¿Quiso decir «{ $nearest }»?
    }
    .remedy = Escriba "all", "dry", "middling", "wet", un año ("2012") o varios ("2011..2014").

## El valle y su estación

problem-latitude-zero = La latitud { $value } cae en el ecuador, donde no hay invierno ni verano.
    .remedy = Escriba los grados al norte, o los grados al sur con signo menos.
problem-latitude-sign = La latitud es { $value }, pero en el registro hay { $june } °C de junio a agosto y { $december } °C de diciembre a febrero.
    .remedy = Al sur del ecuador la latitud lleva signo menos. Al norte no lleva.
problem-areas = Según el archivo, el valle mide { $stated } km², pero sus partes suman { $found } km²: zonas { $bands }, lago { $lake }, parcelas { $fields }.
    .remedy = Las zonas de altura no incluyen ni el lago ni las parcelas. Revise cada superficie y su unidad.
problem-areas-inside = El lago y las parcelas ocupan { $inside } km², pero la curva solo tiene { $found } km².
    .remedy = Revise las unidades de la curva, o escriba holds_lake = false o holds_fields = false.
problem-bands-missing = El lugar no tiene zonas de altura.
    .remedy = Agregue un [[band]] por cada tramo de la montaña, o una curva [area_elevation].
problem-bands-and-curve = El lugar tiene zonas de altura y también una curva.
    .remedy = Deje [[band]] o [area_elevation], no las dos cosas.
problem-bands-order = Esta zona está más abajo que la anterior.
    .remedy = Ponga las zonas de la más baja a la más alta.
problem-too-many-bands = Hay { $found } zonas de altura. Caben { $most } como máximo.
    .remedy = Junte las zonas de alturas parecidas.
problem-station-feet = La estación está a { $station } m, muy por encima del valle (de { $lowest } a { $highest } m). Parecen pies.
    .remedy = Si son pies, escriba elevation_ft.
problem-station-above = La estación está a { $station } m, por encima de todo el valle (de { $lowest } a { $highest } m).
    .remedy = Revise las alturas y sus unidades. Elija una estación que esté en el valle o cerca de él.
problem-station-far-below = La estación está a { $station } m, muy por debajo del valle (de { $lowest } a { $highest } m).
    .remedy = Revise las alturas y sus unidades. Una estación más cercana a la nieve dice más de ella.
problem-gradient = Con este cambio con la altura, a { $elevation } m caería { $factor } veces la lluvia y nieve de la estación.
    .remedy = Lo normal es de 0.02 a 0.10 por cada 100 m: de 2 a 10 % más.
problem-lapse-sign = El aire se calentaría con la altura: { $value } °C por km.
    .remedy = Escríbalo con signo menos: -6.5.
problem-rain-snow-order = Todo es nieve por debajo de { $snow } °C, pero todo es lluvia ya por encima de { $rain } °C.
    .remedy = La temperatura de la lluvia debe ser la mayor.
problem-wet-bulb-humidity = La temperatura de bulbo húmedo necesita humedad, y el registro no la tiene.
    .remedy = Indique una columna de humedad o de punto de rocío, o escriba wet_bulb = false.
problem-melt-swing = La variación del derretimiento ({ $swing }) es mayor que su promedio ({ $factor }). En pleno invierno saldría negativo.
    .remedy = Ponga una variación menor que el promedio.
problem-ground-order = El depósito rápido del suelo tarda { $quick } días y el lento, { $slow }.
    .remedy = El lento debe tardar más.
problem-reach-unstable = Con este peso, el agua debe tardar de { $least } a { $most } días en bajar el tramo. Tarda { $value }.
    .remedy = Cambie reach_travel_days o reach_inflow_weight, o quite los dos.
problem-method-columns = El método «{ $method }» necesita columnas que el registro no tiene: { $columns }.
    .remedy = Indíquelas, o elija uno de estos: { $choices }.
problem-record-short = El registro tiene { $days ->
        [one] { $days } día
       *[other] { $days } días
    } y ningún año hidrológico completo.
    .remedy = Use un registro que vaya del primer día de un año hidrológico hasta el último, o más largo.
problem-record-apart = Este registro va del { $first } al { $last }, y el del tiempo va del { $weather_first } al { $weather_last }. No tienen ni un día en común.
    .remedy = Puede quedarse, pero no hay con qué compararlo. Revise las fechas y su formato.
problem-settling-long = { $value } años de preparación son más de los que tiene el registro: { $years }.
    .remedy = Ponga menos. Con uno o dos alcanza.

## La presa y el río

problem-capacity-below-dead = La capacidad ({ $capacity } hm³) no es mayor que el volumen muerto ({ $dead } hm³).
    .remedy = La capacidad se cuenta desde el fondo e incluye el volumen muerto. Revise los dos números y sus unidades.
problem-capacity-above-table = La capacidad ({ $capacity } hm³) pasa del final de la tabla ({ $top } hm³).
    .remedy = Siga la tabla hasta el nivel lleno, o revise las unidades.
problem-dead-below-table = El volumen muerto ({ $dead } hm³) queda antes del comienzo de la tabla ({ $bottom } hm³).
    .remedy = Empiece la tabla más abajo, o revise las unidades.
problem-lake-shrinks = El lago se hace más chico cuando sube el agua: esta superficie es menor que la anterior.
    .remedy = Ponga nivel, superficie y volumen desde el fondo hacia arriba.
problem-lake-above-land = El lago lleno queda a { $level } m, por encima de la zona más alta, a { $highest } m.
    .remedy = Revise las unidades: level_m o level_ft, elevation_m o elevation_ft.
problem-table-units = Los volúmenes de la tabla suben { $stated } hm³, pero con los niveles y las superficies salen unos { $expected } hm³.
    .remedy = Revise las unidades de nivel, superficie y volumen.
problem-flood-space = El espacio para crecidas ({ $space } hm³) es mayor que el volumen útil ({ $active } hm³).
    .remedy = Póngalo menor: es el hueco que se deja vacío, no el agua que se guarda.
problem-minimum-twice = El caudal para el río tiene un valor para todo el año y además valores por fecha.
    .remedy = Deje una de las dos cosas.
problem-minimum-above-outlet = El caudal para el río ({ $rate } m³/s) es más de lo que deja pasar la obra de toma ({ $outlet } m³/s).
    .remedy = Revise los dos números y sus unidades.
problem-too-many-points = La tabla tiene { $found } puntos. Caben { $most } como máximo.
    .remedy = Quite los puntos que quedan en línea recta con sus vecinos.
problem-too-many-dates = «{ $key }» tiene más de { $most } fechas.
    .remedy = Deje las más importantes.

## Canales, pueblos y derechos

problem-too-many-gates = Hay { $found } canales y pueblos. Caben { $most } como máximo.
    .remedy = Junte los pequeños que estén lado a lado y tengan derechos de fecha parecida.
problem-too-many-fields = Este canal tiene { $found } parcelas. Caben { $most } como máximo.
    .remedy = Junte las parcelas con el mismo cultivo y la misma forma de riego.
problem-gate-unknown = Ningún canal ni pueblo tiene la clave «{ $value }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-right-twice = El derecho de «{ $key }» está aquí y también en la lista de derechos.
    .remedy = Déjelo en un solo lugar.
problem-right-too-large = El derecho de «{ $key }» ({ $rate } m³/s) es { $times } veces lo que cabe en su canal ({ $capacity } m³/s).
    .remedy = Revise la unidad: rate_m3s, rate_cfs o rate_litres_per_second.
problem-right-above-canal = El derecho de «{ $key }» ({ $rate } m³/s) es más de lo que cabe en su canal ({ $capacity } m³/s).
    .remedy = Puede ser así. Si no, revise los dos números y sus unidades.
problem-canal-far-too-large = En «{ $key }» caben { $capacity } m³/s, pero en su día más caluroso necesita { $need } m³/s.
    .remedy = Revise la unidad de la capacidad y las superficies de las parcelas.
problem-canal-large = En «{ $key }» caben { $capacity } m³/s, mucho más que los { $need } m³/s de su día más caluroso.
    .remedy = Puede ser así. Si no, revise la unidad y las superficies de las parcelas.
problem-canal-small = En «{ $key }» caben { $capacity } m³/s, mucho menos que los { $need } m³/s de su día más caluroso.
    .remedy = Puede ser así. Si no, revise la unidad y las superficies de las parcelas.
problem-limit-idle = El tope anual de «{ $key }» ({ $limit } hm³) es mucho más de lo que cabe en su canal en una temporada ({ $most } hm³).
    .remedy = Así no cambia nada. Revise la unidad: yearly_limit_hm3 o yearly_limit_acre_feet.
problem-season-backwards = «{ $key }» abre el { $opens } y cierra el { $closes }: estaría cerrado todo el verano.
    .remedy = Ponga los dos días al revés. Si de veras corre solo en invierno, escriba season_over_new_year = true.
problem-season-winter = «{ $key }» abre el { $opens } y cierra el { $closes }: está cerrado en pleno verano.
    .remedy = Puede ser así. Si no, revise los días: primero va el mes.
problem-season-short = La temporada tiene { $days ->
        [one] { $days } día
       *[other] { $days } días
    }.
    .remedy = Debe durar por lo menos una semana. Revise opens y closes: primero va el mes.
problem-storage-shares = Las partes de la presa suman { $total } %.
    .remedy = Entre todas pueden sumar 100 % como máximo. Lo que sobra es de todos.
problem-share-without-reservoir = «{ $key }» tiene una parte de la presa, y el lugar no tiene presa.
    .remedy = Quite esa parte, o describa la presa en [reservoir].
problem-no-turns = La regla es por turnos (rotation), pero nadie tiene turno.
    .remedy = Ponga turn_days a cada canal.
problem-position-missing = Algunos tienen su posición en el río, y este no.
    .remedy = Dé la posición a todos o a ninguno. Sin ella vale el orden de este archivo.
problem-position-twice = La posición { $value } ya está ocupada.
    .remedy = Numérelos río abajo: 1, 2, 3.
problem-return-uphill = El agua de «{ $key }» volvería arriba de «{ $other }», que no está más abajo.
    .remedy = Nombre uno que esté río abajo, o escriba "below_all".
problem-loss-too-large = El canal perdería { $lost } m³/s de los { $capacity } m³/s que le caben.
    .remedy = Revise el largo, el perímetro mojado y las unidades.

## Parcelas y cultivos

problem-crop-unknown = { $near ->
        [0] No hay un cultivo «{ $value }».
       *[other] No hay un cultivo «{ $value }». ¿Quiso decir «{ $nearest }»?
    }
    .remedy = Use un cultivo de la tabla, o describa el suyo en [[crop]].
problem-crop-stages = Un cultivo lleva cuatro etapas, de 1 a 366 días en total. Este tiene { $found } y { $total } días.
    .remedy = Escriba los días de inicio, crecimiento, mitad y final: [20, 35, 50, 30].
problem-swap-same = El cambio de cultivos cambiaría «{ $value }» por lo mismo.
    .remedy = Elija otro cultivo, o "fallow" (tierra en descanso).
problem-swap-absent = Ninguna parcela tiene «{ $value }», el cultivo que se iba a cambiar.
    .remedy = Elija un cultivo que alguna parcela tenga.

## Perillas

problem-dial-unknown = No hay una perilla «{ $key }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-dial-form = «{ $dial }» lleva un rango, o va escondida.
    .remedy = Escriba least = … y most = … entre llaves, o "hidden".
problem-dial-range = El rango de «{ $dial }», de { $least } a { $most }, no incluye el 0, donde la perilla descansa.
    .remedy = El mínimo debe ser menor que el máximo, con el 0 en medio o en un extremo.
problem-dial-lacking = En este lugar no hay nada que la perilla «{ $dial }» pueda cambiar.
    .remedy = Quite esta línea.
problem-setting-dial-absent = Este lugar no tiene la perilla «{ $dial }». El ajuste no la toca.
    .remedy = Las demás perillas sí quedan puestas.

## Tablas pequeñas

problem-row-length = { $found ->
        [one] Esta fila tiene { $found } celda. El encabezado tiene { $wanted }.
       *[other] Esta fila tiene { $found } celdas. El encabezado tiene { $wanted }.
    }
    .remedy = Ponga en cada fila tantas celdas como en el encabezado.
problem-column-unknown = En esta tabla no hay una columna «{ $key }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-column-missing = A la tabla le falta la columna «{ $key }».
    .remedy = Agréguela al encabezado y a cada fila.
problem-cell-empty = La celda «{ $key }» de esta fila está vacía.
    .remedy = Llénela o quite la fila.
problem-cell-not-number = «{ $value }» no es un número, en la columna «{ $key }».
    .remedy = Escriba cifras con punto decimal: 12.5.
problem-exchange-unit = place.toml dice «{ $unit }» para «{ $column }», pero el archivo dice «{ $found }».
    .remedy = Escriba lo que dice el archivo.
