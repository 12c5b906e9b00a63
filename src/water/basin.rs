//! From weather to the flow that reaches the dam: the first stage of a run, for one setting or several side by side.
//!
//! The order of the day: weather under the dials; in each band rain or snow, sublimation, melt, refreezing, outflow,
//! soil; then, for the basin, ground stores and channel. Nothing is allocated.

use super::calendar::CalendarDay;
use super::channel::{Channel, ChannelStore};
use super::dials::Dials;
use super::evaporation::{DayBeforeWarming, SkyTable};
use super::ground::{Ground, GroundStores};
use super::lanes::Lanes;
use super::power::{AnyPower, CurveByPairs, Halves, HalvesByLane};
use super::slopes::{LaneSums, LaneWeather, RowStore, Slopes, total_of_one};
use super::snow::melt_factor_mm_c_day;
use super::units::M3_PER_MM_KM2;
use super::valley::{MOST_BANDS, Valley};
use super::weather::{Delta, StationDay, precipitation_factor_at};

/// Days that go through weather, slopes and ground together: each stage keeps its constants in registers, and the blocks
/// of the widest lanes still fit the nearest cache.
const BLOCK_DAYS: usize = 16;

/// What a day brings over the basin's bands. Depths are over the area of the bands.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct BasinDay {
    /// Rain and snow, mm.
    pub precipitation_mm: f64,
    /// Snow, mm.
    pub snowfall_mm: f64,
    /// Snow water in the evening, mm.
    pub snow_water_mm: f64,
    /// Soil water in the evening, mm.
    pub soil_mm: f64,
    /// Water in the two ground stores in the evening, mm.
    pub ground_mm: f64,
    /// Water under way to the dam in the evening, mm.
    pub channel_mm: f64,
    /// Evaporation from the soil, mm.
    pub evaporation_mm: f64,
    /// Snow lost to the air, mm.
    pub sublimation_mm: f64,
    /// Natural flow at the dam, m³.
    pub inflow_m3: f64,
    /// Reference evaporation at the reference elevation, mm.
    pub reference_evaporation_mm: f64,
    /// Precipitation at the reference elevation, where lake and fields are, mm.
    pub valley_precipitation_mm: f64,
}

/// Everything in store in the basin.
#[derive(Clone, Debug, PartialEq)]
pub struct BasinStores<const L: usize> {
    /// Snow and soil, row by row.
    pub rows: [RowStore<L>; MOST_BANDS],
    /// Ground, mm, lane by lane (the same in both lanes of a single run).
    pub ground: GroundStores<Lanes<L>>,
    /// Channel, mm, likewise.
    pub channel: ChannelStore<Lanes<L>>,
}

/// What a basin's run is about beside its bands: constants, and what of the weather they make.
#[derive(Clone, Debug)]
struct Course<const L: usize> {
    delta: Delta<Lanes<L>>,
    ground: Ground<Lanes<L>>,
    channel: Channel<Lanes<L>>,
    /// Area-weighted precipitation factor of the bands.
    mean_precipitation_factor: Lanes<L>,
    /// Share of corrected snowfall that the catch correction added.
    added_by_catch: Lanes<L>,
    valley_precipitation_factor: Lanes<L>,
    m3_per_mm: Lanes<L>,
    melt_factor: [Lanes<L>; 366],
}

/// A basin ready to run: one setting of the dials.
#[derive(Clone, Debug)]
pub struct Basin<'v> {
    valley: &'v Valley,
    sky: SkyTable,
    slopes: Slopes<2>,
    /// The same in both lanes.
    course: Course<2>,
}

/// `L` basins ready to run side by side: the same bands under different dials or parameters. `L` is even.
#[derive(Clone, Debug)]
pub struct Basins<'v, const L: usize> {
    valleys: [&'v Valley; L],
    sky: SkyTable,
    slopes: Slopes<L>,
    course: Course<L>,
}

impl<const L: usize> Course<L> {
    fn new(valleys: [&Valley; L], dials: [&Dials; L]) -> Self {
        let lanes = |read: fn(&Valley) -> f64| Lanes(valleys.map(read));
        let dialled = |lane: usize| Delta::new(&valleys[lane].climb, valleys[lane].is_southern(), dials[lane]);
        Self {
            delta: Delta::by_lane(core::array::from_fn(dialled)),
            ground: Ground::by_lane(valleys.map(|valley| &valley.ground)),
            channel: Channel::by_lane(valleys.map(|valley| &valley.channel)),
            mean_precipitation_factor: lanes(|valley| {
                let bands = valley.bands.iter();
                let weighted = bands.map(|band| band.area_km2 * precipitation_factor(valley, band.elevation_m));
                weighted.sum::<f64>() / valley.band_area_km2()
            }),
            added_by_catch: lanes(|valley| 1.0 - 1.0 / valley.climb.snow_catch_factor),
            valley_precipitation_factor: lanes(|valley| {
                precipitation_factor(valley, valley.evaporation.reference_elevation_m)
            }),
            m3_per_mm: lanes(|valley| valley.band_area_km2() * M3_PER_MM_KM2),
            melt_factor: core::array::from_fn(|index| {
                let on = |valley: &Valley| melt_factor_mm_c_day(&valley.snow, index as u16 + 1, valley.is_southern());
                Lanes(valleys.map(on))
            }),
        }
    }

