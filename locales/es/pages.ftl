# Las cuentas, todos los años, la confianza, acerca de esto y las tarjetas que se abren sobre una página.

## Cuentas

page-ledger-parts = Por cada 100 partes de lluvia y nieve, el río trae { $n }.
page-ledger-parts-changed = Por cada 100 partes de lluvia y nieve, el río trae { $n }. Antes: { $before }.
page-ledger-nothing-fell = Este año no cae lluvia ni nieve.
page-no-year = El registro no tiene ningún año de agua completo.
page-ledger-in = Entra: { $amount }
page-ledger-residual = Sin explicar: { $amount }
page-now = ahora
page-was = antes
page-from-reservoir = De la presa
page-into-reservoir = A la presa
page-from-ground = Del suelo
page-into-ground = Al suelo
page-all-else = Lo demás

## Muchos años

page-years-enough = El agua alcanza en { $years } de { $of } años.
page-years-enough-same = El agua alcanza en { $years } de { $of } años, igual que antes.
page-years-enough-changed = El agua alcanza en { $years } de { $of } años. Antes: en { $was-years }.
page-years-enough-changed-of = El agua alcanza en { $years } de { $of } años. Antes: en { $was-years } de { $was-of }.
page-years-nobody-asks = En todos estos años, ningún canal pide agua.
page-years-snow = En un año promedio, la nieve llega a guardar { $now }.
page-years-snow-changed = En un año promedio, la nieve llega a guardar { $now }. Antes: { $before }.
page-years-flow = En un año promedio, el río trae { $now }.
page-years-flow-changed = En un año promedio, el río trae { $now }. Antes: { $before }.
page-years-line = alcanza: { $share }
page-years-was-enough = alcanzó
page-years-was-short = no alcanzó
page-dry = seco
page-middling = regular
page-wet = húmedo

## Confianza

page-yes = Sí
page-partly = A medias
page-no = No
page-trust-invented = Este valle es inventado. No hay aforo con qué comprobarlo.
page-trust-not-fitted = Este lugar todavía no está ajustado a las medidas de su río.
page-trust-untested = Ya está ajustado, pero falta probarlo en años que no había visto.
page-trust-weaker = En los años de prueba falló más. Confíe en el rumbo, no en la cantidad.
page-trust-direction = Hacia dónde cambia
    .plain = La nieve, el suelo y el agua siguen reglas conocidas. Sirve para preguntar y comparar.
page-trust-size = Cuánto cambia
    .plain = Solo más o menos. Nadie lo ha comparado con el caudal medido.
page-trust-exact = El día o la cantidad exacta
    .plain = No, sin medidas del río y años de prueba. Aun así puede fallar.
page-trust-fitted-to = Ajustado a las medidas del río de { $first } a { $last }.
page-trust-too-little = En promedio da { $percent } menos agua de la cuenta.
page-trust-too-much = En promedio da { $percent } más agua de la cuenta.
page-trust-even = En promedio da el agua justa.
page-trust-earlier = { $n ->
    [one] { $n } año anterior
   *[other] { $n } años anteriores
}
page-trust-later = { $n ->
    [one] { $n } año posterior
   *[other] { $n } años posteriores
}
page-trust-colder = { $n ->
    [one] { $n } año más frío
   *[other] { $n } años más fríos
}
page-trust-warmer = { $n ->
    [one] { $n } año más cálido
   *[other] { $n } años más cálidos
}
page-trust-holds = cerca
page-trust-weakens = menos cerca
page-trust-fails = falla
page-trust-model = el modelo, en años que no vio
page-trust-guess = decir «lo de siempre»
page-trust-perfect = sin error

## Acerca de esto

page-sheet = { $n } de { $of }
page-about-record = El registro
page-about-years = { $n ->
    [one] { $n } año de agua, { $first }
   *[other] { $n } años de agua, de { $first } a { $last }
}. En cada vuelta se calculan todos.
page-about-no-gaps = No faltaba ningún dato.
page-about-dials = Lo que las perillas respetan
page-about-delta = Solo cambian el calor y las cantidades.
page-about-air = Agua al aire
page-about-sharing = A quién le toca
page-about-origin = De dónde viene

## Tarjetas

page-card-turn = Gire: siguiente. Presione: cerrar.
page-card-press = Presione: cerrar.
page-term-in-full = En el oficio se dice: { $name }.
page-dial-now = Ahora: { $value }
page-dial-range = De { $low } a { $high }

## Ayuda

help-title = Una perilla y un botón
help-keys = Teclas
help-cautions = Precauciones
help-turn = Gire
    .plain = Cambia lo que tiene en la mano: al principio, una perilla.
help-press = Presione
    .plain = Abre la rueda con todo: perillas, vistas, años y más. Gire hasta una cosa y presione para tomarla.
help-hold = Mantenga presionado
    .plain = Deja todas las perillas como al principio.

key-turn = girar
key-turn-far = girar mucho
key-dial = otra perilla
key-dial-to-rest = esta perilla, sin cambios
key-press = presionar el botón
key-close = cerrar, volver
key-view = otra vista
key-view-number = una vista por su número
key-play = correr o parar el año
key-day = un día atrás o adelante
key-week = una semana atrás o adelante
key-year = un año atrás o adelante
key-third = año seco, regular, húmedo
key-keep = guardar al lado, o soltar
key-settings = ajustes
key-undo = deshacer, o rehacer
key-reset = todo sin cambios
key-language = otro idioma
key-units = otras unidades
key-shade = otros colores
key-words = explicar las palabras
key-help = ayuda

key-name-up = ↑
key-name-down = ↓
key-name-left = ←
key-name-right = →
key-name-page-up = RePág
key-name-page-down = AvPág
key-name-home = Inicio
key-name-enter = Intro
key-name-escape = Esc
key-name-tab = Tab
key-name-back-tab = Mayús+Tab
key-name-space = Espacio
