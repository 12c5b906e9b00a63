//! Long invented weather: a seeded daily generator and its fit to a short record.
//!
//! The structure is that of Richardson (1981, "Stochastic simulation of daily precipitation, temperature, and solar
//! radiation", Water Resources Research 17(1):182–190) with a memory from year to year added:
//!
//! * wet and dry days by a two-state Markov chain whose chances follow the season ([`WetDayChain`]);
//! * depths on wet days by a mixed exponential (Woolhiser and Roldán 1982), read in the gauge's own steps;
//! * maximum, minimum and radiation as standardised residuals with lag-one matrices ([`ResidualCorrelations`]) about
//!   means and spreads that differ between dry and wet days and follow two waves a year ([`SeasonalCurve`]);
//! * a hidden wetness index for each water year that remembers the year before ([`YearIndex`]) and shifts wet-day
//!   chances, depths and, mildly, temperature;
//! * humidity and wind, simply, if asked for.
//!
//! | to | call |
//! |---|---|
//! | invent days from a recipe | [`generate`], or [`Generator::new`] once and [`Generator::generate`] for many seeds |
//! | learn a recipe from a record | [`fit`]; [`fit_at`] where the site is known and the record has radiation |
//! | write a recipe down, or read one | [`Recipe`] is `Serialize` and `Deserialize`; [`Recipe::check`] finds all its faults |
//! | know what a recipe leads to | [`Recipe::expected_precipitation`] |
//! | start from somewhere | [`invented::tresnubes`], [`invented::valle_del_sur`] |
//!
//! Errors ([`GeneratorError`], [`RecipeFault`], [`FitError`]) and remarks ([`FitNote`]) are data without words.
//!
//! # The trap of generators that know only days
//!
//! Days drawn by month alone average out: a year has some hundred wet days, so yearly totals hardly differ, and droughts
//! of several years are next to impossible. Records spread about twice as far (overdispersion; Katz and Parlange 1998,
//! Journal of Climate 11:591–601). [`Recipe::expected_precipitation`] gives both spreads, with the index and without.
//! The index is fitted where a record has at least [`LEAST_YEARS_FOR_SPREAD`] full years; before that the report says
//! that it was taken from [`YearIndex::WHEN_UNKNOWN`]. Even twenty-five years tell the spread only to about a seventh
//! and the memory hardly at all, so look at both before you trust long droughts.
//!
//! # What holds for every run
//!
//! The same recipe, start and seed give the same bits on every target. A longer run begins with the shorter one. The
//! minimum is below the maximum and radiation below the clear sky by construction ([`Temperatures`], [`Radiation`]).
//! A year's index acts from the first month of the water year on and all its year round. Trends are not modelled: a
//! warming in the record is taken for spread.
//!
//! # Example
//!
//! ```
//! use chrono::NaiveDate;
//! use deshielo::generator::{fit, generate, invented};
//!
//! let start = NaiveDate::from_ymd_opt(1981, 10, 1).unwrap();
//! let record = generate(&invented::tresnubes(), start, 20 * 365 + 5, 7).unwrap();
//! assert!(record.iter().all(|day| day.tmin_c < day.tmax_c));
//!
//! // Learn a recipe from the record, and make it longer.
//! let (recipe, report) = fit(&record, 10).unwrap();
//! assert_eq!(report.full_years, 20);
//! let longer = generate(&recipe, start, 100 * 365, 8).unwrap();
//! assert_eq!(longer.len(), 36_500);
//! ```

mod climate;
mod depth;
mod expected;
mod fit;
pub mod invented;
mod normal;
pub(crate) mod random;
mod recipe;
mod residuals;
mod run;
mod season;
mod sky;
mod wetness;

pub use expected::ExpectedPrecipitation;
pub use fit::{
    FitError, FitNote, FitReport, LEAST_DAYS_OF_A_KIND, LEAST_FULL_YEARS, LEAST_YEARS_FOR_SPREAD, Site, fit, fit_at,
};
pub use recipe::{Depths, Humidity, Radiation, Recipe, RecipeFault, Temperatures, Wetness, Wind, YearIndex};
pub use residuals::{Matrix, ResidualCorrelations, ResidualMemory};
pub use run::Generator;
pub use season::SeasonalCurve;
pub use wetness::WetDayChain;

use chrono::NaiveDate;

/// One day of weather.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct GeneratorDay {
    /// The day.
    pub date: NaiveDate,
    /// Minimum air temperature, °C.
    pub tmin_c: f64,
    /// Maximum air temperature, °C.
    pub tmax_c: f64,
    /// Precipitation, mm.
    pub precipitation_mm: f64,
    /// Solar radiation, MJ m⁻² d⁻¹.
    pub solar_mj_m2: Option<f64>,
    /// Mean relative humidity, %.
    pub relative_humidity_percent: Option<f64>,
    /// Mean wind at 2 m above ground, m/s.
    pub wind_2m_ms: Option<f64>,
}

/// Why no weather was made.
#[derive(Debug, Clone, PartialEq)]
pub enum GeneratorError {
    /// The recipe has faults.
    Recipe(
        /// All of them.
        Vec<RecipeFault>,
    ),
    /// The calendar cannot hold so many days after the start.
    PastLastDate {
        /// First day asked for.
        start: NaiveDate,
        /// Days asked for.
        days: usize,
    },
}

/// Invents the given number of days of weather from a first date on; the same for the same seed, on every target.
///
/// # Errors
/// See [`GeneratorError`].
pub fn generate(
    recipe: &Recipe,
    start: NaiveDate,
    days: usize,
    seed: u64,
) -> Result<Vec<GeneratorDay>, GeneratorError> {
    Generator::new(recipe).map_err(GeneratorError::Recipe)?.generate(start, days, seed)
}
