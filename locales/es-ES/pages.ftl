# Mensajes enteros que en España son otros.

page-about-dials = Lo que los mandos respetan
help-title = Un mando y un botón
help-turn = Gire
    .plain = Cambia lo que tiene en la mano: al principio, un mando.
help-press = Pulse
    .plain = Abre la rueda con todo: mandos, vistas, años y más. Gire hasta una cosa y pulse para tomarla.
help-hold = Mantenga pulsado
    .plain = Deja todos los mandos como al principio.
page-card-turn = Gire: siguiente. Pulse: cerrar.
page-card-press = Pulse: cerrar.
key-dial = otro mando
key-dial-to-rest = este mando, sin cambios
key-press = pulsar el botón
