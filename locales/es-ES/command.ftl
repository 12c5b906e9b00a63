# Palabras de España. Las revisa una persona de allá antes de imprimir.

help-about = Gire un mando y vea qué le hace un año más cálido, más seco o con más sed a la nieve, el embalse y los canales de un valle.
help-set = Un mando y cuánto girarlo, por ejemplo warming=2. Se puede repetir.
help-setting = Un archivo con una combinación de mandos y años.
error-dial-out-of-range = El mando «{ $dial }» va de { $low } a { $high }. { $value } queda fuera.
error-dial-step = El mando «{ $dial }» se mueve de { $step } en { $step }. { $value } queda entre dos pasos.
error-dial-unknown = No hay ningún mando «{ $dial }».
error-dial-unknown-nearest = No hay ningún mando «{ $dial }». ¿Quiso decir «{ $nearest }»?
error-dial-list = Los mandos son: { $dials }.
error-dial-hidden = Este lugar no tiene el mando «{ $dial }».
error-dial-not-a-number = «{ $value }» no es un número para el mando «{ $dial }». Escríbalo así: { $example }.
error-dial-twice = El mando «{ $dial }» aparece dos veces. Póngalo una sola vez.
