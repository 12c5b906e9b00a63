# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

tell-reservoir-fills = Años en que se llena el embalse
