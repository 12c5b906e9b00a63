//! Snow and soil of all bands for one day: the innermost loop, for one run or for several settings side by side.
//!
//! In one run neighbouring bands share the lanes; with several settings each band is a row and the settings share the
//! lanes. Either way the bands of even and of odd index are summed apart and added at the end, so that a run gives the
//! same bits alone and in company.

use super::calendar::CalendarDay;
use super::evaporation::air::wet_bulb_c;
use super::lanes::Lanes;
use super::power::PowerCurve;
use super::snow::{SnowConstants, SnowStore};
use super::soil::SoilConstants;
use super::valley::{MOST_BANDS, Valley};
use super::weather::precipitation_factor_at;

/// What differs from band to band, one row.
#[derive(Clone, Copy, Debug, Default)]
pub struct BandRow<const L: usize> {
    /// Share of the bands' area.
    pub area_share: Lanes<L>,
    /// From the station's precipitation to the band's.
    pub precipitation_factor: Lanes<L>,
    /// On the degree-day factor.
    pub melt_exposure: Lanes<L>,
    /// On reference evaporation.
    pub evaporation_factor: Lanes<L>,
}

/// Snow and soil of a row.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct RowStore<const L: usize> {
    /// Snow.
    pub snow: SnowStore<L>,
    /// Soil water, mm.
    pub soil_mm: Lanes<L>,
}

/// The rows of all bands.
#[derive(Clone, Debug)]
pub struct Slopes<const L: usize> {
    snow: SnowConstants<L>,
    soil: SoilConstants<L>,
    rows: [BandRow<L>; MOST_BANDS],
    offset_c: [[Lanes<L>; MOST_BANDS]; 12],
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
    /// Most that the air takes from snow, mm.
    pub most_sublimation_mm: Lanes<L>,
    /// Where wet-bulb temperature splits rain from snow today: the station's humidity, %.
    pub split_humidity_percent: Option<f64>,
}

