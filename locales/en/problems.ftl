# What can be wrong with place.toml, the small tables beside it, or a setting. A message says what is wrong, its
# .remedy says what would be right.

## The files

problem-file-missing = The file “{ $file }” is not in the place's folder.
    .remedy = Check the name, letter by letter, and that the file was copied along.
problem-file-outside = The file “{ $file }” lies outside the place's folder.
    .remedy = Copy it into the folder and write its name only.
problem-file-large = The file “{ $file }” is larger than { $most } MB.
    .remedy = Check that it is the right file. A century of days takes about 5 MB.
problem-file-unreadable = The file “{ $file }” cannot be opened.
    .remedy = Check that you may read it and that no other program holds it.
problem-file-no-file = “{ $file }” is not a file.
    .remedy = Give the name of a file, not of a folder or a device.
problem-utf16 = This text is stored with two bytes for each letter (UTF-16).
    .remedy = In your text editor choose “Save as”, and there the encoding UTF-8.
problem-not-utf8 = There is a letter here that is not UTF-8.
    .remedy = Save the file as UTF-8.

## How the file is written

problem-syntax = This line cannot be read.
    .remedy = Write a line as key = value. Remarks start with #.
problem-decimal-comma = This number has a decimal comma.
    .remedy = Write numbers in this file with a decimal point: 12.5.
problem-quote = Some text here has no closing quotation mark.
    .remedy = Put quotation marks before and after the text, on one line.
problem-text-unquoted = This value is neither a number nor text in quotation marks.
    .remedy = Put text in quotation marks. A number stands alone: its unit goes into the key. Yes and no are true and false.
problem-bracket = A bracket opens here and does not close.
    .remedy = Close it. A table's name stands in brackets: [snow]. A list too: [1, 2].
problem-key-twice = “{ $key }” is here twice.
    .remedy = Keep one of the two.
problem-table-unknown = This file has no part called “{ $key }”.
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-table-missing = The table [{ $table }] is missing.
    .remedy = Add it. PLACE.md shows what goes into it.
problem-key-unknown = There is no key “{ $key }” in [{ $table }].
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-key-unit = “{ $key }” does not say a unit that fits.
    .remedy = Write one of these: { $choices }.
problem-two-units = “{ $key }” and “{ $other }” say the same thing twice.
    .remedy = Keep one of the two.
problem-key-missing = [{ $table }] does not say “{ $key }”.
    .remedy = Add a line: { $key } = …
problem-tables-missing = This [{ $table }] has no “{ $key }”.
    .remedy = Start one below it with a line [[{ $table }.{ $key }]].
problem-key-missing-at-top = The file does not say “{ $key }”.
    .remedy = Add a line at the top: { $key } = …
problem-either = “{ $key }” and “{ $other }” answer the same question.
    .remedy = Keep one of the two.
problem-one-bracket = There may be several of [{ $table }], so each needs double brackets.
    .remedy = Write [[{ $table }]].
problem-not-tables = “{ $table }” must be a table.
    .remedy = Start each one with a line [[{ $table }]].
problem-not-table = “{ $key }” must hold several values with their names.
    .remedy = Write them in braces, with commas: name = value, name = value.

## Kinds of value

problem-not-number = “{ $key }” must be a number.
    .remedy = Write it without quotation marks and with a decimal point: 12.5.
problem-not-whole = “{ $key }” must be a whole number. It is { $value }.
    .remedy = Write a number without decimals.
problem-not-text = “{ $key }” must be text.
    .remedy = Put it between quotation marks.
problem-text-empty = “{ $key }” has nothing between its quotation marks.
    .remedy = Write the text, or take the line away.
problem-not-flag = “{ $key }” must be true or false.
    .remedy = Write true for yes or false for no, without quotation marks.
problem-not-list = “{ $key }” must be a list.
    .remedy = Write the values between square brackets with commas: [1, 2, 3].
problem-list-length = “{ $key }” has { $found ->
        [one] { $found } value
       *[other] { $found } values
    }. It needs { $wanted }.
    .remedy = Give as many values as are needed, in order.
problem-list-short = “{ $key }” needs two values at least.
    .remedy = Add the missing values.
problem-number-range = “{ $key }” is { $value }. It must be between { $least } and { $most }.
    .remedy = Check the number, its sign and its unit.
