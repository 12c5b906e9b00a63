//! The generator itself: one day after another.

use super::climate::{DayClimate, DayTemperature, calendar, depth_factor};
use super::random::{Purpose, Stream};
use super::recipe::{Recipe, RecipeFault};
use super::residuals::ResidualMemory;
use super::season::place_of;
use super::sky::{clear_sky_mj_m2, saturation_kpa};
use super::{GeneratorDay, GeneratorError};
use chrono::{Datelike, NaiveDate};

/// A checked recipe, laid out for drawing.
#[derive(Debug, Clone)]
pub struct Generator {
    recipe: Recipe,
    calendar: Vec<DayClimate>,
    memory: ResidualMemory,
}

/// Daily range, °C, below which the range is bent towards its least.
const BENT_RANGE_C: f64 = 1.0;
/// Daily range, °C, that is neared and never reached: two steps of the usual thermometer.
const LEAST_RANGE_C: f64 = 0.2;

impl Generator {
    /// Checks a recipe and lays it out.
    ///
    /// # Errors
    /// Every fault of the recipe.
    pub fn new(recipe: &Recipe) -> Result<Self, Vec<RecipeFault>> {
        recipe.check()?;
        let memory = recipe.residuals.memory().ok_or_else(|| vec![RecipeFault::ImpossibleCorrelations])?;
        Ok(Self { recipe: recipe.clone(), calendar: calendar(recipe), memory })
    }

    /// Invents the given number of days from a first date on; the same for the same seed, on every target.
    ///
    /// # Errors
    /// [`GeneratorError::PastLastDate`] if the calendar cannot hold the last day.
    pub fn generate(&self, start: NaiveDate, days: usize, seed: u64) -> Result<Vec<GeneratorDay>, GeneratorError> {
        let ahead = days.saturating_sub(1) as u64;
        if start.checked_add_days(chrono::Days::new(ahead)).is_none() {
            return Err(GeneratorError::PastLastDate { start, days });
        }
        let mut chance = Chance::new(seed);
        let mut state: Option<State> = None;
        // Not chrono's own iterator: it leaves out the last date that there is.
        Ok(std::iter::successors(Some(start), NaiveDate::succ_opt)
            .take(days)
            .map(|date| {
                let next = self.day_state(date, state.as_ref(), &mut chance);
                state = Some(next);
                self.weather(date, &next, &mut chance)
            })
            .collect())
    }

    /// The hidden state of a day: year, wet or dry, residuals.
    fn day_state(&self, date: NaiveDate, before: Option<&State>, chance: &mut Chance) -> State {
        let years = &self.recipe.years;
        let water_year = water_year(date, self.recipe.water_year_start_month);
        let year = match before {
            Some(before) if before.year.water_year == water_year => before.year,
            _ => {
                let (fresh, warmth) = (chance.year.normal(), chance.year.normal());
                let lag = years.lag_one;
                let index = before.map_or(fresh, |before| lag * before.year.index + (1.0 - lag * lag).sqrt() * fresh);
                Year {
                    water_year,
                    index,
                    warmer_c: years.temperature_spread_c * warmth - years.wet_year_cooling_c * index,
                    depth_factor: depth_factor(years.depth_shift, index),
                }
            }
        };
        let climate = &self.calendar[place_of(date.month(), date.day())];
        let chain = climate.wetness.in_year(years.wetness_shift, year.index);
        let chance_wet = before.map_or(chain.wet_share(), |before| chain.chance_after(before.wet));
        let wet = chance.wetness.uniform() < chance_wet;
        let deviates = core::array::from_fn(|_| chance.residuals.normal());
        let residuals = match before {
            Some(before) => self.memory.next(&before.residuals, &deviates),
            None => self.memory.first(&deviates),
        };
        State { year, wet, residuals }
    }

