//! From a record to a recipe: how a station's weather is learnt, and what could not be learnt from it.

mod air;
mod precipitation;
mod record;
mod regression;
mod temperature;
mod years;

use super::recipe::{Recipe, RecipeFault};
use super::{GeneratorDay, SeasonalCurve};
use chrono::NaiveDate;
use record::Record;

/// Full water years below which nothing is fitted.
pub const LEAST_FULL_YEARS: usize = 3;
/// Full water years below which differences between years are taken from [`super::YearIndex::WHEN_UNKNOWN`].
pub const LEAST_YEARS_FOR_SPREAD: usize = 15;
/// Wet days, and dry days, below which nothing is fitted.
pub const LEAST_DAYS_OF_A_KIND: usize = 60;

/// Where a record was taken; needed only for its radiation.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Site {
    /// Latitude in degrees, south negative.
    pub latitude_degrees: f64,
    /// Elevation of the station, m.
    pub elevation_m: f64,
}

/// Why no recipe could be made.
#[derive(Debug, Clone, PartialEq)]
pub enum FitError {
    /// The water year's first month is not 1–12.
    WrongMonth {
        /// What was given.
        month: u32,
    },
    /// Too few water years without a missing day.
    TooFewYears {
        /// Full water years found.
        full_years: usize,
        /// How many are needed.
        needed: usize,
    },
    /// A date is not later than the one before it.
    DatesNotAscending {
        /// The date that is out of order.
        date: NaiveDate,
    },
    /// A number is missing or infinite.
    NotANumber {
        /// Its date.
        date: NaiveDate,
        /// Which field of [`GeneratorDay`].
        field: &'static str,
    },
    /// A depth is below zero.
    NegativePrecipitation {
        /// Its date.
        date: NaiveDate,
        /// The depth, mm.
        precipitation_mm: f64,
    },
    /// The minimum is above the maximum.
    TminAboveTmax {
        /// The date.
        date: NaiveDate,
        /// The minimum, °C.
        tmin_c: f64,
        /// The maximum, °C.
        tmax_c: f64,
    },
    /// Too few wet days, or too few dry ones, to tell them apart.
    TooFewDaysOfAKind {
        /// Wet days found.
        wet_days: usize,
        /// Dry days found.
        dry_days: usize,
        /// How many of each are needed.
        needed: usize,
    },
    /// The record leads to numbers that make no sense, for example temperatures in another unit.
    Unusable(
        /// What is wrong with them.
        Vec<RecipeFault>,
    ),
}

/// Something that the reader of a fitted recipe should know.
#[derive(Debug, Clone, PartialEq)]
pub enum FitNote {
    /// Too few years to tell how years differ: [`super::YearIndex::WHEN_UNKNOWN`] was taken.
    YearsNotFitted {
        /// Full water years found.
        full_years: usize,
        /// How many are needed.
        needed: usize,
    },
    /// Yearly totals differ no more than days alone explain; no year index acts on precipitation.
    TotalsSpreadNoMoreThanDays,
    /// Yearly totals, or numbers of wet days, differ more than the year index can make them.
    TotalsSpreadTooWide,
    /// The estimated memory from year to year was outside what is possible; the nearest possible value was taken.
    YearMemoryOutside {
        /// What the record says, after correction for the shortness of the record and the noise of days.
        estimated: f64,
        /// What was taken.
        taken: f64,
    },
    /// Yearly temperatures spread far: look for a trend, or for a thermometer that was changed. It was taken for spread.
    TemperaturesSpreadWide {
        /// Spread of the year's temperature that was taken, °C.
        spread_c: f64,
    },
    /// Yearly temperatures differ no more than days alone explain.
    TemperaturesSpreadNoMoreThanDays,
    /// A month has no wet days, or only wet days: half a day was added to each kind.
    MonthOfOneKind {
        /// Month (1–12).
        month: u32,
    },
    /// In a month wet days came less often after wet days than after dry ones, or nearly always; the nearest possible
    /// memory was taken.
    WetnessMemoryOutside {
        /// Month (1–12).
        month: u32,
        /// Estimated day-to-day correlation.
        estimated: f64,
        /// What was taken.
        taken: f64,
    },
    /// Too few wet days in a month: depths of the months around it were taken in.
    DepthsPooled {
        /// Month (1–12).
        month: u32,
        /// Wet days in the month itself.
        wet_days: usize,
    },
    /// Some month has too few days of a kind for a curve of its own: its step from the other kind is the same all year.
    SameStepAllYear {
        /// Which value: `tmax_c`, `tmin_c` or `solar_mj_m2`.
        field: &'static str,
    },
    /// A spread over the year could not be held above zero with two waves; fewer were taken.
    SimplerSpread {
        /// Which value: `tmax_c` or `tmin_c`.
        field: &'static str,
    },
    /// A value that the record has will not be generated: too few usable days, no spread, or (radiation) no site.
    LeftOut {
        /// Which value: `solar_mj_m2`, `relative_humidity_percent` or `wind_2m_ms`.
        field: &'static str,
        /// Usable days of it.
        days: usize,
    },
    /// Days whose radiation was above the clear sky (or not above zero), and so were left out.
    RadiationAboveClearSky {
        /// How many.
        days: usize,
    },
    /// Correlations with radiation were taken from Richardson and Wright (1984).
    PublishedRadiationMemory,
    /// All residual correlations were taken from Richardson and Wright (1984).
    PublishedMemory,
    /// The mean dewpoint lay above the minimum; the minimum was taken.
    DewpointAtMinimum,
}

