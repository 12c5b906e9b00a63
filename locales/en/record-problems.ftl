# What can be wrong with a daily record. A message says what is wrong, its .remedy says what would be right.

## The file

problem-record-empty = This file has no lines to read.
    .remedy = Write a header with the names of the columns, then one row for each day.
problem-record-no-days = There are no days below the header.
    .remedy = Write one row for each day below the header.
problem-record-spreadsheet = This is a spreadsheet, not a text file.
    .remedy = Open it and save it as CSV (UTF-8).
problem-record-two-byte-text = This text is stored with two bytes for each letter (UTF-16).
    .remedy = Save it as CSV (UTF-8).
problem-record-not-utf8 = There is a letter here that is not UTF-8.
    .remedy = Save the file as UTF-8, or say in place.toml that it is Latin-1.
problem-record-delimiter = The header does not show what stands between the cells.
    .remedy = Put a comma, a semicolon, a tab or a | between the names, or say in place.toml what stands there.
problem-record-quote-open = A quotation mark opens here and does not close on this line.
    .remedy = Close it, or take it away. A cell must stay on one line.
problem-record-quote-behind = There is text behind a closing quotation mark.
    .remedy = Put the whole cell between the marks. Write a quotation mark inside a cell twice.
problem-record-cells-few = { $found ->
        [one] This row has { $found } cell. The header has { $expected }.
       *[other] This row has { $found } cells. The header has { $expected }.
    }
    .remedy = Give each row as many cells as the header. Leave a cell empty where the value is missing.
problem-record-cells-many = { $found ->
        [one] This row has { $found } cell. The header has { $expected }.
       *[other] This row has { $found } cells. The header has { $expected }.
    }
    .remedy = Take the extra cell away. If the file writes 12,5 for twelve and a half, put semicolons between the cells.
problem-record-more = { $count ->
        [one] The file has { $count } more mistake like this, from here on.
       *[other] The file has { $count } more mistakes like this, from here on.
    }
    .remedy = Correct the ones shown first. The rest often go away with them.

## Columns

problem-record-no-columns = No column of this record is to be read.
    .remedy = Name at least one column in place.toml, with what it measures and its unit.
problem-record-column-missing = There is no column “{ $column }”. The header has: { $found }.
    .remedy = Use a name from the header. Capitals do not count.
problem-record-column-twice = The header has the name “{ $column }” twice.
    .remedy = Give each column its own name.
problem-record-column-empty = The column “{ $column }” has no values at all.
    .remedy = Take the column out of place.toml, or check the mark for missing values.
problem-record-measure-twice = The columns “{ $other }” and “{ $column }” are both said to be “{ $measure }”.
    .remedy = Keep the one that the valley should use.
problem-record-unit = The column “{ $column }” is “{ $measure }”, and “{ $unit }” is not a unit for that.
    .remedy = Use one of these units: { $units }.

## Dates

problem-record-date-unreadable = “{ $text }” is not a date in the order that place.toml says.
    .remedy = Write year, month and day in that order, with a year of four digits.
problem-record-date-no-such-day = There is no day “{ $text }” on the calendar.
    .remedy = Correct the month or the day.
problem-record-date-short-year = The year in “{ $text }” has only two digits.
    .remedy = Write the year with four digits. 04 could be 1904 or 2004.
problem-record-date-time = “{ $text }” has a time of day.
    .remedy = Keep one row for each day, and only the date in it.
problem-record-date-far-year = The year in “{ $text }” cannot be right.
    .remedy = Years from 1750 to 2200 are read.
problem-record-date-order = “{ $text }” does not fit “{ $declared }”. The dates of this file look like “{ $found }”.
    .remedy = Say “{ $found }” for the dates in place.toml.
problem-record-day-twice = { $date } comes twice. It is on line { $first } too.
    .remedy = Keep the right one of the two rows.
problem-record-day-out-of-order = { $date } comes after a later day.
    .remedy = Sort the rows from the first day to the last.
problem-record-newest-first = The newest day comes first in this file: { $date }.
    .remedy = Sort the rows from the first day to the last.
problem-record-days-missing = { $days ->
        [one] { $days } day has no row: { $first }.
       *[other] { $days } days have no row: { $first } to { $last }.
    }
    .remedy = Add a row for each day. Leave its cells empty where nothing was measured.
problem-record-leap-day-missing = The leap day has no row: { $date }.
    .remedy = Add it. A record needs every day of the calendar.
problem-record-not-daily = { $count ->
        [one] { $count } of the { $rows } rows is more than a day after the row before.
       *[other] { $count } of the { $rows } rows are more than a day after the row before. This is not a daily record.
    }
    .remedy = Use a record with one row for each day. Months or weeks cannot be read.

## Numbers

