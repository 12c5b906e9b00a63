//! Snow and soil of all bands for one day: the innermost loop, for one run or for several settings side by side.
//!
//! In one run neighbouring bands share the lanes; with several settings each band is a row and the settings share the
//! lanes. Either way the bands of even and of odd index are summed apart and added at the end, so that a run gives the
//! same bits alone and in company.
//!
//! Depths of a band are over the whole basin here, its own times its share of the area: snow and soil do not mind, and the
//! sums over the bands need no weights.

use super::calendar::CalendarDay;
use super::evaporation::air::wet_bulb_c;
use super::lanes::Lanes;
use super::power::{CurveByPairs, PowerCurve};
use super::snow::{SnowConstants, SnowStore, SnowWarmth};
use super::soil::SoilConstants;
use super::valley::{MOST_BANDS, Valley};
use super::weather::{is_cold_half, precipitation_factor_at};

/// What differs from band to band, one row.
#[derive(Clone, Copy, Debug, Default)]
pub struct BandRow<const L: usize> {
    /// Share of the bands' area.
    pub area_share: Lanes<L>,
    /// From the station's precipitation to the band's, over the basin.
    precipitation_factor: Lanes<L>,
    /// On the degree-day factor, over the basin.
    melt_exposure: Lanes<L>,
    /// On reference evaporation, over the basin.
    evaporation_factor: Lanes<L>,
    /// One over the snow water that covers the band, mm over the basin.
    per_full_cover_mm: Lanes<L>,
    soil: SoilConstants<L>,
}

/// What differs from band to band and from month to month.
#[derive(Clone, Copy, Debug, Default)]
struct MonthRow<const L: usize> {
    warmth: SnowWarmth<L>,
    /// Most that the air takes from snow in a day, mm over the basin.
    most_sublimation_mm: Lanes<L>,
}

type MonthRows<const L: usize> = [MonthRow<L>; MOST_BANDS];

/// Snow and soil of a row, mm over the basin.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct RowStore<const L: usize> {
    /// Snow.
    pub snow: SnowStore<L>,
    /// Soil water.
    pub soil_mm: Lanes<L>,
}

/// The rows of all bands.
#[derive(Clone, Debug)]
pub struct Slopes<const L: usize> {
    snow: SnowConstants<L>,
    rows: [BandRow<L>; MOST_BANDS],
    offset_c: [[Lanes<L>; MOST_BANDS]; 12],
    months: [MonthRows<L>; 12],
    used: usize,
}

/// The weather of a day, one value a lane.
#[derive(Clone, Copy, Debug, Default)]
pub struct LaneWeather<const L: usize> {
    /// At the station, °C.
    pub temperature_c: Lanes<L>,
    /// At the station, mm.
    pub precipitation_mm: Lanes<L>,
    /// At the reference elevation, mm.
    pub reference_evaporation_mm: Lanes<L>,
    /// Degree-day factor of the day, mm/°C/day.
    pub melt_factor: Lanes<L>,
    /// Where wet-bulb temperature splits rain from snow today: the station's humidity, %.
    pub split_humidity_percent: Option<f64>,
}

/// Sums of a day over the bands, mm over the basin.
#[derive(Clone, Copy, Debug, Default)]
pub struct LaneSums<const L: usize> {
    /// Snow that fell, corrected for catch.
    pub snowfall_mm: Lanes<L>,
    /// Snow water in the evening.
    pub snow_water_mm: Lanes<L>,
    /// Snow lost to the air.
    pub sublimation_mm: Lanes<L>,
    /// Soil water in the evening.
    pub soil_mm: Lanes<L>,
    /// Evaporation from the soil.
    pub evaporation_mm: Lanes<L>,
    /// Water passed to the ground stores.
    pub recharge_mm: Lanes<L>,
}

impl Slopes<2> {
    /// One run of `valley`: two bands a row.
    pub fn of_one(valley: &Valley) -> Self {
        let snow = SnowConstants::new(&valley.rain_snow, &valley.snow, valley.climb.snow_catch_factor);
        let mut slopes = Self::empty(snow, valley.bands.len().div_ceil(2));
        for index in 0..valley.bands.len() {
            slopes.set(valley, index, index / 2, index % 2);
        }
        slopes.warm();
        slopes
    }
}

