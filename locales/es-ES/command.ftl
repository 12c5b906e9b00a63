# Palabras de España. Las revisa una persona de allá antes de imprimir.

help-about = Gire un mando y vea qué le hace un año más cálido, más seco o con más sed a la nieve, el embalse y los canales de un valle.
help-set = Un mando y cuánto girarlo, por ejemplo warming=2. Se puede repetir. También vale un valor entre dos pasos.
help-setting = Un archivo con una combinación de mandos y años, o el nombre de una que ya trae el programa.
error-dial-out-of-range = El mando «{ $dial }» va de { $low } a { $high }. { $value } queda fuera.
error-dial-unknown = No hay ningún mando «{ $dial }».
error-dial-unknown-nearest = No hay ningún mando «{ $dial }». ¿Quiso decir «{ $nearest }»?
error-dial-list = Los mandos son: { $dials }.
error-dial-hidden = Este lugar no tiene el mando «{ $dial }».
error-dial-not-a-number = «{ $value }» no es un número para el mando «{ $dial }». Escríbalo así: { $example }.
error-dial-twice = El mando «{ $dial }» aparece dos veces. Póngalo una sola vez.
value-set = MANDO=VALOR
help-tell-more =
    Mandos (si un valor se sale, se le dice hasta dónde llega en ese lugar):
      warming               más calor, en grados Celsius
      winter_precipitation  lluvia y nieve de invierno, por ciento más o menos
      summer_precipitation  lluvia de verano, por ciento más o menos
      diversion             agua que piden los canales, por ciento más o menos
      canal_lining          parte de la pérdida que se evita, por ciento
      crop_mix              parte de la tierra que cambia de cultivo, por ciento
      river_minimum         agua mínima en el río, por ciento más o menos
      reservoir_size        tamaño del lago, por ciento más o menos
      starting_storage      agua al empezar el año, por ciento de lo que cabe
      town_growth           crecimiento del pueblo, por ciento más

    Ejemplo: deshielo tell demo --set warming=2 --years dry
error-dial-lacking = Aquí el mando «{ $dial }» no tiene sobre qué actuar: { $reason }.
place-lacks-nothing = este lugar lo esconde
