# The command line: help texts and what can go wrong.

## Help

help-about = Turn a dial and see what a warmer, drier or thirstier year does to a valley's snow, reservoir and canals.
help-usage = Usage
help-commands = Commands
help-arguments = Arguments
help-options = Options
help-default = default: { $value }
help-tell = Says in numbers what a run gives, as it was and with your changes.
help-check = Checks places and settings, and shows every mistake at its line.
help-weather = Makes a long weather record, or makes a short one longer.
help-help = Shows this help.
help-version = Shows the version.

help-place = A folder that describes a valley, or “demo” for the invented one.
help-set = Turns a dial, for example warming=2. Can be given more than once.
help-setting = A file with dials and years.
help-years = Which years to show: all, dry, middling, wet, one year, or a range such as 1990..1999.
help-daily = Writes every day, not only the years.
help-form = How to write the answer: table, csv or json.
help-units = Units for people: metric or us. JSON and CSV are always metric.
help-lang = Language: en, es, or a full tag such as es-MX.
help-locales = A folder with more languages.
help-out = Writes to this file and not to the screen.
help-into = Writes the files into this folder.
help-paths = What to check: place folders or setting files.
help-seed = The number that the random weather starts from. The same number gives the same weather.
help-length = How many years to make.
help-from = The first water year to make.

## Dials and settings

error-dial-out-of-range = The dial “{ $dial }” goes from { $low } to { $high }. { $value } is outside.
error-dial-step = The dial “{ $dial }” moves in steps of { $step }. { $value } is between two steps.
error-dial-unknown = There is no dial “{ $dial }”.
error-dial-unknown-nearest = There is no dial “{ $dial }”. Did you mean “{ $nearest }”?
error-dial-list = The dials are: { $dials }.
error-dial-hidden = This place does not have the dial “{ $dial }”.
error-dial-not-a-number = “{ $value }” is not a number for the dial “{ $dial }”. Write it like this: { $example }.
error-dial-no-equals = “{ $text }” does not say how far to turn. Write it like this: { $example }.
error-dial-twice = The dial “{ $dial }” is set twice. Set it once.
error-setting-unknown = There is no setting “{ $setting }”.
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
error-not-unicode = This text cannot be read as letters: { $text }
error-see-help = For help: { $command }

## Files

error-place-not-found = There is no place at { $path }. Give a folder with a place.toml in it, or “demo”.
error-file-not-found = There is no file { $path }.
error-file-unreadable = The file { $path } cannot be read: { $reason }
error-file-unwritable = The file { $path } cannot be written: { $reason }
error-file-nothing-changed = Nothing was written; what was there before is as it was.
error-folder-unwritable = The folder { $path } cannot be made or written to: { $reason }
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
check-not-known = { $path } is not a place or a setting, so there is nothing to check.

## weather

weather-made = { $n ->
    [one] { $n } year of weather is in { $path }.
   *[other] { $n } years of weather are in { $path }.
}
weather-invented = This weather is made up by a random rule. It never happened.
weather-from-seed = It started from the number { $seed }. The same number gives the same weather.
weather-fitted-to = It follows the pattern of { $n } measured years.
weather-record-too-short = The record has { $n } full years. At least { $least } are needed to learn its pattern.
weather-length-refused = The length must be from { $low } to { $high } years.

## Progress

progress-years = { $done } of { $n } years
progress-reading = Reading { $path }
progress-running = Running the years
progress-writing = Writing { $path }
