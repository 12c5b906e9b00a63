# El ajuste de un lugar a las medidas de su río, y hasta dónde se le puede creer.

## Ayuda

help-fit = Ajusta un valle a las medidas de su río y lo prueba en años que no había visto.
help-trust = Dice hasta dónde se puede creer en el modelo de un valle, y para qué.
help-usage-fit = [LUGAR] [OPCIONES]
help-usage-trust = [LUGAR] [OPCIONES]
value-objective = NOTA
value-correction = QUÉ
help-objective = La nota que se quiere subir: kge, nse, nse-of-roots o kge-with-snow.
help-correction = Qué corregir en la lluvia y la nieve: factor, rain-and-snow, snow o gradient.
help-fit-seed = El número con que arranca la búsqueda. Con el mismo número sale el mismo ajuste.
help-starts = Cuántas búsquedas hacer, cada una desde otro punto.
help-runs = Corridas de cada búsqueda.
help-warm-up = Años del comienzo del registro que se corren pero no se califican.
help-fit-years = Ajusta solo a estos años de agua, por ejemplo 1990..1999.
help-sets = Cuántos juegos de números guardar, 20 o más. Entre todos muestran la duda.
help-no-test = No hace la prueba en años que el ajuste no vio.
help-fit-out = Para escribir el ajuste en este archivo, y no junto a place.toml.
help-fit-into = Para escribir fit.toml en esta carpeta, y no junto a place.toml.
help-trust-form = Cómo escribir la respuesta: table o json.
help-fit-more =
    kge: eficiencia de Kling y Gupta de 2009; nse: eficiencia de Nash y
    Sutcliffe; nse-of-roots: la misma con raíces cuadradas, para caudales bajos;
    kge-with-snow: kge del río y del registro de nieve. En todas, 1 es perfecto.
    Ctrl-C termina la búsqueda y guarda lo mejor que haya.

## Lo que puede salir mal

error-fit-no-gauge = Este lugar no tiene estación de aforo: no hay a qué ajustarlo.
    .remedy = Agregue un [gauge] a place.toml, con un registro del río arriba de todos los canales.
error-fit-below-diversions = La estación de aforo está debajo de los canales. Lo que mide no es el río como viene.
    .remedy = Use una estación arriba de todos los canales, o la entrada calculada de una presa.
error-fit-few-days = Solo { $found } días tienen caudal medido. Hacen falta por lo menos { $needed }.
    .remedy = Dé un registro de aforo más largo, o uno que coincida más con el del tiempo.
error-fit-few-years = { $found } años de agua tienen caudal medido en la mitad de sus días. Hace falta por lo menos { $needed } después de los primeros años, que solo preparan el suelo.
    .remedy = Dé un registro más largo, o menos años de preparación con --warm-up.
error-fit-still = La estación de aforo marca lo mismo todos los días. No hay nada que aprender de ella.
error-fit-no-snow = La nota kge-with-snow necesita un registro de nieve, y este lugar no lo tiene.
    .remedy = Agregue un [snow_record] a place.toml, o escoja otra nota.
error-fit-infinite = Un valor medido del { $date } no tiene fin.
error-fit-nothing = Ninguna corrida dio una nota.
error-fit-built-in = Este lugar es parte del programa: su ajuste no tiene carpeta. Diga dónde escribirlo con --into o --out.
error-fit-elsewhere = Diga en qué otra parte escribirlo con --into o --out.
error-fit-years = «{ $text }» no se puede escoger aquí. Escriba all, un año o un tramo como 1990..1999.
problem-fit-unreadable = Esto no se puede leer como un ajuste.
    .remedy = Ajuste otra vez con «deshielo fit», o quite el archivo.
problem-file-unreadable-here = Este archivo no se puede leer.
    .remedy = Revise quién tiene permiso de leerlo.
problem-fit-parameter = El ajuste tiene un número «{ $key }» que no va ahí, o lo tiene dos veces.
    .remedy = Ajuste otra vez con «deshielo fit», o quite el archivo.
problem-fit-bounds = «{ $key }» vale { $value }. Eso queda fuera de sus límites.
    .remedy = Ajuste otra vez con «deshielo fit», o quite el archivo.
problem-fit-count = Un juego del ajuste tiene { $found } números. Necesita { $needed }.
    .remedy = Ajuste otra vez con «deshielo fit», o quite el archivo.
problem-fit-old-records = Los registros cambiaron desde que se hizo este ajuste. Todavía se usa.
    .remedy = Ajuste otra vez con «deshielo fit».
