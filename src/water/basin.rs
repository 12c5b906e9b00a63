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
use super::power::{AnyPower, Halves, HalvesByLane, PowerCurve};
use super::slopes::{LaneSums, LaneWeather, RowStore, Slopes, total_of_one};
use super::snow::melt_factor_mm_c_day;
use super::units::M3_PER_MM_KM2;
use super::valley::{MOST_BANDS, Valley};
use super::weather::{Delta, DialledDay, StationDay, is_cold_half, precipitation_factor_at};

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
    /// Ground, lane by lane (the first lane alone in a single run).
    pub ground: [GroundStores; L],
    /// Channel, mm, likewise.
    pub channel: [ChannelStore; L],
}

/// The constants of a basin's run, beside the rows of its bands.
#[derive(Clone, Debug)]
struct Course {
    delta: Delta,
    ground: Ground,
    channel: Channel,
    /// Area-weighted precipitation factor of the bands.
    mean_precipitation_factor: f64,
    /// Share of corrected snowfall that the catch correction added.
    added_by_catch: f64,
    valley_precipitation_factor: f64,
    area_km2: f64,
}

/// A basin ready to run: one setting of the dials.
#[derive(Clone, Debug)]
pub struct Basin<'v> {
    valley: &'v Valley,
    sky: SkyTable,
    slopes: Slopes<2>,
    course: Course,
    melt_factor: [f64; 366],
}

/// `L` basins ready to run side by side: the same bands under different dials or parameters.
#[derive(Clone, Debug)]
pub struct Basins<'v, const L: usize> {
    valleys: [&'v Valley; L],
    sky: SkyTable,
    slopes: Slopes<L>,
    courses: [Course; L],
    melt_factor: [Lanes<L>; 366],
}

impl Course {
    fn new(valley: &Valley, dials: &Dials) -> Self {
        let climb = &valley.climb;
        let factor_at = |elevation_m| precipitation_factor_at(climb, valley.station_elevation_m, elevation_m);
        let area_km2 = valley.band_area_km2();
        let weighted: f64 = valley.bands.iter().map(|band| band.area_km2 * factor_at(band.elevation_m)).sum();
        Self {
            delta: Delta::new(climb, valley.is_southern(), dials),
            ground: Ground::new(&valley.ground),
            channel: Channel::new(&valley.channel),
            mean_precipitation_factor: weighted / area_km2,
            added_by_catch: 1.0 - 1.0 / climb.snow_catch_factor,
            valley_precipitation_factor: factor_at(valley.evaporation.reference_elevation_m),
            area_km2,
        }
    }

    /// What the weather alone gives of a day.
    #[inline(always)]
    fn open(&self, weather: &DialledDay) -> BasinDay {
        BasinDay {
            precipitation_mm: weather.precipitation_mm * self.mean_precipitation_factor,
            reference_evaporation_mm: weather.reference_evaporation_mm,
            valley_precipitation_mm: weather.precipitation_mm * self.valley_precipitation_factor,
            ..BasinDay::default()
        }
    }

