# Fitting a place to its river gauge, and how far it can be trusted.

## Help

help-fit = Fits a valley to its river gauge, and tests it on years it never saw.
help-trust = Says how far a valley's model can be trusted, and for what.
help-usage-fit = [PLACE] [OPTIONS]
help-usage-trust = [PLACE] [OPTIONS]
value-objective = SCORE
value-correction = WHAT
help-objective = The score to make large: kge, nse, nse-of-roots or kge-with-snow.
help-correction = What to correct in rain and snow: factor, rain-and-snow, snow or gradient.
help-fit-seed = The number that the search starts from. The same number gives the same fit.
help-starts = How many searches to make, each from another start.
help-runs = Runs of each search.
help-warm-up = Years at the start of the record that are run but not scored.
help-fit-years = Fits only to these water years, for example 1990..1999.
help-sets = How many sets of numbers to keep, at least 20. Together they show the doubt.
help-no-test = Leaves out the test on years that the fit never saw.
help-fit-out = Writes the fit to this file, and not beside place.toml.
help-fit-into = Writes fit.toml into this folder, and not beside place.toml.
help-trust-form = How to write the answer: table or json.
help-fit-more =
    kge: Kling-Gupta efficiency of 2009; nse: Nash-Sutcliffe efficiency;
    nse-of-roots: the same of square roots, for low flows; kge-with-snow: kge of
    the river and of the snow record. 1 is perfect in each.
    Ctrl-C ends the search and keeps the best so far.

## What can go wrong

error-fit-no-gauge = This place has no river gauge, so there is nothing to fit it to.
    .remedy = Add a [gauge] to place.toml, with a record of the river above every canal.
error-fit-below-diversions = The gauge stands below canals. What it measures is not the river as it comes.
    .remedy = Use a gauge above every canal, or the inflow computed from a reservoir.
error-fit-few-days = Only { $found } days have a measured flow. At least { $needed } are needed.
    .remedy = Give a longer gauge record, or one that shares more days with the weather.
error-fit-few-years = { $found } water years have a measured flow on half of their days. At least { $needed } is needed after the first years, which only warm up.
    .remedy = Give a longer record, or fewer years of warm-up with --warm-up.
error-fit-still = The gauge shows the same flow every day. There is nothing to learn from it.
error-fit-no-snow = The score kge-with-snow needs a snow record, and this place has none.
    .remedy = Add a [snow_record] to place.toml, or choose another score.
error-fit-infinite = A measured value of { $date } has no end.
error-fit-nothing = No run gave a score.
error-fit-built-in = This place is part of the program, so its fit has no folder. Say where to write it with --into or --out.
error-fit-elsewhere = Say where else to write it with --into or --out.
error-fit-years = “{ $text }” is no choice here. Write all, a year, or a range such as 1990..1999.
problem-fit-unreadable = This cannot be read as a fit.
    .remedy = Fit again with “deshielo fit”, or take the file away.
problem-file-unreadable-here = This file cannot be read.
    .remedy = Look at who may read it.
problem-fit-parameter = The fit has a number “{ $key }” that does not belong there, or has it twice.
    .remedy = Fit again with “deshielo fit”, or take the file away.
problem-fit-bounds = “{ $key }” is { $value }. That lies outside its limits.
    .remedy = Fit again with “deshielo fit”, or take the file away.
problem-fit-count = A set of the fit has { $found } numbers. It needs { $needed }.
    .remedy = Fit again with “deshielo fit”, or take the file away.
problem-fit-old-records = The records have changed since this fit was made. It is still used.
    .remedy = Fit again with “deshielo fit”.
problem-fit-old-land = The land or the station in place.toml has changed since this fit was made. It is still used.
    .remedy = Fit again with “deshielo fit”.

## While it searches

progress-fit-start = Looking for the best numbers …
progress-fit = { $percent } done · best score so far { $best } · { $left } left · Ctrl-C keeps the best so far

## What fit says

fit-file-head =
    What “deshielo fit” found for { $place }. Used by every command as long as it is here.
    Write nothing into this file: fit again.
fit-title = { $place }: fitted to { $n ->
    [one] { $n } water year
   *[other] { $n } water years
}, { $first } to { $last }
fit-stopped = It was stopped before the end. This is the best so far.
fit-score = Score ({ $objective }) on these years: { $score }. 1 is perfect.
fit-tests = The test: each half of the years, by the half that was fitted there and by the other half, which never saw them. Scores are kge of daily flow.
fit-tests-how = “close”: up to { $good } is lost. “fails”: more than { $bad } is lost, or “same as usual” does better.
fit-test-years = Years
fit-test-own = Fitted here
fit-test-other = Never seen
fit-test-usual = Same as usual
fit-test-verdict = Verdict
fit-untested-years = There is no test on years it never saw: that takes { $needed } gauged years, and there are { $found }.
fit-untested = There is no test on years it never saw: one half of the years has too little measured flow.
fit-untested-asked = There is no test on years it never saw: it was not asked for.
fit-number = Number
fit-value = Value
fit-least = Least
fit-most = Most
fit-on-bound = At a limit
fit-on-bound-mark = yes
fit-ensemble = { $n } sets are kept that score within { $distance } of the best. Answers are given as the range that they span.
fit-band-is-narrow = That range is narrower than the real error. Weather, gauge and model have errors of their own.
fit-written = Written to { $path }.

## What tell says of a fit

