//! From answers to a scene: the chosen year of each run in the series that the pages draw.

use crate::picture::chart::DayMark;
use crate::picture::views::facts::{AllYears, PlaceFacts, YearMeasure};
use crate::picture::views::hand::Hand;
use crate::picture::views::scene::{
    CanalShown, CanalTitle, DialSetting, Doubt, ReservoirShown, RunShown, Scene, YearKind, YearShown,
};
use crate::place::Place;
use crate::water::calendar::CalendarDay;
use crate::water::canals::SharingRule;
use crate::water::dials::{DialRange, Dials};
use crate::water::valley::{Band, Valley};
use crate::words::{System, Words};

use super::answer::{Answer, Source, Supply, YearDetail};
use super::year::{Third, YearChoice, YearList};
use super::{Answers, Offer, Shown};
use crate::signs::{WHITE_MM, YearReport};
use crate::water::dials::Dial;

/// How far back a field's look remembers whether its crops were short, days: one dry day is no dry field.
const CROP_DAYS: usize = 7;

/// What a scene takes from the place, beside the valley.
#[derive(Clone, Copy, Debug)]
pub struct PlaceTold<'a> {
    /// The place's own name.
    pub name: &'a str,
    /// Whether it is made up.
    pub invented: bool,
    /// Whether the model was fitted to its gauge.
    pub fitted: bool,
    /// Names of its canals and towns in downstream order.
    pub gate_names: &'a [&'a str],
}

/// What the about page tells of a place, in the words of `tag`.
pub fn facts_of<'p>(place: &'p Place, percent_per_degree: Option<f64>, tag: &str) -> PlaceFacts<'p> {
    let rule = match place.valley.rule {
        SharingRule::Seniority => "seniority",
        SharingRule::Proportional => "proportional",
        SharingRule::Rotation => "rotation",
    };
    PlaceFacts {
        source: place.source.as_ref().map(|source| source.get(tag)),
        evaporation_key: Some(place.notes.evaporation.choice.key()),
        percent_per_degree,
        rule_key: (!place.valley.gates.is_empty()).then_some(rule),
        filled_values: Some(place.notes.filled_gaps.iter().map(|gaps| gaps.days).sum()),
        gauged: Some(place.gauge.is_some()),
        old_fit: false,
    }
}

/// The series of the chosen year, owned; made anew when an answer or the year changes, not for every frame.
#[derive(Clone, Debug)]
pub struct Stage<'a> {
    place: PlaceTold<'a>,
    bands: &'a [Band],
    start_month: u8,
    calendar: &'a [CalendarDay],
    deepest_snow_mm: f64,
    titles: Vec<CanalTitle<'a>>,
    was: Course<'a>,
    now: Course<'a>,
    beside: Option<Course<'a>>,
    enough_share: f64,
    kinds: Vec<YearKind>,
}

/// What changes from frame to frame without another answer.
#[derive(Clone, Copy, Debug)]
pub struct Moment<'a> {
    /// The dials on offer as they stand.
    pub dials: &'a [DialSetting],
    /// Which of them is being turned.
    pub chosen: Option<usize>,
    /// How the year was chosen.
    pub kind: YearKind,
    /// Day of the year, counted from 0.
    pub day: usize,
    /// Whether the year plays.
    pub playing: bool,
    /// Whether the answer on show is an old one.
    pub stale: bool,
    /// The units.
    pub units: System,
    /// The second language, where two are spoken.
    pub second: Option<&'a Words>,
    /// How far the answer may be off.
    pub doubt: Option<Doubt<'a>>,
}

/// The dials on offer and where they stand, in order.
pub fn settings(offer: &Offer, dials: &Dials) -> Vec<DialSetting> {
    let range = |dial: Dial| offer.scale(dial).map_or(dial.widest(), |scale| scale.range());
    offer.dials().map(|dial| setting(dial, dials, range(dial))).collect()
}

fn setting(dial: Dial, dials: &Dials, range: DialRange) -> DialSetting {
    DialSetting { dial, value: dials.get(dial), range }
}

impl<'a> Moment<'a> {
    /// The moment that a state shows; `settings` come from [`settings`].
    pub fn of(shown: &Shown, settings: &'a [DialSetting], answers: &Answers, second: Option<&'a Words>) -> Self {
        Self {
            dials: settings,
            chosen: settings.iter().position(|setting| Some(setting.dial) == shown.chosen),
            kind: match shown.year {
                YearChoice::Of(Third::Dry) => YearKind::Dry,
                YearChoice::Of(Third::Middling) => YearKind::Middling,
                YearChoice::Of(Third::Wet) => YearKind::Wet,
                YearChoice::Any(_) => YearKind::Any,
            },
            day: shown.day.into(),
            playing: shown.playing,
            stale: !answers.is_dialled_current(),
            units: shown.system,
            second,
            doubt: None,
        }
    }
}

