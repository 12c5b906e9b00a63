//! The river beside its gauge.

use super::season::{DurationPoint, LateSummer, MonthOfYear, duration, months, sorted};
use super::years::{YearSkill, years};
use crate::signs::skill::{
    DayOfYearMean, ErrorShape, KlingGupta, Rating, high_flow_bias, kling_gupta_2009, low_flow_bias, monthly_skill,
    nash_sutcliffe, nash_sutcliffe_of_logs, percent_bias, percent_bias_on, rate_nash_sutcliffe, rate_percent_bias,
    rate_rsr,
};
use crate::water::calendar::CalendarDay;

/// Share of the observed mean that is added to both flows before their ratio is taken, as for efficiencies of logarithms.
const ADDED_BEFORE_RATIO: f64 = 0.01;
/// Share of the highest month's flow from which a month belongs to the flood season (common practice, no source).
const FLOOD_MONTH_SHARE: f64 = 0.5;

/// Scores of daily or yearly values.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Daily {
    /// Nash–Sutcliffe efficiency.
    pub nash_sutcliffe: Option<f64>,
    /// Kling–Gupta efficiency of 2009 and its parts.
    pub kling_gupta: Option<KlingGupta>,
    /// Percent bias, positive where the model gives too little, %.
    pub percent_bias: Option<f64>,
}

impl Daily {
    /// Of two series.
    pub fn of(modelled: &[f64], observed: &[f64]) -> Self {
        Self {
            nash_sutcliffe: nash_sutcliffe(modelled, observed),
            kling_gupta: kling_gupta_2009(modelled, observed),
            percent_bias: percent_bias(modelled, observed),
        }
    }
}

/// Scores of monthly means with the bands of Moriasi et al. (2007).
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Monthly {
    /// Nash–Sutcliffe efficiency and its band.
    pub nash_sutcliffe: (f64, Rating),
    /// Root mean square error over the observed standard deviation and its band.
    pub rsr: (f64, Rating),
    /// Percent bias, positive where the model gives too little, %, and its band.
    pub percent_bias: (f64, Rating),
}

impl Monthly {
    /// The worst of the three, as the bands are meant.
    pub fn worst(&self) -> Rating {
        self.nash_sutcliffe.1.min(self.rsr.1).min(self.percent_bias.1)
    }
}

/// Everything that is told of a modelled flow.
#[derive(Clone, Debug, PartialEq)]
pub struct FlowTrust {
    /// Days with both values.
    pub days: usize,
    /// Of daily flow.
    pub daily: Daily,
    /// Nash–Sutcliffe efficiency of logarithms of daily flow: low flows count most.
    pub nash_sutcliffe_of_logs: Option<f64>,
    /// What the mean of the same day in all other years reaches: a guess without a model.
    pub guess: Daily,
    /// Of yearly volumes; efficiencies of fewer than three years say nothing and are left out.
    pub annual: Option<Daily>,
    /// Of monthly means.
    pub monthly: Option<Monthly>,
    /// The season, from the first month of the water year on.
    pub season: [MonthOfYear; 12],
    /// The duration curve.
    pub duration: Vec<DurationPoint>,
    /// Percent bias of the highest 2 % of days, %.
    pub high_flow_bias: Option<f64>,
    /// Percent bias of the lowest 30 % of days, %.
    pub low_flow_bias: Option<f64>,
    /// Percent bias of the months that carry at least half of the highest month's flow, %.
    pub flood_season_bias: Option<f64>,
    /// Those months.
    pub flood_months: Vec<u8>,
    /// Percent bias of late summer, %.
    pub late_summer_bias: Option<f64>,
    /// The shape of daily errors: natural logarithm of modelled over observed, so that −0.69 is half and 0.69 is twice.
    pub errors: Option<ErrorShape>,
    /// The years with a flow on nearly all days.
    pub years: Vec<YearSkill>,
}

impl FlowTrust {
    /// Of two series, m³/s, as long as `calendar`; missing values are NaN. `None` without a pair.
    pub fn of(
        calendar: &[CalendarDay],
        start_month: u8,
        modelled: &[f64],
        observed: &[f64],
        late: LateSummer,
    ) -> Option<Self> {
        let days = modelled.iter().zip(observed).filter(|(m, o)| !m.is_nan() && !o.is_nan()).count();
        if days == 0 {
            return None;
        }
        let season = months(calendar, modelled, observed, start_month);
        let most = season.iter().map(|month| month.observed_m3s).fold(0.0, f64::max);
        let flood: Vec<u8> = season
            .iter()
            .filter(|month| month.observed_m3s >= FLOOD_MONTH_SHARE * most)
            .map(|month| month.month)
            .collect();
        let sorted = sorted(modelled, observed);
        let years = years(calendar, start_month, modelled, observed, late);
        let bias_in =
            |months: &[u8]| percent_bias_on(modelled, observed, calendar, |day| months.contains(&day.month_day.month));
        Some(Self {
            days,
            daily: Daily::of(modelled, observed),
            nash_sutcliffe_of_logs: nash_sutcliffe_of_logs(modelled, observed),
            guess: guess(calendar, modelled, observed),
            annual: annual(&years),
            monthly: monthly(calendar, modelled, observed),
            season,
            duration: duration(&sorted),
            high_flow_bias: high_flow_bias(&sorted[0], &sorted[1]),
            low_flow_bias: low_flow_bias(&sorted[0], &sorted[1]),
            flood_season_bias: bias_in(&flood),
            flood_months: flood,
            late_summer_bias: bias_in(&late),
            errors: errors(modelled, observed),
            years,
        })
    }

