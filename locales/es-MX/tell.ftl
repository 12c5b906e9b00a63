# Palabras de México. Las revisa una persona de allá antes de imprimir.

tell-rule-rotation = por tandas
