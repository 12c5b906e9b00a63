# The page to take home, the worksheet and answer key of a lesson, and open data.

handout-title = { $place }: what the model shows
handout-changed = What changed
handout-numbers = The year in numbers
handout-season = How the year goes
handout-canals = Who gets water, and until when
handout-years = All the years
handout-ledger = Where the water went
handout-trust = How far to trust this
handout-always = This is a model, not a forecast. Ask your irrigation district before you change your plans.
handout-less = less than before
handout-half-mark = half of the water is past
handout-full-as-it-was = full days as it was
handout-water-in = Water in, { $unit }
handout-water-out = Water out, { $unit }
handout-together = All together
handout-code = This result as text. Point a phone camera at it: no internet needed.
handout-code-alt = A square code with this result as plain text.
handout-season-alt = Snow, river, reservoir and canals through the year, with your changes as solid lines and as it was as dashed lines.
handout-canals-alt = The year of each canal as a strip, with its last full day.
handout-years-alt = Every year of the record: the share of the water asked for that arrived, and the water the river brought.

handout-worksheet = Worksheet
handout-worksheet-of = Worksheet: { $name }
handout-key = Answer key
handout-key-of = Answer key: { $name }
handout-field-group = Group
handout-field-names = Names
handout-field-date = Date
handout-why = We think so because
handout-model-says = The model says
handout-we-see = What we see
handout-sign-of-canal = { $canal }, { $sign }
handout-guess-value = Guess: { $sign }
handout-guess-value-all = Guess over all the years: { $sign }
handout-guess-change = Guess how it changes: { $sign }
handout-guess-change-all = Guess how it changes over all the years: { $sign }

handout-no-lesson = { $path } is not a lesson: it has no steps.
handout-lesson-unknown = There is no lesson “{ $lesson }”, and no file of that name. Built in: { $lessons }.
handout-sheet-of-nothing = A sheet is that of a lesson: say which one with --lesson.
handout-lesson-alone = A lesson sets the dials itself: leave out { $option }.

handout-written = { $n ->
    [one] One page is in { $path }
   *[other] { $n } pages are in { $path }
}
handout-fault = The page could not be written: { $reason }
handout-code-too-long = The result is too long for the square code: { $n } bytes.
handout-out-unknown = The name “{ $path }” does not say what to write. It must end in .pdf, .svg or .png.

## Command line

help-handout = Writes a page to take home, or the worksheet of a lesson.
help-usage-handout = [PLACE] [OPTIONS]
help-handout-lesson = Write the sheet of this lesson: a file, or one of those built in
help-handout-sheet = Which sheet of the lesson: work, key
help-handout-paper = Paper: a4, letter [usual: that of the place]
help-handout-out = Where to write it: a name that ends in .pdf, .svg or .png [usual: deshielo-handout.pdf]
help-handout-more = With --lang both the page says everything in English and Spanish, side by side.
value-sheet = SHEET
value-paper = PAPER

help-data = Writes the days and years of a run as open data.
help-usage-data = [PLACE] [OPTIONS]
help-data-form = What to write: csv (four tables, one of them says what each column means), netcdf (one file of the days, CF-1.11)
help-data-out = With netcdf: the file [usual: deshielo-data.nc]
help-data-into = With csv: the folder for the tables [usual: deshielo-data]
data-title = { $place }: the days of a run as it was and with changes
data-written = { $n ->
    [one] One file is in { $path }
   *[other] { $n } files are in { $path }
}
data-fault = The file could not be written: { $reason }
