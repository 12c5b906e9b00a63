# The map of two dials: what its page says, and the command `map`.

## The page

answer-grid-working = The map is filling in: { $done } of { $all } points.
answer-grid-none = No year here has “{ $sign }”.
answer-grid-same = “{ $sign }” is the same all over this map: { $value }.
answer-grid-range = On this map, “{ $sign }” goes from { $least } to { $most }.
answer-grid-supply-takes = With { $across }, canals get { $level } of their water only with { $up }.
answer-grid-supply-holds = With { $across }, canals always get { $level } or more of their water on this map.
answer-grid-supply-fails = With { $across }, canals never get { $level } of their water on this map.
answer-grid-canal-takes = With { $across }, { $canal } gets { $level } of its water only with { $up }.
answer-grid-canal-holds = With { $across }, { $canal } always gets { $level } or more of its water on this map.
answer-grid-canal-fails = With { $across }, { $canal } never gets { $level } of its water on this map.
answer-grid-keep-takes = With { $across }, “{ $sign }” stays at { $level } only with { $up }.
answer-grid-keep-holds = With { $across }, “{ $sign }” is always { $level } on this map.
answer-grid-keep-fails = With { $across }, “{ $sign }” is never { $level } on this map.
answer-grid-brief-takes = { $across }: { $sign } { $level } only with { $up }.
answer-grid-brief-holds = { $across }: { $sign } always { $level } here.
answer-grid-brief-fails = { $across }: { $sign } never { $level } here.

grid-brief-at = { $dial } { $value }
grid-at-least = { $value } or more
grid-at-most = { $value } or less
grid-no-sooner = { $value } or later
grid-at-warming = { $value }
grid-at-winter-precipitation = winter rain and snow at { $value }
grid-at-summer-precipitation = summer rain at { $value }
grid-at-diversion = canal demand at { $value }
grid-at-canal-lining = canal lining at { $value }
grid-at-crop-mix = the crop change at { $value }
grid-at-river-minimum = the river minimum at { $value }
grid-at-reservoir-size = the reservoir size at { $value }
grid-at-starting-storage = the storage at the start at { $value }
grid-at-town-growth = town growth at { $value }

grid-side = { $dial }, { $unit }
grid-years = { $n ->
    [one] { $n } year
   *[other] mean of { $n } years
}
grid-days = { $n ->
    [one] { $n } day
   *[other] { $n } days
}
grid-enough = enough: { $value }
grid-as-it-was = as it was: { $value }
grid-no-value = no value

## The command

help-map = Makes a map: one number over every combination of two dials.
help-usage-map = [PLACE] [OPTIONS]
help-over = A dial with its values, for example warming=0..6:0.5. Give two. Without a step, the step of the dial is taken.
help-sign = What the map shows, by its name in the JSON of tell, for example supply_ratio or reliability.
help-canal = Shows the number of one canal or town, by its key in place.toml.
help-map-set = Turns another dial for the whole map, or marks the present setting of a dial of the map.
help-map-form = How to write the map: csv, json or png.
help-part = Makes only part K of N, for example 2/8; with --form json. Any N gives the same numbers.
help-merge = A part to put together with the others. Give all of them; the dials and the number come from the parts.
value-over = SIDE
value-sign = NAME
value-canal = KEY
value-part = K/N
help-map-more =
    CSV: one row for each combination; the two dials, then the number.
    JSON: place, sign, canal, years, dials (for the whole map), over (the two
    dials with their values), enough_share, as_it_was, part, and values: along
    the first dial, row after row of the second. A date is the day of the water
    year. Empty or null: no year has such a number.

    Example: deshielo map demo --over warming=0..6:0.5
             --over winter_precipitation=-20..20:5 --sign supply_ratio

progress-map = The map: { $done } of { $all }
error-over-count = A map has two dials. Give --over twice, or not at all.
error-over-unreadable = “{ $text }” does not say from where to where. Write it like this: { $example }.
error-over-same = Both sides of the map turn the dial “{ $dial }”. Choose another for one of them.
error-over-step = The step of “{ $dial }” must be more than 0.
error-over-backward = The values of “{ $dial }” must go up: from { $from } to { $to } they do not.
error-over-misses = Steps of { $step } do not meet { $to } for “{ $dial }”. The last value before it is { $last }.
error-over-many = “{ $dial }” has too many values. { $most } are the most.
error-map-cells = The map has too many points. { $most } are the most.
error-sign-unknown = There is no number “{ $sign }” for a map. There are: { $signs }.
error-sign-unknown-nearest = There is no number “{ $sign }” for a map. Did you mean “{ $nearest }”?
error-canal-unknown = There is no canal or town “{ $canal }”. There are: { $canals }.
error-canal-none = This place has no canals.
error-part-unreadable = “{ $text }” is no part. Write it like this: { $example }. The first number goes from 1 to the second.
error-size-unreadable = “{ $text }” is no size. Write it like this: { $example }. Each side goes from { $low } to { $high }.
error-png-out = A picture goes into a file. Add --out FILE.
error-png-failed = The picture cannot be written.
error-merge-with = --merge does not go with { $option }: the parts say it already.
error-merge-file = { $path } is not a part of a map: { $reason }
error-merge-values = the numbers do not fit its dials
error-merge-differ = { $path } is part of another map than { $other }.
error-merge-twice = { $path } is the same part as { $other }.
error-merge-missing = Parts are missing: { $parts } of { $all }.
error-merge-place = The parts are of “{ $found }”, not of “{ $place }”. Name the place that they were made of.
