# Palabras de España. Las revisa una persona de allá antes de imprimir.

tell-dials-at-rest = Ningún mando se ha movido: todavía no hay cambios.
tell-mean-of-years = Media de { $n } años
tell-storms-kept = Los mandos no cambian el orden de las tormentas, los días de lluvia ni el calendario de cultivos.
