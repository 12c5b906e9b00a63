# Lo que puede estar mal en un registro diario. El mensaje dice qué está mal; .remedy dice qué estaría bien.

## El archivo

problem-record-empty = Este archivo no tiene renglones que leer.
    .remedy = Escriba un encabezado con los nombres de las columnas y luego un renglón por día.
problem-record-no-days = No hay días debajo del encabezado.
    .remedy = Escriba un renglón por día debajo del encabezado.
problem-record-spreadsheet = Esto es una hoja de cálculo, no un archivo de texto.
    .remedy = Ábrala y guárdela como CSV (UTF-8).
problem-record-two-byte-text = Este texto usa dos bytes por letra (UTF-16).
    .remedy = Guárdelo como CSV (UTF-8).
problem-record-not-utf8 = Aquí hay una letra que no está en UTF-8.
    .remedy = Guarde el archivo como UTF-8, o indique en place.toml que es Latin-1.
problem-record-delimiter = El encabezado no muestra qué separa las celdas.
    .remedy = Separe los nombres con coma, punto y coma, tabulador o |, o indique en place.toml qué los separa.
problem-record-quote-open = Aquí se abren comillas que no se cierran en este renglón.
    .remedy = Ciérrelas o quítelas. Una celda no puede pasar de un renglón a otro.
problem-record-quote-behind = Hay texto después de cerrar las comillas.
    .remedy = Ponga toda la celda entre comillas. Dentro de una celda, escriba las comillas dos veces.
problem-record-cells-few = { $found ->
        [one] Este renglón tiene { $found } celda. El encabezado tiene { $expected }.
       *[other] Este renglón tiene { $found } celdas. El encabezado tiene { $expected }.
    }
    .remedy = Ponga en cada renglón tantas celdas como en el encabezado. Donde falte el dato, deje la celda vacía.
problem-record-cells-many = { $found ->
        [one] Este renglón tiene { $found } celda. El encabezado tiene { $expected }.
       *[other] Este renglón tiene { $found } celdas. El encabezado tiene { $expected }.
    }
    .remedy = Quite la celda que sobra. Si en el archivo 12,5 es doce y medio, separe las celdas con punto y coma.
problem-record-more = { $count ->
        [one] De aquí en adelante hay { $count } error más como este.
       *[other] De aquí en adelante hay { $count } errores más como este.
    }
    .remedy = Corrija primero los que se muestran. Muchas veces los demás se van con ellos.

## Columnas

problem-record-no-columns = No se pide leer ninguna columna de este registro.
    .remedy = Nombre al menos una columna en place.toml, con lo que mide y su unidad.
problem-record-column-missing = No hay ninguna columna «{ $column }». El encabezado tiene: { $found }.
    .remedy = Use un nombre del encabezado. Da igual con mayúsculas o minúsculas.
problem-record-column-twice = El nombre «{ $column }» está dos veces en el encabezado.
    .remedy = Póngale a cada columna su propio nombre.
problem-record-column-empty = La columna «{ $column }» no tiene ningún dato.
    .remedy = Quítela de place.toml, o revise la marca de dato faltante.
problem-record-measure-twice = Las columnas «{ $other }» y «{ $column }» están puestas las dos como «{ $measure }».
    .remedy = Deje la que debe usar el valle.
problem-record-unit = La columna «{ $column }» es «{ $measure }», y «{ $unit }» no es una unidad para eso.
    .remedy = Use una de estas unidades: { $units }.

## Fechas

problem-record-date-unreadable = «{ $text }» no es una fecha en el orden que dice place.toml.
    .remedy = Escriba año, mes y día en ese orden, con el año de cuatro cifras.
problem-record-date-no-such-day = El día «{ $text }» no existe en el calendario.
    .remedy = Corrija el mes o el día.
problem-record-date-short-year = El año de «{ $text }» tiene solo dos cifras.
    .remedy = Escriba el año con cuatro cifras. 04 puede ser 1904 o 2004.
problem-record-date-time = «{ $text }» trae una hora.
    .remedy = Deje un renglón por día, y en él solo la fecha.