    /// The weather of a few days under the dials. `valley` is any of the lanes: they are one place.
    #[inline(always)]
    fn weather(
        &self,
        valley: &Valley,
        sky: &SkyTable,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [LaneWeather<L>; BLOCK_DAYS],
    ) {
        for ((today, record), out) in calendar.iter().zip(record).zip(out) {
            let air = DayBeforeWarming::new(&valley.evaporation.method, sky, today.day_of_year, &record.air);
            let dialled = self.delta.day(today, record, &air);
            *out = LaneWeather {
                temperature_c: dialled.temperature_c,
                precipitation_mm: dialled.precipitation_mm,
                reference_evaporation_mm: dialled.reference_evaporation_mm,
                melt_factor: self.melt_factor[usize::from(today.day_of_year - 1) % 366],
                split_humidity_percent: split_humidity(valley, record),
            };
        }
    }

    /// A day whole: sends what the slopes gave through ground and channel.
    #[inline(always)]
    fn day(
        &self,
        weather: &LaneWeather<L>,
        sums: &LaneSums<L>,
        ground: &mut GroundStores<Lanes<L>>,
        channel: &mut ChannelStore<Lanes<L>>,
    ) -> LaneDay<L> {
        let flows = self.ground.day(ground, sums.recharge_mm);
        let arrived_mm = self.channel.day(channel, flows.quick_flow_mm + flows.slow_flow_mm);
        LaneDay {
            precipitation_mm: weather.precipitation_mm * self.mean_precipitation_factor
                + sums.snowfall_mm * self.added_by_catch,
            ground_mm: ground.quick_mm + ground.slow_mm,
            channel_mm: self.channel.in_transit(channel),
            inflow_m3: arrived_mm * self.m3_per_mm,
            valley_precipitation_mm: weather.precipitation_mm * self.valley_precipitation_factor,
        }
    }
}

/// What [`Course::day`] adds to weather and slopes, in the names of [`BasinDay`].
struct LaneDay<const L: usize> {
    precipitation_mm: Lanes<L>,
    ground_mm: Lanes<L>,
    channel_mm: Lanes<L>,
    inflow_m3: Lanes<L>,
    valley_precipitation_mm: Lanes<L>,
}

impl<const L: usize> LaneDay<L> {
    /// The day of one lane.
    #[inline(always)]
    fn of_lane(&self, lane: usize, weather: &LaneWeather<L>, sums: &LaneSums<L>) -> BasinDay {
        BasinDay {
            precipitation_mm: self.precipitation_mm.0[lane],
            snowfall_mm: sums.snowfall_mm.0[lane],
            snow_water_mm: sums.snow_water_mm.0[lane],
            soil_mm: sums.soil_mm.0[lane],
            ground_mm: self.ground_mm.0[lane],
            channel_mm: self.channel_mm.0[lane],
            evaporation_mm: sums.evaporation_mm.0[lane],
            sublimation_mm: sums.sublimation_mm.0[lane],
            inflow_m3: self.inflow_m3.0[lane],
            reference_evaporation_mm: weather.reference_evaporation_mm.0[lane],
            valley_precipitation_mm: self.valley_precipitation_mm.0[lane],
        }
    }
}

/// Runs `$run` with the recharge curve that fits `$powers`, one a lane: halves by multiplication, any other by our own
/// power. Halves that are common and the same in all lanes have a loop of their own.
macro_rules! with_curve {
    ($powers:expr, |$curve:ident| $run:expr) => {{
        let powers = $powers;
        let alike = powers.0.iter().all(|power| *power == powers.0[0]);
        let power = if alike { powers.0[0] } else { f64::NAN };
        let halves = power * 2.0;
        match halves as u32 {
            2 if halves == 2.0 => {
                let $curve = Halves::<2>;
                $run
            }
            3 if halves == 3.0 => {
                let $curve = Halves::<3>;
                $run
            }
            4 if halves == 4.0 => {
                let $curve = Halves::<4>;
                $run
            }
            5 if halves == 5.0 => {
                let $curve = Halves::<5>;
                $run
            }
            6 if halves == 6.0 => {
                let $curve = Halves::<6>;
                $run
            }
            7 if halves == 7.0 => {
                let $curve = Halves::<7>;
                $run
            }
            8 if halves == 8.0 => {
                let $curve = Halves::<8>;
                $run
            }
            _ => match HalvesByLane::of_powers(powers) {
                Some($curve) => $run,
                None => {
                    let $curve = AnyPower(powers);
                    $run
                }
            },
        }
    }};
}

