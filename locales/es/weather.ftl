# Lo que dice `weather` de recetas, de aprender de un registro, y de lo que hizo.

weather-from-recipe = Sigue la receta «{ $recipe }».
weather-columns = Temperaturas en °C, lluvia y nieve en mm de agua, sol en MJ/m² por día, humedad en por ciento, viento en m/s a 2 m.
weather-recipe-head = Una receta para «deshielo weather --recipe». Las listas de doce van de enero a diciembre.

problem-recipe = Esto no se puede leer como receta.
    .remedy = Haga una receta con --recipe-out y cámbiela paso a paso.
problem-recipe-key = Esto no se puede leer como receta: revise «{ $key }».
    .remedy = Haga una receta con --recipe-out y compare las dos.

weather-recipe-refused = La receta no tiene sentido y no se hizo ningún tiempo:
weather-past-last-date = El calendario se acaba antes de que pasen tantos años.
weather-fault-range = { $key } vale { $value }. Tiene que estar entre { $low } y { $high }.
weather-fault-range-month = { $key } vale { $value } en { $month }. Tiene que estar entre { $low } y { $high }.
weather-fault-curve = { $key } llega a { $value } el día { $day } del año. Tiene que quedarse entre { $low } y { $high }.
weather-fault-wetter-after-dry = En { $month }, es más probable un día de lluvia después de uno seco que después de uno de lluvia. Haga wet_to_wet al menos tan grande como dry_to_wet.
weather-fault-correlations = Ningún tiempo puede tener las correlaciones que están en residuals.

weather-fit-month = El año de agua no puede empezar en el mes { $month }.
weather-fit-dates = La fecha { $date } no viene después del día anterior.
weather-fit-missing = El { $date } falta un dato: { $field }. Hace falta todos los días.
weather-fit-negative = El { $date } llovió { $amount } mm. No puede caer menos que nada.
weather-fit-turned = El { $date } la temperatura mínima, { $low } °C, pasa de la máxima, { $high } °C.
weather-fit-one-kind = Días de lluvia en el registro: { $wet }; días secos: { $dry }. Para aprender su forma hacen falta al menos { $least } de cada clase.
weather-fit-unusable = La forma del registro no tiene sentido. ¿Estará mal alguna unidad?

weather-note-few-years = Con { $n } años de agua completos no se sabe cuánto cambia un año de otro; hacen falta { $least }. Se tomaron valores usuales: no confíe en las sequías largas.
weather-note-totals-alike = Los años no cambian más de lo que explican los días sueltos. Por eso los años hechos también se parecen.
weather-note-totals-wide = Los años cambian más de lo que el método puede seguir. Por eso los años hechos cambian menos.
weather-note-year-memory = Según el registro, un año recuerda al anterior en { $estimated }. Eso no es posible; se tomó { $taken }.
weather-note-temperature-wide = Las temperaturas promedio de los años quedan muy separadas ({ $spread } °C). Revise si hay una tendencia o un cambio de termómetro.
weather-note-temperature-alike = Los años no cambian en calor más de lo que explican los días sueltos.
weather-note-month-one-kind = En { $month } no hay días de lluvia, o todos lo son. Se sumó medio día a cada clase.
weather-note-wet-memory = En { $month }, un día recuerda la lluvia del anterior en { $estimated }. Eso no es posible; se tomó { $taken }.
weather-note-depths-pooled = Días de lluvia en { $month }: solo { $n }. Se tomó en cuenta la lluvia de los meses vecinos.
weather-note-same-step = En algún mes hay muy pocos días de una clase. La diferencia entre días secos y de lluvia es la misma todo el año en: { $field }.
weather-note-simpler-spread = Se sabe muy poco de cuánto cambia esto de un día a otro, y se tomó una curva más sencilla: { $field }.
weather-note-left-out = Quedó fuera, con { $n } días útiles: { $field }.
weather-note-radiation-high = { $n ->
    [one] Hubo { $n } día con más sol del que da un cielo limpio. Quedó fuera.
   *[other] Hubo { $n } días con más sol del que da un cielo limpio. Quedaron fuera.
}
weather-note-published-radiation = La relación entre sol y temperatura se tomó de Richardson y Wright (1984).
weather-note-published-memory = La relación de un día con el siguiente se tomó de Richardson y Wright (1984).
weather-note-dewpoint = El aire trae más humedad de la que permite su hora más fría. Se tomó la temperatura mínima como punto de rocío.

weather-field-tmin = temperatura mínima
weather-field-tmax = temperatura máxima
weather-field-precipitation = lluvia y nieve
weather-field-solar = sol
weather-field-humidity = humedad
weather-field-wind = viento
