//! One day's reference evaporation by the method of the place, with the warming dial applied.

use super::hargreaves_samani::of_range_root_mm;
use super::oudin::oudin_mm;
use super::penman_monteith::PenmanMonteithTraits;
use super::sun::SkyTable;
use crate::water::lanes::{Lanes, square_root};

/// How a place gets its reference evaporation.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Method {
    /// FAO-56 Penman–Monteith with its missing-data rules (Allen et al. 1998).
    PenmanMonteith(PenmanMonteithTraits),
    /// Hargreaves & Samani (1985).
    HargreavesSamani,
    /// Oudin et al. (2005).
    Oudin,
    /// A column of the record, scaled under warming as Hargreaves–Samani changes.
    Given,
}

/// One day of the record as measured at the reference elevation. Not a number means not recorded.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct EvaporationDay {
    /// Lowest temperature, °C.
    pub tmin_c: f64,
    /// Highest temperature, °C.
    pub tmax_c: f64,
    /// Mean temperature, °C: used by Oudin only, which takes the middle of the extremes where it is missing.
    pub tmean_c: f64,
    /// Actual vapour pressure, kPa.
    pub vapour_pressure_kpa: f64,
    /// Wind speed at 2 m, m/s.
    pub wind_2m_ms: f64,
    /// Solar radiation, MJ/m² a day.
    pub solar_mj_m2: f64,
    /// Reference evaporation that the record itself gives, mm a day.
    pub given_mm: f64,
}

impl EvaporationDay {
    /// A day of which only the two extremes of temperature (°C) are recorded.
    pub fn from_extremes(tmin_c: f64, tmax_c: f64) -> Self {
        Self {
            tmin_c,
            tmax_c,
            tmean_c: f64::NAN,
            vapour_pressure_kpa: f64::NAN,
            wind_2m_ms: f64::NAN,
            solar_mj_m2: f64::NAN,
            given_mm: f64::NAN,
        }
    }
}

/// Reference evaporation of a day in mm, never negative.
///
/// `warming_c` is added to every temperature. The temperature range, recorded sunshine and wind stay; Penman–Monteith
/// holds the relative humidity; a given column is multiplied by warmed over unwarmed Hargreaves–Samani, and left as it is
/// on days on which the unwarmed one is zero. A `warming_c` of 0 gives the record's own value to the last bit.
///
/// Penman–Monteith and Hargreaves–Samani take the middle of the extremes as the mean, as FAO-56 eq. 9 has it.
/// The result is not a number when what the method needs is missing, the range is negative, or `day_of_year` is not 1 to 366.
pub fn reference_evaporation_mm(
    method: &Method,
    sky: &SkyTable,
    day_of_year: u16,
    day: &EvaporationDay,
    warming_c: f64,
) -> f64 {
    DayBeforeWarming::new(method, sky, day_of_year, day).warmed_mm(warming_c)
}

/// A day with everything worked out that warming leaves as it is, for many warmings of the same day.
#[derive(Clone, Copy, Debug)]
pub struct DayBeforeWarming<'a> {
    method: &'a Method,
    day: &'a EvaporationDay,
    extraterrestrial_mj_m2: f64,
    middle_c: f64,
    range_root: f64,
}

impl<'a> DayBeforeWarming<'a> {
    /// The day by the place's method; see [`reference_evaporation_mm`].
    #[inline(always)]
    pub fn new(method: &'a Method, sky: &SkyTable, day_of_year: u16, day: &'a EvaporationDay) -> Self {
        Self {
            method,
            day,
            extraterrestrial_mj_m2: sky.extraterrestrial_on_mj_m2(day_of_year),
            middle_c: (day.tmax_c + day.tmin_c) / 2.0,
            range_root: square_root(day.tmax_c - day.tmin_c),
        }
    }

    #[inline(always)]
    fn hargreaves_samani_mm(&self, warming_c: f64) -> f64 {
        not_negative(of_range_root_mm(self.middle_c + warming_c, self.range_root, self.extraterrestrial_mj_m2))
    }

    /// The same for several warmings side by side, with the bits of each alone.
    #[inline(always)]
    pub fn warmed_by_lane_mm<const L: usize>(&self, warming_c: Lanes<L>) -> Lanes<L> {
        match self.method {
            // The choice of method stays outside the lanes, so that they go through the arithmetic together.
            Method::HargreavesSamani => warming_c.map(|warming_c| self.hargreaves_samani_mm(warming_c)),
            _ => warming_c.map(|warming_c| self.warmed_mm(warming_c)),
        }
    }

