# `place`: preparing a valley of one's own.

## Help

help-place-command = Prepares a valley of your own: looks at a record, writes a starter, adds records.
help-place-more = For the options of each: deshielo place new --help
help-place-new = Writes the starter of a place, with what you know already and the records you have.
help-place-peek = Looks at a record or a grid of heights, and proposes the lines for place.toml.
help-place-add = Adds new days to a record of a place, or a record that it does not have yet.
help-usage-new = FOLDER [OPTIONS]
help-usage-peek = FILE [OPTIONS]
help-usage-add = PLACE FILE [OPTIONS]
help-new-dir = The folder of the new place.
help-new-name = The name of the valley.
help-new-name-es = Its name in Spanish, if that is another one.
help-new-region = Language and country, for example en-US or es-CL.
help-new-latitude = Degrees of latitude, the south with a minus sign: --latitude -33.4
help-new-station = The height of the weather station, for example 1600m or 5250ft.
help-new-sharing = How the river is shared: seniority, proportional or rotation.
help-new-weather = The weather record: CSV, WaterML 2.0 or NetCDF classic.
help-new-gauge = The record of a river gauge.
help-new-snow = A record of snow water.
help-new-storage = A record of the water in the reservoir.
help-new-grid = A grid of heights, Esri ASCII or GeoTIFF. It needs --outline.
help-new-ask = Asks for what is missing even where nobody seems to sit.
help-measures = What the gauge measures: natural, computed_inflow or below_diversions.
help-replace = Writes over files that are there.
help-peek-file = A record (CSV, WaterML 2.0, NetCDF classic) or a grid of heights (Esri ASCII, GeoTIFF).
help-peek-form = How to answer: table or json.
help-outline = The outline of the basin as GeoJSON, for a grid of heights.
help-coordinates = The coordinates of the grid where its file does not say them, for example EPSG:32613.
help-height-unit = The unit of the heights where the file does not say it: m or ft.
help-bands = How many height bands, from 1 to 32.
help-add-place = The folder of the place.
help-add-file = The record with the new days, or the new record.
help-add-as = What it is for: weather, gauge, snow, storage or canal.
help-add-canal = The key of the canal or town whose flow it is.
help-add-column = The column to take, if there is more than one.
help-add-unit = The unit of that column.

value-text = TEXT
value-height = HEIGHT
value-rule = RULE
value-measures = WHAT
value-coordinates = CODE
value-unit = UNIT
value-record = RECORD
value-key = KEY

place-which = Say what to do: new, peek or add.
place-coordinates-unknown = “{ $value }” is not a coordinate system that is known here. Use degrees (EPSG:4326) or a UTM zone, for example EPSG:32613.
place-outline-missing = A grid of heights needs the outline of the basin: --outline FILE
place-option-wrong = The value of { $option } cannot be read. Write it like this: { $example }
place-file-name = { $path } has no name that a place can use.

## new

place-exists = { $path } is there already. Nothing was written. With --replace it is written over.
place-not-folder = { $path } is not a folder. Nothing was written.
place-file-twice = Two records would both be called { $file } in the place. Give one of them another name.
place-no-column = { $path } has no column that fits [{ $table }].
place-see-peek = To see what is in it: deshielo place peek { $path }
place-made = The starter of the place is in { $path }.
place-ready = { $path } has no mistakes. It can be run.
place-still-open = { $n ->
    [one] { $n } thing is still to fill in or to mend:
   *[other] { $n } things are still to fill in or to mend:
}
place-then-check = Open the file in a text editor. Then run: deshielo check { $path }
ask-intro = Some questions. Press Enter to leave one for later.
ask-name = What is the valley called?
ask-region = Which language and country? For example en-US, es-MX, es-CL.
ask-latitude = At what latitude does it lie, in degrees? South with a minus sign: -33.4
ask-station = How high is the weather station? For example 1600m or 5250ft.
ask-rule = How is the river shared? seniority (oldest right first), proportional (same part for all) or rotation (turns).
ask-again = “{ $text }” cannot be read here. Please try again, or press Enter.

## The text of a starter