problem-choice = { $near ->
        [0] “{ $value }” is not known for “{ $key }”.
       *[other] “{ $value }” is not known for “{ $key }”. Did you mean “{ $nearest }”?
    }
    .remedy = Write one of these: { $choices }.
problem-not-rising = “{ $key }” does not rise: this value is not above the one before it.
    .remedy = List the values from low to high, each once.

## Names and languages

problem-name-one-language = “{ $key }” is in one language only.
    .remedy = Write both, in braces: en = "…", es = "…".
problem-name-language = “{ $key }” has no words in { $language ->
        [en] English (en)
       *[es] Spanish (es)
    }.
    .remedy = Add them: people may change the language at any moment.
problem-language-tag = “{ $value }” is not a language. It stands in “{ $key }”.
    .remedy = Write en or es, with a region where the words differ there: es-CL.
problem-region = “{ $value }” is not a region.
    .remedy = Write a language and a country: en-US, es-MX, es-CL.
problem-key-letters = The key “{ $value }” has letters that a key cannot have.
    .remedy = Use small letters a to z, digits, _ and - only. The name may have any letters.
problem-same-key = The key “{ $key }” is here twice.
    .remedy = Give each its own key.

## Days and years

problem-month = { $near ->
        [0] “{ $value }” is not a month, in “{ $key }”.
       *[other] “{ $value }” is not a month, in “{ $key }”. Did you mean “{ $nearest }”?
    }
    .remedy = Write a month's name, or its number from 1 to 12.
problem-month-day = “{ $key }” must be a month and a day.
    .remedy = Write the month first, in quotation marks: "04-15" is April 15.
problem-month-day-swapped = “{ $value }” has day and month the wrong way round.
    .remedy = Write the month first: "{ $right }".
problem-day-impossible = There is no such day as “{ $value }”.
    .remedy = Write the month first and a day that the month has: "04-15" is April 15.
problem-right-date = “{ $key }” is not a date that a right can have.
    .remedy = Write a year (1905), a date (1905-05-14) or "before_all".
problem-date-twice = “{ $key }” has the same day twice.
    .remedy = Give each day once.
problem-years = { $near ->
        [0] “{ $value }” does not say which years.
       *[other] “{ $value }” does not say which years. Did you mean “{ $nearest }”?
    }
    .remedy = Write "all", "dry", "middling", "wet", a year ("2012") or some years ("2011..2014").

## The valley and its station

problem-latitude-zero = A latitude of { $value } is on the equator, where there is no winter and no summer.
    .remedy = Write degrees north, or degrees south with a minus sign.
problem-latitude-sign = The latitude is { $value }, but the record is { $june } °C from June to August and { $december } °C from December to February.
    .remedy = South of the equator the latitude has a minus sign. North of it, none.
problem-areas = The valley is stated as { $stated } km², but its parts add up to { $found } km²: bands { $bands }, lake { $lake }, fields { $fields }.
    .remedy = Bands leave out the lake and the fields. Check each area and its unit.
problem-areas-inside = Lake and fields take { $inside } km², but the curve has { $found } km² only.
    .remedy = Check the units of the curve, or say holds_lake = false or holds_fields = false.
problem-bands-missing = The place has no elevation bands.
    .remedy = Add a [[band]] for each slice of the mountain, or an [area_elevation] curve.
problem-bands-and-curve = The place has both bands and a curve.
    .remedy = Keep [[band]] or [area_elevation], not both.
problem-bands-order = This band is lower than the one before it.
    .remedy = List bands from low to high.
problem-too-many-bands = There are { $found } bands. At most { $most } fit.
    .remedy = Join bands that lie close together.
problem-station-feet = The station stands at { $station } m, far above the valley ({ $lowest } to { $highest } m). That looks like feet.
    .remedy = Write elevation_ft for feet.
problem-station-above = The station stands at { $station } m, above the whole valley ({ $lowest } to { $highest } m).
    .remedy = Check the elevations and their units. Choose a station that stands in or near the valley.
problem-station-far-below = The station stands at { $station } m, far below the valley ({ $lowest } to { $highest } m).
    .remedy = Check the elevations and their units. A station nearer to the snow says more about it.
problem-gradient = With this change with height, a place at { $elevation } m gets { $factor } times the station's rain and snow.
    .remedy = A usual value is 0.02 to 0.10 per 100 m: that is 2 to 10% more.
problem-lapse-sign = The air would get warmer with height: { $value } °C per km.
    .remedy = Write it with a minus sign: -6.5.