problem-fit-old-land = El terreno o la estación de place.toml cambiaron desde que se hizo este ajuste. Todavía se usa.
    .remedy = Ajuste otra vez con «deshielo fit».

## Mientras busca

progress-fit-start = Buscando los mejores números …
progress-fit = { $percent } hecho · mejor nota hasta ahora { $best } · faltan { $left } · Ctrl-C guarda lo mejor que haya

## Lo que dice fit

fit-file-head =
    Lo que «deshielo fit» encontró para { $place }. Todas las órdenes lo usan mientras esté aquí.
    No escriba nada en este archivo: ajuste otra vez.
fit-title = { $place }: ajustado a { $n ->
    [one] { $n } año de agua
   *[other] { $n } años de agua
}, de { $first } a { $last }
fit-stopped = Se detuvo antes del final. Esto es lo mejor que había.
fit-score = Nota ({ $objective }) en esos años: { $score }. 1 es perfecto.
fit-tests = La prueba: cada mitad de los años, con el ajuste hecho ahí y con el de la otra mitad, que no los vio. Las notas son kge del caudal diario.
fit-tests-how = «cerca»: se pierde hasta { $good }. «falla»: se pierde más de { $bad }, o «lo de siempre» acierta más.
fit-test-years = Años
fit-test-own = Ajustado ahí
fit-test-other = Sin verlos
fit-test-usual = Lo de siempre
fit-test-verdict = Veredicto
fit-untested-years = No hay prueba en años que no vio: para eso hacen falta { $needed } años con caudal medido, y hay { $found }.
fit-untested = No hay prueba en años que no vio: una mitad de los años tiene muy poco caudal medido.
fit-untested-asked = No hay prueba en años que no vio: no se pidió.
fit-number = Número
fit-value = Valor
fit-least = Mínimo
fit-most = Máximo
fit-on-bound = En un límite
fit-on-bound-mark = sí
fit-ensemble = Se guardan { $n } juegos de números con notas a menos de { $distance } de la mejor. Las respuestas se dan como el tramo que abarcan.
fit-band-is-narrow = Ese tramo es más angosto que el error de verdad. El tiempo, la medición y el modelo también tienen sus errores.
fit-written = Escrito en { $path }.

## Lo que dice tell de un ajuste

tell-fitted = Ajustado a las medidas del río, años de agua { $first } a { $last }.
tell-fit-stale = El ajuste es de registros anteriores o de otra descripción del terreno. Ajuste otra vez con «deshielo fit».
tell-not-fitted = Todavía sin ajustar a las medidas del río: «deshielo fit» lo hace.
tell-no-gauge = Este lugar no tiene estación de aforo. Nadie ha comparado estos números con un río medido.
tell-ranges = Lo que dicen { $n } juegos de números que se ajustan más o menos igual de bien:
tell-range-line = { $name }: { $range }
tell-range-days-fewer = de { $a } a { $b } días menos
tell-range-days-more = de { $a } a { $b } días más
tell-range-ends = de { $low } a { $high }

## El pie de la página

picture-fitted = ajustado al río
picture-fit-old = ajuste viejo
picture-no-gauge = sin aforo

## Lo que dice trust

