# Lo que dice `tell --columns` de cada columna del CSV y de cada parte del JSON.

columns-yearly = Años: --form csv. Por cada cálculo y año de agua hay un renglón del valle, con «canal» vacío, y luego uno por cada canal o pueblo. Lo que un renglón no tiene queda vacío.
columns-daily = Días: --form csv --daily. Un renglón por cálculo y día. En lugar de GATE va la clave de un canal o pueblo, como está en place.toml.
columns-units = El nombre termina en su unidad: _mm, _m3, _hm3 (millones de metros cúbicos), _m3s (metros cúbicos por segundo), _km2, _m. Lo que termina en _share o _ratio va de 0 a 1. El idioma y --units no cambian nada aquí.
columns-dates = Las fechas van en el orden año-mes-día. El año de agua lleva el nombre del año en que termina.
columns-missing = Vacío en CSV y null en JSON: ese valor no existe; por ejemplo, la fecha de llenado cuando el lago no se llenó.
columns-json = JSON: place, dials, as_it_was (sin cambios), with_changes (con sus cambios) y change (la diferencia). Cada cálculo tiene «years» con water_year, signs, canals y ledger, y «all» con los años mostrados juntos. Los nombres son los mismos del CSV.
columns-all = En «all»: promedio (mean), mínimo (least), máximo (most) y cuántos años tienen el valor. Ahí las fechas son días del año de agua, con el mes y día del promedio. reliability, resilience y vulnerability_hm3 califican los años (Hashimoto y otros, 1982). Las dos últimas, y las cuentas, son null si los años mostrados no van seguidos.
columns-change = En «change»: promedio, mínimo y máximo de los cambios de cada año contra el mismo año sin cambios. Las fechas van en días; menos de cero es antes.

column-run = as_it_was, con todo en reposo, o with_changes, con los cambios.
column-date = El día.
column-water-year = El año de agua.
column-canal = La clave del canal o pueblo; vacía para todo el valle.
column-canal-name = Su nombre en inglés.
column-right-year = El año de su derecho; vacío si va antes que todos.

## Las cuentas del año

column-flow-basin-precipitation = Entra: lluvia y nieve en la cuenca, sin lago ni parcelas.
column-flow-lake-rain = Entra: lluvia en el lago.
column-flow-field-rain = Entra: lluvia en las parcelas.
column-flow-storage-set-in = Entra: agua que puso en el lago starting_storage.
column-flow-basin-evaporation = Sale: lo que la tierra de la cuenca le da al aire.
column-flow-sublimation = Sale: nieve que se va directo al aire.
column-flow-lake-evaporation = Sale: lo que el lago le da al aire.
column-flow-field-evaporation = Sale: lo que cultivos y parcelas le dan al aire.
column-flow-town-use = Sale: lo que los pueblos usan y no regresa.
column-flow-deep-loss = Sale: lo que canales y parcelas pierden a lo hondo.
column-flow-river-loss = Sale: agua guardada que se pierde en el río antes de llegar a los canales.
column-flow-river-out = Sale: río que deja el valle.
column-flow-storage-set-out = Sale: agua que quitó del lago starting_storage.
column-flow-natural-inflow = Adentro: agua natural que llega al lago por el río.
column-flow-reservoir-take = Adentro: agua natural que el lago se queda.
column-flow-natural-take = Adentro: agua natural que entra a los canales.
column-flow-stored-release = Adentro: agua guardada que se suelta para canales y pueblos.
column-flow-canals = Adentro: toda el agua que entra a los canales.
column-flow-conveyance-loss = Adentro: lo que se pierde en el camino por los canales.
column-flow-field-loss = Adentro: lo que se escurre de las parcelas o baja más allá de las raíces.
column-flow-return-flow = Adentro: lo que regresa al río después de usarse.
column-flow-minimum-release = Adentro: agua guardada que se suelta para el mínimo del río.
column-flow-flood-release = Adentro: agua guardada que se suelta para dejar lugar a crecidas.
column-flow-spill = Adentro: agua natural que no cupo por la toma, y agua guardada que se derramó.

column-store-start-snow = Agua en la nieve, la primera mañana.
column-store-end-snow = Agua en la nieve, la última tarde.
column-store-start-soil = Agua en la tierra de la cuenca, la primera mañana.
column-store-end-soil = Agua en la tierra de la cuenca, la última tarde.
column-store-start-ground = Agua subterránea, la primera mañana.
column-store-end-ground = Agua subterránea, la última tarde.
column-store-start-channel = Agua del río en camino al lago, la primera mañana.
column-store-end-channel = Agua del río en camino al lago, la última tarde.
column-store-start-reservoir = Agua del lago que se puede sacar, la primera mañana.
column-store-end-reservoir = Agua del lago que se puede sacar, la última tarde.
column-store-start-root-zones = Agua donde están las raíces, la primera mañana.
column-store-end-root-zones = Agua donde están las raíces, la última tarde.
column-store-start-returning = Agua de retorno en camino, la primera mañana.
column-store-end-returning = Agua de retorno en camino, la última tarde.

column-ledger-in-m3 = Todo lo que entró.
column-ledger-out-m3 = Todo lo que salió.
column-ledger-residual-m3 = Sin explicar: lo que entró, menos lo que salió, menos lo que se guardó.
column-ledger-residual-share = Lo mismo como parte de lo que entró o salió, lo que sea más.

## Cada día

column-day-precipitation-mm = Lluvia y nieve en las zonas de altura.
column-day-snowfall-mm = Nieve en las zonas de altura.
column-day-snow-water-mm = Agua en la nieve, por la tarde.
column-day-soil-mm = Agua en la tierra, por la tarde.
column-day-ground-mm = Agua subterránea, por la tarde.
column-day-channel-mm = Agua en camino al lago, por la tarde.
column-day-evaporation-mm = Lo que la tierra de las zonas le da al aire.
column-day-sublimation-mm = Nieve que se va directo al aire.
column-day-reference-evaporation-mm = Evaporación de referencia a la altura que dice el lugar.
column-day-inflow-m3s = Caudal natural que llega al lago.
column-day-storage-hm3 = Agua del lago que se puede sacar, por la tarde.
column-day-lake-level-m = Nivel del lago, por la tarde.
column-day-lake-area-km2 = Superficie del lago, por la mañana.
column-day-lake-rain-m3 = Lluvia en el lago.
column-day-lake-evaporation-m3 = Lo que el lago le da al aire.
column-day-storage-set-m3 = Agua que puso en el lago starting_storage; menos de cero es agua que quitó.
column-day-flood-release-m3s = Agua guardada que se suelta para dejar lugar a crecidas.
column-day-spill-m3s = Agua natural que no cupo por la toma, y agua guardada que se derramó.
column-day-dam-outflow-m3s = Toda el agua que pasa del lago al río.
column-day-return-flow-m3s = Agua que regresa al río después de usarse.
column-day-river-minimum-m3s = Caudal que el río debe llevar.
column-day-river-minimum-met = 1 si lo llevó, 0 si no.
column-day-river-out-m3s = Caudal al final del río.

column-gate-demand-m3s = Agua pedida a la entrada del canal.
column-gate-delivered-m3s = Agua que entró al canal.
column-gate-stored-m3s = Agua guardada que se soltó para este canal o pueblo.
column-gate-crop-evaporation-m3 = Lo que sus cultivos le dan al aire en su temporada.
column-gate-account-hm3 = Lo que queda en su cuenta de agua, por la tarde.
