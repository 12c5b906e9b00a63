//! What the map of two dials says: how far the second dial must go where the first one stands.

use super::{Cell, GridShown};
use crate::picture::views::answer::name_said;
use crate::picture::views::scene::{DialSetting, Scene};
use crate::picture::views::wording::{dial_name, dial_value};
use crate::signs::{Better, Reading, SignKind};
use crate::water::dials::{Dial, Dials};
use crate::words::Words;

/// The sentence of the map, chosen from its numbers.
#[derive(Clone, Debug, PartialEq)]
pub enum GridAnswer {
    /// Not every cell is there yet.
    Working {
        /// Cells that are there.
        done: usize,
        /// All cells.
        all: usize,
    },
    /// No cell has such a number.
    Nothing(Reading),
    /// Every cell has the same.
    Same(Reading, f64),
    /// From the least to the most.
    Range(Reading, f64, f64),
    /// With one dial at some value, what the other must be for the level to be kept.
    Needs {
        /// What is kept.
        reading: Reading,
        /// The canal that it is about.
        canal: Option<String>,
        /// Where the first dial stands.
        across: (Dial, f64),
        /// Which values of the second dial keep it.
        up: Needed,
        /// What is kept.
        level: f64,
        /// Whether it is said in as few words as can be, for small screens and long names.
        brief: bool,
    },
}

/// Which values of a dial keep a level; only values that were run are named.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Needed {
    /// This one and all above it.
    From(Dial, f64),
    /// This one and all below it.
    To(Dial, f64),
    /// All of them.
    Any,
    /// None of them.
    None,
}

impl GridAnswer {
    /// Chooses the sentence.
    pub fn of(grid: &GridShown<'_>) -> Self {
        let reading = grid.reading;
        let all = grid.cells.len();
        let done = grid.cells.iter().filter(|cell| **cell != Cell::Waiting).count();
        if done < all {
            return Self::Working { done, all };
        }
        let Some((least, most)) = grid.range() else { return Self::Nothing(reading) };
        if least == most {
            return Self::Same(reading, least);
        }
        Self::needs(grid).unwrap_or(Self::Range(reading, least, most))
    }

    /// The sentence about the column of the dialled value, or where that rests, of a third of the way from rest to the
    /// far end. `None` where the reading has no better or worse, or where a column goes to and fro.
    fn needs(grid: &GridShown<'_>) -> Option<Self> {
        let (better, level) = (grid.reading.better()?, grid.level()?.value());
        let column = told_column(grid)?;
        let keeps: Option<Vec<bool>> = (0..grid.up.values.len())
            .map(|row| match grid.cell(column, row) {
                Cell::Value(value) => Some(match better {
                    Better::More => value >= level,
                    Better::Less => value <= level,
                }),
                Cell::Waiting | Cell::Nothing => None,
            })
            .collect();
        let keeps = keeps?;
        let turns = keeps.windows(2).filter(|pair| pair[0] != pair[1]).count();
        let up = grid.up;
        let needed = match (turns, keeps.first()?) {
            (0, true) => Needed::Any,
            (0, false) => Needed::None,
            (1, false) => Needed::From(up.dial, *up.values.get(keeps.iter().position(|keeps| *keeps)?)?),
            (1, true) => Needed::To(up.dial, *up.values.get(keeps.iter().rposition(|keeps| *keeps)?)?),
            _ => return None,
        };
        let across = (grid.across.dial, *grid.across.values.get(column)?);
        let canal = grid.gate_name.map(name_said);
        Some(Self::Needs { reading: grid.reading, canal, across, up: needed, level, brief: false })
    }

    /// The sentence in words.
    pub(in crate::picture::views) fn say(&self, scene: &Scene<'_>, words: &Words) -> String {
        let sign = |reading: &Reading| ("sign", sign_name(*reading, words).into());
        let value = |reading: &Reading, value: f64| reading_value(*reading, value, scene, words);
        match self {
            Self::Working { done, all } => {
                words.say("answer-grid-working", &[("done", (*done).into()), ("all", (*all).into())])
            }
            Self::Nothing(reading) => words.say("answer-grid-none", &[sign(reading)]),
            Self::Same(reading, at) => {
                words.say("answer-grid-same", &[sign(reading), ("value", value(reading, *at).into())])
            }
            Self::Range(reading, least, most) => {
                let ends = [("least", value(reading, *least).into()), ("most", value(reading, *most).into())];
                let [least, most] = ends;
                words.say("answer-grid-range", &[sign(reading), least, most])
            }
            Self::Needs { reading, canal, across, up, level, brief } => {
                let form = match up {
                    Needed::From(..) | Needed::To(..) => "takes",
                    Needed::Any => "holds",
                    Needed::None => "fails",
                };
                let mut args = vec![("across", dial_at(across.0, across.1, None, *brief, scene, words).into())];
                match *up {
                    Needed::From(dial, from) => {
                        args.push(("up", dial_at(dial, from, Some("grid-at-least"), *brief, scene, words).into()));
                    }
                    Needed::To(dial, to) => {
                        args.push(("up", dial_at(dial, to, Some("grid-at-most"), *brief, scene, words).into()));
                    }
                    Needed::Any | Needed::None => {}
                }
                let level = value(reading, *level);
                if reading.is_supply_ratio() && !brief {
                    args.push(("level", level.into()));
                    let whose = if canal.is_some() { "canal" } else { "supply" };
                    args.extend(canal.iter().map(|canal| ("canal", canal.as_str().into())));
                    return words.say(&format!("answer-grid-{whose}-{form}"), &args);
                }
                let bound = match (reading.better(), reading.kind()) {
                    (Some(Better::Less), _) => "grid-at-most",
                    (_, SignKind::Date | SignKind::Day) => "grid-no-sooner",
                    _ => "grid-at-least",
                };
                args.push(("level", words.say(bound, &[("value", level.into())]).into()));
                args.push(sign(reading));
                let length = if *brief { "brief" } else { "keep" };
                words.say(&format!("answer-grid-{length}-{form}"), &args)
            }
        }
    }

