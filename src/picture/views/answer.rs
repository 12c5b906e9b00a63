//! The one sentence with which each page answers its question, chosen from the signs of both runs.

use super::grid::GridAnswer;
use super::page_answer::PageAnswer;
use super::scene::Scene;
use super::wording::{day_in_sentence, share};
use crate::signs::{CanalSigns, YearSigns};
use crate::water::calendar::CalendarDay;
use crate::words::{Value, Words};

/// What a page says. The words come later, so that it can be said in two languages.
#[derive(Clone, Debug, PartialEq)]
pub enum Answer {
    /// No dial is turned yet.
    NothingYet,
    /// The days on which one canal lacks water.
    Lacking {
        /// Which canal, in order of right.
        canal: usize,
        /// Days without full water with your changes.
        now: u16,
        /// The same as it was.
        before: u16,
    },
    /// The share of all the water asked for that arrives, 0 to 1.
    Supply {
        /// With your changes.
        now: f64,
        /// As it was.
        before: f64,
    },
    /// The day on which something happens, now and before; both are there.
    Moved {
        /// What happens.
        what: Event,
        /// With your changes.
        now: CalendarDay,
        /// As it was.
        before: CalendarDay,
    },
    /// Something that happens on a day now and did not before.
    Gained {
        /// What happens.
        what: Event,
        /// When.
        now: CalendarDay,
    },
    /// Something that happened on a day before and does not now.
    Lost {
        /// What happened.
        what: Event,
        /// When.
        before: CalendarDay,
    },
    /// Something that happens in neither run.
    Never(Event),
    /// Something that is told as it was, since nothing is turned.
    Told {
        /// What happens.
        what: Event,
        /// When.
        on: CalendarDay,
    },
    /// The days by which something moves as a range; it does not hold zero.
    MovedBetween {
        /// What happens.
        what: Event,
        /// Least and most days; less than zero is sooner.
        days: (i32, i32),
    },
    /// The range of the change holds zero.
    Unclear,
    /// No day that the valley speaks of moves.
    SameDays,
    /// Every canal has the same last full day as before.
    SameLastFullDays,
    /// As it was, every canal gets all its water.
    AllFull,
    /// No canal asks for water.
    NobodyAsks,
    /// There are no canals.
    NoCanals,
    /// What the pages beside the year say.
    Page(PageAnswer),
    /// What the map of two dials says.
    Grid(GridAnswer),
}

/// Something that happens on a day of the year.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Event {
    /// Half of the year's natural flow is past.
    HalfVolume,
    /// The snow is gone.
    SnowGone,
    /// The last full day of a canal, by its place in order of right.
    LastFull(usize),
    /// The first day on which a canal lacks water.
    FirstShort(usize),
}

impl Event {
    fn key(self) -> &'static str {
        match self {
            Self::HalfVolume => "half",
            Self::SnowGone => "snow",
            Self::LastFull(_) => "last-full",
            Self::FirstShort(_) => "first-short",
        }
    }

    fn canal(self) -> Option<usize> {
        match self {
            Self::HalfVolume | Self::SnowGone => None,
            Self::LastFull(canal) | Self::FirstShort(canal) => Some(canal),
        }
    }
}

