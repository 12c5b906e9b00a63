# Coma para los decimales.

number-decimal-mark = ,
