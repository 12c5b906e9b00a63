# The pages of a lesson that is led: what the knob does, what a group guessed, and the notes beside it.

lesson-list = Lessons
lesson-minutes = About { $n } minutes
lesson-groups = { $n ->
    [one] { $n } group will guess
   *[other] { $n } groups will guess
}
lesson-for-leader = For whoever leads
lesson-may-turn = Then it is your turn: { $dials }
lesson-nothing = It does not happen.

## What can be done

lesson-do-on = Go on
lesson-do-show = Show the result
lesson-do-skip = Go on without a guess
lesson-do-guess = Keep guessing
lesson-do-group = Another group
lesson-do-word = Type a word
lesson-do-back = Back
lesson-do-more = More
lesson-do-again = Next group
lesson-do-leave = End the lesson

lesson-hint-list = Turn: choose. Press: open.
lesson-hint-start = Turn: how many groups. Press: begin. Hold: back to the list.
lesson-hint-on = Press: do it. Turn: something else. Hold: begin again.
lesson-hint-guess = Turn: your guess. Press: it is in. Hold: more.
lesson-hint-choose = Press: do it. Turn: something else.
lesson-hint-word = Turn: a letter. Press: take it. Hold: leave.

## Notes

lesson-in = Group { $group } is in.
lesson-in-word = Group { $group } is in. Its word: { $word }
lesson-letter-wrong = No word has this letter here.
lesson-cleared = All guesses are cleared. Z brings them back.
lesson-not-here = This lesson does not fit this place.
lesson-word-ask = Type the word that another board shows. Letter by letter.

## What is guessed

lesson-of-canal = { $canal }: { $sign }
lesson-axis = { $what }, { $unit }
lesson-axis-change = { $what }: change, { $unit }
lesson-axis-change-only = { $what }: change
lesson-unit-parts = of each 100 parts
lesson-unit-days = days
lesson-unit-years = years
lesson-days-fewer = { $n ->
    [one] { $n } day fewer
   *[other] { $n } days fewer
}
lesson-days-more = { $n ->
    [one] { $n } day more
   *[other] { $n } days more
}
lesson-years-fewer = { $n ->
    [one] { $n } year fewer
   *[other] { $n } years fewer
}
lesson-years-more = { $n ->
    [one] { $n } year more
   *[other] { $n } years more
}
lesson-parts = { $n } of 100 parts
lesson-parts-fewer = { $n } of 100 parts less
lesson-parts-more = { $n } of 100 parts more

## The guesses and the result

lesson-usual-value = Many people say: { $value }
lesson-verdict = You said from { $least } to { $most }. { $n ->
    [0] Nobody was close.
    [one] { $n } group was close.
   *[other] { $n } groups were close.
}
lesson-verdict-one = You said { $guess }.
lesson-verdict-one-near = You said { $guess }. That is close.
lesson-verdict-right = { $n ->
    [0] Nobody named this canal.
    [one] { $n } of { $of } groups named this canal.
   *[other] { $n } of { $of } groups named this canal.
}

## The command line

value-lesson = FILE|NAME
help-lesson = A lesson file, or the name of a built-in one such as line_the_canal.
help-groups = How many groups guess, 1 to 12.
error-lesson-unknown = There is no lesson “{ $lesson }”. There are: { $lessons }; or give a file.
error-lesson-unknown-nearest = There is no lesson “{ $lesson }”. Did you mean “{ $nearest }”?
error-lesson-has-problems = The lesson { $path } has mistakes on this place, so it cannot be led.