problem-record-date-far-year = El año de «{ $text }» no puede ser.
    .remedy = Se leen años de 1750 a 2200.
problem-record-date-order = «{ $text }» no va con «{ $declared }». Las fechas de este archivo parecen «{ $found }».
    .remedy = Ponga «{ $found }» para las fechas en place.toml.
problem-record-day-twice = Este día está dos veces: { $date }. También está en el renglón { $first }.
    .remedy = Deje el renglón bueno y quite el otro.
problem-record-day-out-of-order = Este día está después de uno posterior: { $date }.
    .remedy = Ordene los renglones del primer día al último.
problem-record-newest-first = En este archivo va primero el día más reciente: { $date }.
    .remedy = Ordene los renglones del primer día al último.
problem-record-days-missing = { $days ->
        [one] Falta el renglón de { $days } día: { $first }.
       *[other] Faltan los renglones de { $days } días: del { $first } al { $last }.
    }
    .remedy = Agregue un renglón por día. Si no se midió nada, deje vacías sus celdas.
problem-record-leap-day-missing = Falta el renglón del día bisiesto: { $date }.
    .remedy = Agréguelo. El registro necesita todos los días del calendario.
problem-record-not-daily = { $count ->
        [one] De { $rows } renglones, { $count } está a más de un día del anterior.
       *[other] De { $rows } renglones, { $count } están a más de un día del anterior. Este registro no es diario.
    }
    .remedy = Use un registro con un renglón por día. No se leen meses ni semanas.

## Números

problem-record-number = «{ $text }» en la columna «{ $column }» no es un número.
    .remedy = Corríjalo. Si quiere decir que falta el dato, póngalo como marca de dato faltante en place.toml.
problem-record-number-thousands = «{ $text }» en la columna «{ $column }» trae separados los miles.
    .remedy = Escriba 1234.5 sin marcas ni espacios en los miles.
problem-record-number-comma = «{ $text }» en la columna «{ $column }» trae una coma. No se sabe si marca decimales o miles.
    .remedy = Use punto decimal y nada en los miles, o indique en place.toml que el archivo usa coma decimal.
problem-record-number-point = «{ $text }» en la columna «{ $column }» trae un punto, pero place.toml dice coma decimal.
    .remedy = Escriba una coma, o indique en place.toml que el archivo usa punto decimal.
problem-record-number-tail = «{ $text }» en la columna «{ $column }» trae letras o signos después del número.
    .remedy = Deje solo el número. La unidad va en place.toml.
problem-record-number-trace = «{ $text }» en la columna «{ $column }» quiere decir que cayó muy poco, menos de lo que se puede medir.
    .remedy = Escriba 0 en ese caso.
problem-record-undeclared-missing = «{ $text }» en la columna «{ $column }» parece una marca de dato faltante.
    .remedy = Póngalo como marca de dato faltante en place.toml, o deje vacía la celda.

## Huecos

problem-record-gap-refused = { $days ->
        [one] Desde aquí falta { $days } día de datos en la columna «{ $column }».
       *[other] Desde aquí faltan { $days } días de datos en la columna «{ $column }».
    }
    .remedy = Complete los datos, o indique en place.toml cómo se puede rellenar esta columna.
problem-record-gap-long = { $days ->
        [one] Desde aquí falta { $days } día de datos en la columna «{ $column }». Hueco más largo que se rellena, en días: { $limit }.
       *[other] Desde aquí faltan { $days } días de datos en la columna «{ $column }». Hueco más largo que se rellena, en días: { $limit }.
    }
    .remedy = Tome otra estación para esos días, o empiece el registro después de ellos.
problem-record-gap-at-end = { $days ->
        [one] Falta { $days } día de datos en la columna «{ $column }», en un extremo del registro.
       *[other] Faltan { $days } días de datos en la columna «{ $column }», en un extremo del registro.
    }
    .remedy = Acorte el registro a los días con dato. Para trazar la línea hace falta un dato a cada lado.
