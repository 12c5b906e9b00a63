# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

dial-warming = Calentamiento
    .short = Calentamiento
    .unit = grados
    .stands = Cuántos grados más de calor hace, de día y de noche, que en los años medidos. También lo sienten los cultivos, el suelo y el embalse: se va más agua al aire.
dial-reservoir-size = Tamaño del embalse
    .short = Tam. embalse
    .unit = por ciento
    .stands = Cuánta agua de más o de menos cabe en el embalse arriba de la toma. Las cuentas de agua crecen o bajan igual.
dial-starting-storage = Agua al empezar el año
    .short = Al empezar
    .unit = por ciento de lleno
    .stands = Qué tan lleno está el embalse el primer día del año de agua. Todos los años empiezan así. Si no se mueve, cada año empieza con lo que dejó el anterior.
