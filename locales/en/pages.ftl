# The ledger, all the years, trust, about, and the cards that lie over a page.

## Ledger

page-ledger-parts = For each 100 parts of rain and snow, the river brings { $n }.
page-ledger-parts-changed = For each 100 parts of rain and snow, the river brings { $n }. Before: { $before }.
page-ledger-nothing-fell = No rain and no snow falls in this year.
page-no-year = The record has no whole water year.
page-ledger-in = Water in: { $amount }
page-ledger-residual = Not accounted for: { $amount }
page-now = now
page-was = was
page-from-reservoir = From reservoir
page-into-reservoir = Into reservoir
page-from-ground = From ground
page-into-ground = Into ground
page-all-else = All else

## Many years

page-years-enough = Enough water in { $years } of { $of } years.
page-years-enough-same = Enough water in { $years } of { $of } years, the same as before.
page-years-enough-changed = Enough water in { $years } of { $of } years. Before: { $was-years }.
page-years-enough-changed-of = Enough water in { $years } of { $of } years. Before: { $was-years } of { $was-of }.
page-years-nobody-asks = In all these years no canal asks for water.
page-years-snow = In a mean year the snow holds { $now } at its peak.
page-years-snow-changed = In a mean year the snow holds { $now } at its peak. Before: { $before }.
page-years-flow = In a mean year the river brings { $now }.
page-years-flow-changed = In a mean year the river brings { $now }. Before: { $before }.
page-years-line = enough: { $share }
page-years-was-enough = enough
page-years-was-short = not enough
page-dry = dry
page-middling = middling
page-wet = wet

## Trust

page-yes = Yes
page-partly = In part
page-no = No
page-trust-invented = This valley is invented. There is no gauge to check it by.
page-trust-not-fitted = This place is not fitted to a river gauge yet.
page-trust-untested = It is fitted, but not yet tested on years it had not seen.
page-trust-weaker = In the test years it missed more. Trust the direction, not the size.
page-trust-direction = Which way it changes
    .plain = Snow, soil and water follow known rules. Use it to ask and to compare.
page-trust-size = By how much
    .plain = Only roughly. Nobody has checked it against measured flow.
page-trust-exact = The exact day or amount
    .plain = Not without a gauge and test years. Even then it can miss.
page-trust-fitted-to = Fitted to the gauge in { $first } to { $last }.
page-trust-too-little = On average it gives { $percent } too little water.
page-trust-too-much = On average it gives { $percent } too much water.
page-trust-even = On average it gives the right amount of water.
page-trust-earlier = { $n ->
    [one] { $n } earlier year
   *[other] { $n } earlier years
}
page-trust-later = { $n ->
    [one] { $n } later year
   *[other] { $n } later years
}
page-trust-colder = { $n ->
    [one] { $n } colder year
   *[other] { $n } colder years
}
page-trust-warmer = { $n ->
    [one] { $n } warmer year
   *[other] { $n } warmer years
}
page-trust-holds = close
page-trust-weakens = weaker
page-trust-fails = fails
page-trust-model = the model, on years it never saw
page-trust-guess = saying “same as usual”
page-trust-perfect = no error

## About

page-sheet = { $n } of { $of }
page-about-record = The record
page-about-years = { $n ->
    [one] { $n } water year, { $first }
   *[other] { $n } water years, { $first } to { $last }
}. All of it is run at every turn.
page-about-no-gaps = No value was missing.
page-about-dials = What the dials keep
page-about-delta = Only warmth and amounts change.
page-about-air = Water to the air
page-about-sharing = Who gets it
page-about-origin = Where it comes from

## Cards

page-card-turn = Turn: next. Press: close.
page-card-press = Press: close.
page-term-in-full = The trade says: { $name }.
page-dial-now = Now: { $value }
page-dial-range = From { $low } to { $high }

## Help

help-title = One knob, one button
help-keys = Keys
help-cautions = Cautions
help-turn = Turn
    .plain = Changes what you have in hand: at first, a dial.
help-press = Press
    .plain = Shows the ring of all things: dials, views, years and more. Turn to one, then press to take it.
help-hold = Hold
    .plain = Sets every dial back as it was.

key-turn = turn
key-turn-far = turn far
key-dial = next dial
key-dial-to-rest = this dial as it was
key-press = press the button
key-close = close, go back
key-view = next view
key-view-number = a view by its number
key-play = play or pause the year
key-day = a day back or on
key-week = a week back or on
key-year = a year back or on
key-third = dry, middling, wet year
key-keep = keep beside, or let go
key-settings = settings
key-undo = undo, or do again
key-reset = everything as it was
key-language = next language
key-units = other units
key-shade = other colors
key-words = explain the words
key-help = help

key-name-up = ↑
key-name-down = ↓
key-name-left = ←
key-name-right = →
key-name-page-up = PgUp
key-name-page-down = PgDn
key-name-home = Home
key-name-enter = Enter
key-name-escape = Esc
key-name-tab = Tab
key-name-back-tab = Shift+Tab
key-name-space = Space
