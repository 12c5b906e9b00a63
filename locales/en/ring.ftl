# The ring that one knob and one button reach, the list of settings, and what a finger does.

## Things on the ring

ring-view = View
ring-year = Year
ring-day = Day
ring-play = Play the year
ring-keep = Keep beside
ring-settings = Settings
ring-undo = Undo
ring-words = Words
ring-language = Language
ring-units = Units
ring-shade = Colors
ring-help = Help

## How they stand

ring-paused = paused
ring-slow = slowly
ring-middling = steadily
ring-fast = fast
ring-kept = one is kept
ring-nothing-kept = nothing kept
ring-setting-count = { $n } to choose from
ring-undo-turn = the turn of { $dial }
ring-undo-reset = setting it all back
ring-undo-recall = the setting
ring-nothing-to-undo = nothing to undo
ring-word-count = { $n } explained
ring-metric = metric
ring-us = United States
ring-light = light
ring-dark = dark
ring-sunlight = for the sun
ring-help-told = how this works

## What is said at the foot

ring-hint-on-ring = Turn: go on. Press: take it.
ring-hint-acts = Turn: go on. Press: do it.
ring-hint-in = Turn: change it. Press: all things.
ring-working = Working out the new answer …
ring-end-lowest = It goes no lower here.
ring-end-highest = It goes no higher here.
ring-end-first = This is the first one.
ring-end-last = This is the last one.
ring-done-kept = Kept beside: the round dots.
ring-done-let-go = No longer kept beside.
ring-done-undone = Taken back.
ring-done-again = Done again.
ring-done-nothing = There is nothing to undo.
ring-done-reset = All as it was. Undo brings it back.
ring-done-saved = Saved as yours, number { $n }.
ring-done-forgot = The last of yours is gone.

## The list of settings

setting-title = Settings
setting-hint = Turn: choose. Press: take it.
setting-back = Back
setting-own = Yours, number { $n }
setting-save = Save what is dialed now
setting-forget = Forget the last of yours

## A finger or a mouse

help-touch = Finger or mouse
help-touch-dial = Tap a dial to take it. Slide along it to turn it.
help-touch-day = Tap a day of the year, or a year. Tap the date to play.
help-touch-view = Tap the left or right edge for another view.
help-touch-ring = Tap the small knob at the foot for all the rest.
help-touch-wheel = The mouse wheel is the knob. The right button presses.
