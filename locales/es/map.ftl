# El mapa de dos perillas: lo que dice su página, y la orden `map`.

## La página

answer-grid-working = El mapa se va llenando: { $done } de { $all } puntos.
answer-grid-none = Aquí ningún año tiene «{ $sign }».
answer-grid-same = «{ $sign }» es igual en todo el mapa: { $value }.
answer-grid-range = En este mapa, «{ $sign }» va de { $least } a { $most }.
answer-grid-supply-takes = Con { $across }, a los canales les llega { $level } de su agua solo con { $up }.
answer-grid-supply-holds = Con { $across }, en todo este mapa a los canales les llega { $level } de su agua o más.
answer-grid-supply-fails = Con { $across }, en este mapa a los canales nunca les llega { $level } de su agua.
answer-grid-canal-takes = Con { $across }, a { $canal } le llega { $level } de su agua solo con { $up }.
answer-grid-canal-holds = Con { $across }, en todo este mapa a { $canal } le llega { $level } de su agua o más.
answer-grid-canal-fails = Con { $across }, en este mapa a { $canal } nunca le llega { $level } de su agua.
answer-grid-keep-takes = Con { $across }, «{ $sign }» queda en { $level } solo con { $up }.
answer-grid-keep-holds = Con { $across }, «{ $sign }» siempre queda en { $level } en este mapa.
answer-grid-keep-fails = Con { $across }, «{ $sign }» nunca queda en { $level } en este mapa.
answer-grid-brief-takes = { $across }: { $sign } { $level } solo con { $up }.
answer-grid-brief-holds = { $across }: { $sign } aquí siempre { $level }.
answer-grid-brief-fails = { $across }: { $sign } aquí nunca { $level }.

grid-brief-at = { $dial } { $value }
grid-at-least = { $value } o más
grid-at-most = { $value } o menos
grid-no-sooner = { $value } o después
grid-at-warming = { $value }
grid-at-winter-precipitation = { $value } de lluvia y nieve de invierno
grid-at-summer-precipitation = { $value } de lluvia de verano
grid-at-diversion = { $value } de agua pedida por los canales
grid-at-canal-lining = { $value } de canales revestidos
grid-at-crop-mix = { $value } de cambio de cultivo
grid-at-river-minimum = { $value } de mínimo para el río
grid-at-reservoir-size = { $value } de tamaño de la presa
grid-at-starting-storage = { $value } de la presa al empezar
grid-at-town-growth = { $value } de agua para el pueblo

grid-side = { $dial }, { $unit }
grid-years = { $n ->
    [one] { $n } año
   *[other] promedio de { $n } años
}
grid-days = { $n ->
    [one] { $n } día
   *[other] { $n } días
}
grid-enough = alcanza: { $value }
grid-as-it-was = sin cambios: { $value }
grid-no-value = sin dato

## La orden

help-map = Hace un mapa: un número con cada combinación de dos perillas.
help-usage-map = [LUGAR] [OPCIONES]
help-over = Una perilla con sus valores, por ejemplo warming=0..6:0.5. Van dos. Sin paso, vale el paso de la perilla.
help-sign = Lo que muestra el mapa, con su nombre en el JSON de tell; por ejemplo supply_ratio o reliability.
help-canal = Muestra el número de un canal o pueblo, con su clave en place.toml.
help-map-set = Mueve otra perilla en todo el mapa, o marca dónde está ahora una perilla del mapa.
help-map-form = Cómo escribir el mapa: csv, json o png.
help-part = Hace solo la parte K de N, por ejemplo 2/8; con --form json. Con cualquier N salen los mismos números.
help-merge = Una parte para juntar con las demás. Van todas; las perillas y el número salen de las partes.
value-over = LADO
value-sign = NOMBRE
value-canal = CLAVE
value-part = K/N
help-map-more =
    CSV: un renglón por combinación; las dos perillas y luego el número.
    JSON: place, sign, canal, years, dials (para todo el mapa), over (las dos
    perillas con sus valores), enough_share, as_it_was, part y values: a lo
    largo de la primera perilla, fila tras fila de la segunda. Una fecha es el
    día del año de agua. Vacío o null: ningún año tiene ese número.

    Ejemplo: deshielo map demo --over warming=0..6:0.5
             --over winter_precipitation=-20..20:5 --sign supply_ratio

progress-map = El mapa: { $done } de { $all }
error-over-count = Un mapa lleva dos perillas. Ponga --over dos veces, o ninguna.
error-over-unreadable = «{ $text }» no dice de dónde a dónde. Escríbalo así: { $example }.
error-over-same = Los dos lados del mapa mueven la perilla «{ $dial }». Cambie una de las dos.
error-over-step = El paso de «{ $dial }» tiene que ser mayor que 0.
error-over-backward = Los valores de «{ $dial }» tienen que subir: de { $from } a { $to } no suben.
error-over-misses = Con pasos de { $step } no se llega justo a { $to } en «{ $dial }». El último valor antes es { $last }.
error-over-many = «{ $dial }» tiene demasiados valores. Caben { $most }.
error-map-cells = El mapa tiene demasiados puntos. Caben { $most }.
error-sign-unknown = No hay un número «{ $sign }» para el mapa. Hay: { $signs }.
error-sign-unknown-nearest = No hay un número «{ $sign }» para el mapa. ¿Quiso decir «{ $nearest }»?
error-canal-unknown = No hay un canal ni un pueblo «{ $canal }». Hay: { $canals }.
error-canal-none = Este lugar no tiene canales.
error-part-unreadable = «{ $text }» no es una parte. Escríbalo así: { $example }. El primer número va de 1 al segundo.
error-size-unreadable = «{ $text }» no es un tamaño. Escríbalo así: { $example }. Cada lado va de { $low } a { $high }.
error-png-out = Una imagen va a un archivo. Agregue --out ARCHIVO.
error-png-failed = No se puede escribir la imagen.
error-merge-with = --merge no va con { $option }: eso ya lo dicen las partes.
error-merge-file = { $path } no es parte de un mapa: { $reason }
error-merge-values = los números no corresponden a sus perillas
error-merge-differ = { $path } es parte de otro mapa que { $other }.
error-merge-twice = { $path } es la misma parte que { $other }.
error-merge-missing = Faltan partes: { $parts } de { $all }.
error-merge-place = Las partes son de «{ $found }», no de «{ $place }». Nombre el lugar del que se hicieron.