impl<const L: usize> Slopes<L> {
    /// `L` runs side by side, a band a row: the same place with different parameters. All valleys must have as many
    /// bands as the first.
    pub fn of_many(valleys: [&Valley; L]) -> Self {
        let snow = SnowConstants::by_lane(
            valleys.map(|v| &v.rain_snow),
            valleys.map(|v| &v.snow),
            valleys.map(|v| v.climb.snow_catch_factor),
        );
        let bands = valleys.iter().map(|v| v.bands.len()).min().unwrap_or(0);
        let mut slopes = Self::empty(snow, bands);
        for (lane, valley) in valleys.into_iter().enumerate() {
            for index in 0..bands {
                slopes.set(valley, index, index, lane);
            }
        }
        slopes.warm();
        slopes
    }

    fn empty(snow: SnowConstants<L>, used: usize) -> Self {
        Self {
            snow,
            rows: [BandRow::default(); MOST_BANDS],
            offset_c: [[Lanes::default(); MOST_BANDS]; 12],
            months: [[MonthRow::default(); MOST_BANDS]; 12],
            used,
        }
    }

    fn set(&mut self, valley: &Valley, index: usize, row: usize, lane: usize) {
        let Some(band) = valley.bands.get(index) else { return };
        let climb_m = band.elevation_m - valley.station_elevation_m;
        let area_share = band.area_km2 / valley.band_area_km2();
        let to = &mut self.rows[row];
        to.area_share.0[lane] = area_share;
        to.precipitation_factor.0[lane] =
            precipitation_factor_at(&valley.climb, valley.station_elevation_m, band.elevation_m) * area_share;
        to.melt_exposure.0[lane] = band.melt_exposure * area_share;
        to.evaporation_factor.0[lane] = band.evaporation_factor * area_share;
        to.per_full_cover_mm.0[lane] = 1.0 / (valley.snow.full_cover_mm * area_share);
        to.soil.set(lane, &valley.soil, area_share);
        for (month_index, lapse) in valley.climb.lapse_c_per_km.into_iter().enumerate() {
            self.offset_c[month_index][row].0[lane] = lapse * climb_m / 1000.0;
            if is_cold_half(month_index, valley.is_southern()) {
                self.months[month_index][row].most_sublimation_mm.0[lane] = valley.snow.sublimation_mm_day * area_share;
            }
        }
    }

    /// Works out what the bands' offsets of temperature mean to snow.
    fn warm(&mut self) {
        for (rows, offsets) in self.months.iter_mut().zip(&self.offset_c) {
            for (row, offset_c) in rows.iter_mut().zip(offsets).take(self.used) {
                row.warmth = self.snow.of_offset(*offset_c);
            }
        }
    }

    /// The rows in use.
    pub fn rows(&self) -> &[BandRow<L>] {
        &self.rows[..self.used]
    }

    /// Some days over all bands, each into its place in `sums`. With `APART` the rows of even and of odd index are summed
    /// apart and then added; without it the sums are over all rows. The slices are of equal length; the shortest counts.
    #[inline(never)]
    pub fn days<const APART: bool>(
        &self,
        curve: impl CurveByPairs<L>,
        calendar: &[CalendarDay],
        weather: &[LaneWeather<L>],
        stores: &mut [RowStore<L>; MOST_BANDS],
        sums: &mut [LaneSums<L>],
    ) {
        let mut split = [MonthRow::default(); MOST_BANDS];
        let mut thaw = [Thaw::default(); MOST_BANDS];
        let mut snow_water_mm = self.snow_water_mm(stores);
        for ((today, weather), sums) in calendar.iter().zip(weather).zip(sums) {
            let mut months = &self.months[today.month_index()];
            // Worked out apart: a call in the loop over the bands would cost every day its registers.
            if let Some(humidity_percent) = weather.split_humidity_percent {
                self.wet_bulb(today, weather.temperature_c, humidity_percent, &mut split);
                months = &split;
            }
            let wet = weather.precipitation_mm.0.iter().any(|mm| *mm != 0.0);
            for pair in 0..Lanes::<L>::PAIRS {
                let day = self.pair_day(weather, pair);
                let bare = !wet && snow_water_mm.pair(pair) == Lanes::default();
                let rows = Rows { curve: curve.pair(pair), day: &day, months, pair, wet, bare };
                let sum = if APART {
                    let even = self.rows_day::<2>(0, &rows, stores, &mut thaw);
                    let odd = self.rows_day::<2>(1, &rows, stores, &mut thaw);
                    even.and(&odd)
                } else {
                    self.rows_day::<1>(0, &rows, stores, &mut thaw)
                };
                sums.set_pair(pair, &sum);
            }
            snow_water_mm = sums.snow_water_mm;
        }
    }