problem-rain-snow-order = All is snow below { $snow } °C, but all is rain above { $rain } °C already.
    .remedy = The temperature for rain must be the higher one.
problem-wet-bulb-humidity = The wet-bulb temperature needs humidity, and the record has none.
    .remedy = Map a humidity or dew point column, or write wet_bulb = false.
problem-melt-swing = The swing of melt ({ $swing }) is larger than its mean ({ $factor }). In midwinter, melt would turn negative.
    .remedy = Make the swing smaller than the mean.
problem-ground-order = The quick ground store takes { $quick } days and the slow one { $slow }.
    .remedy = The slow one must take longer.
problem-reach-unstable = With this weight, water must take { $least } to { $most } days down the reach. It takes { $value }.
    .remedy = Change reach_travel_days or reach_inflow_weight, or leave both out.
problem-method-columns = The way “{ $method }” needs columns that the record does not have: { $columns }.
    .remedy = Map them, or choose one of these: { $choices }.
problem-record-short = The record has { $days ->
        [one] { $days } day
       *[other] { $days } days
    } and no whole water year.
    .remedy = Use a record from the first day of a water year to the last, or longer.
problem-record-apart = This record runs from { $first } to { $last }, the weather from { $weather_first } to { $weather_last }. They share no day.
    .remedy = It may stay, but nothing is compared with it. Check the dates and their format.
problem-settling-long = { $value } years of settling are more than the record has: { $years }.
    .remedy = Use fewer. One or two are enough.

## The reservoir and the river

problem-capacity-below-dead = The capacity ({ $capacity } hm³) is not above the dead storage ({ $dead } hm³).
    .remedy = Capacity counts from the bottom and holds the dead storage too. Check both numbers and their units.
problem-capacity-above-table = The capacity ({ $capacity } hm³) is above the end of the table ({ $top } hm³).
    .remedy = Carry the table on to the full level, or check the units.
problem-dead-below-table = The dead storage ({ $dead } hm³) is below the start of the table ({ $bottom } hm³).
    .remedy = Start the table lower, or check the units.
problem-lake-shrinks = The lake gets smaller as the water rises: this area is below the one before it.
    .remedy = List level, area and volume from the bottom up.
problem-lake-above-land = The full lake lies at { $level } m, above the highest band at { $highest } m.
    .remedy = Check the units: level_m or level_ft, elevation_m or elevation_ft.
problem-table-units = The volumes of the table rise by { $stated } hm³, but levels and areas make it about { $expected } hm³.
    .remedy = Check the units of level, area and volume.
problem-flood-space = The space for floods ({ $space } hm³) is larger than the active storage ({ $active } hm³).
    .remedy = Make it smaller: it is the room to keep empty, not the water to keep.
problem-minimum-twice = The river minimum has one rate for the year and dated rates as well.
    .remedy = Keep one of the two.
problem-minimum-above-outlet = The river minimum ({ $rate } m³/s) is more than the outlet can pass ({ $outlet } m³/s).
    .remedy = Check both numbers and their units.
problem-too-many-points = The table has { $found } points. At most { $most } fit.
    .remedy = Leave out points that lie on a straight line with their neighbors.
problem-too-many-dates = “{ $key }” has more than { $most } dates.
    .remedy = Keep the most important ones.

## Canals, towns and rights

problem-too-many-gates = There are { $found } canals and towns. At most { $most } fit.
    .remedy = Join small ones that lie side by side and have rights of about the same date.
problem-too-many-fields = This canal has { $found } fields. At most { $most } fit.
    .remedy = Join fields with the same crop and the same way of watering.
problem-gate-unknown = No canal or town has the key “{ $value }”.
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-right-twice = The right of “{ $key }” is here and in the list of rights.
    .remedy = Keep one of the two.
problem-right-too-large = The right of “{ $key }” ({ $rate } m³/s) is { $times } times what its canal can carry ({ $capacity } m³/s).
    .remedy = Check the unit: rate_m3s, rate_cfs or rate_litres_per_second.
problem-right-above-canal = The right of “{ $key }” ({ $rate } m³/s) is more than its canal can carry ({ $capacity } m³/s).
    .remedy = It may be so. If not, check both numbers and their units.
problem-canal-far-too-large = “{ $key }” can carry { $capacity } m³/s, but needs { $need } m³/s on its hottest day.
    .remedy = Check the unit of the capacity and the areas of the fields.
