# How numbers are written. A third language states its own marks here.

number-decimal-mark = .
number-thousands-mark = ,
# The fewest digits of the whole part that are grouped.
number-thousands-from = 4
number-missing = –
number-percent = { $n }%
number-between = between { $a } and { $b }
