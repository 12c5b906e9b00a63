//! What the pages beside the year tell: all years, the place, and how far its model was right.

use super::scene::YearKind;

/// What a mark of the many-years page stands for.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum YearMeasure {
    /// The share of the water asked for that arrived.
    #[default]
    Supply,
    /// The most snow water of the year, mm.
    Snow,
    /// Natural flow of the year, hm³.
    Flow,
}

/// How the years of a record are looked at.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct AllYears<'a> {
    /// Share of the water asked for from which a year counts as enough, 0 to 1.
    pub enough_share: f64,
    /// The third of each whole water year by natural flow as it was, in order of time; empty where nobody ranked them.
    pub kinds: &'a [YearKind],
    /// What the marks stand for.
    pub measure: YearMeasure,
}

/// What the about page tells of a place.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct PlaceFacts<'a> {
    /// Where the description of the place comes from, in the language on show.
    pub source: Option<&'a str>,
    /// Key of the way to reference evaporation, such as `penman_monteith`.
    pub evaporation_key: Option<&'a str>,
    /// How much more water crops can lose to the air with one degree Celsius of warming, %.
    pub percent_per_degree: Option<f64>,
    /// Key of the rule by which water is shared, such as `seniority`.
    pub rule_key: Option<&'a str>,
    /// Values of the weather record that were missing and filled by rule; `None` where nobody counted.
    pub filled_values: Option<usize>,
    /// Whether the river is measured; `None` where nobody says.
    pub gauged: Option<bool>,
    /// Whether the fit is from older records or another description of the land.
    pub old_fit: bool,
}

/// How far a fitted model was right.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Skill<'a> {
    /// First and last water year that it was fitted to.
    pub fitted_years: (i32, i32),
    /// Kling–Gupta efficiency of daily flow on all fitted years; 1 is perfect.
    pub fitted: Option<f64>,
    /// Percent bias of daily flow on them, %; positive where the model gives too little.
    pub percent_bias: Option<f64>,
    /// Years judged by a set that never saw them; empty where there were too few years.
    pub tests: &'a [TestShown],
    /// What the model may be used for; empty where nobody judged.
    pub uses: &'a [UseShown],
    /// The modelled river beside the measured one; `None` where nobody compared.
    pub river: Option<RiverSkill<'a>>,
}

/// One use of the model, and what is known of it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct UseShown {
    /// Key of the use, the end of its message `trust-use-…`.
    pub key: &'static str,
    /// The verdict; `None` where it is unknown.
    pub verdict: Option<Verdict>,
    /// Key of the score behind it, the end of its message `trust-score-…`.
    pub score: &'static str,
    /// What the score is measured in.
    pub unit: ScoreUnit,
    /// Its value, or the key of what is lacking for one, the end of its message `trust-need-…`.
    pub value: Result<f64, &'static str>,
    /// Up to the first the answer is yes, up to the second in part.
    pub thresholds: (f64, f64),
    /// Whether a failed half of the years makes it a no all the same.
    pub beaten: bool,
}

/// What a score is measured in.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ScoreUnit {
    /// A part of a score that is 1 at best.
    Score,
    /// Days.
    Days,
    /// Percent.
    Percent,
}

/// The modelled river beside the measured one.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct RiverSkill<'a> {
    /// Whether these are years that the model never saw.
    pub unseen: bool,
    /// Month (1 to 12), measured and modelled mean flow, m³/s, in the order of the water year.
    pub season: &'a [(u8, f64, f64)],
    /// Share of time, measured and modelled flow that is exceeded for it, m³/s.
    pub duration: &'a [(f64, f64, f64)],
    /// Density of the daily errors at even steps between the ends; natural logarithms of modelled over measured.
    pub errors: &'a [f64],
    /// The ends of the errors.
    pub error_ends: (f64, f64),
    /// How many humps the errors have.
    pub humps: usize,
    /// Water year, measured and modelled volume, hm³.
    pub years: &'a [(i32, f64, f64)],
}

/// Which years a test judged.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum TestedYears {
    /// The earlier half of the years, judged by the later.
    Earlier,
    /// The later half, judged by the earlier.
    Later,
    /// The colder half, judged by the warmer.
    Colder,
    /// The warmer half, judged by the colder.
    Warmer,
}

impl TestedYears {
    /// The message that names them.
    pub(super) fn id(self) -> &'static str {
        match self {
            Self::Earlier => "page-trust-earlier",
            Self::Later => "page-trust-later",
            Self::Colder => "page-trust-colder",
            Self::Warmer => "page-trust-warmer",
        }
    }
}

/// What a set is worth on years that it never saw, best first.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Verdict {
    /// Nearly as good as a set fitted there.
    Holds,
    /// Clearly worse.
    Weakens,
    /// Far worse, or worse than saying "same as usual".
    Fails,
}

impl Verdict {
    /// The message that names it.
    pub(super) fn id(self) -> &'static str {
        match self {
            Self::Holds => "page-trust-holds",
            Self::Weakens => "page-trust-weakens",
            Self::Fails => "page-trust-fails",
        }
    }
}

/// One half of the years, judged by a set that never saw it. Scores are Kling–Gupta efficiencies of daily flow.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct TestShown {
    /// Which years.
    pub years: TestedYears,
    /// How many.
    pub count: usize,
    /// Score of the set that never saw them.
    pub judged: Option<f64>,
    /// Score of saying "same as usual": the mean of each day of the other years.
    pub guess: Option<f64>,
    /// What that makes.
    pub verdict: Verdict,
}

impl Skill<'_> {
    /// The worst verdict; `None` without a test.
    pub fn worst(&self) -> Option<Verdict> {
        self.tests.iter().map(|test| test.verdict).max()
    }
}