    /// Sends the slopes' water through ground and channel; the sums of the slopes are in `day`.
    #[inline(always)]
    fn close(&self, day: &mut BasinDay, recharge_mm: f64, ground: &mut GroundStores, channel: &mut ChannelStore) {
        day.precipitation_mm += day.snowfall_mm * self.added_by_catch;
        let flows = self.ground.day(ground, recharge_mm);
        let arrived_mm = self.channel.day(channel, flows.quick_flow_mm + flows.slow_flow_mm);
        day.ground_mm = ground.quick_mm + ground.slow_mm;
        day.channel_mm = self.channel.in_transit(channel);
        day.inflow_m3 = arrived_mm * self.area_km2 * M3_PER_MM_KM2;
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
            course: Course::new(valley, dials),
            melt_factor: core::array::from_fn(|index| melt_factor_on(valley, index)),
        }
    }

    /// What is in store on the first morning, as the place says.
    pub fn start(&self) -> BasinStores<2> {
        let mut stores = BasinStores::empty();
        for row in &mut stores.rows[..self.slopes.rows().len()] {
            row.snow.ice_mm = Lanes::splat(self.valley.start.snow_mm);
            row.soil_mm = Lanes::splat(self.valley.start.soil_share * self.valley.soil.capacity_mm);
        }
        stores.ground[0] = GroundStores { quick_mm: self.valley.start.quick_mm, slow_mm: self.valley.start.slow_mm };
        stores
    }

    /// What is in store after `stores` evening, as the day before the first would show it.
    pub fn evening(&self, stores: &BasinStores<2>) -> BasinDay {
        let (mut snow, mut soil) = (Lanes::default(), Lanes::default());
        for (row, store) in self.slopes.rows().iter().zip(&stores.rows) {
            snow = snow + row.area_share * (store.snow.ice_mm + store.snow.liquid_mm);
            soil = soil + row.area_share * store.soil_mm;
        }
        BasinDay {
            snow_water_mm: total_of_one(snow),
            soil_mm: total_of_one(soil),
            ground_mm: stores.ground[0].quick_mm + stores.ground[0].slow_mm,
            channel_mm: self.course.channel.in_transit(&stores.channel[0]),
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

    /// Like [`Basin::run`], telling `each` the number of the day and the stores of the bands every evening.
    pub fn run_telling(
        &self,
        stores: &mut BasinStores<2>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        mut each: impl FnMut(usize, &[RowStore<2>]),
        out: &mut [BasinDay],
    ) {
        let used = self.slopes.rows().len();
        for (index, ((calendar, record), out)) in calendar.iter().zip(record).zip(out).enumerate() {
            self.run(
                stores,
                core::slice::from_ref(calendar),
                core::slice::from_ref(record),
                core::slice::from_mut(out),
            );
            each(index, &stores.rows[..used]);
        }
    }
    fn run_with(
        &self,
        curve: impl PowerCurve<2>,
        stores: &mut BasinStores<2>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [BasinDay],
    ) {
        let southern = self.valley.is_southern();
        let days = calendar.len().min(record.len()).min(out.len());
        let (calendar, record, out) = (&calendar[..days], &record[..days], &mut out[..days]);
        // Local copies: the compiler keeps what nobody else can see in registers.
        let (mut rows, mut ground, mut channel) = (stores.rows, stores.ground[0], stores.channel[0]);
        let mut weather = [LaneWeather::default(); BLOCK_DAYS];
        let mut sums = [[LaneSums::default(); 2]; BLOCK_DAYS];
        let blocks = calendar.chunks(BLOCK_DAYS).zip(record.chunks(BLOCK_DAYS)).zip(out.chunks_mut(BLOCK_DAYS));
        for ((calendar, record), out) in blocks {
            for (((today, record), weather), out) in calendar.iter().zip(record).zip(&mut weather).zip(out.iter_mut()) {
                let air = air_of(self.valley, &self.sky, today, record);
                let dialled = self.course.delta.day(today, record, &air);
                *weather = LaneWeather {
                    temperature_c: Lanes::splat(dialled.temperature_c),
                    precipitation_mm: Lanes::splat(dialled.precipitation_mm),
                    reference_evaporation_mm: Lanes::splat(dialled.reference_evaporation_mm),
                    melt_factor: Lanes::splat(self.melt_factor[usize::from(today.day_of_year - 1) % 366]),
                    most_sublimation_mm: Lanes::splat(sublimation_on(self.valley, today, southern)),
                    split_humidity_percent: split_humidity(self.valley, record),
                };
                *out = self.course.open(&dialled);
            }
            self.slopes.days::<false>(curve, calendar, &weather[..out.len()], &mut rows, &mut sums);
            for ([sum, _], out) in sums.iter().zip(out) {
                out.snowfall_mm = total_of_one(sum.snowfall_mm);
                out.snow_water_mm = total_of_one(sum.snow_water_mm);
                out.soil_mm = total_of_one(sum.soil_mm);
                out.evaporation_mm = total_of_one(sum.evaporation_mm);
                out.sublimation_mm = total_of_one(sum.sublimation_mm);
                self.course.close(out, total_of_one(sum.recharge_mm), &mut ground, &mut channel);
            }
        }
        (stores.rows, stores.ground[0], stores.channel[0]) = (rows, ground, channel);
    }
}

impl<'v, const L: usize> Basins<'v, L> {
    /// The basins of `valleys` under `dials`, side by side. The valleys must be one place: the same latitude, bands, kind
    /// of split and way to reference evaporation; parameters may differ.
    pub fn new(valleys: [&'v Valley; L], dials: [&Dials; L]) -> Self {
        Self {
            valleys,
            sky: sky_of(valleys[0]),
            slopes: Slopes::of_many(valleys),
            courses: core::array::from_fn(|lane| Course::new(valleys[lane], dials[lane])),
            melt_factor: core::array::from_fn(|index| Lanes(valleys.map(|valley| melt_factor_on(valley, index)))),
        }
    }

    /// What is in store on the first morning, as the places say.
    pub fn start(&self) -> BasinStores<L> {
        let mut stores = BasinStores::empty();
        for (lane, valley) in self.valleys.iter().enumerate() {
            for row in &mut stores.rows[..self.slopes.rows().len()] {
                row.snow.ice_mm.0[lane] = valley.start.snow_mm;
                row.soil_mm.0[lane] = valley.start.soil_share * valley.soil.capacity_mm;
            }
            stores.ground[lane] = GroundStores { quick_mm: valley.start.quick_mm, slow_mm: valley.start.slow_mm };
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
        curve: impl PowerCurve<L>,
        stores: &mut BasinStores<L>,
        calendar: &[CalendarDay],
        record: &[StationDay],
        out: &mut [&mut [BasinDay]; L],
    ) {
        let southern = self.valleys[0].is_southern();
        let days = calendar.len().min(record.len());
        let (calendar, record) = (&calendar[..days], &record[..days]);
        let mut rows = stores.rows;
        let mut weather = [LaneWeather::default(); BLOCK_DAYS];
        let mut sums = [[LaneSums::default(); 2]; BLOCK_DAYS];
        for (block, (calendar, record)) in calendar.chunks(BLOCK_DAYS).zip(record.chunks(BLOCK_DAYS)).enumerate() {
            let first = block * BLOCK_DAYS;
            for (index, (today, record)) in calendar.iter().zip(record).enumerate() {
                let weather = &mut weather[index];
                weather.melt_factor = self.melt_factor[usize::from(today.day_of_year - 1) % 366];
                weather.most_sublimation_mm = Lanes(self.valleys.map(|valley| sublimation_on(valley, today, southern)));
                weather.split_humidity_percent = split_humidity(self.valleys[0], record);
                let air = air_of(self.valleys[0], &self.sky, today, record);
                for lane in 0..L {
                    let dialled = self.courses[lane].delta.day(today, record, &air);
                    weather.temperature_c.0[lane] = dialled.temperature_c;
                    weather.precipitation_mm.0[lane] = dialled.precipitation_mm;
                    weather.reference_evaporation_mm.0[lane] = dialled.reference_evaporation_mm;
                    if let Some(out) = out[lane].get_mut(first + index) {
                        *out = self.courses[lane].open(&dialled);
                    }
                }
            }
            self.slopes.days::<true>(curve, calendar, &weather[..calendar.len()], &mut rows, &mut sums);
            for (index, [even, odd]) in sums.iter().enumerate().take(calendar.len()) {
                let snowfall = even.snowfall_mm + odd.snowfall_mm;
                let snow_water = even.snow_water_mm + odd.snow_water_mm;
                let soil = even.soil_mm + odd.soil_mm;
                let evaporation = even.evaporation_mm + odd.evaporation_mm;
                let sublimation = even.sublimation_mm + odd.sublimation_mm;
                let recharge = even.recharge_mm + odd.recharge_mm;
                for lane in 0..L {
                    let Some(out) = out[lane].get_mut(first + index) else { continue };
                    out.snowfall_mm = snowfall.0[lane];
                    out.snow_water_mm = snow_water.0[lane];
                    out.soil_mm = soil.0[lane];
                    out.evaporation_mm = evaporation.0[lane];
                    out.sublimation_mm = sublimation.0[lane];
                    let (ground, channel) = (&mut stores.ground[lane], &mut stores.channel[lane]);
                    self.courses[lane].close(out, recharge.0[lane], ground, channel);
                }
            }
        }
        stores.rows = rows;
    }
}

impl<const L: usize> BasinStores<L> {
    fn empty() -> Self {
        Self {
            rows: [RowStore::default(); MOST_BANDS],
            ground: [GroundStores::default(); L],
            channel: [ChannelStore::default(); L],
        }
    }
}

fn sky_of(valley: &Valley) -> SkyTable {
    // `place` admits only latitudes that have a table; any other gives no number rather than a wrong one.
    let nowhere = SkyTable { extraterrestrial_mj_m2: [f64::NAN; 366], daylight_h: [f64::NAN; 366] };
    SkyTable::at_latitude(valley.latitude_deg).unwrap_or(nowhere)
}

#[inline(always)]
fn air_of<'a>(valley: &'a Valley, sky: &SkyTable, today: &CalendarDay, record: &'a StationDay) -> DayBeforeWarming<'a> {
    DayBeforeWarming::new(&valley.evaporation.method, sky, today.day_of_year, &record.air)
}

fn melt_factor_on(valley: &Valley, index: usize) -> f64 {
    melt_factor_mm_c_day(&valley.snow, index as u16 + 1, valley.is_southern())
}

#[inline(always)]
fn sublimation_on(valley: &Valley, today: &CalendarDay, southern: bool) -> f64 {
    if is_cold_half(today.month_index(), southern) { valley.snow.sublimation_mm_day } else { 0.0 }
}

/// Humidity by which the day's rain and snow are split, %; `None` where air temperature splits them.
#[inline(always)]
fn split_humidity(valley: &Valley, record: &StationDay) -> Option<f64> {
    let humidity_percent = record.relative_humidity_percent;
    let counts = valley.rain_snow.wet_bulb && record.precipitation_mm > 0.0 && !humidity_percent.is_nan();
    counts.then_some(humidity_percent)
}