/// What was found on the way to a recipe.
#[derive(Debug, Clone, PartialEq)]
pub struct FitReport {
    /// Days in the record.
    pub days: usize,
    /// Water years without a missing day.
    pub full_years: usize,
    /// Days with at least half a step of the gauge.
    pub wet_days: usize,
    /// Step of the gauge that was recognised, mm.
    pub depth_step_mm: f64,
    /// Mean of the full water years' totals, mm.
    pub annual_mean_mm: f64,
    /// Standard deviation of the totals, mm.
    pub annual_spread_mm: f64,
    /// Correlation of a total with that of the year before; `None` with fewer than [`LEAST_YEARS_FOR_SPREAD`] years.
    pub annual_lag_one: Option<f64>,
    /// Whether differences between years were fitted (else they are the recipe's default).
    pub years_fitted: bool,
    /// What else should be known.
    pub notes: Vec<FitNote>,
}

/// Learns a recipe from a record of daily weather without a known site: radiation is left out.
///
/// # Errors
/// See [`FitError`].
pub fn fit(record: &[GeneratorDay], water_year_start_month: u32) -> Result<(Recipe, FitReport), FitError> {
    fit_at(record, water_year_start_month, None)
}

/// Learns a recipe from a record of daily weather, with radiation if the site is given and the record has it.
///
/// Days may be missing (what spans a gap is not counted); a year with a missing day is no full year.
///
/// # Errors
/// See [`FitError`].
pub fn fit_at(
    record: &[GeneratorDay],
    water_year_start_month: u32,
    site: Option<Site>,
) -> Result<(Recipe, FitReport), FitError> {
    let record = Record::read(record, water_year_start_month)?;
    let mut notes = Vec::new();
    let wetness = precipitation::wetness(&record, &mut notes);
    let shapes = precipitation::depth_shapes(&record, &mut notes);
    let mut temperature = temperature::fit(&record, &mut notes);
    let radiation = air::radiation(&record, site, &mut notes);
    let fitted = years::fit(&record, &wetness, &shapes, &temperature, &mut notes);
    let residuals = temperature::memory(
        &record,
        &temperature,
        radiation.as_ref().map(|found| &found.residuals[..]),
        fitted.years.shared_variance(),
        &mut notes,
    );
    temperature.leave_room_for_years(fitted.years.shared_variance());
    let annual = record.annual();
    let recipe = Recipe {
        about: format!("Fitted to {} days of record, {} full water years.", record.days.len(), record.full_years.len()),
        water_year_start_month,
        depth_step_mm: record.step_mm,
        temperature_step_c: 0.1,
        round_as_station: true,
        wetness,
        depths: fitted.depths,
        temperature: temperature.curves,
        residuals,
        years: fitted.years,
        radiation: radiation.map(|found| found.recipe),
        humidity: air::humidity(&record, &mut notes),
        wind: air::wind(&record, &mut notes),
    };
    recipe.check().map_err(FitError::Unusable)?;
    let report = FitReport {
        days: record.days.len(),
        full_years: record.full_years.len(),
        wet_days: record.days.iter().filter(|day| day.wet).count(),
        depth_step_mm: record.step_mm,
        annual_mean_mm: annual.mean_mm,
        annual_spread_mm: annual.variance_mm2.sqrt(),
        annual_lag_one: annual.lag_one,
        years_fitted: fitted.from_record,
        notes,
    };
    Ok((recipe, report))
}

/// Means and spreads on dry and on wet days over the year.
#[derive(Debug, Clone, Copy, PartialEq)]
struct ByKind {
    dry: SeasonalCurve,
    wet: SeasonalCurve,
    dry_spread: SeasonalCurve,
    wet_spread: SeasonalCurve,
}
