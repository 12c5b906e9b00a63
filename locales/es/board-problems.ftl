# Lo que puede estar mal en el archivo de una placa. El mensaje dice qué está mal; su .remedy dice cómo queda bien.

problem-board-no-screen = El archivo no nombra ninguna pantalla.
    .remedy = Agregue una con la línea [[screen]] y debajo kind = "panel" (pantalla pequeña) o kind = "monitor".
problem-board-device = «{ $value }» no es un dispositivo, en «{ $key }».
    .remedy = Escriba la ruta completa: "/dev/gpiochip0".
problem-board-name = «{ $value }» no es un nombre, en «{ $key }».
    .remedy = Escriba solo el nombre, sin barras.
problem-board-pin-twice = La patilla { $pin } se usa dos veces: aquí como «{ $key }» y en la línea { $line } como «{ $other }».
    .remedy = Pase uno de los dos cables a otra patilla y escriba aquí el número.
problem-board-pin-of-bus = La patilla { $pin } no puede ser «{ $key }»: es { $other }, y la línea { $line } usa ese bus.
    .remedy = Pase el cable a una patilla que ningún bus necesite y escriba aquí el número.
problem-board-place-twice = Dos partes están conectadas en el mismo sitio: { $place }. La otra está en la línea { $line }.
    .remedy = Dele a una de ellas otro bus, otro chip_select u otra dirección, y cámbiela también en la placa.
problem-board-beyond-memory = Entre el margen y el tamaño suman { $sum } píxeles, pero el chip tiene memoria para { $memory }.
    .remedy = Revise los dos números. En muchas pantallas pequeñas el vidrio empieza en 0.
problem-board-too-small = En una pantalla de { $size } píxeles no cabe ninguna imagen.
    .remedy = La imagen más chica es de 240x240 píxeles. Revise el tamaño y el giro.
problem-board-bars = En una pantalla de { $size } la imagen es de { $layout }, con franjas oscuras alrededor.
    .remedy = Puede quedar así. Tal vez con otro giro se llene la pantalla.
problem-board-rotation = Una imagen no se puede girar { $value } grados.
    .remedy = Escriba 0, 90, 180 o 270, en el sentido de las agujas del reloj.
problem-board-word-bits = Este chip no puede recibir { $value } bits a la vez.
    .remedy = Escriba 8. Solo un ili9486 con registros de desplazamiento recibe 16.
problem-board-time = «{ $key }» no es una hora del día: «{ $value }».
    .remedy = Escriba la hora y los minutos, de 24 horas: "21:30".
problem-board-night-empty = La noche termina a la misma hora en que empieza.
    .remedy = Escriba dos horas distintas, o quite la noche.
problem-board-edges-same = «{ $key }» tiene el mismo valor en los dos bordes.
    .remedy = Toque los dos bordes de la pantalla y escriba lo que se lee en cada uno: [200, 3900].
problem-board-edges-per-detent = Ninguna perilla tiene 3 flancos entre un clic y el siguiente.
    .remedy = Escriba 1, 2 o 4. La mayoría tiene 4.
problem-board-input-twice = La entrada { $input } se usa dos veces. La otra está en la línea { $line }.
    .remedy = Cada perilla lleva su propia entrada. Revise los cables.
problem-board-dial-twice = Dos manos mueven la perilla «{ $dial }». La otra está en la línea { $line }.
    .remedy = Deje que una sola la mueva: si no, la llevarían de un lado a otro.
problem-board-two-monitors = Hay dos monitores y solo se puede usar uno.
    .remedy = Deje uno de los dos. Paneles pequeños puede haber tantos como alcancen los cables.