    /// The same in as few words as can be.
    #[must_use]
    pub fn in_brief(mut self) -> Self {
        if let Self::Needs { brief, .. } = &mut self {
            *brief = true;
        }
        self
    }
}

/// A dial with a value or a bound, within a sentence; in brief with its short name.
fn dial_at(dial: Dial, value: f64, bound: Option<&str>, brief: bool, scene: &Scene<'_>, words: &Words) -> String {
    let setting = DialSetting { dial, value: Some(value), range: dial.widest() };
    let mut value = dial_value(&setting, scene.units, words);
    if let Some(bound) = bound {
        value = words.say(bound, &[("value", value.into())]);
    }
    if brief {
        return words.say("grid-brief-at", &[("dial", dial_name(dial, words).into()), ("value", value.into())]);
    }
    words.say(&Words::key_id("grid-at", dial.key()), &[("value", value.into())])
}

fn told_column(grid: &GridShown<'_>) -> Option<usize> {
    let values = grid.across.values;
    let dialled = grid.dials.get(grid.across.dial).filter(|_| !grid.dials.rests(grid.across.dial));
    if let Some(column) = dialled.and_then(|dialled| values.iter().position(|value| *value == dialled)) {
        return Some(column);
    }
    let last = values.len().checked_sub(1)?;
    let rest = Dials::REST.get(grid.across.dial).unwrap_or(values[0]);
    let nearest = values.iter().enumerate().min_by(|a, b| (a.1 - rest).abs().total_cmp(&(b.1 - rest).abs()));
    let at_rest = nearest.map_or(0, |(column, _)| column);
    Some(if last - at_rest >= at_rest { at_rest + (last - at_rest).div_ceil(3) } else { at_rest - at_rest.div_ceil(3) })
}

/// The short name of what is read.
pub(super) fn sign_name(reading: Reading, words: &Words) -> String {
    let topic = if matches!(reading, Reading::Canal { .. }) { "sign-canal" } else { "sign" };
    words.say(&format!("{}.short", Words::key_id(topic, reading.key())), &[])
}

/// What is read, with the name of the canal that it is about; `gates` are the names of canals and towns, counted
/// downstream.
pub fn reading_name(reading: Reading, gates: &[&str], words: &Words) -> String {
    let sign = sign_name(reading, words);
    match reading.gate().and_then(|gate| gates.get(gate)) {
        Some(name) => format!("{name} · {sign}"),
        None => sign,
    }
}

/// A value of what is read, with its unit.
pub(super) fn reading_value(reading: Reading, value: f64, scene: &Scene<'_>, words: &Words) -> String {
    use crate::signs::Sign;
    use crate::words::{DateStyle, Quantity};
    let quantity = |quantity| words.quantity(value, quantity, scene.units, 3);
    match reading.kind() {
        SignKind::Share => super::super::wording::share(value, words),
        SignKind::Days => words.say("grid-days", &[("n", crate::words::Value::Number(value, 0))]),
        SignKind::Date | SignKind::Day => match mean_date(value, scene.year.start_month) {
            Some(date) => words.date(date, DateStyle::Short),
            None => words.style().missing.clone(),
        },
        SignKind::Volume => quantity(Quantity::StoredVolume),
        SignKind::Flow => quantity(Quantity::Flow),
        SignKind::Depth if reading == Reading::Year(Sign::Precipitation) => quantity(Quantity::Rain),
        SignKind::Depth => quantity(Quantity::SnowWater),
    }
}

/// The date of a mean day of the water year, in a year without a leap day.
fn mean_date(day_of_water_year: f64, start_month: u8) -> Option<chrono::NaiveDate> {
    let year = if start_month > 2 { 2000 } else { 2001 };
    let first = chrono::NaiveDate::from_ymd_opt(year, u32::from(start_month), 1)?;
    let later = libm::round(day_of_water_year - 1.0);
    (0.0..=365.0).contains(&later).then(|| first.checked_add_days(chrono::Days::new(later as u64)))?
}