impl Answer {
    /// What the valley page says: the canal whose days without full water change most, else the share that arrives,
    /// the end of the snow, the half of the flow.
    pub fn valley(scene: &Scene<'_>) -> Self {
        if !scene.changed() {
            return Self::NothingYet;
        }
        let Some((was, now)) = both(scene) else { return Self::SameDays };
        let lacking = |signs: &CanalSigns| signs.days_short + signs.days_cut;
        let change = |(_, now, before): &(usize, u16, u16)| now.abs_diff(*before);
        let canals = pairs(scene, was, now).map(|(at, was, now)| (at, lacking(now), lacking(was)));
        // Of canals with the same change the youngest right speaks: it comes last.
        if let Some((canal, now, before)) = canals.max_by_key(change).filter(|canal| change(canal) > 0) {
            let range = scene.doubt.and_then(|doubt| doubt.lacking_days.get(canal).copied());
            return match range {
                Some(days) if holds_zero(days) => Self::Unclear,
                _ => Self::Lacking { canal, now, before },
            };
        }
        if let (Some(before), Some(now)) = (was.supply_ratio, now.supply_ratio)
            && libm::round(before * 100.0) != libm::round(now * 100.0)
        {
            return Self::Supply { now, before };
        }
        let moved = |what, was: Option<CalendarDay>, now: Option<CalendarDay>| match (was, now) {
            (Some(before), Some(now)) if before != now => Some(Self::Moved { what, now, before }),
            _ => None,
        };
        moved(Event::SnowGone, was.melt_out_date, now.melt_out_date)
            .or_else(|| moved(Event::HalfVolume, was.half_volume_date, now.half_volume_date))
            .unwrap_or(Self::SameDays)
    }

    /// What the season page says: when half of the year's water is past.
    pub fn season(scene: &Scene<'_>) -> Self {
        let Some((was, now)) = both(scene) else { return Self::Never(Event::HalfVolume) };
        if let (true, Some(days)) = (scene.changed(), scene.doubt.and_then(|doubt| doubt.half_volume_days)) {
            return match days {
                days if holds_zero(days) => Self::Unclear,
                days => Self::MovedBetween { what: Event::HalfVolume, days },
            };
        }
        event(Event::HalfVolume, was.half_volume_date, now.half_volume_date, scene.changed())
    }

    /// What the canals page says: the canal whose last full day moves most.
    pub fn canals(scene: &Scene<'_>) -> Self {
        let Some((was, now)) = both(scene) else { return Self::NoCanals };
        if scene.canals.is_empty() {
            return Self::NoCanals;
        }
        if pairs(scene, was, now).all(|(_, was, now)| was.supply_ratio.is_none() && now.supply_ratio.is_none()) {
            return Self::NobodyAsks;
        }
        if !scene.changed() {
            let first = pairs(scene, was, now).filter_map(|(at, _, now)| Some((at, now.first_short_date?)));
            return first
                .min_by_key(|(_, day)| day.day_of_water_year)
                .map_or(Self::AllFull, |(at, on)| Self::Told { what: Event::FirstShort(at), on });
        }
        // One that loses or gains its full days altogether has changed more than any shift.
        let change = |(_, was, now): &(usize, &CanalSigns, &CanalSigns)| match (was.last_full_date, now.last_full_date)
        {
            (Some(was), Some(now)) => was.day_of_water_year.abs_diff(now.day_of_water_year),
            (None, None) => 0,
            _ => u16::MAX,
        };
        let most = pairs(scene, was, now).max_by_key(change).filter(|canal| change(canal) > 0);
        let Some((canal, was, now)) = most else { return Self::SameLastFullDays };
        let what = Event::LastFull(canal);
        match scene.doubt.and_then(|doubt| *doubt.last_full_days.get(canal)?) {
            Some(days) if holds_zero(days) => Self::Unclear,
            Some(days) => Self::MovedBetween { what, days },
            None => event(what, was.last_full_date, now.last_full_date, true),
        }
    }

