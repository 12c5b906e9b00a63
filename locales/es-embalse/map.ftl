# El mapa de dos perillas donde la laguna es un embalse.

grid-at-reservoir-size = { $value } de tamaño del embalse
grid-at-starting-storage = { $value } del embalse al empezar