problem-record-number = “{ $text }” in the column “{ $column }” is not a number.
    .remedy = Correct it. If it stands for a missing value, name it as a missing mark in place.toml.
problem-record-number-thousands = “{ $text }” in the column “{ $column }” has a mark between the thousands.
    .remedy = Write 1234.5 without marks or gaps.
problem-record-number-comma = “{ $text }” in the column “{ $column }” has a comma. It could mean decimals or thousands.
    .remedy = Write a decimal point and no mark for thousands, or say in place.toml that the file has decimal commas.
problem-record-number-point = “{ $text }” in the column “{ $column }” has a point, but place.toml says decimal commas.
    .remedy = Write a comma, or say in place.toml that the file has decimal points.
problem-record-number-tail = “{ $text }” in the column “{ $column }” has letters or signs behind the number.
    .remedy = Keep only the number. The unit stands in place.toml.
problem-record-number-trace = “{ $text }” in the column “{ $column }” means a trace of rain or snow, too little to measure.
    .remedy = Write 0 for a trace.
problem-record-undeclared-missing = “{ $text }” in the column “{ $column }” looks like a mark for a missing value.
    .remedy = Name it as a missing mark in place.toml, or leave the cell empty.

## Gaps

problem-record-gap-refused = { $days ->
        [one] The column “{ $column }” has no value on { $days } day from here on.
       *[other] The column “{ $column }” has no value on { $days } days from here on.
    }
    .remedy = Fill in the values, or say in place.toml how this column may be filled.
problem-record-gap-long = { $days ->
        [one] The column “{ $column }” has no value on { $days } day from here on. Longest gap that is filled, in days: { $limit }.
       *[other] The column “{ $column }” has no value on { $days } days from here on. Longest gap that is filled, in days: { $limit }.
    }
    .remedy = Use another station for these days, or start the record after them.
problem-record-gap-at-end = { $days ->
        [one] The column “{ $column }” has no value on { $days } day at an end of the record.
       *[other] The column “{ $column }” has no value on { $days } days at an end of the record.
    }
    .remedy = Shorten the record to days that have a value. A line needs a value on both sides.
problem-record-gap-no-mean = { $days ->
        [one] The column “{ $column }” has no value on { $days } day, and none in that month of any year.
       *[other] The column “{ $column }” has no value on { $days } days, and none in that month of any year.
    }
    .remedy = Fill in the values. There is no mean to fill them with.
problem-record-filled-across = The filled value puts “{ $column }” over “{ $other }” on this day.
    .remedy = Leave both cells of this day empty, so that both are filled. Or write the missing value.

## Temperature

problem-record-fahrenheit = The column “{ $column }” cannot be °C. Its mean is { $mean } and its highest value { $highest }.
    .remedy = Say °F for it in place.toml if that is its unit. Check the other temperatures too.
problem-record-celsius = The column “{ $column }” hardly goes over { $highest }. That is too cold for °F.
    .remedy = Say °C for it in place.toml if that is its unit. Check the other temperatures too.
problem-record-coldest-over-warmest = { $count ->
        [one] On { $count } day “{ $column }” is over “{ $other }”: { $coldest } and { $warmest }.
       *[other] On { $count } days “{ $column }” is over “{ $other }”. The first: { $coldest } and { $warmest }.
    }
    .remedy = The coldest of a day cannot be over its warmest. Correct the row.
problem-record-temperatures-swapped = { $count ->
        [one] “{ $column }” is over “{ $other }” on { $count } day. The first: { $coldest } and { $warmest }.
       *[other] “{ $column }” is over “{ $other }” on { $count } days. The first: { $coldest } and { $warmest }.
    }
    .remedy = Exchange the two columns in place.toml.
problem-record-range-wide = From “{ $column }” to “{ $other }” it is { $range } °C on a mean day. That is a lot.
    .remedy = Check that both are °C and not °F.
problem-record-mean-outside = { $count ->
        [one] On { $count } day the mean in “{ $column }” is not between coldest and warmest: { $text }.
       *[other] On { $count } days the mean in “{ $column }” is not between coldest and warmest. The first: { $text }.
    }
    .remedy = Check the row, and that all temperatures are of the same day.
problem-record-dew-over-warmest = { $count ->
        [one] On { $count } day the dew point in “{ $column }” is over the day's warmest: { $text }.
       *[other] On { $count } days the dew point in “{ $column }” is over the day's warmest. The first: { $text }.
    }
    .remedy = Check the instrument and the unit.

## Rain, snow and evaporation

problem-record-precipitation-inches = The column “{ $column }” adds up to { $year } mm in a mean year. Are these inches?
    .remedy = Say “in” for it in place.toml if that is its unit.
