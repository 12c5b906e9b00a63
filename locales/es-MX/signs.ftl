# Palabras de México. Las revisa una persona de allá antes de imprimir.

sign-centre-of-volume-day = Centro del gasto
    .short = Centro gasto
    .plain = El día que queda en medio del gasto del año, contado desde que empieza el año de agua. Pesan más los días de mucha agua.
sign-peak-flow-m3s = Gasto más alto
    .short = Gasto mayor
    .plain = El gasto más alto de un día del año.
sign-peak-flow-date = Día del gasto más alto
    .short = Día del pico
    .plain = El día en que el río llevó más agua.
sign-low-flow-7day-m3s = Semana con menos agua
    .short = Semana baja
    .plain = El gasto promedio de los siete días seguidos con menos agua.
