# Palabras de España. Las revisa una persona de allá antes de imprimir.

sign-low-flow-7day-m3s = Semana con menos agua
    .short = Semana baja
    .plain = El caudal medio de los siete días seguidos con menos agua.
sign-flood-release-hm3 = Agua soltada para dejar lugar a avenidas
    .short = Para avenidas
    .plain = Agua que se suelta a propósito para que quepa una avenida.
sign-supply-ratio = Parte del agua pedida que llegó
    .short = Entregado
    .plain = De cada 100 partes pedidas en las tomas, cuántas llegaron.
sign-canal-supply-ratio = Parte que llegó
    .short = Entregado
    .plain = De cada 100 partes que pidió este canal en su toma, cuántas llegaron.
sign-reliability = Garantía
    .short = Garantía
    .plain = En cuántos años de cada diez alcanzó el agua.
sign-vulnerability-hm3 = Faltante medio de los años malos
    .short = Faltante medio
    .plain = En los años en que no alcanzó, cuánta agua faltó.
