# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

page-from-reservoir = Del embalse
page-into-reservoir = Al embalse
