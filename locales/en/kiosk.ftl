# The unattended instrument: what it says by itself, the staff menu, what is kept, and the count of use.

help-kiosk = For a screen that nobody watches over: shows by itself what it can do, and begins anew for everyone.
help-keep = The folder where settings, guesses and the count of use are kept.
help-set-pin = Asks for the PIN of the staff menu, keeps it, and does nothing else.
help-tally = Tells how often a screen with --kiosk was used. It never knows by whom.
help-usage-tally = [OPTIONS]
help-tally-from = The first day, for example 2026-05-01.
help-tally-to = The last day.
help-tally-form = How to write the count: table or csv.
value-date = DATE

## What the stroll says

stroll-hello = This is a mountain valley and its water. What would a warmer year do to it?
stroll-year = Watch one year go by: snow falls, snow melts, fields drink.
stroll-season = In winter the mountain keeps water as snow. In spring it lets it go.
stroll-warmer = What if every day were warmer?
stroll-canals = Which canal would run short, and when?
stroll-dry = And how would that be in a dry year?
stroll-lining = What if the canals let less water seep away?
stroll-years = One year is only one. How do all the years go?
stroll-trust = How far can you believe this? Here is what was tested.
stroll-caution = This helps you learn. It does not forecast.
stroll-take-over = Turn the knob: it is yours.
stroll-message-of-day = Today
kiosk-anyone-there = Is anyone there? Turn the knob to go on.

## The staff menu

staff-title = For the staff
staff-pin-title = Staff: PIN
staff-health-title = How the board is
staff-tally-title = How it was used
staff-no-pin =
    No PIN has been set, so this menu stays closed.
    Set one on this board with: deshielo show --set-pin
staff-wait = Too many wrong PINs. Try again in { $time }.
staff-pin-wrong = That was not the PIN.
staff-pin-done = Done
staff-pin-back = Back
staff-foot-pin = Turn: digit. Press: take it. Hold: back.
staff-foot-menu = Turn: choose. Press: change. Hold: leave.
staff-foot-value = Turn: change. Press: done.
staff-foot-page = Press: back.
staff-yes = yes
staff-no = no
staff-close = Back to the visitors
staff-health = How the board is
staff-tally = How it was used
staff-message = Show the message of the day
staff-night = Sleep at night
staff-night-from = Night begins
staff-night-until = Night ends
staff-light = Light of the screen
staff-low-power = Save power
staff-clock = The clock is right
staff-forget-guesses = Forget the lesson’s guesses
staff-start-again = Forget where visitors were
staff-end = End the program

staff-power = Power
    .fine = enough
    .low = too little now
    .was-low = was too little
    .unknown = the board does not tell
staff-card = Memory card
    .fine = keeps everything
    .full = is full
    .read-only = cannot be written
    .other = does not keep
    .damaged = a damaged file was set aside
staff-wall-clock = Clock
    .missing = none
    .year = wrong year
    .no-source = no battery clock
    .unsteady = not steady yet
staff-running = Running for
staff-version = Version
staff-uses-today = Visits today
staff-uses-week = Visits in 7 days
staff-uses-month = Visits in 30 days
staff-uses-all = Visits in all
staff-uses-minutes = Minutes in all
staff-most-view = Most opened
staff-most-dial = Most turned

## What is said once in the log

keep-settings = the settings
keep-guesses = the guesses
keep-tally = the count of use
keep-damaged-afresh = Damaged: { $what }. The file is set aside, and begins afresh.
keep-damaged-last = Damaged: { $what }. The file is set aside, and the last good copy is used.
keep-newer = Written by a newer program: { $what }. The file is set aside.
keep-unreadable = Cannot be read: { $what }. The system says: { $reason }
keep-cannot = Cannot be kept now: { $what }. The system says: { $reason }
keep-again = Can be kept again: { $what }.
keep-message-bad = Some lines of message.toml cannot be used.
keep-no-folder = There is no folder to keep anything in. Name one with --keep.
kiosk-power-low = The board gets too little power.
kiosk-power-fine = The board gets enough power again.
kiosk-pin-ask = New PIN, { $least } to { $most } digits:
kiosk-pin-bad = A PIN has { $least } to { $most } digits and nothing else.
kiosk-pin-kept = The PIN is kept.
kiosk-pin-no-chance = This system gives no random numbers, so no PIN can be kept.

## The count of use

tally-nothing = Nothing was counted.
tally-span = From { $from } to { $to }
tally-span-all = All that was counted
tally-visits = Visits
tally-minutes = Minutes
tally-day = Day
tally-views = Views, by visits that opened them
tally-dials = Dials, by visits that turned them
tally-languages = Languages, by visits that saw them
tally-lessons = Lessons, by visits that began them
tally-others = others
tally-undated = Without a day, since the clock was not right
tally-earlier = Before those days
tally-no-names = Only use is counted. Nothing tells who was there.
tally-date-wrong = “{ $text }” is not a day. Write it like this: 2026-05-01.
tally-dates-backward = The first day comes after the last one.
