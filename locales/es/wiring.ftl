# Los mandos de una placa, la tabla de cables y la carta de prueba.

help-wiring = Muestra cómo conectar una placa y prueba su pantalla y cada mando.
help-usage-wiring = [PLACA] [OPCIONES]
help-wiring-board = El archivo de la placa. Hay ejemplos en cross/boards.
help-wiring-more =
    Primero sale una tabla con todos los cables. Después, la pantalla de la placa muestra una carta de prueba y lo que dice
    cada mando. Las páginas pasan solas: no hace falta tocar nada. En otro equipo: --screen window, terminal o pictures.
    Ejemplo: deshielo wiring board.toml --screen pictures

## Cómo se llaman los mandos

hand-input-device = { $name }
hand-touchscreen = Táctil: { $name }
hand-encoder = Perilla en { $a } y { $b }
hand-shaft-button = Su botón en { $pin }
hand-button = Botón en { $pin }
hand-knob = { $dial } (entrada { $input })
hand-here = Este equipo

## Lo que dicen los mandos

hand-silent = nada aún
hand-closed = cerrado
hand-open = abierto
hand-contacts = A { $a }, B { $b }
hand-turned = giró { $detents }
hand-pressed = apretado
hand-held = sostenido
hand-share = { $percent } %
hand-at = en { $x }, { $y }
hand-key = tecla { $key }
hand-some-key = una tecla
hand-lost = no está
hand-stuck-button = sigue apretado
hand-stuck-one-contact = un solo contacto
hand-stuck-loose = salta
board-hand-lost = Este mando no responde: { $hand }. Lo demás sigue y se vuelve a probar cada pocos segundos. El sistema dice:
board-hand-stuck = Algo anda mal con este mando: { $hand }. Dice: { $what }.
board-hand-back = Este mando responde: { $hand }.

## La carta de prueba

test-card-red = rojo
test-card-green = verde
test-card-blue = azul
test-card-size = { $width } × { $height }
test-card-look = Flecha hacia arriba, anillo redondo, una línea fina en todo el borde y cada color con su nombre. Si no, cambie rotation_deg, offset_x_px, blue_first o inverted en el archivo de la placa.
test-card-hands = Mandos
wiring-foot = Escape termina. Las páginas pasan solas.
wiring-touch-each = Gire y apriete cada uno. Un anillo quiere decir: aún no dijo nada.
wiring-all-heard = Todos los mandos respondieron. Muy bien.
wiring-stuck = Un triángulo marca lo que no puede ser. Desenchufe la placa y revise los cables de ese mando.
wiring-no-hands = El archivo de la placa no nombra ningún mando.
wiring-no-board = No se indicó ningún archivo de placa, así que no se buscan sus mandos.
wiring-nothing = ¿Qué placa? Indique un archivo de placa, o una pantalla con --screen.
wiring-only-table = La pantalla de esta placa no está en este equipo: solo se imprimió la tabla. Para ver aquí la carta de prueba, agregue --screen window, terminal o pictures.

## Qué hacer cuando algo no dice nada

silent-screen =
    Oscura: ¿está conectada la luz de fondo y hay 3,3 V en su alimentación? Blanca o gris: revise los cables de reinicio y de datos/órdenes. Revuelta: baje speed_mhz y acorte los cables. No hay ningún /dev/spidev*: active el bus SPI en los ajustes del sistema.
    .title = Si la pantalla no muestra nada
silent-input-device =
    ¿Está su nombre en la lista del sistema (/proc/bus/input/devices)? Si no, vuelva a enchufarlo, o revise el overlay que debe cargar el núcleo. Si está, ¿dice lo mismo el archivo de la placa? ¿Tiene permiso de leerlo? La cuenta que usa el programa debe estar en el grupo input.
    .title = Si un mando enchufado no dice nada
    .brief = Enchúfelo. ¿Está bien su nombre en el archivo de la placa?
