# Qué puede estar mal en archivos de intercambio (WaterML 2.0, NetCDF), mallas de alturas y contornos. El mensaje dice qué
# está mal; .remedy dice qué estaría bien.

## A primera vista

problem-peek-layout = Esto no parece una tabla de días: ningún renglón tiene una fecha junto a otras celdas.
    .remedy = Un registro tiene un encabezado y una fila por día, con coma, punto y coma, tabulador o | entre las celdas.
problem-peek-header = Los días empiezan en el primer renglón, sin encabezado.
    .remedy = Escriba arriba un renglón con los nombres de las columnas.
problem-peek-date = Ninguna columna de este archivo se puede leer como fecha en cada fila.
    .remedy = Escriba el día de cada fila, con el año de cuatro cifras: 2004-05-31.
problem-peek-columns = Ninguna columna de este archivo es de las que usa un lugar.
    .remedy = Nombre las columnas por lo que miden: tmin, tmax, precipitación, caudal, agua en nieve, almacenamiento.

## Archivos de intercambio

problem-exchange-two-byte = Este texto está guardado con dos bytes por letra (UTF-16).
    .remedy = Guárdelo en UTF-8.
problem-exchange-not-utf8 = Aquí hay una letra que no es UTF-8.
    .remedy = Guarde el archivo en UTF-8.
problem-exchange-time = «{ $text }» no es la hora de una medición.
    .remedy = Escríbala así: 2004-05-31 o 2004-05-31T00:00:00-06:00, de 1750 a 2200.
problem-exchange-value = «{ $text }» no es un número.
    .remedy = Escriba solo el número, o marque que falta como lo pide el formato.
problem-exchange-day-twice = El { $date } tiene más de un valor.
    .remedy = Saque primero los días: el promedio del día para caudales, la suma para lluvia y nieve.
problem-exchange-day-back = El { $date } viene después de un día posterior.
    .remedy = Ordene los valores del primer día al último.
problem-exchange-empty = Hay una serie sin ningún valor.
    .remedy = Pida otra vez el archivo, con los años que necesita.
problem-exchange-many = Este archivo tiene más de { $most } series.
    .remedy = Pida solo las series de su valle.

## WaterML

problem-xml = Este XML no se puede leer de aquí en adelante.
    .remedy = Pida otra vez el archivo. Pudo cortarse o cambiar en el camino.
problem-xml-cut = El archivo termina antes de cerrar «{ $text }».
    .remedy = Pida otra vez el archivo. Se cortó en el camino.
problem-xml-deep = Aquí hay demasiados elementos, uno dentro de otro.
    .remedy = Pida el archivo en WaterML 2.0.
problem-xml-entity = La forma corta «&{ $text };» no se lee.
    .remedy = Escriba las letras mismas.
problem-waterml-old = Esto es WaterML 1, la forma anterior.
    .remedy = Pida WaterML 2.0, o CSV.
problem-waterml-none = Este XML no tiene ninguna serie de mediciones en WaterML 2.0.
    .remedy = Pida la serie en WaterML 2.0, o en CSV.
problem-waterml-namespace = Esta serie no está en el espacio de nombres de WaterML 2.0.
    .remedy = Pida WaterML 2.0: http://www.opengis.net/waterml/2.0
problem-waterml-words = Esta serie trae palabras y no números.
    .remedy = Quítela del archivo.
problem-waterml-units = Este valor está en «{ $unit }» y los anteriores en «{ $other }».
    .remedy = Ponga las series de distinta unidad en archivos aparte.

## NetCDF

problem-netcdf-hdf5 = Esto es NetCDF-4, hecho sobre HDF5.
    .remedy = Guárdelo como NetCDF clásico.
problem-netcdf-header = El comienzo de este archivo NetCDF no tiene sentido en el byte { $byte }.
    .remedy = Pida otra vez el archivo. Se lee NetCDF clásico: versiones 1, 2 y 5.
problem-netcdf-cut = El archivo tiene menos bytes de los que dice. Lo que falta empieza en el byte { $byte }.
    .remedy = Pida otra vez el archivo. Se cortó en el camino.
problem-netcdf-no-time = Este archivo no tiene un eje de tiempo.
    .remedy = Un eje de tiempo lleva unidades como «days since 1970-01-01».
problem-netcdf-time-units = El eje de tiempo tiene las unidades «{ $text }».
    .remedy = Se leen días, horas, minutos o segundos desde un día. Los meses y los años no duran siempre igual.
problem-netcdf-calendar = El eje de tiempo sigue el calendario «{ $text }».
    .remedy = Solo se lee el calendario de todos los días. Otros no tienen 29 de febrero, o tienen meses de 30 días.
problem-netcdf-time = El paso { $n } del eje de tiempo, { $text }, no es un día de un registro.
    .remedy = Se leen días de 1750 a 2200. Revise las unidades del eje.
problem-netcdf-long = El eje de tiempo tiene más de { $most } pasos.
    .remedy = Saque primero días de las horas, o pida menos años.
problem-netcdf-no-series = Ningún número de este archivo tiene un valor por cada paso del eje de tiempo.
    .remedy = Pida la serie de una sola estación.
problem-netcdf-stations = Este archivo tiene { $n } estaciones o celdas, una junto a otra.
    .remedy = Saque solo la de su valle.
