//! The station's record, and what the dials make of a day of it (delta change: storm order and wet days stay).

use super::calendar::CalendarDay;
use super::dials::Dials;
use super::evaporation::air::saturation_vapour_pressure_kpa;
use super::evaporation::{DayBeforeWarming, EvaporationDay};
use super::lanes::{Lanes, Number};
use super::valley::{Climb, Valley};

/// One day of the station's record, whole: gaps were filled or refused before.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StationDay {
    /// Rain and snow at the station, mm.
    pub precipitation_mm: f64,
    /// Mean temperature at the station, °C.
    pub mean_temperature_c: f64,
    /// Mean relative humidity at the station, %; NaN where not recorded. Held under warming and with height.
    pub relative_humidity_percent: f64,
    /// The air at the reference elevation, for evaporation; NaN where not recorded.
    pub air: EvaporationDay,
}

impl StationDay {
    /// A day from what the station measured: `air` is brought from the station to the reference elevation by the lapse
    /// rate of the month, its relative humidity held. A mean temperature that was not recorded is the middle of the
    /// extremes.
    pub fn at_station(valley: &Valley, month_index: usize, precipitation_mm: f64, air: EvaporationDay) -> Self {
        let middle_c = (air.tmin_c + air.tmax_c) / 2.0;
        let mean_temperature_c = if air.tmean_c.is_nan() { middle_c } else { air.tmean_c };
        let relative_humidity_percent =
            (100.0 * air.vapour_pressure_kpa / saturation_vapour_pressure_kpa(mean_temperature_c)).min(100.0);
        let climb_m = valley.evaporation.reference_elevation_m - valley.station_elevation_m;
        let warmer_c = valley.climb.lapse_c_per_km[month_index] * climb_m / 1000.0;
        let humidity_held = if climb_m == 0.0 {
            1.0
        } else {
            saturation_vapour_pressure_kpa(mean_temperature_c + warmer_c)
                / saturation_vapour_pressure_kpa(mean_temperature_c)
        };
        let air = EvaporationDay {
            tmin_c: air.tmin_c + warmer_c,
            tmax_c: air.tmax_c + warmer_c,
            tmean_c: mean_temperature_c + warmer_c,
            vapour_pressure_kpa: air.vapour_pressure_kpa * humidity_held,
            ..air
        };
        Self {
            precipitation_mm,
            mean_temperature_c,
            // `min` takes the other number where one is NaN: an unrecorded humidity must stay unrecorded.
            relative_humidity_percent: if air.vapour_pressure_kpa.is_nan() {
                f64::NAN
            } else {
                relative_humidity_percent
            },
            air,
        }
    }
}

/// The weather of a day at the station, with the dials applied.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DialledDay<N = f64> {
    /// Mean temperature at the station, °C.
    pub temperature_c: N,
    /// Precipitation at the station after the place's factor, mm.
    pub precipitation_mm: N,
    /// Reference evaporation at the reference elevation, mm.
    pub reference_evaporation_mm: N,
}

/// The dials as each month feels them.
#[derive(Clone, Copy, Debug)]
pub struct Delta<N = f64> {
    warming_c: [N; 12],
    precipitation_factor: [N; 12],
}

impl Delta {
    /// What `dials` do in each month of a valley's year.
    pub fn new(climb: &Climb, southern: bool, dials: &Dials) -> Self {
        let mut delta = Self { warming_c: [0.0; 12], precipitation_factor: [1.0; 12] };
        for month_index in 0..12 {
            // December to February is the first quarter.
            let quarter = (month_index + 1) % 12 / 3;
            delta.warming_c[month_index] = dials.warming * climb.warming_weight[quarter];
            let northern_winter = !(3..9).contains(&month_index);
            let percent =
                if northern_winter != southern { dials.winter_precipitation } else { dials.summer_precipitation };
            delta.precipitation_factor[month_index] = climb.precipitation_factor * (1.0 + percent / 100.0);
        }
        delta
    }

    /// °C added in a month.
    pub fn warming_c(&self, month_index: usize) -> f64 {
        self.warming_c[month_index]
    }

    /// The day under the dials; `air` is its reference evaporation before warming.
    #[inline(always)]
    pub fn day(&self, calendar: &CalendarDay, day: &StationDay, air: &DayBeforeWarming<'_>) -> DialledDay {
        self.turned(calendar, day, |warming_c| air.warmed_mm(warming_c))
    }
}

impl<const L: usize> Delta<Lanes<L>> {
    /// Different dials, one set a lane.
    pub fn by_lane(lanes: [Delta; L]) -> Self {
        Self {
            warming_c: core::array::from_fn(|month| Lanes(lanes.map(|lane| lane.warming_c[month]))),
            precipitation_factor: core::array::from_fn(|month| {
                Lanes(lanes.map(|lane| lane.precipitation_factor[month]))
            }),
        }
    }

    /// The day under the dials; `air` is its reference evaporation before warming.
    #[inline(always)]
    pub fn day(&self, calendar: &CalendarDay, day: &StationDay, air: &DayBeforeWarming<'_>) -> DialledDay<Lanes<L>> {
        self.turned(calendar, day, |warming_c| air.warmed_by_lane_mm(warming_c))
    }
}

impl<N: Number> Delta<N> {
    #[inline(always)]
    fn turned(&self, calendar: &CalendarDay, day: &StationDay, evaporation_mm: impl Fn(N) -> N) -> DialledDay<N> {
        let month_index = calendar.month_index();
        let warming_c = self.warming_c[month_index];
        DialledDay {
            temperature_c: N::splat(day.mean_temperature_c) + warming_c,
            precipitation_mm: N::splat(day.precipitation_mm) * self.precipitation_factor[month_index],
            reference_evaporation_mm: evaporation_mm(warming_c),
        }
    }
}

/// Factor from the station's precipitation to that at `elevation_m`: a straight gradient, never below zero.
pub fn precipitation_factor_at(climb: &Climb, station_elevation_m: f64, elevation_m: f64) -> f64 {
    let factor = 1.0 + climb.precipitation_per_100m * (elevation_m - station_elevation_m) / 100.0;
    if factor > 0.0 { factor } else { 0.0 }
}

/// Whether the day lies in the cold half of the year: October to March in the north, April to September in the south.
pub fn is_cold_half(month_index: usize, southern: bool) -> bool {
    (3..9).contains(&month_index) == southern
}
