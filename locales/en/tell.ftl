# Headings and sentences of `tell`.

tell-title = { $place }: { $years }
tell-invented = This valley is invented. It is here to learn with.
tell-place = Place
tell-dials = Dials
tell-dial-line = { $dial }: { $value }
tell-dials-at-rest = Every dial is at rest: nothing has changed yet.
tell-setting = Setting: { $name }

tell-years-all = all { $n } years, { $first } to { $last }
tell-years-dry = dry years
tell-years-middling = middling years
tell-years-wet = wet years
tell-year-one = water year { $year }
tell-years-between = water years { $first } to { $last }
tell-per-year = Year by year
tell-all-years = All years
tell-water-year = Water year
tell-day = Day
tell-mean = Mean
tell-lowest = Lowest
tell-highest = Highest
tell-mean-of-years = Mean of { $n } years

tell-sign = What is counted
tell-as-it-was = As it was
tell-with-your-changes = With your changes
tell-change = Change
tell-no-change = no change
tell-no-clear-change = no clear change
tell-never = never
tell-never-in-years = { $n ->
    [one] not in { $n } year
   *[other] not in { $n } years
}
tell-what-changed = What changed
tell-nothing-changed = Nothing that is counted here has changed.

tell-canals = Canals
tell-canals-by-right = Canals, oldest right first
tell-right-before-all = before all others
tell-enough = A year is enough when at least { $share } of the water asked for arrives.
tell-ledger = Ledger
tell-ledger-closes = The ledger closes: { $residual } of { $throughput } is not accounted for.

tell-method = Reference evaporation: { $method }
tell-method-penman-monteith = Penman–Monteith (FAO-56)
tell-method-hargreaves-samani = Hargreaves–Samani (1985)
tell-method-oudin = Oudin and others (2005)
tell-method-given = a column of the record
tell-method-per-degree = With { $degree } of warming, crops can lose about { $percent } more water to the air.
tell-rule = How water is shared: { $rule }
tell-rule-seniority = by the date of the right
tell-rule-proportional = the same share for everyone
tell-rule-rotation = by turns
tell-gaps = { $n ->
    [one] { $n } missing value in the record was filled by rule.
   *[other] { $n } missing values in the record were filled by rule.
}
tell-crops = Crops
tell-crop-source = Source: { $source }
tell-from-memory = from memory

tell-storms-kept = The dials keep the order of storms, the wet days and the crop calendar.
