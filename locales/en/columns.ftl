# What `tell --columns` says of every column of the CSV and every part of the JSON.

columns-yearly = Years: --form csv. For each run and water year one row for the valley, where “canal” is empty, then one row for each canal or town. What a row does not have is empty.
columns-daily = Days: --form csv --daily. One row for each run and day. In place of GATE stands the key of a canal or town, as place.toml gives it.
columns-units = A name ends in its unit: _mm, _m3, _hm3 (million cubic meters), _m3s (cubic meters per second), _km2, _m. A name that ends in _share or _ratio runs from 0 to 1. Language and --units change nothing here.
columns-dates = Dates are written year-month-day. A water year has the name of the calendar year in which it ends.
columns-missing = Empty in CSV and null in JSON: there is no such value, as a reservoir that did not fill has no fill date.
columns-json = JSON: place, dials, as_it_was, with_changes and change. Each run has “years” with water_year, signs, canals and ledger, and “all” for the years shown together. The names are the same as in the CSV.
columns-all = In “all”: mean, least, most and the number of years that have the value. Dates are days of the water year there, with the month and day of the mean. reliability, resilience and vulnerability_hm3 judge the years (Hashimoto and others, 1982). The last two, and the ledger, are null where the years shown do not follow one another.
columns-change = In “change”: mean, least and most of the changes of each year against the same year at rest. Dates are in days; below zero is sooner.

column-run = as_it_was, with every dial at rest, or with_changes.
column-date = The day.
column-water-year = The water year.
column-canal = The key of the canal or town; empty for the whole valley.
column-canal-name = Its name in English.
column-right-year = The year of its right; empty for a right before all others.

## The ledger of the year

column-flow-basin-precipitation = In: rain and snow on the basin, without lake and fields.
column-flow-lake-rain = In: rain on the lake.
column-flow-field-rain = In: rain on the fields.
column-flow-storage-set-in = In: water that the dial starting_storage put into the reservoir.
column-flow-basin-evaporation = Out: given to the air by the land of the basin.
column-flow-sublimation = Out: snow that went straight to the air.
column-flow-lake-evaporation = Out: given to the air by the lake.
column-flow-field-evaporation = Out: given to the air by crops and fields.
column-flow-town-use = Out: used up by towns.
column-flow-deep-loss = Out: lost deep in the ground from canals and fields.
column-flow-river-loss = Out: stored water lost in the river on its way to the head gates.
column-flow-river-out = Out: river that leaves the valley.
column-flow-storage-set-out = Out: water that the dial starting_storage took from the reservoir.
column-flow-natural-inflow = Within: natural flow that reached the dam.
column-flow-reservoir-take = Within: natural flow that the reservoir kept.
column-flow-natural-take = Within: natural flow into canals.
column-flow-stored-release = Within: stored water let go for canals and towns.
column-flow-canals = Within: all water into canals at their heads.
column-flow-conveyance-loss = Within: lost on the way in canals.
column-flow-field-loss = Within: ran off the fields or sank below the roots.
column-flow-return-flow = Within: came back to the river after use.
column-flow-minimum-release = Within: stored water let go for the river minimum.
column-flow-flood-release = Within: stored water let go to make room for floods.
column-flow-spill = Within: natural flow that the outlet could not carry, and stored water over the spillway.

column-store-start-snow = Water in the snow on the first morning.
column-store-end-snow = Water in the snow in the last evening.
column-store-start-soil = Water in the soil of the basin on the first morning.
column-store-end-soil = Water in the soil of the basin in the last evening.
column-store-start-ground = Water in the ground on the first morning.
column-store-end-ground = Water in the ground in the last evening.
column-store-start-channel = River water on its way to the dam on the first morning.
column-store-end-channel = River water on its way to the dam in the last evening.
column-store-start-reservoir = Water in the reservoir above its outlet on the first morning.
column-store-end-reservoir = Water in the reservoir above its outlet in the last evening.
column-store-start-root-zones = Water in the root zones of the fields on the first morning.
column-store-end-root-zones = Water in the root zones of the fields in the last evening.
column-store-start-returning = Return flow on its way on the first morning.
column-store-end-returning = Return flow on its way in the last evening.

column-ledger-in-m3 = All that came in.
column-ledger-out-m3 = All that went out.
column-ledger-residual-m3 = Not accounted for: in, less out, less what the stores gained.
column-ledger-residual-share = The same as a share of what came in or went out, whichever is more.

## Every day

column-day-precipitation-mm = Rain and snow over the height bands.
column-day-snowfall-mm = Snow over the height bands.
column-day-snow-water-mm = Water held in the snow in the evening.
column-day-soil-mm = Water in the soil in the evening.
column-day-ground-mm = Water in the ground in the evening.
column-day-channel-mm = Water on its way to the dam in the evening.
column-day-evaporation-mm = Given to the air by the soil of the bands.
column-day-sublimation-mm = Snow that went straight to the air.
column-day-reference-evaporation-mm = Reference evaporation at the height that the place names.
column-day-inflow-m3s = Natural flow at the dam.
column-day-storage-hm3 = Water in the reservoir above its outlet in the evening.
column-day-lake-level-m = Level of the lake in the evening.
column-day-lake-area-km2 = Surface of the lake in the morning.
column-day-lake-rain-m3 = Rain on the lake.
column-day-lake-evaporation-m3 = Given to the air by the lake.
column-day-storage-set-m3 = Put into the reservoir by the dial starting_storage; below zero is taken out.
column-day-flood-release-m3s = Stored water let go to make room for floods.
column-day-spill-m3s = Natural flow that the outlet could not carry, and stored water over the spillway.
column-day-dam-outflow-m3s = All water that passed the dam.
column-day-return-flow-m3s = Water that came back to the river after use.
column-day-river-minimum-m3s = Flow that the river must have.
column-day-river-minimum-met = 1 where it had it, 0 where not.
column-day-river-out-m3s = Flow at the end of the river.

column-gate-demand-m3s = Asked for at the head gate.
column-gate-delivered-m3s = Into the canal at the head gate.
column-gate-stored-m3s = Stored water let go at the dam for this gate.
column-gate-crop-evaporation-m3 = Given to the air by its crops in their season.
column-gate-account-hm3 = Left in its water account in the evening.
