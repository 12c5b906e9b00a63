# La placa: su archivo en la línea de órdenes y lo que se dice de sus pantallas.

help-board = El archivo de la placa: qué pantallas y qué mandos tiene. También dice con qué idioma y qué lugar empezar.
board-screen-lost = Esta pantalla no responde: { $screen }. Lo demás sigue y se vuelve a probar cada pocos segundos. El sistema dice:
board-screen-back = Esta pantalla volvió: { $screen }.
show-why-no-board-file = El archivo de la placa debe decir cómo está conectada: --board ARCHIVO.