    /// Snow water of all rows, mm over the basin.
    fn snow_water_mm(&self, stores: &[RowStore<L>; MOST_BANDS]) -> Lanes<L> {
        let rows = stores.iter().take(self.used);
        rows.fold(Lanes::default(), |sum, row| sum + (row.snow.ice_mm + row.snow.liquid_mm))
    }

    #[inline(always)]
    fn pair_day(&self, weather: &LaneWeather<L>, pair: usize) -> PairDay {
        let snow = self.snow.pair(pair);
        let temperature_c = weather.temperature_c.pair(pair);
        let mut station = snow.of_station(temperature_c);
        if weather.split_humidity_percent.is_some() {
            // The rows of such a day know the share already.
            station.snow_share = Lanes::default();
        }
        PairDay {
            snow,
            station,
            precipitation_mm: weather.precipitation_mm.pair(pair),
            reference_evaporation_mm: weather.reference_evaporation_mm.pair(pair),
            melt_factor: weather.melt_factor.pair(pair),
        }
    }

    /// One pair of lanes over every `STEP`th row from `first` on: first the snow of all, then the soil of all, since short
    /// chains of arithmetic fill a processor better than long ones.
    #[inline(always)]
    fn rows_day<const STEP: usize>(
        &self,
        first: usize,
        rows: &Rows<L, impl PowerCurve<2>>,
        stores: &mut [RowStore<L>; MOST_BANDS],
        thaw: &mut [Thaw; MOST_BANDS],
    ) -> LaneSums<2> {
        let mut sum = LaneSums::default();
        if rows.bare {
            self.soil_day::<STEP, true>(first, rows, stores, thaw, &mut sum);
            return sum;
        }
        if rows.wet {
            self.snow_day::<STEP, true>(first, rows, stores, thaw, &mut sum);
        } else {
            self.snow_day::<STEP, false>(first, rows, stores, thaw, &mut sum);
        }
        self.soil_day::<STEP, false>(first, rows, stores, thaw, &mut sum);
        sum
    }

    /// The soil of [`Slopes::rows_day`]; on a `BARE` day there is no snow and no water enters.
    #[inline(always)]
    fn soil_day<const STEP: usize, const BARE: bool>(
        &self,
        first: usize,
        rows: &Rows<L, impl PowerCurve<2>>,
        stores: &mut [RowStore<L>; MOST_BANDS],
        thaw: &[Thaw; MOST_BANDS],
        sum: &mut LaneSums<2>,
    ) {
        let Rows { curve, day, pair, .. } = *rows;
        let mut index = first;
        while index < self.used.min(MOST_BANDS) {
            let (row, thaw, soil_mm) = (&self.rows[index], &thaw[index], &mut stores[index].soil_mm);
            let mut moist_mm = soil_mm.pair(pair);
            let asked_mm = day.reference_evaporation_mm * row.evaporation_factor.pair(pair);
            let soil = row.soil.pair(pair);
            if BARE {
                sum.evaporation_mm = sum.evaporation_mm + soil.dry_day(&mut moist_mm, asked_mm);
            } else {
                let soil = soil.day(&mut moist_mm, curve, thaw.outflow_mm, asked_mm, thaw.covered_share);
                sum.evaporation_mm = sum.evaporation_mm + soil.evaporation_mm;
                sum.recharge_mm = sum.recharge_mm + soil.recharge_mm;
            }
            soil_mm.set_pair(pair, moist_mm);
            sum.soil_mm = sum.soil_mm + moist_mm;
            index += STEP;
        }
    }

    /// The snow of [`Slopes::rows_day`]; a day that is not `WET` has no precipitation.
    #[inline(always)]
    fn snow_day<const STEP: usize, const WET: bool>(
        &self,
        first: usize,
        rows: &Rows<L, impl PowerCurve<2>>,
        stores: &mut [RowStore<L>; MOST_BANDS],
        thaw: &mut [Thaw; MOST_BANDS],
        sum: &mut LaneSums<2>,
    ) {
        let Rows { day, months, pair, .. } = *rows;
        let mut index = first;
        while index < self.used.min(MOST_BANDS) {
            let (row, month, store) = (&self.rows[index], &months[index], &mut stores[index].snow);
            let mut pack = SnowStore { ice_mm: store.ice_mm.pair(pair), liquid_mm: store.liquid_mm.pair(pair) };
            let precipitation_mm = day.precipitation_mm * row.precipitation_factor.pair(pair);
            let snow = day.snow.pack::<WET>(
                &mut pack,
                precipitation_mm,
                month.warmth.pair(pair).at(&day.station),
                day.melt_factor * row.melt_exposure.pair(pair),
                month.most_sublimation_mm.pair(pair),
                row.per_full_cover_mm.pair(pair),
            );
            store.ice_mm.set_pair(pair, pack.ice_mm);
            store.liquid_mm.set_pair(pair, pack.liquid_mm);
            thaw[index] = Thaw { outflow_mm: snow.outflow_mm, covered_share: snow.covered_share };
            if WET {
                sum.snowfall_mm = sum.snowfall_mm + snow.snowfall_mm;
            }
            sum.snow_water_mm = sum.snow_water_mm + snow.snow_water_mm;
            sum.sublimation_mm = sum.sublimation_mm + snow.sublimation_mm;
            index += STEP;
        }
    }