    /// The sentence.
    pub fn say(&self, scene: &Scene<'_>, words: &Words) -> String {
        let date = |day: &CalendarDay| Value::from(day_in_sentence(*day, &scene.year, words));
        let name =
            |canal: usize| Value::from(scene.canals.get(canal).map_or(String::new(), |title| name_said(title.name)));
        let tell = |what: &Event, form: &str, args: &[(&str, Value<'_>)]| {
            let mut args = args.to_vec();
            args.extend(what.canal().map(|canal| ("canal", name(canal))));
            words.say(&format!("answer-{}-{form}", what.key()), &args)
        };
        match self {
            // Where no dial can be turned, nobody is asked to.
            Self::NothingYet if scene.dials.is_empty() => words.say("lesson-unchanged", &[]),
            Self::NothingYet => words.say("answer-nothing-yet", &[]),
            Self::Lacking { canal, now, before } => {
                let id = if now > before { "answer-lacking-more" } else { "answer-lacking-fewer" };
                let days = |days: u16| Value::from(u32::from(days));
                words.say(id, &[("canal", name(*canal)), ("n", days(now.abs_diff(*before))), ("before", days(*before))])
            }
            Self::Supply { now, before } => {
                let args = [("now", share(*now, words).into()), ("before", share(*before, words).into())];
                words.say("answer-supply", &args)
            }
            Self::Moved { what, now, before } if now == before => tell(what, "same", &[("date", date(now))]),
            Self::Moved { what, now, before } => {
                let days = i32::from(now.day_of_water_year) - i32::from(before.day_of_water_year);
                let form = if days < 0 { "sooner" } else { "later" };
                tell(what, form, &[("n", days.abs().into()), ("date", date(now)), ("before", date(before))])
            }
            Self::Gained { what, now } => tell(what, "gained", &[("date", date(now))]),
            Self::Lost { what, before } => tell(what, "lost", &[("before", date(before))]),
            Self::Never(what) => tell(what, "never", &[]),
            Self::Told { what, on } => tell(what, "told", &[("date", date(on))]),
            Self::MovedBetween { what, days: (low, high) } => {
                let range = words.days_range(*low, *high);
                tell(what, "between", &[("range", range.into())])
            }
            Self::Unclear => words.say("change-unclear", &[]),
            Self::SameDays => words.say("answer-same-days", &[]),
            Self::SameLastFullDays => words.say("answer-same-last-full-days", &[]),
            Self::AllFull => words.say("answer-all-full", &[]),
            Self::NobodyAsks => words.say("answer-nobody-asks", &[]),
            Self::NoCanals => words.say("answer-no-canals", &[]),
            Self::Page(answer) => answer.say(scene, words),
            Self::Grid(answer) => answer.say(scene, words),
        }
    }
}

fn both<'a>(scene: &Scene<'a>) -> Option<(&'a YearSigns, &'a YearSigns)> {
    Some((scene.was.signs()?, scene.now.signs()?))
}

/// Every canal with its place in order of right and its signs as it was and now.
fn pairs<'a>(
    scene: &Scene<'a>,
    was: &'a YearSigns,
    now: &'a YearSigns,
) -> impl Iterator<Item = (usize, &'a CanalSigns, &'a CanalSigns)> {
    let canals = scene.canals.iter().enumerate();
    canals.filter_map(move |(at, title)| Some((at, was.canals.get(title.gate)?, now.canals.get(title.gate)?)))
}

fn event(what: Event, was: Option<CalendarDay>, now: Option<CalendarDay>, changed: bool) -> Answer {
    match (was, now) {
        (None, None) => Answer::Never(what),
        (_, Some(on)) if !changed => Answer::Told { what, on },
        (Some(before), Some(now)) => Answer::Moved { what, now, before },
        (None, Some(now)) => Answer::Gained { what, now },
        (Some(before), None) => Answer::Lost { what, before },
    }
}

fn holds_zero((low, high): (i32, i32)) -> bool {
    low.min(high) <= 0 && low.max(high) >= 0
}

/// Letters that a name may take of a sentence.
const NAME_LETTERS: usize = 24;

/// A name as a sentence says it: whole, or its beginning where it would leave no room for the rest.
pub(super) fn name_said(name: &str) -> String {
    match name.char_indices().nth(NAME_LETTERS) {
        None => name.to_owned(),
        Some(_) => {
            let end = name.char_indices().nth(NAME_LETTERS - 1).map_or(name.len(), |(at, _)| at);
            format!("{}…", name[..end].trim_end())
        }
    }
}