impl<'v> Basin<'v> {
    /// The basin of `valley` under `dials`.
    pub fn new(valley: &'v Valley, dials: &Dials) -> Self {
        Self {
            valley,
            sky: sky_of(valley),
            slopes: Slopes::of_one(valley),
            course: Course::new([valley; 2], [dials; 2]),
        }
    }

    /// What is in store on the first morning, as the place says.
    pub fn start(&self) -> BasinStores<2> {
        let mut stores = BasinStores::empty([self.valley; 2]);
        for (row, store) in self.slopes.rows().iter().zip(&mut stores.rows) {
            store.snow.ice_mm = Lanes::splat(self.valley.start.snow_mm) * row.area_share;
            store.soil_mm = Lanes::splat(self.valley.start.soil_share * self.valley.soil.capacity_mm) * row.area_share;
        }
        stores
    }

    /// What is in store after `stores` evening, as the day before the first would show it.
    pub fn evening(&self, stores: &BasinStores<2>) -> BasinDay {
        let (mut snow, mut soil) = (Lanes::default(), Lanes::default());
        for store in &stores.rows[..self.slopes.rows().len()] {
            snow = snow + (store.snow.ice_mm + store.snow.liquid_mm);
            soil = soil + store.soil_mm;
        }
        BasinDay {
            snow_water_mm: total_of_one(snow),
            soil_mm: total_of_one(soil),
            ground_mm: (stores.ground.quick_mm + stores.ground.slow_mm).0[0],
            channel_mm: self.course.channel.in_transit(&stores.channel).0[0],
            ..BasinDay::default()
        }
    }

    /// Runs the days from `stores`, which end as they stand in the last evening. The slices are of equal length; the
    /// shortest counts.
    pub fn run(
        &self,
        stores: &mut BasinStores<2>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [BasinDay],
    ) {
        let powers = Lanes::splat(self.valley.soil.recharge_power);
        with_curve!(powers, |curve| self.run_with(curve, stores, calendar, record, out));
    }

    /// Like [`Basin::run`], telling `each` the number of the day and the snow water of every band, mm, every evening.
    pub fn run_telling(
        &self,
        stores: &mut BasinStores<2>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        mut each: impl FnMut(usize, &[f64]),
        out: &mut [BasinDay],
    ) {
        let bands = self.valley.bands.len();
        let mut snow_water_mm = [0.0; MOST_BANDS];
        for (index, ((calendar, record), out)) in calendar.iter().zip(record).zip(out).enumerate() {
            self.run(
                stores,
                core::slice::from_ref(calendar),
                core::slice::from_ref(record),
                core::slice::from_mut(out),
            );
            for (band, snow_water_mm) in snow_water_mm.iter_mut().enumerate().take(bands) {
                let (row, lane) = (band / 2, band % 2);
                let snow = &stores.rows[row].snow;
                let over_basin_mm = snow.ice_mm.0[lane] + snow.liquid_mm.0[lane];
                *snow_water_mm = over_basin_mm / self.slopes.rows()[row].area_share.0[lane];
            }
            each(index, &snow_water_mm[..bands]);
        }
    }

    fn run_with(
        &self,
        curve: impl CurveByPairs<2>,
        stores: &mut BasinStores<2>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [BasinDay],
    ) {
        let days = calendar.len().min(record.len()).min(out.len());
        let (calendar, record, out) = (&calendar[..days], &record[..days], &mut out[..days]);
        // Local copies: the compiler keeps what nobody else can see in registers.
        let mut rows = stores.rows;
        let mut weather = [LaneWeather::default(); BLOCK_DAYS];
        let mut sums = [LaneSums::default(); BLOCK_DAYS];
        let blocks = calendar.chunks(BLOCK_DAYS).zip(record.chunks(BLOCK_DAYS)).zip(out.chunks_mut(BLOCK_DAYS));
        for ((calendar, record), out) in blocks {
            self.course.weather(self.valley, &self.sky, calendar, record, &mut weather);
            self.slopes.days::<false>(curve, calendar, &weather[..calendar.len()], &mut rows, &mut sums);
            for ((sums, weather), out) in sums.iter().zip(&weather).zip(out) {
                let sums = sums.of_one();
                let day = self.course.day(weather, &sums, &mut stores.ground, &mut stores.channel);
                *out = day.of_lane(0, weather, &sums);
            }
        }
        stores.rows = rows;
    }
}