    /// The month's rows of a day on which the wet bulb at the station's humidity tells rain from snow.
    #[cold]
    #[inline(never)]
    fn wet_bulb(&self, calendar: &CalendarDay, temperature_c: Lanes<L>, humidity_percent: f64, out: &mut MonthRows<L>) {
        let month = calendar.month_index();
        let rows = out.iter_mut().zip(&self.months[month]).zip(&self.offset_c[month]);
        for ((out, row), offset_c) in rows.take(self.used) {
            *out = *row;
            let wet_bulb_c = (temperature_c + *offset_c).map(|air_c| wet_bulb_c(air_c, humidity_percent));
            out.warmth.snow_share = self.snow.of_offset(wet_bulb_c).snow_share;
        }
    }
}

/// What the soil of a row needs to know of its snow.
#[derive(Clone, Copy, Default)]
struct Thaw {
    outflow_mm: Lanes<2>,
    covered_share: Lanes<2>,
}

/// A day over all rows for one pair of lanes.
#[derive(Clone, Copy)]
struct Rows<'d, const L: usize, C> {
    curve: C,
    day: &'d PairDay,
    months: &'d MonthRows<L>,
    pair: usize,
    /// Whether any rain or snow falls, in any lane.
    wet: bool,
    /// Whether it is dry and no snow lies anywhere, in either lane.
    bare: bool,
}

/// The weather of a day as a pair of lanes meets it in every row.
struct PairDay {
    snow: SnowConstants<2>,
    station: SnowWarmth<2>,
    precipitation_mm: Lanes<2>,
    reference_evaporation_mm: Lanes<2>,
    melt_factor: Lanes<2>,
}

impl LaneSums<2> {
    /// Both together.
    #[inline(always)]
    fn and(&self, other: &Self) -> Self {
        Self {
            snowfall_mm: self.snowfall_mm + other.snowfall_mm,
            snow_water_mm: self.snow_water_mm + other.snow_water_mm,
            sublimation_mm: self.sublimation_mm + other.sublimation_mm,
            soil_mm: self.soil_mm + other.soil_mm,
            evaporation_mm: self.evaporation_mm + other.evaporation_mm,
            recharge_mm: self.recharge_mm + other.recharge_mm,
        }
    }
}

impl LaneSums<2> {
    /// The sums of one run, in both lanes: even and odd bands lie in the two lanes of every row.
    #[inline(always)]
    pub fn of_one(&self) -> Self {
        let both = |sum: Lanes<2>| Lanes::splat(total_of_one(sum));
        Self {
            snowfall_mm: both(self.snowfall_mm),
            snow_water_mm: both(self.snow_water_mm),
            sublimation_mm: both(self.sublimation_mm),
            soil_mm: both(self.soil_mm),
            evaporation_mm: both(self.evaporation_mm),
            recharge_mm: both(self.recharge_mm),
        }
    }
}

impl<const L: usize> LaneSums<L> {
    #[inline(always)]
    fn set_pair(&mut self, pair: usize, of: &LaneSums<2>) {
        self.snowfall_mm.set_pair(pair, of.snowfall_mm);
        self.snow_water_mm.set_pair(pair, of.snow_water_mm);
        self.sublimation_mm.set_pair(pair, of.sublimation_mm);
        self.soil_mm.set_pair(pair, of.soil_mm);
        self.evaporation_mm.set_pair(pair, of.evaporation_mm);
        self.recharge_mm.set_pair(pair, of.recharge_mm);
    }
}

/// The sums of one run: even and odd bands lie in the two lanes of every row.
#[inline(always)]
pub fn total_of_one(sum: Lanes<2>) -> f64 {
    sum.0[0] + sum.0[1]
}