/// One run of the chosen year.
#[derive(Clone, Debug)]
struct Course<'a> {
    answer: &'a Answer,
    has_reservoir: bool,
    snow_line_m: Vec<Option<f64>>,
    snow_water_mm: Vec<f64>,
    natural_flow_m3s: Vec<f64>,
    storage_hm3: Vec<f64>,
    lake_area_km2: Vec<f64>,
    river_m3s: Vec<f64>,
    minimum_m3s: Vec<f64>,
    delivered_m3s: Vec<f64>,
    demand_m3s: Vec<f64>,
    canals: Vec<Canal>,
}

#[derive(Clone, Debug)]
struct Canal {
    marks: Vec<DayMark>,
    delivered_m3s: Vec<f64>,
    demand_m3s: Vec<f64>,
    crop_water_met: Vec<f64>,
}

impl<'a> Stage<'a> {
    /// The stage for the answers at hand.
    pub fn new(place: PlaceTold<'a>, source: &Source<'a>, answers: &'a Answers) -> Self {
        let valley = source.valley;
        let titles = titles(valley, place.gate_names);
        let course = |answer| Course::new(valley, &titles, answer);
        let (was, now) = (course(answers.rest()), course(answers.dialled()));
        let beside = answers.beside().map(course);
        let detail = &answers.dialled().year;
        let (from, days) = (detail.year.first, detail.year.days);
        Self {
            place,
            bands: &valley.bands,
            start_month: valley.water_year_start_month,
            calendar: source.calendar.get(from..from + days).unwrap_or_default(),
            deepest_snow_mm: deepest(&answers.rest().year).max(deepest(detail)),
            titles,
            was,
            now,
            beside,
            enough_share: valley.enough_share,
            kinds: kinds(&answers.rest().run.years),
        }
    }

    /// What of the stage a scene borrows besides: kept by the caller for as long as the scene.
    pub fn props(&self) -> Props<'_> {
        Props {
            was: self.was.canals_shown(),
            now: self.now.canals_shown(),
            beside: self.beside.as_ref().map(Course::canals_shown).unwrap_or_default(),
        }
    }

    /// The scene of a moment. What the about and the trust page tell is the caller's to add: it knows the place's
    /// files.
    pub fn scene<'s>(&'s self, props: &'s Props<'s>, moment: Moment<'s>) -> Scene<'s> {
        Scene {
            place_name: self.place.name,
            invented: self.place.invented,
            fitted: self.place.fitted,
            year: YearShown { kind: moment.kind, calendar: self.calendar, start_month: self.start_month },
            day: moment.day,
            playing: moment.playing,
            stale: moment.stale,
            dials: moment.dials,
            chosen: moment.chosen,
            units: moment.units,
            second: moment.second,
            bands: self.bands,
            deepest_snow_mm: self.deepest_snow_mm,
            canals: &self.titles,
            was: self.was.shown(&props.was, moment.day),
            now: self.now.shown(&props.now, moment.day),
            beside: self.beside.as_ref().map(|course| course.shown(&props.beside, moment.day)),
            doubt: moment.doubt,
            all_years: AllYears {
                enough_share: self.enough_share,
                kinds: &self.kinds,
                measure: YearMeasure::default(),
            },
            facts: PlaceFacts::default(),
            skill: None,
            sheet: 0,
            hand: Hand::default(),
        }
    }
}

/// Lists of borrowed canals for a scene.
#[derive(Clone, Debug)]
pub struct Props<'s> {
    was: Vec<CanalShown<'s>>,
    now: Vec<CanalShown<'s>>,
    beside: Vec<CanalShown<'s>>,
}

/// Canals and towns in order of right, the oldest first; of equal rights the one further upstream.
fn titles<'n>(valley: &Valley, names: &[&'n str]) -> Vec<CanalTitle<'n>> {
    let mut order: Vec<usize> = (0..valley.gates.len()).collect();
    order.sort_by_key(|&gate| valley.gates[gate].right_date);
    let title = |gate: usize| CanalTitle {
        name: names.get(gate).copied().unwrap_or_default(),
        right_year: valley.gates[gate].right_date.right_year(),
        is_town: valley.gates[gate].is_town(),
        gate,
    };
    order.into_iter().map(title).collect()
}

/// The third of every year, as the year chooser ranks them.
fn kinds(years: &[YearReport]) -> Vec<YearKind> {
    let Some(list) = YearList::of(years) else { return Vec::new() };
    let kind = |third| match third {
        Third::Dry => YearKind::Dry,
        Third::Middling => YearKind::Middling,
        Third::Wet => YearKind::Wet,
    };
    (0..list.count()).filter_map(|index| list.third(index)).map(kind).collect()
}

fn deepest(year: &YearDetail) -> f64 {
    (0..year.days.len()).flat_map(|day| year.band_snow_mm(day)).copied().fold(0.0, f64::max)
}