skeleton-head = The description of a valley for deshielo. Written by “place new”; change it as you like.
skeleton-how = A remark starts with #. Take the # away from a line to make it count. Keys carry their unit. Numbers have a decimal point. PLACE.md explains every key.
skeleton-fill = TO FILL IN:
skeleton-name = The name that people see, in both languages.
skeleton-region = Language and country: decides words and the decimal mark on the screen.
skeleton-latitude = Degrees of latitude. The south has a minus sign.
skeleton-year = The usual calendar. It holds without these lines.
skeleton-source = Where the numbers come from. People will ask.
skeleton-station = The height of the weather station above the sea.
skeleton-weather = The weather, one row a day and no day left out.
skeleton-weather-missing = TO FILL IN: put the record into this folder. “place add” writes these lines for you.
skeleton-curve = The area of the basin below each height, from the grid of heights. It is cut into bands of equal height.
skeleton-bands = TO FILL IN: bands from low to high, without the lake and the fields. “place new --grid” makes them from a grid of heights.
skeleton-usual = Usual values of the mountain. They hold without these lines. Fitting to a gauge replaces most of them.
skeleton-reservoir = The reservoir, if there is one. The table goes up from the bottom.
skeleton-minimum = Water that must stay in the river, if any.
skeleton-sharing = How the river is shared: "seniority" (oldest right first), "proportional" (same part for all) or "rotation" (turns).
skeleton-canal = Canals in the order in which the river meets them. “right” and “rate” are needed with "seniority", “turn_days” with "rotation".
skeleton-town = A town that takes water.
skeleton-compare = Records to compare with, if there are any. “place add” writes these lines for you.
skeleton-gauge = Is the gauge above every canal? Then “natural” is right. Below canals write "below_diversions".

## peek

peek-text = Text with “{ $mark }” between the cells. The header is on line { $line }.
peek-tab = tab
peek-comma = Numbers have a decimal comma.
peek-latin = The letters are Latin-1, not UTF-8.
peek-exchange = A file that says itself where its days and units are.
peek-date = Dates are in “{ $column }”, as { $order }: { $reason }.
peek-date-only = no other order gives days of the calendar
peek-date-daily = only so each row is the day after the one before
peek-date-usual = other orders fit too, so check this
peek-date-parts = the names of the columns say so
peek-date-columns = The date is in several columns: { $columns }.
peek-marks = These seem to stand for missing values: { $marks }
peek-days = { $n ->
    [one] { $n } day: { $first }.
   *[other] { $n } days, from { $first } to { $last }.
}
peek-column = column
peek-is = seems to be
peek-unit = unit
peek-missing = missing
peek-lowest = lowest
peek-mean = mean
peek-highest = highest
peek-why = why
peek-role-date = the date
peek-role-again = is “{ $measure }” again
peek-role-numbers = numbers of an unknown kind
peek-role-text = text
peek-unit-name = the name says the unit
peek-unit-size = the size of the numbers says the unit
peek-unit-usual = nothing says the unit: please check it
peek-months = The mean year, month by month, each column from its lowest to its highest month:
peek-years = How much of each year there is:
peek-propose = These lines could go into place.toml:
peek-gauge = Is the gauge above every canal? Then “natural” is right. Below canals write "below_diversions".
peek-no-kind = No table of place.toml fits these columns by itself. “place add --as” says what the record is for.
peek-fine = Read this way, the record has no mistakes.
peek-problems = { $n ->
    [one] Read this way, { $n } thing is to be looked at:
   *[other] Read this way, { $n } things are to be looked at. The first ones:
}
place-curve = The basin has { $area }, from { $low } to { $high }, { $mean } on average. Cells counted: { $n }.
place-curve-unit = The file does not say the unit of its heights, so they were taken as meters. If they are feet, add --height-unit ft.
place-curve-empty = { $percent }% of the basin has no height in the grid. The rest stands for it.

## add

place-add-no-place = { $path } has no place.toml. “place new” writes one.
place-add-canal = Say which canal: --canal KEY
place-add-canal-only = The option --canal goes with --as canal only.
place-add-as = The columns do not say what the record is for. Add --as and one of these: { $choices }
place-add-weather-columns = A weather record has several columns. Name them in place.toml.
place-add-unit = The file does not say the unit of this column. Add { $option }.
place-add-column = No column fits by its name. Say which one to take: { $option }
place-add-columns = Several columns fit: { $choices }. Say which one to take: { $option }
place-add-lacks = { $path } has no column for “{ $column }” of the record.
place-add-exchange = Days cannot be added to { $path }. Only text records can grow. Name the newer, longer file in place.toml.
place-add-not-utf8 = { $path } is not UTF-8, so no lines can be added to it.
place-added-days = { $n ->
    [one] { $n } day was added to { $path }: { $first }.
   *[other] { $n } days were added to { $path }, from { $first } to { $last }.
}
place-added-same = { $n ->
    [one] { $n } day was there already, with the same values.
   *[other] { $n } days were there already, with the same values.
}
place-added-record = { $file } is in the place now. These lines were added to { $path }:

problem-add-nothing = This file has no day after { $date }, the last day of the record.
    .remedy = Give a file with newer days.
problem-add-hole = Between the record and this file, days are missing: { $first } to { $last }.
    .remedy = Add these days first, with empty cells where nothing was measured.
problem-add-before = This file begins before the record, which begins on { $date }.
    .remedy = Only days at the end can be added. Cut the earlier ones off.
problem-add-differs = On { $date } the record has { $before } in “{ $column }”, and this file has { $after }.
    .remedy = Find out which one is right. Correct it in the record or in this file.