problem-record-gap-no-mean = { $days ->
        [one] Falta { $days } día de datos en la columna «{ $column }», y ese mes no tiene datos en ningún año.
       *[other] Faltan { $days } días de datos en la columna «{ $column }», y ese mes no tiene datos en ningún año.
    }
    .remedy = Complete los datos. No hay promedio con qué rellenarlos.
problem-record-filled-across = Al rellenar este día, «{ $column }» queda por encima de «{ $other }».
    .remedy = Deje vacías las dos celdas de este día para que se rellenen juntas. O escriba el dato que falta.

## Temperatura

problem-record-fahrenheit = La columna «{ $column }» no puede estar en °C. Su promedio es { $mean } y su valor más alto, { $highest }.
    .remedy = Si está en °F, póngalo en place.toml. Revise también las otras temperaturas.
problem-record-celsius = La columna «{ $column }» casi no pasa de { $highest }. Es demasiado frío para estar en °F.
    .remedy = Si está en °C, póngalo en place.toml. Revise también las otras temperaturas.
problem-record-coldest-over-warmest = { $count ->
        [one] En { $count } día, «{ $column }» es mayor que «{ $other }»: { $coldest } y { $warmest }.
       *[other] En { $count } días, «{ $column }» es mayor que «{ $other }». El primero: { $coldest } y { $warmest }.
    }
    .remedy = La mínima de un día no puede pasar de su máxima. Corrija el renglón.
problem-record-temperatures-swapped = { $count ->
        [one] «{ $column }» es mayor que «{ $other }» en { $count } día. El primero: { $coldest } y { $warmest }.
       *[other] «{ $column }» es mayor que «{ $other }» en { $count } días. El primero: { $coldest } y { $warmest }.
    }
    .remedy = Intercambie las dos columnas en place.toml.
problem-record-range-wide = De «{ $column }» a «{ $other }» hay { $range } °C en un día promedio. Es mucho.
    .remedy = Revise que las dos estén en °C y no en °F.
problem-record-mean-outside = { $count ->
        [one] En { $count } día, la media de «{ $column }» no queda entre la mínima y la máxima: { $text }.
       *[other] En { $count } días, la media de «{ $column }» no queda entre la mínima y la máxima. El primero: { $text }.
    }
    .remedy = Revise el renglón, y que todas las temperaturas sean del mismo día.
problem-record-dew-over-warmest = { $count ->
        [one] En { $count } día, el punto de rocío de «{ $column }» pasa de la máxima del día: { $text }.
       *[other] En { $count } días, el punto de rocío de «{ $column }» pasa de la máxima del día. El primero: { $text }.
    }
    .remedy = Revise el aparato y la unidad.

## Lluvia, nieve y evaporación

problem-record-precipitation-inches = La columna «{ $column }» suma { $year } mm en un año promedio. ¿Serán pulgadas?
    .remedy = Si son pulgadas, ponga «in» en place.toml.
problem-record-precipitation-little = En un año promedio la columna «{ $column }» suma { $year } { $unit }. Es lo que cae en un desierto.
    .remedy = Revise la unidad, y que cada renglón sea un día.
problem-record-precipitation-much = En un año promedio la columna «{ $column }» suma { $year } { $unit }. En ningún valle cae tanto.
    .remedy = Revise la unidad en place.toml. Pueden ser milímetros puestos como pulgadas, o décimas como enteros.
problem-record-precipitation-adds-up = La columna «{ $column }» solo sube. Parece un pluviómetro que va sumando todo el año.
    .remedy = Escriba la lluvia y la nieve de cada día: cada lectura menos la anterior.
problem-record-precipitation-negative = { $count ->
        [one] La lluvia y la nieve de «{ $column }» están bajo cero en { $count } día: { $text }.
       *[other] La lluvia y la nieve de «{ $column }» están bajo cero en { $count } días. El primero: { $text }.
    }
    .remedy = Escriba 0 o deje vacía la celda.
problem-record-precipitation-dry-run = La columna «{ $column }» está en 0 por { $days } días seguidos, en un lugar que no es seco.
    .remedy = Si el aparato no servía, deje vacías esas celdas.