problem-record-precipitation-little = In a mean year the column “{ $column }” adds up to { $year } { $unit }. That is a desert.
    .remedy = Check the unit, and that every row is one day.
problem-record-precipitation-much = In a mean year the column “{ $column }” adds up to { $year } { $unit }. No valley is that wet.
    .remedy = Check the unit in place.toml. Millimeters may be given as inches, or tenths as whole ones.
problem-record-precipitation-adds-up = The column “{ $column }” only rises. It looks like a gauge that adds up over the year.
    .remedy = Write the rain and snow of each day: each reading less the one before.
problem-record-precipitation-negative = { $count ->
        [one] Rain and snow in “{ $column }” are below zero on { $count } day: { $text }.
       *[other] Rain and snow in “{ $column }” are below zero on { $count } days. The first: { $text }.
    }
    .remedy = Write 0 or leave the cell empty.
problem-record-precipitation-dry-run = The column “{ $column }” is 0 for { $days } days on end, in a place that is not dry.
    .remedy = If the gauge was out of order, leave these cells empty.
problem-record-snow-negative = { $count ->
        [one] Snow water in “{ $column }” is below zero on { $count } day: { $text }.
       *[other] Snow water in “{ $column }” is below zero on { $count } days. The first: { $text }.
    }
    .remedy = Write 0 or leave the cell empty.
problem-record-evaporation-little = The column “{ $column }” adds up to { $year } mm in a mean year. Are these inches?
    .remedy = Say “in” for it in place.toml if that is its unit.

## Sun, wind and humidity

problem-record-humidity-share = The column “{ $column }” never goes over { $highest }. It looks like shares, not percent.
    .remedy = Say “share” for its unit in place.toml.
problem-record-humidity-percent = The column “{ $column }” goes up to { $highest }. It looks like percent, not shares.
    .remedy = Say “%” for its unit in place.toml.
problem-record-humidity-crossed = { $count ->
        [one] On { $count } day “{ $column }” is over “{ $other }”: { $lowest } and { $highest }.
       *[other] On { $count } days “{ $column }” is over “{ $other }”. The first: { $lowest } and { $highest }.
    }
    .remedy = The lowest of a day cannot be over its highest. Correct the row.
problem-record-solar-watts = The column “{ $column }” goes up to { $highest }. No day brings so many MJ/m². Are these W/m²?
    .remedy = Say W/m² for it in place.toml if that is its unit.
problem-record-solar-megajoules = The column “{ $column }” never goes over { $highest } W/m². Are these MJ/m²?
    .remedy = Say MJ/m² for it in place.toml if that is its unit.
problem-record-pressure-hectopascals = The column “{ $column }” has a mean of { $mean } kPa. Are these hPa?
    .remedy = Say hPa for it in place.toml if that is its unit.
problem-record-pressure-kilopascals = The column “{ $column }” has a mean of { $mean } hPa. Are these kPa?
    .remedy = Say kPa for it in place.toml if that is its unit.
problem-record-wind-strong = The column “{ $column }” has a mean of { $mean } { $unit }. That is a storm every day.
    .remedy = Check the unit in place.toml.

## River, reservoir and canals

problem-record-flow-negative = { $count ->
        [one] The flow in “{ $column }” is below zero on { $count } day: { $text }.
       *[other] The flow in “{ $column }” is below zero on { $count } days. The first: { $text }.
    }
    .remedy = Leave the cell empty. If the flow was computed from a reservoir, say “computed_inflow” in place.toml.
problem-record-inflow-negative = { $count ->
        [one] The inflow in “{ $column }” is below zero on { $count } day: { $text }. It is kept as it is.
       *[other] The inflow in “{ $column }” is below zero on { $count } days. The first: { $text }. They are kept as they are.
    }
    .remedy = A few small ones are usual in an inflow that was computed from storage. Check large ones.
problem-record-storage-negative = { $count ->
        [one] The storage in “{ $column }” is below zero on { $count } day: { $text }.
       *[other] The storage in “{ $column }” is below zero on { $count } days. The first: { $text }.
    }
    .remedy = Leave the cell empty, or count storage from the empty lake.

## Any column

problem-record-out-of-bounds = { $count ->
        [one] The column “{ $column }” has { $count } value that cannot be right: { $text }.
       *[other] The column “{ $column }” has { $count } values that cannot be right. The first: { $text }.
    }
    .remedy = Values from { $low } to { $high } { $unit } are read. Check the unit, correct the value, or leave the cell empty. If it stands for a missing value, name it as a missing mark in place.toml.
problem-record-stuck = { $days ->
        [one] The column “{ $column }” reads { $text } on { $days } day on end.
       *[other] The column “{ $column }” reads { $text } on { $days } days on end. The instrument may be stuck.
    }
    .remedy = If it was, leave these cells empty.
