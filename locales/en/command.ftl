# The command line: help texts and what can go wrong.

## Help

help-about = Turn a dial and see what a warmer, drier or thirstier year does to a valley's snow, reservoir and canals.
help-usage = Usage
help-commands = Commands
help-arguments = Arguments
help-options = Options
help-default = default: { $value }
help-tell = Says in numbers what a run gives, as it was and with your changes.
help-check = Checks places, settings, lessons and board files, with every mistake at its line.
help-weather = Makes a long weather record, or makes a short one longer.
help-help = Shows this help.
help-version = Shows the version.

help-place = A folder that describes a valley, or “demo” for the invented one.
help-set = Turns a dial, for example warming=2. Can be given more than once. A value between two steps is fine.
help-setting = A file with dials and years, or the name of a built-in one.
help-years = Which years to show: all, dry, middling, wet, one year, or a range such as 1990..1999.
help-daily = Every day, not only the years; with --form csv or --form json.
help-form = How to write the answer: table, csv or json.
help-units = Units for people: metric or us. JSON and CSV are always metric.
help-lang = Language: en, es, or a full tag such as es-MX.
help-locales = A folder with more languages.
help-out = Writes to this file and not to the screen.
help-paths = What to check: place folders, setting files, lesson files or board files.
help-seed = The number that the random weather starts from. The same number gives the same weather.
help-length = How many years to make.
help-from = The first water year to make, four digits.

## Dials and settings

error-dial-out-of-range = The dial “{ $dial }” goes from { $low } to { $high }. { $value } is outside.
error-dial-unknown = There is no dial “{ $dial }”.
error-dial-unknown-nearest = There is no dial “{ $dial }”. Did you mean “{ $nearest }”?
error-dial-list = The dials are: { $dials }.
error-dial-hidden = This place does not have the dial “{ $dial }”.
error-dial-not-a-number = “{ $value }” is not a number for the dial “{ $dial }”. Write it like this: { $example }.
error-dial-no-equals = “{ $text }” does not say how far to turn. Write it like this: { $example }.
error-dial-twice = The dial “{ $dial }” is set twice. Set it once.
error-setting-unknown = There is no setting “{ $setting }”. There are: { $settings }; or give a file.
error-setting-unknown-nearest = There is no setting “{ $setting }”. Did you mean “{ $nearest }”?
error-years-unreadable = “{ $text }” does not name years. Write all, dry, middling, wet, a year, or a range such as 1990..1999.
error-years-outside = The record has the water years { $first } to { $last }. { $asked } is not there.
error-years-backward = The range { $text } runs backward. Put the earlier year first.
error-choice-unknown = “{ $value }” is not a choice for { $option }. The choices are: { $choices }.
error-choice-unknown-nearest = “{ $value }” is not a choice for { $option }. Did you mean “{ $nearest }”?

## Options

error-command-unknown = There is no command “{ $command }”.
error-command-unknown-nearest = There is no command “{ $command }”. Did you mean “{ $nearest }”?
error-option-unknown = There is no option { $option }.
error-option-unknown-nearest = There is no option { $option }. Did you mean { $nearest }?
error-option-no-value = The option { $option } needs a value.
error-option-twice = The option { $option } is given twice. Give it once.
error-option-number = The option { $option } needs a whole number from { $low } to { $high }.
error-argument-extra = “{ $text }” is one thing too many.
error-argument-missing = Something is missing: { $name }.
error-see-help = For help: { $command }

## Files

error-place-not-found = There is no place at { $path }. Give a folder with a place.toml in it, or “demo”.
error-file-not-found = There is no file { $path }.
error-file-unreadable = The file { $path } cannot be read: { $reason }
error-file-unwritable = The file { $path } cannot be written: { $reason }
error-file-nothing-changed = Nothing was written; what was there before is as it was.
error-disk-full = There is no room left on the disk for { $path }.
error-output = The answer cannot be written: { $reason }
error-place-has-problems = The place { $path } has mistakes, so it cannot be run.
error-warning = Note
error-error = Mistake

## check

