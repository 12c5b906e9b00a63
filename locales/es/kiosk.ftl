# El aparato que nadie vigila: lo que dice solo, el menú del personal, lo que se guarda y el conteo de uso.

help-kiosk = Para una pantalla que nadie vigila: muestra sola lo que sabe hacer y empieza de nuevo para cada persona.
help-keep = La carpeta donde se guardan los ajustes, las respuestas y el conteo de uso.
help-set-pin = Pide la clave del menú del personal, la guarda y no hace nada más.
help-tally = Dice cuánto se usó una pantalla con --kiosk. Nunca sabe quién la usó.
help-usage-tally = [OPCIONES]
help-tally-from = El primer día, por ejemplo 2026-05-01.
help-tally-to = El último día.
help-tally-form = Cómo escribir el conteo: table (tabla) o csv.
value-date = FECHA

## Lo que dice el paseo

stroll-hello = Este es un valle de montaña con su agua. ¿Qué le haría un año más cálido?
stroll-year = Mire pasar un año: cae la nieve, se derrite y beben los campos.
stroll-season = En invierno la montaña guarda agua como nieve. En primavera la suelta.
stroll-warmer = ¿Y si todos los días fueran más cálidos?
stroll-canals = ¿A qué canal le faltaría agua, y cuándo?
stroll-dry = ¿Y cómo sería eso en un año seco?
stroll-lining = ¿Y si los canales perdieran menos agua en el camino?
stroll-years = Un año es solo uno. ¿Cómo salen todos los años?
stroll-trust = ¿Hasta dónde se le puede creer? Aquí está lo que se probó.
stroll-caution = Esto sirve para aprender. No es un pronóstico.
stroll-take-over = Gire la perilla: es suya.
stroll-message-of-day = Hoy
kiosk-anyone-there = ¿Hay alguien? Gire la perilla para seguir.

## El menú del personal

staff-title = Para el personal
staff-pin-title = Personal: clave
staff-health-title = Cómo está el aparato
staff-tally-title = Cuánto se usó
staff-no-pin =
    No se ha puesto ninguna clave, así que este menú sigue cerrado.
    Ponga una en este aparato con: deshielo show --set-pin
staff-wait = Demasiadas claves equivocadas. Pruebe otra vez en { $time }.
staff-pin-wrong = Esa no era la clave.
staff-pin-done = Listo
staff-pin-back = Atrás
staff-foot-pin = Girar: cifra. Oprimir: tomarla. Mantener: atrás.
staff-foot-menu = Girar: elegir. Oprimir: cambiar. Mantener: salir.
staff-foot-value = Girar: cambiar. Oprimir: listo.
staff-foot-page = Oprimir: volver.
staff-yes = sí
staff-no = no
staff-close = Volver con el público
staff-health = Cómo está el aparato
staff-tally = Cuánto se usó
staff-message = Mostrar el aviso del día
staff-night = Dormir de noche
staff-night-from = Empieza la noche
staff-night-until = Termina la noche
staff-light = Luz de la pantalla
staff-low-power = Ahorrar energía
staff-clock = El reloj está bien
staff-forget-guesses = Borrar las respuestas
staff-start-again = Borrar lo del público
staff-end = Cerrar el programa

staff-power = Corriente
    .fine = suficiente
    .low = falta ahora
    .was-low = faltó antes
    .unknown = el aparato no avisa
staff-card = Tarjeta de memoria
    .fine = guarda todo
    .full = está llena
    .read-only = no deja escribir
    .other = no guarda
    .damaged = se apartó un archivo dañado
staff-wall-clock = Reloj
    .missing = no hay
    .year = año equivocado
    .no-source = sin pila de reloj
    .unsteady = todavía no es seguro
staff-running = Encendido hace
staff-version = Versión
staff-uses-today = Visitas hoy
staff-uses-week = Visitas en 7 días
staff-uses-month = Visitas en 30 días
staff-uses-all = Visitas en total
staff-uses-minutes = Minutos en total
staff-most-view = Lo más visto
staff-most-dial = Lo más girado

## Lo que se dice una vez en el registro

keep-settings = los ajustes
keep-guesses = las respuestas
keep-tally = el conteo de uso
keep-damaged-afresh = Archivo dañado: { $what }. Se apartó y se empieza de nuevo.
keep-damaged-last = Archivo dañado: { $what }. Se apartó y se usa la última copia buena.
keep-newer = Archivo de un programa más nuevo: { $what }. Se apartó.
keep-unreadable = No se puede leer: { $what }. El sistema dice: { $reason }
keep-cannot = Ahora no se puede guardar: { $what }. El sistema dice: { $reason }
keep-again = Ya se puede guardar otra vez: { $what }.
keep-message-bad = Algunas líneas de message.toml no sirven.
keep-no-folder = No hay carpeta donde guardar nada. Indique una con --keep.
kiosk-power-low = Al aparato le llega poca corriente.
kiosk-power-fine = Al aparato ya le llega suficiente corriente.
kiosk-pin-ask = Clave nueva, de { $least } a { $most } cifras:
kiosk-pin-bad = Una clave tiene de { $least } a { $most } cifras y nada más.
kiosk-pin-kept = La clave quedó guardada.
kiosk-pin-no-chance = Este sistema no da números al azar, así que no se puede guardar una clave.

## El conteo de uso

tally-nothing = No se contó nada.
tally-span = Del { $from } al { $to }
tally-span-all = Todo lo que se contó
tally-visits = Visitas
tally-minutes = Minutos
tally-day = Día
tally-views = Vistas, por visitas que las abrieron
tally-dials = Perillas, por visitas que las giraron
tally-languages = Idiomas, por visitas que los vieron
tally-lessons = Lecciones, por visitas que las empezaron
tally-others = otros
tally-undated = Sin día, porque el reloj no estaba bien
tally-earlier = Antes de esos días
tally-no-names = Solo se cuenta el uso. Nada dice quién estuvo.
tally-date-wrong = «{ $text }» no es un día. Escríbalo así: 2026-05-01.
tally-dates-backward = El primer día viene después del último.
