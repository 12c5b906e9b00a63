# Cómo se escriben los números. El hueco delgado (U+202F) no se parte al final del renglón.

number-decimal-mark = .
number-thousands-mark = { "\u202F" }
# Cuántas cifras enteras hacen falta para agruparlas.
number-thousands-from = 5
number-missing = –
number-percent = { $n }{ "\u202F" }%
number-between = entre { $a } y { $b }
