# Headings and sentences of `tell`.

tell-title = { $place }: { $years }
tell-invented = This valley is invented. It is here to learn with.
tell-dials = With these changes:
tell-dial-line = { $dial }: { $value }
tell-dials-at-rest = Every dial is at rest: nothing has changed yet.
tell-setting = Setting: { $name }

tell-years-all = all { $n } water years, { $first } to { $last }
tell-years-dry = { $n ->
    [one] the driest of { $of } water years
   *[other] the { $n } driest of { $of } water years
}
tell-years-middling = { $n ->
    [one] the middling one of { $of } water years
   *[other] the { $n } middling ones of { $of } water years
}
tell-years-wet = { $n ->
    [one] the wettest of { $of } water years
   *[other] the { $n } wettest of { $of } water years
}
tell-year-one = water year { $year }
tell-years-between = water years { $first } to { $last }
tell-over-one-year = Water year { $year }
tell-mean-of-years = Mean of { $n } years

tell-as-it-was = As it was
tell-with-your-changes = With your changes
tell-change = Change
tell-no-change = no change
tell-never = never
tell-name-and-unit = { $name }, { $unit }
tell-years-of = { $k } of { $n }
tell-years-fewer = { $n ->
    [one] { $n } year fewer
   *[other] { $n } years fewer
}
tell-years-more = { $n ->
    [one] { $n } year more
   *[other] { $n } years more
}
tell-days-fewer = { $n ->
    [one] { $n } day fewer
   *[other] { $n } days fewer
}
tell-days-more = { $n ->
    [one] { $n } day more
   *[other] { $n } days more
}
# Parts of a hundred.
tell-points-less = { $n ->
    [one] { $n } point less
   *[other] { $n } points less
}
tell-points-more = { $n ->
    [one] { $n } point more
   *[other] { $n } points more
}
tell-reservoir-fills = Years in which the reservoir fills

tell-canals-downstream = Canals, going downstream
tell-canals-by-right = Canals, oldest right first
tell-canal-with-changes = with changes
tell-canal-since = Right since
tell-canal-share = Share met
tell-canal-enough = Enough in years
tell-canal-full = Full days
tell-canal-short = Short days
tell-canal-cut = Cut days
tell-canal-last-full = Last full day
tell-canal-last-water = Last water
tell-canal-before-all = first
tell-right-before-all = before all others
tell-enough = A year is enough when at least { $share } of the water asked for arrives. Short: some of it came that day. Cut: none, or almost none.
tell-ledger-closes = The ledger closes: { $residual } of { $throughput } is not accounted for.
tell-less-than-a-liter = less than a liter

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
tell-crops-none = No crops grow here.
tell-place-notes = { $n ->
    [one] { $n } note on this place. To see it: deshielo check { $path }
   *[other] { $n } notes on this place. To see them: deshielo check { $path }
}
tell-how-to-go-on =
    Try: deshielo tell demo --set warming=2
    Help: deshielo --help

tell-rounded = Each number is rounded on its own, so a change can look off by one.
tell-fill-dates = Fill dates are the mean of the years in which the reservoir fills; the change is that of the years that fill both ways.
tell-storms-kept = The dials keep the order of storms, the wet days and the crop calendar.

## Crops

crop-column-name = Crop
crop-column-coefficients = Coefficients: start / middle / end
crop-column-stages = Days of the four stages
crop-column-roots = Roots
crop-column-depletion = Easy water
crop-column-yield = Yield factor
crop-and-source = { $crop }: { $source }.
crop-source-coefficients = coefficients FAO-56 (1998) table 12{ $memory }
crop-source-stages = stages FAO-56 table 11{ $memory }
crop-source-stages-ours = stages chosen for this program, no source
crop-source-roots = roots and easy water FAO-56 table 22{ $memory }
crop-source-yield = yield factor FAO-33 (1979){ $memory }
crop-source-memory = { " " }(from memory)
crop-source-place = all numbers from the place itself
crop-source-none = no season, no water asked for; no source
