# Palabras de Chile. Las revisa una persona de allá antes de imprimir.

sign-supply-ratio = Parte del agua pedida que llegó
    .short = Entregado
    .plain = De cada 100 partes pedidas en las bocatomas, cuántas llegaron.
sign-canal-supply-ratio = Parte que llegó
    .short = Entregado
    .plain = De cada 100 partes que pidió este canal en su bocatoma, cuántas llegaron.
sign-reliability = Seguridad
    .short = Seguridad
    .plain = En cuántos años de cada diez alcanzó el agua.
