# El mapa de dos perillas en el aparato: lo que se puede elegir para él.

ring-map-sign = El mapa muestra
ring-map-across = Mapa, a lo ancho
ring-map-up = Mapa, a lo alto