silent-touchscreen =
    ¿Está su nombre en la lista del sistema (/proc/bus/input/devices)? Si responde en otro lugar, cambie left_right_raw y top_bottom_raw. Si izquierda y derecha son arriba y abajo, cambie axes_swapped.
    .title = Si al tocar no pasa nada
    .brief = ¿Está bien el nombre de la pantalla táctil en el archivo de la placa?
silent-encoder =
    Gire despacio y mire A y B: los dos deben abrir y cerrar. Uno nunca cambia: su cable está suelto. Ninguno cambia: la pata del medio debe ir a tierra. Va al revés: escriba reversed = true. Dos clics por paso: cambie edges_per_detent.
    .title = Si una perilla en los pines no dice nada
    .brief = ¿Están libres los pines y es ese el gpio_chip? La cuenta que usa el programa debe estar en el grupo gpio.
silent-button =
    Apriete y mire: debe pasar de abierto a cerrado y volver. Nunca cierra: una pata va al pin y la otra a tierra; en muchos botones las patas unidas están lado a lado. Siempre cerrado: los dos cables se tocan.
    .title = Si un botón no dice nada
    .brief = ¿Está libre el pin y es ese el gpio_chip? La cuenta que usa el programa debe estar en el grupo gpio.
silent-converter =
    Gire y mire la barra. Ninguna se mueve: ¿está activo el bus en los ajustes del sistema y es esa la dirección o la selección? Una no se mueve: su cable del medio está suelto. Salta: el cable del medio está en el aire. No llega al final: cambie low_end_percent o high_end_percent.
    .title = Si una perilla con barra no dice nada
    .brief = ¿Está activo el bus y está conectado el chip?

## La tabla de cables

wiring-first = Antes de conectar nada
wiring-unpowered = Desenchufe la placa. Conecte cables solo mientras está desenchufada.
wiring-volts = Toda señal es de 3,3 V. Con 5 V en un pin la placa se arruina. Aquí las piezas se alimentan con 3,3 V.
wiring-mains = Use una fuente comprada y bien cerrada. Todo lo que toca la red eléctrica es trabajo de un electricista autorizado.
wiring-look-twice = Revise dos veces la alimentación y la tierra, y después enchufe la placa.
wiring-column-end = Pata de la pieza
wiring-column-to = Va a
wiring-column-place = Lugar en el conector
wiring-panel = Pantalla { $n }: panel con { $chip }
wiring-monitor = Pantalla { $n }: monitor
wiring-converter = Conversor { $chip }
wiring-plugged-in = Enchúfela en su conector. No lleva cables propios.
wiring-of-touchscreen = Es parte de la pantalla. La página del fabricante dice qué pines usa.
wiring-of-system = Enchúfelo, o conéctelo a los pines que nombra el overlay del núcleo.
wire-supply = alimentación (VCC, VDD)
wire-ground = tierra (GND)
wire-clock = reloj (SCK, SCL, CLK)
wire-data-in = entrada de datos (MOSI, SDA, DIN)
wire-data-out = salida de datos (MISO, DOUT)
wire-chip-select = selección (CS)
wire-data-command = datos/órdenes (DC, RS)
wire-reset = reinicio (RES, RST)
wire-backlight = luz de fondo (BL, LED)
wire-serial-data = datos (SDA)
wire-serial-clock = reloj (SCL)
wire-address = dirección (ADDR)
wire-contact-a = contacto A (CLK)
wire-contact-b = contacto B (DT)
wire-shaft-button = botón (SW)
wire-contact = un lado
wire-common = el otro lado de cada contacto
wire-input = entrada { $n }
wire-left-ends = extremo izquierdo de cada perilla
wire-right-ends = extremo derecho de cada perilla
wire-to-pin = GPIO { $pin }
wire-to-supply = 3,3 V
wire-to-ground = tierra
wire-to-wiper = medio de la perilla: { $dial }
