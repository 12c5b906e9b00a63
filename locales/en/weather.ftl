# What `weather` says of recipes, of learning from a record, and of what it made.

weather-from-recipe = It follows the recipe “{ $recipe }”.
weather-columns = Temperatures in °C, rain and snow in mm of water, sun in MJ/m² a day, humidity in percent, wind in m/s at 2 m.
weather-recipe-head = A recipe for “deshielo weather --recipe”. Lists of twelve run from January to December.

problem-recipe = This cannot be read as a recipe.
    .remedy = Make a recipe with --recipe-out and change it step by step.
problem-recipe-key = This cannot be read as a recipe: look at “{ $key }”.
    .remedy = Make a recipe with --recipe-out and compare the two.

weather-recipe-refused = The recipe makes no sense, so no weather was made:
weather-past-last-date = The calendar ends before that many years are over.
weather-fault-range = { $key } is { $value }. It must lie between { $low } and { $high }.
weather-fault-range-month = { $key } is { $value } for { $month }. It must lie between { $low } and { $high }.
weather-fault-curve = { $key } comes to { $value } on day { $day } of the year. It must stay between { $low } and { $high }.
weather-fault-wetter-after-dry = In { $month }, a wet day is more likely after a dry day than after a wet one. Make wet_to_wet at least as large as dry_to_wet.
weather-fault-correlations = No weather can have the correlations under residuals.

weather-fit-month = The water year cannot start in month { $month }.
weather-fit-dates = { $date } is not after the day before it.
weather-fit-missing = On { $date } this is missing: { $field }. It is needed on every day.
weather-fit-negative = On { $date } it rained { $amount } mm. Less than nothing cannot fall.
weather-fit-turned = On { $date } the lowest temperature, { $low } °C, is above the highest, { $high } °C.
weather-fit-one-kind = The record has { $wet } wet and { $dry } dry days. At least { $least } of each are needed to learn its pattern.
weather-fit-unusable = The pattern of the record makes no sense. Is a unit wrong?

weather-note-few-years = With { $n } whole water years one cannot tell how much years differ; { $least } are needed. Usual values were taken, so do not trust long droughts.
weather-note-totals-alike = Years differ no more than single days explain. So the years made differ little too.
weather-note-totals-wide = Years differ more than the method can follow. So the years made differ less.
weather-note-year-memory = By the record, a year remembers the one before by { $estimated }. That is not possible; { $taken } was taken.
weather-note-temperature-wide = Mean temperatures of years lie far apart ({ $spread } °C). Look for a trend or a change of thermometer.
weather-note-temperature-alike = Years differ in warmth no more than single days explain.
weather-note-month-one-kind = { $month } has no wet days, or only wet ones. Half a day was added to each kind.
weather-note-wet-memory = In { $month }, a day remembers the rain of the day before by { $estimated }. That is not possible; { $taken } was taken.
weather-note-depths-pooled = { $month } has only { $n } wet days. The rain of the months around it was taken in.
weather-note-same-step = Too few days of a kind in some month. Wet and dry days differ by the same all year in: { $field }.
weather-note-simpler-spread = Too little is known of how much this differs from day to day, so a simpler curve was taken: { $field }.
weather-note-left-out = Left out, with { $n } usable days: { $field }.
weather-note-radiation-high = { $n ->
    [one] On { $n } day there was more sun than a clear sky gives. It was left out.
   *[other] On { $n } days there was more sun than a clear sky gives. They were left out.
}
weather-note-published-radiation = How sun and temperature go together was taken from Richardson and Wright (1984).
weather-note-published-memory = How one day follows from the other was taken from Richardson and Wright (1984).
weather-note-dewpoint = The air is damper than its coldest hour allows. The lowest temperature was taken as dew point.

weather-field-tmin = lowest temperature
weather-field-tmax = highest temperature
weather-field-precipitation = rain and snow
weather-field-solar = sun
weather-field-humidity = humidity
weather-field-wind = wind