impl<'v, const L: usize> Basins<'v, L> {
    /// The basins of `valleys` under `dials`, side by side. The valleys must be one place: the same latitude, bands, kind
    /// of split and way to reference evaporation; parameters may differ.
    pub fn new(valleys: [&'v Valley; L], dials: [&Dials; L]) -> Self {
        Self { valleys, sky: sky_of(valleys[0]), slopes: Slopes::of_many(valleys), course: Course::new(valleys, dials) }
    }

    /// What is in store on the first morning, as the places say.
    pub fn start(&self) -> BasinStores<L> {
        let mut stores = BasinStores::empty(self.valleys);
        let snow_mm = Lanes(self.valleys.map(|valley| valley.start.snow_mm));
        let soil_mm = Lanes(self.valleys.map(|valley| valley.start.soil_share * valley.soil.capacity_mm));
        for (row, store) in self.slopes.rows().iter().zip(&mut stores.rows) {
            store.snow.ice_mm = snow_mm * row.area_share;
            store.soil_mm = soil_mm * row.area_share;
        }
        stores
    }

    /// Runs the days; `out` has one slice a lane, as long as the record.
    pub fn run(
        &self,
        stores: &mut BasinStores<L>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [&mut [BasinDay]; L],
    ) {
        let powers = Lanes(self.valleys.map(|valley| valley.soil.recharge_power));
        // Where one lane's power is no number of halves all take the general curve: then the bits of a lane that is one
        // are those of a run alone only to 1e-12.
        with_curve!(powers, |curve| self.run_with(curve, stores, calendar, record, out));
    }

    fn run_with(
        &self,
        curve: impl CurveByPairs<L>,
        stores: &mut BasinStores<L>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [&mut [BasinDay]; L],
    ) {
        let days = calendar.len().min(record.len());
        let (calendar, record) = (&calendar[..days], &record[..days]);
        let mut weather = [LaneWeather::default(); BLOCK_DAYS];
        let mut sums = [LaneSums::default(); BLOCK_DAYS];
        for (block, (calendar, record)) in calendar.chunks(BLOCK_DAYS).zip(record.chunks(BLOCK_DAYS)).enumerate() {
            let first = block * BLOCK_DAYS;
            self.course.weather(self.valleys[0], &self.sky, calendar, record, &mut weather);
            self.slopes.days::<true>(curve, calendar, &weather[..calendar.len()], &mut stores.rows, &mut sums);
            for (index, (sums, weather)) in sums.iter().zip(&weather).enumerate().take(calendar.len()) {
                let day = self.course.day(weather, sums, &mut stores.ground, &mut stores.channel);
                for (lane, out) in out.iter_mut().enumerate() {
                    if let Some(out) = out.get_mut(first + index) {
                        *out = day.of_lane(lane, weather, sums);
                    }
                }
            }
        }
    }
}

impl<const L: usize> BasinStores<L> {
    /// The ground as the places say, and nothing on the slopes.
    fn empty(valleys: [&Valley; L]) -> Self {
        Self {
            rows: [RowStore::default(); MOST_BANDS],
            ground: GroundStores {
                quick_mm: Lanes(valleys.map(|valley| valley.start.quick_mm)),
                slow_mm: Lanes(valleys.map(|valley| valley.start.slow_mm)),
            },
            channel: ChannelStore::default(),
        }
    }
}

fn sky_of(valley: &Valley) -> SkyTable {
    // `place` admits only latitudes that have a table; any other gives no number rather than a wrong one.
    let nowhere = SkyTable { extraterrestrial_mj_m2: [f64::NAN; 366], daylight_h: [f64::NAN; 366] };
    SkyTable::at_latitude(valley.latitude_deg).unwrap_or(nowhere)
}

fn precipitation_factor(valley: &Valley, elevation_m: f64) -> f64 {
    precipitation_factor_at(&valley.climb, valley.station_elevation_m, elevation_m)
}

/// Humidity by which the day's rain and snow are split, %; `None` where air temperature splits them.
#[inline(always)]
fn split_humidity(valley: &Valley, record: &StationDay) -> Option<f64> {
    let humidity_percent = record.relative_humidity_percent;
    let counts = valley.rain_snow.wet_bulb && record.precipitation_mm > 0.0 && !humidity_percent.is_nan();
    counts.then_some(humidity_percent)
}
