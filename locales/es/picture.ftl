# Lo que dicen las páginas del aparato. Primero las respuestas: una oración para el cambio y otra para el dato de antes.

view-valley = valle
view-season = temporada
view-canals = canales
view-ledger = cuentas
view-years = muchos años
view-grid = qué pasa si
view-trust = confianza
view-lesson = lección
view-about = acerca de esto

answer-nothing-yet = Todavía no hay cambios. Mueva una perilla.
answer-lacking-more = A { $canal } le falta agua { $n ->
    [one] { $n } día
   *[other] { $n } días
} más. Antes: { $before ->
    [one] { $before } día
   *[other] { $before } días
}.
answer-lacking-fewer = A { $canal } le falta agua { $n ->
    [one] { $n } día
   *[other] { $n } días
} menos. Antes: { $before ->
    [one] { $before } día
   *[other] { $before } días
}.
answer-supply = A los canales les llega { $now } del agua que piden. Antes: { $before }.
answer-same-days = Los mismos días que antes, en los canales y en la nieve.

answer-snow-sooner = La nieve se acaba { $n ->
    [one] { $n } día
   *[other] { $n } días
} antes: dura hasta { $date }. Antes: { $before }.
answer-snow-later = La nieve se acaba { $n ->
    [one] { $n } día
   *[other] { $n } días
} después: dura hasta { $date }. Antes: { $before }.

answer-half-sooner = La mitad del agua del año pasa { $n ->
    [one] { $n } día
   *[other] { $n } días
} antes: { $date }. Antes: { $before }.
answer-half-later = La mitad del agua del año pasa { $n ->
    [one] { $n } día
   *[other] { $n } días
} después: { $date }. Antes: { $before }.
answer-half-same = La mitad del agua del año pasa el mismo día que antes: { $date }.
answer-half-told = La mitad del agua del año ya pasó { $date }.
answer-half-between = La mitad del agua del año pasa { $range }.
answer-half-gained = Ahora el río trae agua: la mitad ya pasó { $date }. Antes: nada.
answer-half-lost = Ahora el río no trae agua. Antes, la mitad ya había pasado { $before }.
answer-half-never = Este año el río no trae agua.

answer-last-full-sooner = { $canal } tiene su último día completo { $n ->
    [one] { $n } día
   *[other] { $n } días
} antes: { $date }. Antes: { $before }.
answer-last-full-later = { $canal } tiene su último día completo { $n ->
    [one] { $n } día
   *[other] { $n } días
} después: { $date }. Antes: { $before }.
answer-last-full-between = { $canal } tiene su último día completo { $range }.
answer-last-full-gained = { $canal } ahora tiene días completos; el último, { $date }. Antes: ninguno.
answer-last-full-lost = { $canal } ya no tiene ningún día completo. Antes, el último era { $before }.
answer-same-last-full-days = Cada canal tiene el mismo último día completo que antes.
answer-first-short-told = { $canal } es el primero al que le falta agua, desde { $date }.
answer-all-full = Este año, a cada canal le llega toda su agua.
answer-nobody-asks = Este año ningún canal pide agua.
answer-no-canals = Este lugar no tiene canales.

picture-invented = valle inventado
picture-not-fitted = sin ajustar todavía
picture-year-dry = { $year }, año seco
picture-year-middling = { $year }, año regular
picture-year-wet = { $year }, año húmedo
picture-year-any = año de agua { $year }
picture-carried-over = sin fijar

picture-snow = Nieve { $amount }
picture-was = antes { $value }
picture-snow-line = línea de nieve { $height }
picture-no-snow = sierra sin nieve
picture-minimum = mínimo { $amount }
picture-oldest-first = primero el más antiguo
picture-since = desde { $year }
picture-canal-count = { $n ->
    [one] { $n } canal
   *[other] { $n } canales
}
picture-no-demand = no pide
picture-no-full-day = sin día completo
picture-names-elsewhere = Una pantalla más grande nombra los { $n }.
picture-same-day = el mismo día
picture-as-it-was = sin cambios
picture-with-changes = con sus cambios
picture-beside = la guardada
picture-was-full = era completo
picture-canals = Canales