    /// Mean size of a yearly error, %, of the observed mean; `None` without a whole year.
    pub fn annual_error_percent(&self) -> Option<f64> {
        error_percent(self.years.iter().map(|year| (year.modelled_hm3, year.observed_hm3)))
    }

    /// The same of late summer.
    pub fn late_summer_error_percent(&self) -> Option<f64> {
        error_percent(self.years.iter().map(|year| (year.modelled_late_hm3, year.observed_late_hm3)))
    }

    /// Mean size of the error of the day on which half of the year's water is past, days.
    pub fn half_day_error(&self) -> Option<f64> {
        let errors = self.years.iter().map(|year| year.modelled_half_day.abs_diff(year.observed_half_day));
        (!self.years.is_empty()).then(|| errors.map(f64::from).sum::<f64>() / self.years.len() as f64)
    }
}

/// Mean size of the errors of (modelled, observed) over the observed mean, %.
pub(super) fn error_percent(pairs: impl Iterator<Item = (f64, f64)>) -> Option<f64> {
    let (error, observed) = pairs.fold((0.0, 0.0), |sum: (f64, f64), (m, o)| (sum.0 + (m - o).abs(), sum.1 + o));
    (observed > 0.0).then(|| 100.0 * error / observed)
}

fn annual(years: &[YearSkill]) -> Option<Daily> {
    let (modelled, observed): (Vec<f64>, Vec<f64>) =
        years.iter().map(|year| (year.modelled_hm3, year.observed_hm3)).unzip();
    (years.len() >= 3).then(|| Daily::of(&modelled, &observed))
}

fn monthly(calendar: &[CalendarDay], modelled: &[f64], observed: &[f64]) -> Option<Monthly> {
    let (efficiency, percent) = monthly_skill(calendar, modelled, observed)?;
    // The ratio and the efficiency are two faces of one sum of squares (Moriasi et al. 2007, equation 3).
    let ratio = libm::sqrt((1.0 - efficiency).max(0.0));
    Some(Monthly {
        nash_sutcliffe: (efficiency, rate_nash_sutcliffe(efficiency)),
        rsr: (ratio, rate_rsr(ratio)),
        percent_bias: (percent, rate_percent_bias(percent)),
    })
}

/// What the mean of the same day in all other years reaches on the days that have a modelled value.
fn guess(calendar: &[CalendarDay], modelled: &[f64], observed: &[f64]) -> Daily {
    let judged: Vec<f64> = modelled.iter().zip(observed).map(|(m, o)| if m.is_nan() { f64::NAN } else { *o }).collect();
    let mut guessed = vec![f64::NAN; judged.len()];
    let mut first = 0;
    let mut others = judged.clone();
    while first < judged.len() {
        let water_year = calendar[first].water_year;
        let days = calendar[first..judged.len()].iter().take_while(|day| day.water_year == water_year).count();
        let span = first..first + days;
        others[span.clone()].fill(f64::NAN);
        let usual = DayOfYearMean::of(calendar, &others);
        others[span.clone()].copy_from_slice(&judged[span.clone()]);
        for day in span {
            guessed[day] = usual.on(&calendar[day]);
        }
        first += days;
    }
    Daily::of(&guessed, &judged)
}

fn errors(modelled: &[f64], observed: &[f64]) -> Option<ErrorShape> {
    let pairs = || modelled.iter().zip(observed).filter(|(m, o)| !m.is_nan() && !o.is_nan());
    let added = ADDED_BEFORE_RATIO * pairs().map(|(_, o)| *o).sum::<f64>() / pairs().count() as f64;
    let ratio = |(m, o): (&f64, &f64)| {
        let (m, o) = (m + added, o + added);
        if m > 0.0 && o > 0.0 { libm::log(m / o) } else { f64::NAN }
    };
    ErrorShape::of(&mut pairs().map(ratio).collect::<Vec<f64>>())
}
