# Cambios, dudas y partes en palabras sencillas. Primero cantidad, unidad y sentido; el dato de antes va en otra oración.

days-sooner = { $n ->
    [one] { $n } día antes
   *[other] { $n } días antes
}
days-later = { $n ->
    [one] { $n } día después
   *[other] { $n } días después
}
days-same = El mismo día que antes.
days-range-sooner = entre { $a } y { $b } días antes
days-range-later = entre { $a } y { $b } días después
days-range-across = desde { $a ->
    [one] { $a } día
   *[other] { $a } días
} antes hasta { $b ->
    [one] { $b } día
   *[other] { $b } días
} después
days-count = { $n ->
    [one] { $n } día
   *[other] { $n } días
}
years-count = { $n ->
    [one] { $n } año
   *[other] { $n } años
}

amount-less = { $amount } menos
amount-more = { $amount } más
change-none = Sin cambio.
change-unclear = Sin cambio claro: la franja incluye el cero.
percent-range-less = entre { $a } y { $b } menos
percent-range-more = entre { $a } y { $b } más
percent-range-across = desde { $a } menos hasta { $b } más
before = Antes: { $value }.

years-of-ten = { $k } de cada 10 años
shortage-none = Llega toda el agua pedida.
shortage-under-one = De cada 100 partes, falta menos de 1.
shortage-parts = { $n ->
    [one] de cada 100 partes, { $n } no llega
   *[other] de cada 100 partes, { $n } no llegan
}
shortage-shared = Hay menos agua para repartir.
shortage-by-priority = A los derechos más recientes les toca esperar.

model-calm = Es un modelo: muestra qué podría cambiar.
model-weak = Aquí el modelo falla seguido. Sirve para preguntar, no para decidir.
model-strong = En los años de prueba anduvo cerca. Aun así puede fallar.
model-outside = Fuera de los años de prueba: aquí confíe menos.
