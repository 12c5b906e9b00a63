# The ledger: every store and every flow, with its short form (14 characters at most).

## Water in

ledger-precipitation = Rain and snow on the basin
    .short = Rain and snow
    .plain = What fell on the mountains and the valley floor, without lake and fields.
ledger-lake-rain = Rain on the lake
    .short = Rain on lake
    .plain = What fell straight onto the reservoir.
ledger-field-rain = Rain on the fields
    .short = Rain on fields
    .plain = What fell straight onto the irrigated fields.
ledger-set-storage = Storage that a dial set
    .short = Set by dial
    .plain = Water that the dial added at the start of a year. A minus means taken away.
ledger-inflow = River into the reservoir
    .short = Inflow
    .plain = What the river brought to the reservoir.

## Water out

ledger-evaporation = Given to the air by the land
    .short = Land to air
    .plain = What soil and plants of the basin gave to the air.
ledger-sublimation = Snow straight to the air
    .short = Snow to air
    .plain = Snow that went to the air without melting.
ledger-lake-evaporation = Given to the air by the lake
    .short = Lake to air
    .plain = What the reservoir gave to the air.
ledger-crop-evaporation = Given to the air by crops
    .short = Crops to air
    .plain = What the fields and their crops gave to the air.
ledger-town-use = Used up by the town
    .short = Town use
    .plain = Town water that does not come back to the river.
ledger-deep-loss = Lost deep in the ground
    .short = Deep ground
    .plain = What went so deep that it does not come back to the river.
ledger-river-loss = Lost along the river
    .short = River loss
    .plain = Stored water lost on its way down the river to the head gate.
ledger-river-out = River leaving the valley
    .short = River out
    .plain = What flows on to the neighbors downstream.

## Water inside

ledger-canal-take = Taken in at the head gates
    .short = Head gates
    .plain = What the canals took from the river.
ledger-town-take = Taken by the town
    .short = Town take
    .plain = What the town took from the river or the reservoir.
ledger-seepage = Seepage from canals
    .short = Seepage
    .plain = What leaked into the ground from the canals.
ledger-field-delivery = Delivered to fields
    .short = To the fields
    .plain = What reached the fields.
ledger-field-loss = Field losses
    .short = Field losses
    .plain = What ran off or sank below the roots.
ledger-return-flow = Return flow
    .short = Return flow
    .plain = What came back to the river after use.
ledger-release = Released from the reservoir
    .short = Release
    .plain = What was let out of the reservoir on purpose.
ledger-spill = Spill
    .short = Spill
    .plain = What went over because there was no room left.
ledger-flood-release = Released to keep room for floods
    .short = Flood release
    .plain = What was let go so that a flood can fit.

## Stores

ledger-snow = Snow
    .short = Snow
    .plain = Water held in the snow.
ledger-soil = Soil
    .short = Soil
    .plain = Water held in the soil of the basin.
ledger-ground-quick = Ground, quick part
    .short = Quick ground
    .plain = Water in the ground that reaches the river in days.
ledger-ground-slow = Ground, slow part
    .short = Slow ground
    .plain = Water in the ground that feeds the river for months.
ledger-in-transit = River water on its way
    .short = On its way
    .plain = Water in the river that has not arrived yet.
ledger-reservoir = Reservoir
    .short = Reservoir
    .plain = Water in the reservoir, with what lies below the outlet.
ledger-root-zone = Root zones of the fields
    .short = Root zones
    .plain = Water in the soil where the crops have their roots.
ledger-return-store = Return flow on its way
    .short = Returns later
    .plain = Water under canals and fields that comes back later.

## The sum

ledger-title = Where the water went
ledger-in = Water in
ledger-out = Water out
ledger-inside = On the way
ledger-store-start = In store at the start
ledger-store-end = In store at the end
ledger-store-change = Change in store
ledger-residual = Not accounted for
ledger-rule = What came in equals what went out plus the change in store.
