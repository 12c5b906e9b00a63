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
lesson-unchanged = This is the year as it was. Nothing has changed.

## What can be done

lesson-do-on = Go on
lesson-do-show = Show the result
lesson-do-skip = Go on without a guess
lesson-do-guess = Keep guessing
lesson-do-group = Another group
lesson-do-word = Type a word
lesson-do-back = Back
lesson-do-more = More
lesson-do-again = Begin again
lesson-do-leave = End the lesson

lesson-hint-list = Turn to a lesson. Press to open it. Hold for more.
    .short = Turn, press to open. Hold: more.
lesson-hint-start = Turn to the number of groups. Press to begin. Hold for the list.
    .short = Turn: groups. Press: begin. Hold: list.
lesson-hint-on = Press takes it. Turn for other things. Hold to start over.
    .short = Press: take it. Turn: more. Hold: restart.
lesson-hint-look = Press: go on
lesson-hint-guess = Turn to your guess. Press to put it in. Hold for more.
    .short = Turn: guess. Press: it is in. Hold: more.
lesson-hint-choose = Press takes it. Turn for other things.
    .short = Press: take it. Turn: more.
lesson-hint-word = Turn to a letter. Press to take it. Hold to leave.
    .short = Turn: letter. Press: take it. Hold: leave.

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
lesson-unit-rights = 1 is the oldest right
lesson-no-change = no change
lesson-same-day = the same day
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
lesson-verdict = You said from { $least } to { $most }.
lesson-none-near = Nobody was close.
lesson-near = { $n ->
    [one] { $n } group was close.
   *[other] { $n } groups were close.
}
lesson-verdict-one = You said { $guess }.
lesson-verdict-one-near = You said { $guess }. That is close.
lesson-none-right = Nobody named this canal.
lesson-right = { $n ->
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

## Rehearsing

help-rehearse = Plays a lesson, or a script of events, and writes every page as a picture.
help-usage-rehearse = [PLACE] --lesson FILE|NAME --into FOLDER [OPTIONS]
help-steps = A script: one event a line.
help-rehearse-into = The folder for the pictures. It appears when all are in it.
help-rehearse-more =
    A script has one event a line; what follows a # is a remark:
      turn 3            the knob, so many steps; -3 the other way
      press             the button
      hold              the button, held
      key L             a key: a letter, or Up, Down, Left, Right, PageUp,
                        PageDown, Home, Enter, Escape, Tab, Space
      dial warming 2    the knob of one dial
      wait 500          milliseconds go by
      picture NAME      a picture is made; without any such line,
                        one is made after every event

    With --lesson and --steps together the script plays the lesson.
    Example: deshielo rehearse --lesson line_the_canal --into pages
rehearse-what = Say what to rehearse: --lesson or --steps.
rehearse-into = Say where the pictures go: --into FOLDER.
rehearse-too-many = This would be more than { $most } pictures.
rehearse-not-ours = { $path } holds something that no rehearsal made: { $file }. Choose another folder.
rehearse-bad-verb = “{ $text }” is no event.
rehearse-bad-line = “{ $text }” has a word too many or too few.
rehearse-bad-number = “{ $text }” needs a whole number.
rehearse-bad-key = “{ $text }” names no key.
rehearse-bad-dial = “{ $text }” names no dial.
rehearse-bad-name = “{ $text }”: a picture’s name has only letters, figures and hyphens, at most 40.
rehearse-lines = Events are: turn 3, press, hold, key L, dial warming 2, wait 500, picture NAME.