problem-netcdf-ragged = En este archivo hay varias estaciones, una tras otra en el mismo eje.
    .remedy = Saque solo la de su valle.

## Alturas y contornos

problem-outline-json = Este GeoJSON no se puede leer de aquí en adelante.
    .remedy = Guarde otra vez el contorno como GeoJSON.
problem-outline-none = En este archivo no hay ningún polígono.
    .remedy = Guarde el contorno de la cuenca como polígono.
problem-outline-several = Este archivo tiene { $n } polígonos. No está claro cuál es la cuenca.
    .remedy = Deje solo el de su cuenca, o júntelos en uno.
problem-outline-ring = Una línea alrededor de la cuenca no está completa.
    .remedy = Lleva por lo menos tres esquinas, con números, y termina donde empezó.
problem-outline-not-degrees = El contorno no dice sus coordenadas, y sus números no son grados.
    .remedy = Guárdelo en grados (EPSG:4326), o en la proyección de las alturas con su código en el archivo.
problem-outline-tangled = El contorno cruza demasiadas veces las filas de la malla para ser una cuenca.
    .remedy = Haga más sencillo el contorno.
problem-terrain-coordinates = Las alturas ({ $file }) están en { $grid } y el contorno en { $outline }.
    .remedy = Guarde los dos en las mismas coordenadas. Aquí no se pasa de unas a otras.
problem-terrain-code = Aquí no se sabe si las coordenadas «{ $text }» van en grados o en metros.
    .remedy = Use grados (EPSG:4326) o una zona UTM, por ejemplo EPSG:32719.
problem-terrain-told-otherwise = El archivo dice que está en { $found }. Usted dice { $told }.
    .remedy = Quite --coordinates, o dé el archivo que quería.
problem-terrain-no-prj = Esta malla no dice sus coordenadas.
    .remedy = Ponga a su lado el archivo .prj, o dígalas: --coordinates EPSG:32719
problem-terrain-prj = El archivo .prj de esta malla no nombra coordenadas que aquí se conozcan.
    .remedy = Use grados (EPSG:4326) o una zona UTM en metros. Puede decirlas: --coordinates EPSG:32719
problem-terrain-place = Esta malla no queda en ningún lado de la Tierra, o sus celdas no tienen tamaño.
    .remedy = Revise la esquina, el tamaño de la celda y las coordenadas.
problem-terrain-large = Esta malla tiene más de { $most } millones de celdas.
    .remedy = Recorte la parte de la cuenca, o haga más grandes las celdas.
problem-terrain-side = Esta malla tiene un lado de más de { $most } celdas.
    .remedy = Recorte la parte de la cuenca, o haga más grandes las celdas.
problem-terrain-beyond = El contorno se sale { $text } celdas de la malla.
    .remedy = Use una malla que abarque toda la cuenca, en las mismas coordenadas.
problem-terrain-nothing = Ninguna celda de la malla tiene su centro dentro del contorno.
    .remedy = Revise que vayan juntos y que las celdas sean más chicas que la cuenca.
problem-terrain-empty = El { $percent } % de la cuenca no tiene altura en la malla.
    .remedy = Use una malla sin huecos dentro de la cuenca.
problem-terrain-wild = { $n ->
        [one] { $n } celda de la cuenca tiene una altura que no existe en la Tierra.
       *[other] { $n } celdas de la cuenca tienen una altura que no existe en la Tierra.
    }
    .remedy = Revise la unidad de las alturas y la marca de las que faltan.
problem-terrain-flat = Toda la cuenca cabe en un metro de altura.
    .remedy = Revise que la malla traiga alturas y no clases de terreno.
problem-grid-header = «{ $text }» no es una palabra del comienzo de una malla Esri ASCII.
    .remedy = El comienzo lleva ncols, nrows, xllcorner, yllcorner, cellsize y NODATA_value, cada una con un número.
problem-grid-number = «{ $text }» no es un número.
    .remedy = Las alturas llevan punto decimal y un espacio entre ellas.
problem-grid-lacks = El comienzo de esta malla no dice «{ $key }», o dice un número que no puede ser.
    .remedy = Guarde otra vez la malla como Esri ASCII, o como GeoTIFF.
problem-grid-few = La malla termina antes de tiempo. Su comienzo dice { $wanted } alturas.
    .remedy = Guarde otra vez la malla. Se cortó.
problem-grid-many = La malla sigue después de sus { $wanted } alturas.
    .remedy = Revise ncols y nrows.
problem-tiff = Este TIFF no se puede leer.
    .remedy = Guárdelo otra vez como GeoTIFF: una banda, sin comprimir o con deflate o LZW.
problem-tiff-part = La parte { $n } de { $of } de este TIFF no se puede leer.
    .remedy = Guárdelo otra vez como GeoTIFF: una banda, sin comprimir o con deflate o LZW.
problem-tiff-bands = Este TIFF tiene { $n } bandas. Las alturas son una sola.
    .remedy = Guarde aparte la banda de las alturas.
problem-tiff-turned = Esta malla está girada o torcida respecto a sus coordenadas.
    .remedy = Guárdela con el norte arriba.
problem-tiff-no-place = Este TIFF no dice dónde queda.
    .remedy = Guárdelo como GeoTIFF.
problem-tiff-no-code = Este TIFF no dice sus coordenadas con un código.
    .remedy = Guárdelo con su código EPSG, o dígalo: --coordinates EPSG:32719