tell-fitted = Fitted to the river gauge, water years { $first } to { $last }.
tell-fit-stale = The fit is from older records or another description of the land. Fit again with “deshielo fit”.
tell-not-fitted = Not fitted to the river gauge yet: “deshielo fit” does that.
tell-no-gauge = This place has no river gauge. Nobody has checked these numbers against a measured river.
tell-ranges = What { $n } sets of numbers say that fit the gauge about as well:
tell-range-line = { $name }: { $range }
tell-range-days-fewer = { $a } to { $b } days fewer
tell-range-days-more = { $a } to { $b } days more
tell-range-ends = from { $low } to { $high }

## The foot of a page

picture-fitted = fitted to the gauge
picture-fit-old = old fit
picture-no-gauge = no gauge

## What trust says

trust-title = How far to trust { $place }
trust-no-gauge = This place has no river gauge. Nobody has checked its model against a measured river.
trust-below-diversions = The gauge stands below canals, so the river as it comes cannot be checked.
trust-gauge-apart = The gauge and the weather share no days.
trust-not-fitted = It is not fitted to the gauge yet. The scores are those of the numbers in place.toml.
trust-stale = The fit is from older records or another description of the land.
trust-judged-unseen = The river is judged on years that the numbers had never seen: each half by the fit to the other half.
trust-judged-seen = The river is judged on the same years that it was fitted to. That flatters the model.
trust-uses = What you may use it for here, and why:
trust-use-direction = Which way it goes
trust-use-timing = When the water comes
trust-use-volume = How much in a year
trust-use-late-summer = Late summer
trust-use-storage = How full the lake is
trust-use-deliveries = What canals get
trust-known-yes = yes
trust-known-partly = in part
trust-known-no = no
trust-known-unknown = unknown
trust-need-gauge = There is no river gauge with a whole year.
trust-need-tests = It has not been tested on years it never saw.
trust-need-storage-record = There is no record of the lake.
trust-need-diversion-record = There is no record of a canal.
trust-score-loss-warm-cold = Between warm and cold years its score drops by { $value }. Yes up to { $good }, in part up to { $fair }.
trust-score-half-day-error-days = Half of the water comes { $value } days off in a mean year. Yes up to { $good }, in part up to { $fair }.
trust-score-annual-error-percent = A year is { $value } off on average. Yes up to { $good }, in part up to { $fair }.
trust-score-late-summer-error-percent = Its late summers are { $value } off on average. Yes up to { $good }, in part up to { $fair }.
trust-score-storage-error-percent = A day is { $value } of the lake off on average. Yes up to { $good }, in part up to { $fair }.
trust-score-delivery-error-percent = A day is { $value } off on average. Yes up to { $good }, in part up to { $fair }.
trust-beaten = On one half of the years it fails: what was learned in one half does not hold in the other.
trust-scores = Scores
trust-nse = nse
trust-kge = kge
trust-correlation = same rhythm
trust-variability = same swing
trust-ratio = same mean
trust-bias = Bias, %
trust-guess-nse = Same as usual, nse
trust-daily-unseen = Days, years never seen
trust-daily = Days, the set in use
trust-annual = Whole years
trust-guess = Days, “same as usual”
trust-scores-how = 1 is perfect everywhere but in the last column, where 0 is. nse: Nash-Sutcliffe efficiency. kge: Kling-Gupta efficiency of 2009; its three parts come after it. “Same as usual” says for each day the mean of that day in all other years: a model must do better.
trust-monthly = Months: nse { $nse } ({ $nse_rating }), error over spread { $rsr } ({ $rsr_rating }), { $bias } bias ({ $bias_rating }).
trust-monthly-worst = By the bands of Moriasi et al. (2007): { $rating }.
trust-rating-very-good = very good
trust-rating-good = good
trust-rating-satisfactory = satisfactory
trust-rating-unsatisfactory = unsatisfactory
trust-month = Month
trust-observed = Measured
trust-modelled = Model
trust-bars = = both, o only measured, m only the model
trust-season = The season, { $unit }:
trust-exceeded = More than this for
trust-duration = How often the river is high or low, { $unit }:
trust-high-flow = The highest floods (2% of days): { $amount }.
trust-flood-season = The flood season: { $amount }.
trust-late-summer = Late summer: { $amount }.
trust-low-flow = The lowest flows (30% of days): { $amount }.
trust-too-little = { $percent } too little
trust-too-much = { $percent } too much
trust-even = the right amount
trust-errors = How daily errors lie, from too little to too much; 1 is right, 0.5 is half, 2 is twice:
trust-errors-shape = { $from } |{ $shape }| { $to }
trust-one-hump = One hump, at { $at }: the errors are of one kind.
trust-several-humps = { $n } humps, at { $at }: the errors are of several kinds, and their mean tells nothing. Often low flows come out too low and storms too high.
trust-year = Year
trust-half-day = Half the water, days off
trust-years = Year by year, { $unit }:
trust-link-snow = Where a year has too much snow in the model, it has too much river (r { $r }, { $n } years): the error comes in with the weather.
trust-link-model = The error of a year's river does not go with that of its snow (r { $r }, { $n } years): look at the soil and the ground, not at the weather.
trust-link-both = The error of a year's river goes in part with that of its snow (r { $r }, { $n } years): weather and model both have a share.
trust-records = Other records
trust-days = Days
trust-snow = Snow
trust-lake = Lake

## The trust page

trust-chart-model = model
trust-chart-model-unseen = model, on years it never saw
trust-chart-measured = measured
trust-chart-season = The season, months, up to { $most }
trust-chart-duration = How often so much, from { $least } to { $most }
trust-chart-rare = few days
trust-chart-always = nearly always
trust-chart-no-errors = Daily errors: too few days
trust-chart-one-hump = Daily errors: one hump
trust-chart-humps = Daily errors: { $n } humps, so their mean tells nothing
trust-chart-too-little = too little
trust-chart-too-much = too much
trust-chart-years = Year by year, up to { $most }
