# What the pages of the instrument say. Answers first: one sentence for the change, one for what was before.

view-valley = valley
view-season = season
view-canals = canals
view-ledger = ledger
view-years = many years
view-grid = what if
view-trust = trust
view-lesson = lesson
view-about = about

answer-nothing-yet = Nothing has changed yet. Turn one dial to begin.
answer-lacking-more = { $canal } lacks water on { $n ->
    [one] { $n } more day
   *[other] { $n } more days
}. Before: { $before ->
    [one] { $before } day
   *[other] { $before } days
}.
answer-lacking-fewer = { $canal } lacks water on { $n ->
    [one] { $n } fewer day
   *[other] { $n } fewer days
}. Before: { $before ->
    [one] { $before } day
   *[other] { $before } days
}.
answer-supply = Canals get { $now } of the water they ask for. Before: { $before }.
answer-same-days = The same days as before, for the canals and the snow.

answer-snow-sooner = The snow is gone { $n ->
    [one] { $n } day
   *[other] { $n } days
} sooner: its last day is { $date }. Before: { $before }.
answer-snow-later = The snow is gone { $n ->
    [one] { $n } day
   *[other] { $n } days
} later: its last day is { $date }. Before: { $before }.

answer-half-sooner = Half of the year’s water is past { $n ->
    [one] { $n } day
   *[other] { $n } days
} sooner: { $date }. Before: { $before }.
answer-half-later = Half of the year’s water is past { $n ->
    [one] { $n } day
   *[other] { $n } days
} later: { $date }. Before: { $before }.
answer-half-same = Half of the year’s water is past on the same day as before: { $date }.
answer-half-told = Half of the year’s water is past by { $date }.
answer-half-between = Half of the year’s water is past { $range }.
answer-half-gained = Now the river brings water: half of it is past by { $date }. Before: none.
answer-half-lost = Now the river brings no water. Before, half of it was past by { $before }.
answer-half-never = The river brings no water in this year.

answer-last-full-sooner = { $canal } has its last full day { $n ->
    [one] { $n } day
   *[other] { $n } days
} sooner: { $date }. Before: { $before }.
answer-last-full-later = { $canal } has its last full day { $n ->
    [one] { $n } day
   *[other] { $n } days
} later: { $date }. Before: { $before }.
answer-last-full-between = { $canal } has its last full day { $range }.
answer-last-full-gained = { $canal } now has full days, the last on { $date }. Before: none.
answer-last-full-lost = { $canal } has no full day now. Before, the last one was { $before }.
answer-same-last-full-days = Every canal has the same last full day as before.
answer-first-short-told = { $canal } is the first to lack water, from { $date } on.
answer-all-full = In this year every canal gets all its water.
answer-nobody-asks = In this year no canal asks for water.
answer-no-canals = This place has no canals.

picture-invented = invented valley
picture-not-fitted = not fitted yet
picture-year-dry = { $year }, a dry year
picture-year-middling = { $year }, a middling year
picture-year-wet = { $year }, a wet year
picture-year-any = water year { $year }
picture-carried-over = not set

picture-snow = Snow { $amount }
picture-was = was { $value }
picture-snow-line = snow line { $height }
picture-no-snow = bare mountain
picture-minimum = minimum { $amount }
picture-oldest-first = oldest right first
picture-since = since { $year }
picture-canal-count = { $n ->
    [one] { $n } canal
   *[other] { $n } canals
}
picture-no-demand = not asking
picture-no-full-day = no full day
picture-names-elsewhere = A larger screen names all { $n }.
picture-same-day = same day
picture-as-it-was = as it was
picture-with-changes = with your changes
picture-beside = kept beside
picture-was-full = was full
picture-canals = Canals