    /// The weather of a day whose hidden state is known.
    fn weather(&self, date: NaiveDate, state: &State, chance: &mut Chance) -> GeneratorDay {
        let climate = &self.calendar[place_of(date.month(), date.day())];
        let (which, how_much) = (chance.depth.uniform(), chance.depth.uniform());
        let still = chance.wind.uniform();
        let precipitation_mm = if state.wet {
            let beyond = climate.depth.times(state.year.depth_factor).draw(which, how_much);
            self.rounded(0.5 * self.recipe.depth_step_mm + beyond, self.recipe.depth_step_mm)
        } else {
            0.0
        };
        let temperature = if state.wet { &climate.wet } else { &climate.dry };
        let (tmin_c, tmax_c) = temperatures(temperature, state);
        let tmin_c = self.rounded(tmin_c, self.recipe.temperature_step_c);
        let tmax_c = self.rounded(tmax_c, self.recipe.temperature_step_c);
        let solar_mj_m2 = self.recipe.radiation.as_ref().zip(climate.sky).map(|(sun, (dry, wet))| {
            let odds = if state.wet { wet } else { dry };
            let clear_sky = clear_sky_mj_m2(sun.latitude_degrees, sun.elevation_m, date.ordinal());
            clear_sky / (1.0 + libm::exp(-(odds.mean + odds.spread * state.residuals[2])))
        });
        let relative_humidity_percent = self.recipe.humidity.as_ref().map(|humidity| {
            let below = if state.wet { humidity.wet_dewpoint_below_tmin_c } else { humidity.dry_dewpoint_below_tmin_c };
            let saturated = 0.5 * (saturation_kpa(tmax_c) + saturation_kpa(tmin_c));
            100.0 * saturation_kpa(tmin_c - below) / saturated
        });
        let wind_2m_ms = self.recipe.wind.as_ref().zip(climate.wind_2m_ms).map(|(wind, mean)| {
            let scale = mean / libm::tgamma(1.0 + 1.0 / wind.shape);
            scale * libm::pow(-libm::log(still), 1.0 / wind.shape)
        });
        GeneratorDay { date, tmin_c, tmax_c, precipitation_mm, solar_mj_m2, relative_humidity_percent, wind_2m_ms }
    }

    fn rounded(&self, value: f64, step: f64) -> f64 {
        if self.recipe.round_as_station { round_to(value, step) } else { value }
    }
}

/// A value at the nearest step, halves upward, written with as few digits as the step has.
fn round_to(value: f64, step: f64) -> f64 {
    let steps = libm::floor(value / step + 0.5);
    // Dividing by a whole number of steps per unit gives 2.3, where multiplying by 0.1 would give 2.3000000000000003.
    let per_unit = libm::floor(1.0 / step + 0.5);
    // Adding zero turns a rounded −0 into 0.
    let rounded = if per_unit >= 1.0 && (per_unit * step - 1.0).abs() < 1e-9 { steps / per_unit } else { steps * step };
    rounded + 0.0
}

/// The year to which a date belongs when years begin with the given month; named for the year in which it ends.
pub(super) fn water_year(date: NaiveDate, start_month: u32) -> i32 {
    if start_month > 1 && date.month() >= start_month { date.year() + 1 } else { date.year() }
}

/// Minimum and maximum, °C, with the range kept above its least.
fn temperatures(day: &DayTemperature, state: &State) -> (f64, f64) {
    let tmax = day.tmax.mean + day.tmax.spread * state.residuals[0];
    let tmin = day.tmin.mean + day.tmin.spread * state.residuals[1];
    let range = tmax - tmin;
    if range >= BENT_RANGE_C {
        return (tmin + state.year.warmer_c, tmax + state.year.warmer_c);
    }
    let room = BENT_RANGE_C - LEAST_RANGE_C;
    let bent = LEAST_RANGE_C + room * libm::exp((range - BENT_RANGE_C) / room);
    let middle = 0.5 * (tmax + tmin) + state.year.warmer_c;
    (middle - 0.5 * bent, middle + 0.5 * bent)
}

/// The streams, one for each kind of draw.
struct Chance {
    year: Stream,
    wetness: Stream,
    depth: Stream,
    residuals: Stream,
    wind: Stream,
}

impl Chance {
    fn new(seed: u64) -> Self {
        let stream = |purpose| Stream::new(seed, purpose);
        Self {
            year: stream(Purpose::YearIndex),
            wetness: stream(Purpose::Wetness),
            depth: stream(Purpose::Depth),
            residuals: stream(Purpose::Residuals),
            wind: stream(Purpose::Wind),
        }
    }
}

#[derive(Debug, Clone, Copy)]
struct Year {
    water_year: i32,
    index: f64,
    warmer_c: f64,
    depth_factor: f64,
}

#[derive(Debug, Clone, Copy)]
struct State {
    year: Year,
    wet: bool,
    residuals: [f64; 3],
}
