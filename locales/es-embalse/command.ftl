# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

help-about = Gire una perilla y vea qué le hace un año más cálido, más seco o con más sed a la nieve, el embalse y los canales de un valle.
place-lacks-reservoir = este lugar no tiene embalse
