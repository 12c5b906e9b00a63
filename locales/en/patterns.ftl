# Changes, doubt and shares in plain words. Size, unit and direction first; the earlier value follows in its own sentence.

days-sooner = { $n ->
    [one] { $n } day sooner
   *[other] { $n } days sooner
}
days-later = { $n ->
    [one] { $n } day later
   *[other] { $n } days later
}
days-same = Same day as before.
days-range-sooner = between { $a } and { $b } days sooner
days-range-later = between { $a } and { $b } days later
days-range-across = from { $a ->
    [one] { $a } day
   *[other] { $a } days
} sooner to { $b ->
    [one] { $b } day
   *[other] { $b } days
} later
days-count = { $n ->
    [one] { $n } day
   *[other] { $n } days
}
years-count = { $n ->
    [one] { $n } year
   *[other] { $n } years
}

amount-less = { $amount } less
amount-more = { $amount } more
change-none = No change.
change-unclear = No clear change. The band includes zero.
percent-range-less = between { $a } and { $b } less
percent-range-more = between { $a } and { $b } more
percent-range-across = from { $a } less to { $b } more
before = Before: { $value }.

years-of-ten = { $k } of 10 years
shortage-none = All the water asked for arrives.
shortage-under-one = Less than 1 of each 100 parts does not arrive.
shortage-parts = { $n ->
    [one] { $n } of each 100 parts does not arrive
   *[other] { $n } of each 100 parts do not arrive
}
shortage-shared = There is less water to share.
shortage-by-priority = The newer rights wait.

model-calm = This is a model. It shows what could change.
model-weak = The model often misses here. Use it to ask, not to decide.
model-strong = In the test years it came close. It can still miss.
model-outside = Outside the tested years. Trust it less here.