problem-canal-large = “{ $key }” can carry { $capacity } m³/s, far more than the { $need } m³/s of its hottest day.
    .remedy = It may be so. If not, check the unit and the areas of the fields.
problem-canal-small = “{ $key }” can carry { $capacity } m³/s, far less than the { $need } m³/s of its hottest day.
    .remedy = It may be so. If not, check the unit and the areas of the fields.
problem-limit-idle = The yearly limit of “{ $key }” ({ $limit } hm³) is far more than its canal can carry in a season ({ $most } hm³).
    .remedy = It changes nothing so. Check the unit: yearly_limit_hm3 or yearly_limit_acre_feet.
problem-season-backwards = “{ $key }” opens on { $opens } and closes on { $closes }: it would be shut all summer.
    .remedy = Change the two days round. If it does run in winter only, write season_over_new_year = true.
problem-season-winter = “{ $key }” opens on { $opens } and closes on { $closes }: it is shut in midsummer.
    .remedy = It may be so. If not, check the days: the month comes first.
problem-season-short = The season has { $days ->
        [one] { $days } day
       *[other] { $days } days
    }.
    .remedy = It must last a week at least. Check opens and closes: the month comes first.
problem-storage-shares = The shares of the reservoir add up to { $total }%.
    .remedy = Together they may be 100% at most. What is left belongs to all.
problem-share-without-reservoir = “{ $key }” has a share of a reservoir, and the place has none.
    .remedy = Take the share away, or describe the [reservoir].
problem-no-turns = The rule is rotation, but nobody has a turn.
    .remedy = Give each canal its turn_days.
problem-position-missing = Some have a position on the river, and this one has none.
    .remedy = Give a position to all or to none. Without, the order of this file counts.
problem-position-twice = Position { $value } is taken already.
    .remedy = Number them down the river: 1, 2, 3.
problem-return-uphill = Water of “{ $key }” would come back above “{ $other }”, which is not below it.
    .remedy = Name one that lies farther down the river, or write "below_all".
problem-loss-too-large = The canal would lose { $lost } m³/s of the { $capacity } m³/s that it can carry.
    .remedy = Check the length, the wetted perimeter and the units.

## Fields and crops

problem-crop-unknown = { $near ->
        [0] There is no crop “{ $value }”.
       *[other] There is no crop “{ $value }”. Did you mean “{ $nearest }”?
    }
    .remedy = Use a crop of the table, or describe your own as a [[crop]].
problem-crop-stages = A crop needs four stages, of 1 to 366 days in all. This one has { $found } and { $total } days.
    .remedy = Write the days of start, growth, middle and end: [20, 35, 50, 30].
problem-swap-same = The crop mix would change “{ $value }” to itself.
    .remedy = Choose another crop, or "fallow".
problem-swap-absent = No field grows “{ $value }”, which the crop mix is to change.
    .remedy = Choose a crop that a field grows.

## Dials

problem-dial-unknown = There is no dial “{ $key }”.
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-dial-form = “{ $dial }” needs a range, or to be hidden.
    .remedy = Write least = … and most = … in braces, or "hidden".
problem-dial-range = The range of “{ $dial }”, { $least } to { $most }, does not hold 0, where the dial rests.
    .remedy = The least must be below the most, with 0 between them or at an end.
problem-dial-lacking = The place has nothing for the dial “{ $dial }” to change.
    .remedy = Take this line away.
problem-setting-dial-absent = This place does not have the dial “{ $dial }”. The setting leaves it alone.
    .remedy = The other dials are set.

## Small tables

problem-row-length = { $found ->
        [one] This row has { $found } cell. The header has { $wanted }.
       *[other] This row has { $found } cells. The header has { $wanted }.
    }
    .remedy = Give each row as many cells as the header.
problem-column-unknown = There is no column “{ $key }” in this table.
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-column-missing = The table has no column “{ $key }”.
    .remedy = Add it to the header and to each row.
problem-cell-empty = The cell “{ $key }” of this row is empty.
    .remedy = Fill it in, or take the row away.
problem-cell-not-number = “{ $value }” is not a number, in the column “{ $key }”.
    .remedy = Write digits with a decimal point: 12.5.
problem-exchange-unit = place.toml says “{ $unit }” for “{ $column }”, but the file says “{ $found }”.
    .remedy = Write what the file says.