/// The height above which the ground is white, m: the foot of the lowest band above which all are white, half-way to
/// its lower neighbour. `None` where the highest band is bare.
pub fn snow_line_m(bands: &[Band], band_snow_mm: &[f64]) -> Option<f64> {
    let white = |band: &usize| band_snow_mm.get(*band).is_some_and(|&snow| snow > WHITE_MM);
    let lowest = (0..bands.len()).rev().take_while(white).last()?;
    let height = |band: usize| bands[band].elevation_m;
    let half_step = |low: usize, high: usize| (height(high) - height(low)) / 2.0;
    Some(match lowest {
        0 if bands.len() > 1 => height(0) - half_step(0, 1),
        0 => height(0),
        band => height(band) - half_step(band - 1, band),
    })
}

impl<'a> Course<'a> {
    fn new(valley: &Valley, titles: &[CanalTitle<'_>], answer: &'a Answer) -> Self {
        let detail = &*answer.year;
        let has_reservoir = valley.reservoir.is_some();
        let series = |value: fn(&super::answer::ValleyDay) -> f64| detail.days.iter().map(value).collect::<Vec<f64>>();
        let dead_hm3 = detail.dead_hm3;
        let together = |value: fn(&super::answer::GateDay) -> f64| -> Vec<f64> {
            (0..detail.days.len())
                .map(|day| detail.gates.iter().filter_map(|gate| gate.get(day)).map(value).sum())
                .collect()
        };
        Self {
            answer,
            has_reservoir,
            snow_line_m: (0..detail.days.len())
                .map(|day| snow_line_m(&valley.bands, detail.band_snow_mm(day)))
                .collect(),
            snow_water_mm: series(|day| day.snow_water_mm),
            natural_flow_m3s: series(|day| day.inflow_m3s),
            storage_hm3: detail.days.iter().map(|day| dead_hm3 + day.content_hm3).collect(),
            lake_area_km2: detail.days.iter().filter_map(|day| day.lake_area_km2).collect(),
            river_m3s: series(|day| day.river_out_m3s),
            minimum_m3s: series(|day| day.minimum_m3s),
            delivered_m3s: together(|gate| gate.delivered_m3s),
            demand_m3s: together(|gate| gate.demand_m3s),
            canals: titles.iter().map(|title| Canal::new(detail, title.gate)).collect(),
        }
    }

    fn canals_shown(&self) -> Vec<CanalShown<'_>> {
        self.canals.iter().map(Canal::shown).collect()
    }

    fn shown<'s>(&'s self, canals: &'s [CanalShown<'s>], day: usize) -> RunShown<'s> {
        let detail = &*self.answer.year;
        let reservoir = self.has_reservoir.then_some(ReservoirShown {
            storage_hm3: &self.storage_hm3,
            capacity_hm3: detail.dead_hm3 + detail.active_hm3,
            dead_hm3: detail.dead_hm3,
            lake_area_km2: &self.lake_area_km2,
        });
        RunShown {
            snow_water_mm: &self.snow_water_mm,
            band_snow_mm: detail.band_snow_mm(day),
            snow_line_m: self.snow_line_m.get(day).copied().flatten(),
            natural_flow_m3s: &self.natural_flow_m3s,
            reservoir,
            river_m3s: &self.river_m3s,
            minimum_m3s: &self.minimum_m3s,
            delivered_m3s: &self.delivered_m3s,
            demand_m3s: &self.demand_m3s,
            canals,
            years: &self.answer.run.years,
            chosen_year: detail.index,
        }
    }
}

impl Canal {
    fn new(detail: &YearDetail, gate: usize) -> Self {
        let days = detail.gates.get(gate).map(Vec::as_slice).unwrap_or_default();
        let mark = |supply| match supply {
            None => DayMark::Idle,
            Some(Supply::Full) => DayMark::Full,
            Some(Supply::Short) => DayMark::Short,
            Some(Supply::Cut) => DayMark::Cut,
        };
        let met = |day: usize| {
            let week = &days[day.saturating_sub(CROP_DAYS - 1)..=day];
            let used: f64 = week.iter().map(|day| day.crop_evaporation_m3).sum();
            let need: f64 = week.iter().map(|day| day.full_crop_evaporation_m3).sum();
            if need > 0.0 { used / need } else { f64::NAN }
        };
        Self {
            marks: days.iter().map(|day| mark(day.supply)).collect(),
            delivered_m3s: days.iter().map(|day| day.delivered_m3s).collect(),
            demand_m3s: days.iter().map(|day| day.demand_m3s).collect(),
            crop_water_met: (0..days.len()).map(met).collect(),
        }
    }

    fn shown(&self) -> CanalShown<'_> {
        CanalShown {
            marks: &self.marks,
            delivered_m3s: &self.delivered_m3s,
            demand_m3s: &self.demand_m3s,
            crop_water_met: &self.crop_water_met,
        }
    }
}