    /// Reference evaporation with `warming_c` added to every temperature; see [`reference_evaporation_mm`].
    #[inline(always)]
    pub fn warmed_mm(&self, warming_c: f64) -> f64 {
        not_negative(match self.method {
            Method::HargreavesSamani => self.hargreaves_samani_mm(warming_c),
            Method::PenmanMonteith(traits) => traits.day_mm(self.extraterrestrial_mj_m2, self.day, warming_c),
            Method::Oudin => {
                let mean_c = if self.day.tmean_c.is_nan() { self.middle_c } else { self.day.tmean_c };
                oudin_mm(mean_c + warming_c, self.extraterrestrial_mj_m2)
            }
            Method::Given if warming_c == 0.0 => self.day.given_mm,
            Method::Given => {
                let unwarmed_mm = self.hargreaves_samani_mm(0.0);
                let given_mm = self.day.given_mm;
                if unwarmed_mm == 0.0 {
                    given_mm
                } else {
                    given_mm * (self.hargreaves_samani_mm(warming_c) / unwarmed_mm)
                }
            }
        })
    }
}

/// By how many percent a method's evaporation over a whole record grows with the first degree of warming.
///
/// The change of the sum, not the mean of daily changes, so that days near zero do not rule it. Each item is a day of the
/// year and its record; days whose value is not a number are left out of both sums. Nothing if the record evaporates
/// nothing.
pub fn percent_per_degree(
    method: &Method,
    sky: &SkyTable,
    record: impl IntoIterator<Item = (u16, EvaporationDay)>,
) -> Option<f64> {
    let mut as_recorded_mm = 0.0;
    let mut one_degree_warmer_mm = 0.0;
    for (day_of_year, day) in record {
        let now_mm = reference_evaporation_mm(method, sky, day_of_year, &day, 0.0);
        let warmer_mm = reference_evaporation_mm(method, sky, day_of_year, &day, 1.0);
        if now_mm.is_finite() && warmer_mm.is_finite() {
            as_recorded_mm += now_mm;
            one_degree_warmer_mm += warmer_mm;
        }
    }
    (as_recorded_mm > 0.0).then(|| (one_degree_warmer_mm / as_recorded_mm - 1.0) * 100.0)
}

