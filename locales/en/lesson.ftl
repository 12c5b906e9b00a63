# What a person reads around the steps of a lesson, and the signs that only lessons read.

lesson-step = Step { $step } of { $steps }
lesson-guess-first = Guess first.
lesson-group = Group { $group }
lesson-needs-guess = No guess is in yet. Turn and press.
lesson-closed = The result is out. Guesses are closed.
lesson-skipped = You went on without a guess.
lesson-over = The lesson is over. Thank you.
lesson-result = The model says
lesson-usual = Many people say
lesson-word = Your word:
lesson-word-wrong = This word does not fit here. Read it again.

## Signs that lessons read

lesson-natural-inflow-hm3 = Water the river brought
    .short = River water
    .plain = All the water that came down the river in the year.
lesson-return-flow-hm3 = Return flow
    .short = Return flow
    .plain = Water that went back to the river from canals, fields and the town.
lesson-conveyance-loss-hm3 = Lost along the canals
    .short = Canal loss
    .plain = Water that entered the canals and did not reach the fields.
lesson-canals-hm3 = Water into the canals
    .short = Into canals
    .plain = All the water that entered at the head gates in the year.
lesson-minimum-release-hm3 = Let go for the river
    .short = For the river
    .plain = Stored water let go so that the river keeps the least it must have.
lesson-river-out-hm3 = Water that leaves the valley
    .short = Leaves valley
    .plain = Water that the river carries out at the end of the valley.
lesson-years-enough = Years with enough water
    .short = Enough years
    .plain = In how many years of the record the water was enough.
lesson-years-filled = Years in which the reservoir fills
    .short = Years filled
    .plain = In how many years of the record the reservoir got full.
lesson-first-short-canal = First canal to run short
    .short = First short
    .plain = The canal that is the first not to get all its water. They are counted from the oldest right.
lesson-least-supplied-canal = Canal with the least
    .short = Gets least
    .plain = The canal that gets the smallest part of what it asked for. They are counted from the oldest right.

## Checking a lesson

lesson-check-no-place = { $path }: the lesson was not tried, since the place { $place } has mistakes. Check the place first.