trust-title = Hasta dónde creerle al modelo de { $place }
trust-no-gauge = Este lugar no tiene estación de aforo. Nadie ha comparado su modelo con un río medido.
trust-below-diversions = La estación de aforo está debajo de los canales: el río como viene no se puede comprobar.
trust-gauge-apart = El registro del río y el del tiempo no coinciden en ningún día.
trust-not-fitted = Todavía no está ajustado a las medidas del río. Las notas son de los números de place.toml.
trust-stale = El ajuste es de registros anteriores o de otra descripción del terreno.
trust-judged-unseen = El río se juzga en años que los números no habían visto: cada mitad con el ajuste de la otra.
trust-judged-seen = El río se juzga en los mismos años a los que se ajustó. Eso favorece al modelo.
trust-uses = Para qué sirve aquí, y por qué:
trust-use-direction = Hacia dónde va
trust-use-timing = Cuándo llega el agua
trust-use-volume = Cuánta en un año
trust-use-late-summer = Fines del verano
trust-use-storage = Qué tan lleno el lago
trust-use-deliveries = Lo que reciben canales
trust-known-yes = sí
trust-known-partly = a medias
trust-known-no = no
trust-known-unknown = no se sabe
trust-need-gauge = No hay estación de aforo con un año entero.
trust-need-tests = No se ha probado en años que no vio.
trust-need-storage-record = No hay registro del lago.
trust-need-diversion-record = No hay registro de ningún canal.
trust-score-loss-warm-cold = Entre años cálidos y fríos su nota baja { $value }. Sí hasta { $good }, a medias hasta { $fair }.
trust-score-half-day-error-days = La mitad del agua llega con { $value } días de error en un año medio. Sí hasta { $good }, a medias hasta { $fair }.
trust-score-annual-error-percent = Un año se desvía { $value } en promedio. Sí hasta { $good }, a medias hasta { $fair }.
trust-score-late-summer-error-percent = El fin del verano se desvía { $value } en promedio. Sí hasta { $good }, a medias hasta { $fair }.
trust-score-storage-error-percent = Un día se desvía { $value } del lago en promedio. Sí hasta { $good }, a medias hasta { $fair }.
trust-score-delivery-error-percent = Un día se desvía { $value } en promedio. Sí hasta { $good }, a medias hasta { $fair }.
trust-beaten = En una mitad de los años falla: lo aprendido en una mitad no vale en la otra.
trust-scores = Notas
trust-nse = nse
trust-kge = kge
trust-correlation = mismo ritmo
trust-variability = mismo vaivén
trust-ratio = misma media
trust-bias = Desvío, %
trust-guess-nse = Lo de siempre, nse
trust-daily-unseen = Días, años no vistos
trust-daily = Días, juego en uso
trust-annual = Años enteros
trust-guess = Días, «lo de siempre»
trust-scores-how = 1 es perfecto en todo menos en la última columna, donde es 0. nse: eficiencia de Nash y Sutcliffe. kge: eficiencia de Kling y Gupta de 2009; después vienen sus tres partes. «Lo de siempre» dice para cada día el promedio de ese día en todos los demás años: un modelo tiene que acertar más.
trust-monthly = Meses: nse { $nse } ({ $nse_rating }), error entre variación { $rsr } ({ $rsr_rating }), desvío { $bias } ({ $bias_rating }).
trust-monthly-worst = Según las bandas de Moriasi et al. (2007): { $rating }.
trust-rating-very-good = muy bueno
trust-rating-good = bueno
trust-rating-satisfactory = satisfactorio
trust-rating-unsatisfactory = insatisfactorio
trust-month = Mes
trust-observed = Medido
trust-modelled = Modelo
trust-bars = = ambos, o solo medido, m solo el modelo
trust-season = La temporada, { $unit }:
trust-exceeded = Más que esto el
trust-duration = Qué tan seguido el río viene alto o bajo, { $unit }:
trust-high-flow = Las crecidas más altas (2% de los días): { $amount }.
trust-flood-season = La temporada de crecidas: { $amount }.
trust-late-summer = Fines del verano: { $amount }.
trust-low-flow = Los caudales más bajos (30% de los días): { $amount }.
trust-too-little = { $percent } de menos
trust-too-much = { $percent } de más
trust-even = lo justo
trust-errors = Cómo se reparten los errores de cada día, de muy poco a demasiado; 1 es lo justo, 0.5 la mitad, 2 el doble:
trust-errors-shape = { $from } |{ $shape }| { $to }
trust-one-hump = Una sola joroba, en { $at }: los errores son de un solo tipo.
trust-several-humps = { $n } jorobas, en { $at }: hay errores de varios tipos, y su promedio no dice nada. Muchas veces los caudales bajos salen muy bajos y las crecidas muy altas.
trust-year = Año
trust-half-day = Mitad del agua, días de error
trust-years = Año por año, { $unit }:
trust-link-snow = Cuando un año tiene nieve de más en el modelo, tiene río de más (r { $r }, { $n } años): el error entra con el tiempo.
trust-link-model = El error del río de un año no va con el de su nieve (r { $r }, { $n } años): mire el suelo, no el tiempo.
trust-link-both = El error del río de un año va en parte con el de su nieve (r { $r }, { $n } años): el tiempo y el modelo tienen cada uno su parte.
trust-records = Otros registros
trust-days = Días
trust-snow = Nieve
trust-lake = Lago

## La página de confianza

trust-chart-model = modelo
trust-chart-model-unseen = modelo, en años que no vio
trust-chart-measured = medido
trust-chart-season = La temporada, por meses, hasta { $most }
trust-chart-duration = Qué tan seguido, de { $least } a { $most }
trust-chart-rare = pocos días
trust-chart-always = casi siempre
trust-chart-no-errors = Errores de cada día: hay muy pocos días
trust-chart-one-hump = Errores de cada día: una joroba
trust-chart-humps = Errores de cada día: { $n } jorobas; su promedio no dice nada
trust-chart-too-little = de menos
trust-chart-too-much = de más
trust-chart-years = Año por año, hasta { $most }