problem-record-snow-negative = { $count ->
        [one] El agua en nieve de «{ $column }» está bajo cero en { $count } día: { $text }.
       *[other] El agua en nieve de «{ $column }» está bajo cero en { $count } días. El primero: { $text }.
    }
    .remedy = Escriba 0 o deje vacía la celda.
problem-record-evaporation-little = La columna «{ $column }» suma { $year } mm en un año promedio. ¿Serán pulgadas?
    .remedy = Si son pulgadas, ponga «in» en place.toml.

## Sol, viento y humedad

problem-record-humidity-share = La columna «{ $column }» nunca pasa de { $highest }. Parecen fracciones, no porcentajes.
    .remedy = Ponga «share» como su unidad en place.toml.
problem-record-humidity-percent = La columna «{ $column }» llega a { $highest }. Parecen porcentajes, no fracciones.
    .remedy = Ponga «%» como su unidad en place.toml.
problem-record-humidity-crossed = { $count ->
        [one] En { $count } día, «{ $column }» es mayor que «{ $other }»: { $lowest } y { $highest }.
       *[other] En { $count } días, «{ $column }» es mayor que «{ $other }». El primero: { $lowest } y { $highest }.
    }
    .remedy = La humedad más baja de un día no puede pasar de la más alta. Corrija el renglón.
problem-record-solar-watts = La columna «{ $column }» llega a { $highest }. Ningún día trae tantos MJ/m². ¿Serán W/m²?
    .remedy = Si son W/m², póngalo en place.toml.
problem-record-solar-megajoules = La columna «{ $column }» nunca pasa de { $highest } W/m². ¿Serán MJ/m²?
    .remedy = Si son MJ/m², póngalo en place.toml.
problem-record-pressure-hectopascals = La columna «{ $column }» tiene un promedio de { $mean } kPa. ¿Serán hPa?
    .remedy = Si son hPa, póngalo en place.toml.
problem-record-pressure-kilopascals = La columna «{ $column }» tiene un promedio de { $mean } hPa. ¿Serán kPa?
    .remedy = Si son kPa, póngalo en place.toml.
problem-record-wind-strong = La columna «{ $column }» tiene un promedio de { $mean } { $unit }. Sería una tormenta diaria.
    .remedy = Revise la unidad en place.toml.

## Río, presa y canales

problem-record-flow-negative = { $count ->
        [one] El caudal de «{ $column }» está bajo cero en { $count } día: { $text }.
       *[other] El caudal de «{ $column }» está bajo cero en { $count } días. El primero: { $text }.
    }
    .remedy = Deje vacía la celda. Si el caudal se calculó con el agua guardada, ponga «computed_inflow» en place.toml.
problem-record-inflow-negative = { $count ->
        [one] La entrada de agua de «{ $column }» está bajo cero en { $count } día: { $text }. Se deja como está.
       *[other] La entrada de agua de «{ $column }» está bajo cero en { $count } días. El primero: { $text }. Se dejan como están.
    }
    .remedy = Unos pocos valores chicos son normales si la entrada se calculó con el agua guardada. Revise los grandes.
problem-record-storage-negative = { $count ->
        [one] El agua guardada de «{ $column }» está bajo cero en { $count } día: { $text }.
       *[other] El agua guardada de «{ $column }» está bajo cero en { $count } días. El primero: { $text }.
    }
    .remedy = Deje vacía la celda, o cuente el agua desde el vaso vacío.

## Cualquier columna

problem-record-out-of-bounds = { $count ->
        [one] La columna «{ $column }» tiene { $count } valor que no puede ser: { $text }.
       *[other] La columna «{ $column }» tiene { $count } valores que no pueden ser. El primero: { $text }.
    }
    .remedy = Se leen valores de { $low } a { $high } { $unit }. Revise la unidad, corrija el valor o deje vacía la celda. Si quiere decir que falta el dato, póngalo como marca de dato faltante en place.toml.
problem-record-stuck = { $days ->
        [one] La columna «{ $column }» marca { $text } por { $days } día.
       *[other] La columna «{ $column }» marca { $text } por { $days } días seguidos. Puede que el aparato se haya trabado.
    }
    .remedy = Si fue así, deje vacías esas celdas.
