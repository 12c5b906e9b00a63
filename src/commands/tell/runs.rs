//! The two runs of a place: as it was, and with the dials turned.

use super::daily::{DailyColumns, Days};
use super::ranges::Ranges;
use super::years::chosen;
use crate::commands::failure::Failure;
use crate::commands::fitted::PlaceFit;
use crate::commands::places::Opened;
use crate::place::{Place, Setting, UnitSystem, Years};
use crate::signs::{YearReport, read_run};
use crate::water::basin::{Basin, BasinDay};
use crate::water::dials::{Dials, Stage};
use crate::water::run::run_basin;
use crate::water::valley::Valley;
use crate::water::works::Works;
use crate::words::{System, Words};

/// One run, cut down to the years that are shown.
#[derive(Clone)]
pub(in crate::commands) struct Run {
    /// The years shown, in order.
    pub years: Vec<YearReport>,
    /// The days of those years, where they were asked for.
    pub days: Option<Days>,
}

/// Everything that an answer is written from.
pub(in crate::commands) struct Told {
    /// The place.
    pub place: Place,
    /// The setting that was used.
    pub setting: Option<Setting>,
    /// Where the dials stand.
    pub dials: Dials,
    /// Which years were asked for.
    pub asked: Years,
    /// First and last whole water year of the record, and how many there are.
    pub record_years: (i32, i32, usize),
    /// With every dial at rest.
    pub as_it_was: Run,
    /// With the dials turned.
    pub with_changes: Run,
    /// Percent that reference evaporation grows with the first degree, over the record.
    pub percent_per_degree: Option<f64>,
    /// What the sets of the fit's ensemble say, where there is one and a dial is turned.
    pub ranges: Option<Ranges>,
    /// The fit that was run with.
    pub fit: Option<PlaceFit>,
}

impl Told {
    /// Runs the whole record twice, unless every dial rests, and keeps the years asked for.
    pub fn run(
        Opened { place, fit }: Opened,
        setting: Option<Setting>,
        dials: Dials,
        asked: Option<Years>,
        daily: bool,
        words: &Words,
    ) -> Result<Self, Failure> {
        let asked = asked.unwrap_or(Years::All);
        let valley = &place.valley;
        let columns = daily.then(|| DailyColumns::of(&place));
        let at_rest = first_stage(&place, valley, &Dials::REST);
        let as_it_was = second_stage(&place, valley, &Dials::REST, &at_rest, columns.as_ref(), words)?;
        let with_changes = match dials.first_stage_since(&Dials::REST) {
            None => as_it_was.clone(),
            Some(Stage::Works) => second_stage(&place, valley, &dials, &at_rest, columns.as_ref(), words)?,
            Some(Stage::Basin) => {
                second_stage(&place, valley, &dials, &first_stage(&place, valley, &dials), columns.as_ref(), words)?
            }
        };
        let shown = chosen(asked, &as_it_was.years, "tell", words)?;
        let ranges = match &fit {
            Some(fit) if dials != Dials::REST => Ranges::of(&place, &fit.sets, &dials, &shown, words)?,
            _ => None,
        };
        let ends =
            [as_it_was.years.first(), as_it_was.years.last()].map(|year| year.map_or(0, |year| year.year.water_year));
        let record_years = (ends[0], ends[1], as_it_was.years.len());
        let percent_per_degree = place.evaporation_percent_per_degree();
        Ok(Told {
            setting,
            dials,
            asked,
            record_years,
            as_it_was: as_it_was.keep(&shown),
            with_changes: with_changes.keep(&shown),
            percent_per_degree,
            ranges,
            fit,
            place,
        })
    }

    /// Whether any dial is off its rest.
    pub fn is_turned(&self) -> bool {
        self.dials != Dials::REST
    }

    /// Whether the years shown follow one another without a gap.
    pub fn is_unbroken(&self) -> bool {
        self.as_it_was.years.windows(2).all(|pair| pair[0].year.water_year + 1 == pair[1].year.water_year)
    }
}

impl Run {
    fn keep(self, shown: &[usize]) -> Run {
        let kept: Vec<YearReport> = shown.iter().filter_map(|index| self.years.get(*index).cloned()).collect();
        let days = self.days.map(|days| days.keep(&kept));
        Run { years: kept, days }
    }
}

/// Every whole water year of the place with every dial at rest.
pub(in crate::commands) fn years_at_rest(place: &Place, words: &Words) -> Result<Vec<YearReport>, Failure> {
    let valley = &place.valley;
    second_stage(place, valley, &Dials::REST, &first_stage(place, valley, &Dials::REST), None, words)
        .map(|run| run.years)
}

struct FirstStage {
    basin: Vec<BasinDay>,
    before: BasinDay,
}

/// The years of another set of the place's numbers, as it was and with the dials turned.
pub(super) fn years_of_set(
    place: &Place,
    valley: &Valley,
    dials: &Dials,
    words: &Words,
) -> Result<[Vec<YearReport>; 2], Failure> {
    let at_rest = first_stage(place, valley, &Dials::REST);
    let was = second_stage(place, valley, &Dials::REST, &at_rest, None, words)?;
    let with = match dials.first_stage_since(&Dials::REST) {
        Some(Stage::Basin) => second_stage(place, valley, dials, &first_stage(place, valley, dials), None, words)?,
        _ => second_stage(place, valley, dials, &at_rest, None, words)?,
    };
    Ok([was.years, with.years])
}

fn first_stage(place: &Place, valley: &Valley, dials: &Dials) -> FirstStage {
    let mut basin = vec![BasinDay::default(); place.days.len()];
    let before = run_basin(valley, &Basin::new(valley, dials), &place.calendar, &place.days, &mut basin);
    FirstStage { basin, before }
}

fn second_stage(
    place: &Place,
    valley: &Valley,
    dials: &Dials,
    first: &FirstStage,
    columns: Option<&DailyColumns>,
    words: &Words,
) -> Result<Run, Failure> {
    // The reader lets no such place through; should it ever, that is told and nothing breaks.
    let works = Works::new(valley, dials)
        .map_err(|fault| Failure::input(words.say("error-river-fault", &[("value", fault.value.into())])))?;
    let mut years = Vec::new();
    let mut days = columns.map(|columns| Days::new(columns, place));
    read_run(
        valley,
        &works,
        &place.calendar,
        &first.basin,
        &first.before,
        |evening, stores| {
            if let Some(days) = &mut days {
                days.enter(&works, evening, stores);
            }
        },
        |year| years.push(year),
    );
    Ok(Run { years, days })
}

/// The units that the people of a place are used to.
pub(in crate::commands) fn usual_system(place: &Place) -> System {
    match place.units {
        UnitSystem::Metric => System::Metric,
        UnitSystem::Us => System::Us,
    }
}