/// Zero for what is below zero; a value that is not a number stays so, to be seen by the caller.
fn not_negative(value_mm: f64) -> f64 {
    if value_mm < 0.0 { 0.0 } else { value_mm }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::water::evaporation::air::{mean_saturation_vapour_pressure_kpa, vapour_pressure_from_mean_humidity_kpa};
    use crate::water::evaporation::hargreaves_samani_mm;
    use crate::water::evaporation::radiation::INTERIOR_SOLAR_RANGE_COEFFICIENT;

    const JULY: u16 = 196;

    fn methods() -> [Method; 4] {
        let traits = PenmanMonteithTraits::new(1500.0, INTERIOR_SOLAR_RANGE_COEFFICIENT);
        [Method::PenmanMonteith(traits), Method::HargreavesSamani, Method::Oudin, Method::Given]
    }

    fn full_day() -> EvaporationDay {
        EvaporationDay {
            tmin_c: 11.3,
            tmax_c: 28.9,
            tmean_c: 20.7,
            vapour_pressure_kpa: 1.1,
            wind_2m_ms: 2.6,
            solar_mj_m2: 25.4,
            given_mm: 6.1,
        }
    }

    fn sky() -> SkyTable {
        SkyTable::at_latitude(42.0).unwrap()
    }

    #[test]
    fn warming_raises_every_method_and_none_is_exact() {
        let (sky, day) = (sky(), full_day());
        for method in methods() {
            let at_rest = reference_evaporation_mm(&method, &sky, JULY, &day, 0.0);
            assert!((3.0..9.0).contains(&at_rest), "{method:?}: {at_rest}");
            let mut before = at_rest;
            for half_degrees in 1..=12 {
                let warmer = reference_evaporation_mm(&method, &sky, JULY, &day, f64::from(half_degrees) / 2.0);
                assert!(warmer > before, "{method:?}");
                before = warmer;
            }
        }
        let rest = |method| reference_evaporation_mm(&method, &sky, JULY, &day, 0.0);
        assert_eq!(rest(Method::Given), day.given_mm);
        let radiation = sky.extraterrestrial_on_mj_m2(JULY);
        let middle_c = (day.tmax_c + day.tmin_c) / 2.0;
        let unwarmed = hargreaves_samani_mm(middle_c, day.tmax_c - day.tmin_c, radiation);
        assert_eq!(rest(Method::HargreavesSamani), unwarmed);
        assert_eq!(rest(Method::Oudin), oudin_mm(day.tmean_c, radiation));
    }

    #[test]
    fn penman_monteith_holds_relative_humidity() {
        let (sky, warming_c) = (sky(), 3.0);
        let recorded = full_day();
        let share =
            recorded.vapour_pressure_kpa / mean_saturation_vapour_pressure_kpa(recorded.tmin_c, recorded.tmax_c);
        let mut warmed = recorded;
        warmed.tmin_c += warming_c;
        warmed.tmax_c += warming_c;
        warmed.vapour_pressure_kpa =
            vapour_pressure_from_mean_humidity_kpa(warmed.tmin_c, warmed.tmax_c, 100.0 * share);
        let method = methods()[0];
        let dialled = reference_evaporation_mm(&method, &sky, JULY, &recorded, warming_c);
        let measured = reference_evaporation_mm(&method, &sky, JULY, &warmed, 0.0);
        assert!((dialled - measured).abs() < 1e-12, "{dialled} {measured}");
    }

    #[test]
    fn a_given_column_follows_hargreaves_samani() {
        let (sky, day) = (sky(), full_day());
        let at = |method, warming_c| reference_evaporation_mm(&method, &sky, JULY, &day, warming_c);
        let ratio = at(Method::HargreavesSamani, 2.0) / at(Method::HargreavesSamani, 0.0);
        assert!((at(Method::Given, 2.0) / day.given_mm - ratio).abs() < 1e-12);
        // A day without a temperature range has no Hargreaves–Samani evaporation to scale by.
        let flat = EvaporationDay { tmin_c: 3.0, tmax_c: 3.0, ..day };
        assert_eq!(reference_evaporation_mm(&Method::Given, &sky, JULY, &flat, 2.0), day.given_mm);
    }

    #[test]
    fn no_day_evaporates_less_than_nothing() {
        for latitude_deg in [-75.0, 0.0, 42.0, 75.0] {
            let sky = SkyTable::at_latitude(latitude_deg).unwrap();
            for day_of_year in 1..=366 {
                for tmin_c in [-45.0, -20.0, -5.0, 15.0] {
                    let day = EvaporationDay { given_mm: 0.0, ..EvaporationDay::from_extremes(tmin_c, tmin_c + 9.0) };
                    for method in methods() {
                        let value = reference_evaporation_mm(&method, &sky, day_of_year, &day, 0.0);
                        assert!((0.0..20.0).contains(&value), "{latitude_deg} {day_of_year} {method:?} {value}");
                    }
                }
            }
        }
    }

    #[test]
    fn what_is_missing_or_senseless_shows() {
        let (sky, day) = (sky(), full_day());
        let unknown = EvaporationDay::from_extremes(f64::NAN, 20.0);
        let crossed = EvaporationDay::from_extremes(20.0, 10.0);
        assert!(reference_evaporation_mm(&Method::HargreavesSamani, &sky, JULY, &unknown, 0.0).is_nan());
        assert!(reference_evaporation_mm(&Method::HargreavesSamani, &sky, JULY, &crossed, 0.0).is_nan());
        assert!(reference_evaporation_mm(&Method::Given, &sky, JULY, &unknown, 0.0).is_nan());
        assert!(reference_evaporation_mm(&Method::Oudin, &sky, 367, &day, 0.0).is_nan());
    }

    #[test]
    fn the_percent_per_degree_is_that_of_the_sums() {
        let sky = sky();
        let record = [(15, EvaporationDay::from_extremes(-9.0, 1.0)), (JULY, full_day())];
        let sum = |warming_c| -> f64 {
            let each = |(on, day): &(u16, EvaporationDay)| {
                reference_evaporation_mm(&Method::HargreavesSamani, &sky, *on, day, warming_c)
            };
            record.iter().map(each).sum()
        };
        let percent = percent_per_degree(&Method::HargreavesSamani, &sky, record).unwrap();
        assert!((percent - 100.0 * (sum(1.0) - sum(0.0)) / sum(0.0)).abs() < 1e-9);
        assert!((2.0..4.0).contains(&percent));
        assert_eq!(percent_per_degree(&Method::Given, &sky, [(1, EvaporationDay::from_extremes(0.0, 9.0))]), None);
    }
}