/// Area-weighted sums of a day over the bands, mm.
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
        let used = valley.bands.len().div_ceil(2);
        let snow = SnowConstants::new(&valley.rain_snow, &valley.snow, valley.climb.snow_catch_factor);
        let mut slopes = Self::empty(snow, SoilConstants::new(&valley.soil), used);
        for index in 0..valley.bands.len() {
            slopes.set(valley, index, index / 2, index % 2);
        }
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
        let soil = SoilConstants::by_lane(valleys.map(|v| &v.soil));
        let bands = valleys.iter().map(|v| v.bands.len()).min().unwrap_or(0);
        let mut slopes = Self::empty(snow, soil, bands);
        for (lane, valley) in valleys.into_iter().enumerate() {
            for index in 0..bands {
                slopes.set(valley, index, index, lane);
            }
        }
        slopes
    }

    fn empty(snow: SnowConstants<L>, soil: SoilConstants<L>, used: usize) -> Self {
        Self {
            snow,
            soil,
            rows: [BandRow::default(); MOST_BANDS],
            offset_c: [[Lanes::default(); MOST_BANDS]; 12],
            used,
        }
    }

    fn set(&mut self, valley: &Valley, index: usize, row: usize, lane: usize) {
        let Some(band) = valley.bands.get(index) else { return };
        let climb_m = band.elevation_m - valley.station_elevation_m;
        let to = &mut self.rows[row];
        to.area_share.0[lane] = band.area_km2 / valley.band_area_km2();
        to.precipitation_factor.0[lane] =
            precipitation_factor_at(&valley.climb, valley.station_elevation_m, band.elevation_m);
        to.melt_exposure.0[lane] = band.melt_exposure;
        to.evaporation_factor.0[lane] = band.evaporation_factor;
        for (offsets, lapse) in self.offset_c.iter_mut().zip(valley.climb.lapse_c_per_km) {
            offsets[row].0[lane] = lapse * climb_m / 1000.0;
        }
    }

    /// The rows in use.
    pub fn rows(&self) -> &[BandRow<L>] {
        &self.rows[..self.used]
    }

    /// Some days over all bands, each into its place in `sums`. With `APART` the rows of even and of odd index are summed
    /// in the first and the second sum; without it all go into the first. The slices are of equal length; the shortest
    /// counts.
    #[inline(never)]
    pub fn days<const APART: bool>(
        &self,
        curve: impl PowerCurve<L>,
        calendar: &[CalendarDay],
        weather: &[LaneWeather<L>],
        stores: &mut [RowStore<L>; MOST_BANDS],
        sums: &mut [[LaneSums<L>; 2]],
    ) {
        let mut wet_bulb_c = [Lanes::default(); MOST_BANDS];
        for ((today, weather), sums) in calendar.iter().zip(weather).zip(sums) {
            // Worked out apart: a call in the loop over the bands would cost every day its registers.
            let split_c = weather.split_humidity_percent.map(|humidity_percent| {
                self.wet_bulb(today, weather.temperature_c, humidity_percent, &mut wet_bulb_c);
                &wet_bulb_c
            });
            *sums = self.day::<APART>(curve, today, weather, split_c, stores);
        }
    }

    #[inline(always)]
    fn day<const APART: bool>(
        &self,
        curve: impl PowerCurve<L>,
        calendar: &CalendarDay,
        weather: &LaneWeather<L>,
        wet_bulb_c: Option<&[Lanes<L>; MOST_BANDS]>,
        stores: &mut [RowStore<L>; MOST_BANDS],
    ) -> [LaneSums<L>; 2] {
        let mut sums = [LaneSums::default(); 2];
        let offsets = &self.offset_c[calendar.month_index()];
        for index in 0..self.used.min(MOST_BANDS) {
            let (row, store) = (&self.rows[index], &mut stores[index]);
            let air_c = weather.temperature_c + offsets[index];
            let split_c = wet_bulb_c.map_or(air_c, |bands| bands[index]);
            let precipitation_mm = weather.precipitation_mm * row.precipitation_factor;
            let melt_factor = weather.melt_factor * row.melt_exposure;
            let snow = self.snow.day(
                &mut store.snow,
                precipitation_mm,
                split_c,
                air_c,
                melt_factor,
                weather.most_sublimation_mm,
            );
            let asked_mm = weather.reference_evaporation_mm * row.evaporation_factor;
            let soil = self.soil.day(&mut store.soil_mm, curve, snow.outflow_mm, asked_mm, snow.covered_share);

            let sum = &mut sums[if APART { index % 2 } else { 0 }];
            sum.snowfall_mm = sum.snowfall_mm + row.area_share * snow.snowfall_mm;
            sum.snow_water_mm = sum.snow_water_mm + row.area_share * snow.snow_water_mm;
            sum.sublimation_mm = sum.sublimation_mm + row.area_share * snow.sublimation_mm;
            sum.soil_mm = sum.soil_mm + row.area_share * store.soil_mm;
            sum.evaporation_mm = sum.evaporation_mm + row.area_share * soil.evaporation_mm;
            sum.recharge_mm = sum.recharge_mm + row.area_share * soil.recharge_mm;
        }
        sums
    }

    /// Wet-bulb temperature of every band at the station's humidity.
    #[cold]
    #[inline(never)]
    fn wet_bulb(
        &self,
        calendar: &CalendarDay,
        temperature_c: Lanes<L>,
        humidity_percent: f64,
        out: &mut [Lanes<L>; MOST_BANDS],
    ) {
        for (out, offset) in out.iter_mut().zip(&self.offset_c[calendar.month_index()]).take(self.used) {
            *out = (temperature_c + *offset).map(|air_c| wet_bulb_c(air_c, humidity_percent));
        }
    }
}

/// The sums of one run: even and odd bands lie in the two lanes of every row.
#[inline(always)]
pub fn total_of_one(sum: Lanes<2>) -> f64 {
    sum.0[0] + sum.0[1]
}
