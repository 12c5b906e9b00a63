# Palabras de Argentina, de memoria. Las revisa una persona de allá antes de imprimir.

term-irrigation-efficiency = eficiencia de riego
    .short = Eficiencia
    .plain = De cada diez baldes enviados, cuántos usa el cultivo.
term-dry-beans = poroto
    .short = Poroto
    .plain = Poroto seco para comer.
term-sugar-beet = remolacha azucarera
    .short = Remolacha
    .plain = Raíz que se siembra para hacer azúcar.
term-chile = ají
    .short = Ají
    .plain = Planta de ají para comer.