check-fine = { $path }: no mistakes.
check-found = { $n ->
    [one] { $path }: { $n } mistake.
   *[other] { $path }: { $n } mistakes.
}
check-notes = { $n ->
    [one] { $path }: { $n } note.
   *[other] { $path }: { $n } notes.
}
check-not-known = { $path } is not a place, a setting, a lesson or a board file, so there is nothing to check.

## weather

weather-made = { $n ->
    [one] { $n } year of weather is in { $path }.
   *[other] { $n } years of weather are in { $path }.
}
weather-invented = This weather is made up by a random rule. It never happened.
weather-from-seed = It started from the number { $seed }. The same number gives the same weather.
weather-fitted-to = { $n ->
    [one] It follows the pattern of { $n } whole water year of { $place }.
   *[other] It follows the pattern of { $n } whole water years of { $place }.
}
weather-record-too-short = Whole water years in the record: { $n }. At least { $least } are needed to learn its pattern.

## Progress

progress-reading = Reading { $path }
progress-running = Running the years

## What stands for a value in the help

value-place = PLACE
value-set = DIAL=VALUE
value-setting = FILE|NAME
value-years = YEARS
value-form = FORM
value-units = UNITS
value-file = FILE
value-folder = FOLDER
value-path = PATH
value-recipe = FILE|NAME
value-number = NUMBER
value-year = YEAR
value-lang = LANGUAGE

help-usage-commands = COMMAND [OPTIONS]
help-usage-tell = [PLACE] [OPTIONS]
help-usage-check = PATH... [OPTIONS]
help-usage-weather = [PLACE] [OPTIONS]
help-more = For the options of a command: deshielo COMMAND --help
help-crops = Adds the crops of the place, with their numbers and where these come from.
help-columns = Explains every column of the CSV and every part of the JSON, and does nothing else.
help-tell-more =
    Dials (deshielo tells the range of a place when a value is outside):
      warming               degrees Celsius
      winter_precipitation  percent more or less
      summer_precipitation  percent more or less
      diversion             percent more or less
      canal_lining          percent of the loss that stays in
      crop_mix              percent of the land that changes
      river_minimum         percent more or less
      reservoir_size        percent more or less
      starting_storage      percent full
      town_growth           percent more

    Example: deshielo tell demo --set warming=2 --years dry
help-check-form = How to write what was found: table or json.
help-weather-place = A place whose own record is learned from. Without one, a recipe is used.
help-recipe = What the weather is like: tresnubes, south, or a recipe file.
help-recipe-out = Writes the recipe to this file too.

## Why a dial has nothing to act on, and more

error-dial-lacking = The dial “{ $dial }” has nothing to act on here: { $reason }.
place-lacks-canals = this place has no canals
place-lacks-canal-loss = the canals of this place lose no water
place-lacks-crop-swap = this place does not say which crop may change
place-lacks-river-minimum = this place asks for no water in the river
place-lacks-reservoir = this place has no reservoir
place-lacks-town = this place has no town
place-lacks-nothing = this place hides it
error-years-none = The record has no whole water year.
error-river-fault = The river of this place has a value that makes no sense: { $value }.
error-option-form = The option { $option } goes with { $forms }.
error-place-and-recipe = Name a place or give { $option }, not both.
error-not-unicode-here = A part of the command line cannot be read as letters.
error-out-is-folder = { $path } is a folder. Give the name of a file.
error-recipe-unknown = There is no recipe “{ $recipe }”. There are: { $recipes }; or give a file.
error-recipe-unknown-nearest = There is no recipe “{ $recipe }”. Did you mean “{ $nearest }”?
error-remedy = What to do

reason-not-found = it is not there
reason-not-allowed = you may not
reason-read-only = the disk can only be read
reason-is-folder = it is a folder
reason-not-folder = a part of the path is not a folder
reason-not-text = it is not text in UTF-8
reason-too-large = it is too large
reason-full = there is no room left
reason-other = the system says “{ $reason }”

check-more = { $n ->
    [one] { $n } more is not shown.
   *[other] { $n } more are not shown.
}
