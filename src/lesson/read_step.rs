//! One step of a lesson's file: its words, its dials, its guess and what it expects.

use super::measure::{CanalSign, LessonSign, Measure, Over, Quantity, Reading, Shape, gates_by_right};
use super::read::{ReadStep, day_of_water_year, words};
use super::script::{
    Allowed, Expectation, Guess, MOST_GUESS_STOPS, MOST_PROMPT, MOST_REVEAL, MOST_TALK, Relation, Shows, Step,
};
use super::waters::Waters;
use crate::place::dated::month_day;
use crate::place::dial_plan::unknown_dial;
use crate::place::problem::{Location, Problem};
use crate::place::section::{Limits, Section};
use crate::place::tree::{Entry, Kind};
use crate::place::unit_suffix::PLAIN;
use crate::place::{DialOffer, DialPlan};
use crate::signs::{Sign, YearReport};
use crate::water::dials::{Dial, DialRange, Dials};
use crate::water::valley::Valley;

/// No reading of any valley is larger than this, in its unit.
const LEVELS: Limits = Limits(-1e6, 1e6);

/// What a step is read against.
pub(super) struct Around<'a, 'p> {
    /// The place and its years as they were.
    pub waters: &'a Waters<'p>,
    /// What the place does with every dial.
    pub plan: &'a DialPlan,
}

impl Around<'_, '_> {
    fn valley(&self) -> &Valley {
        &self.waters.place().valley
    }

    fn water_year(&self, year: usize) -> i32 {
        self.waters.as_it_was().get(year).map_or(0, |report| report.year.water_year)
    }
}

/// Reads a `[[step]]`.
pub(super) fn read_step(section: &Section<'_>, around: &Around<'_, '_>) -> ReadStep {
    let key = section.need_text("key");
    let at = key.as_ref().map_or_else(|| section.at.clone(), |(_, at)| at.clone());
    let prompt = words(section, "prompt", MOST_PROMPT);
    let shows = section.choice("view", &Shows::ALL.map(|shows| (shows.key(), shows)));
    if section.peek("view").is_none() {
        section.tell_missing("view");
    }
    let year = year(section, around.waters.as_it_was());
    let dials = dials(section, around.plan);
    let allowed = allowed(section, around.plan, &dials);
    let guess_part = section.section("guess");
    let guess = if guess_part.present { guess(&guess_part, around, year) } else { None };
    let reveal =
        (guess_part.present || section.peek("reveal").is_some()).then(|| words(section, "reveal", MOST_REVEAL));
    let talk = section.peek("talk").is_some().then(|| words(section, "talk", MOST_TALK));
    // A text that the file leaves out must be a known key all the same.
    let _ = (section.get("reveal"), section.get("talk"));
    let mut expect = (Vec::new(), Vec::new());
    for part in section.sections("expect") {
        if let Some((found, at)) = expectation(&part, around, year) {
            expect.0.push(found);
            expect.1.push(at);
        }
    }
    let word = |key: &'static str, of: &Section<'_>| of.text(key).map(|(word, at)| (word.to_owned(), at));
    let then = word("then", section);
    let if_far = if guess_part.present { word("if_far", &guess_part) } else { None };
    ReadStep {
        step: Step {
            key: key.map(|(key, _)| key.to_owned()).unwrap_or_default(),
            prompt,
            shows: shows.map_or(Shows::Valley, |(shows, _)| shows),
            year,
            dials,
            allowed,
            guess,
            reveal,
            talk,
            expect: expect.0,
            then: None,
        },
        at,
        guess_at: guess_part.present.then(|| guess_part.at.clone()),
        expect_at: expect.1,
        then,
        if_far,
    }
}

/// The year that is shown, counted from 0: a kind of year stands for the median of its third, as in the year chooser.
fn year(section: &Section<'_>, years: &[YearReport]) -> usize {
    const KINDS: [&str; 5] = ["dry", "middling", "wet", "driest", "wettest"];
    let mut by_flow: Vec<usize> = (0..years.len()).collect();
    by_flow.sort_by(|a, b| years[*a].signs.natural_flow_hm3.total_cmp(&years[*b].signs.natural_flow_hm3));
    let (count, outer) = (years.len(), (years.len() / 3).max(1));
    let middle = if count < 3 { count.div_ceil(2).max(1) - 1..count.div_ceil(2).max(1) } else { outer..count - outer };
    let median = |from: usize, to: usize| by_flow.get((from + to).saturating_sub(1) / 2).copied();
    let of_kind = |kind: &str| match kind {
        "dry" => median(0, outer),
        "middling" => median(middle.start, middle.end),
        "wet" => median(count - outer, count),
        "driest" => by_flow.first().copied(),
        "wettest" => by_flow.last().copied(),
        _ => None,
    };
    let Some(value) = section.get("year") else { return of_kind("middling").unwrap_or(0) };
    let (found, word) = match &value.kind {
        Kind::Text(word) => (of_kind(word), word.clone()),
        Kind::Number(number) => {
            (years.iter().position(|report| f64::from(report.year.water_year) == *number), number.to_string())
        }
        _ => (None, String::new()),
    };
    found.unwrap_or_else(|| {
        let (first, last) = (years.first(), years.last());
        let edge = |report: Option<&YearReport>| report.map_or(0.0, |report| f64::from(report.year.water_year));
        let told = Problem::error(section.value_at(value), "problem-lesson-year").with_nearest(&word, KINDS);
        section.sheet.tell(told.with("value", word).with("first", edge(first)).with("last", edge(last)));
        0
    })
}

/// The dial of an entry and its range on the place; tells of one that there is not, or not here.
fn dial(section: &Section<'_>, entry: &Entry, plan: &DialPlan) -> Option<(Dial, DialRange)> {
    let Some(dial) = Dial::from_key(&entry.key) else {
        section.sheet.tell(unknown_dial(section.key_at(entry), &entry.key));
        return None;
    };
    match plan.offer(dial) {
        DialOffer::Open(range) => Some((dial, range)),
        DialOffer::Hidden | DialOffer::Lacking => {
            let problem = Problem::error(section.key_at(entry), "problem-lesson-dial-absent");
            section.sheet.tell(problem.with("dial", dial.key()));
            None
        }
    }
}

fn dials(section: &Section<'_>, plan: &DialPlan) -> Dials {
    let mut part = section.section("dials");
    let mut dials = Dials::REST;
    for entry in part.free_entries() {
        if let Some((dial, range)) = dial(&part, entry, plan) {
            let limits = Limits(range.least, range.most);
            dials = dials.with(dial, part.checked_number(&entry.key, &entry.value, PLAIN[0], limits).value);
        }
    }
    dials
}

fn allowed(section: &Section<'_>, plan: &DialPlan, dials: &Dials) -> Vec<Allowed> {
    let mut part = section.section("allow");
    let mut allowed = Vec::new();
    for entry in part.free_entries() {
        let Some((dial, within)) = dial(&part, entry, plan) else { continue };
        let limits = part.as_section(&entry.value, format!("{}.{}", part.name, dial.key()));
        let ends = Limits(within.least, within.most);
        let least = limits.number_or("least", PLAIN, ends, within.least).value;
        let most = limits.number_or("most", PLAIN, ends, within.most).value;
        let step = limits.number_or("step", PLAIN, Limits(0.1, within.most - within.least), within.step).value;
        // At rest a dial must have a place to stand; starting storage rests by being off.
        let rests = dial == Dial::StartingStorage || !(least > 0.0 || most < 0.0);
        let problem = |message| Problem::error(limits.at.clone(), message).with("dial", dial.key());
        if least >= most || !rests {
            part.sheet.tell(problem("problem-dial-range").with("least", least).with("most", most));
            continue;
        }
        if let Some(value) = dials.get(dial).filter(|value| *value < least || *value > most) {
            let told = problem("problem-lesson-dial-outside").with("value", value);
            part.sheet.tell(told.with("least", least).with("most", most));
        }
        allowed.push(Allowed { dial, range: DialRange { least, most, step } });
    }
    allowed
}

fn guess(part: &Section<'_>, around: &Around<'_, '_>, year: usize) -> Option<Guess> {
    let reading = reading(part, around);
    let at = |key: &'static str| reading.and_then(|reading| level(part, key, &reading, around, year));
    let (least, most) = (at("least"), at("most"));
    let step = part.need_number("step", PLAIN, Limits(1e-6, LEVELS.1)).value;
    let near = part.number_or("near", PLAIN, Limits(0.0, LEVELS.1), step).value;
    let usual = part.peek("usual").is_some().then(|| at("usual")).flatten();
    let _ = part.get("usual");
    for key in ["least", "most"] {
        // Asked for even where the sign is unknown, so that it is not told as a strange key.
        if part.get(key).is_none() {
            part.tell_missing(key);
        }
    }
    let (reading, least, most) = (reading?, least?, most?);
    if !(step > 0.0 && near >= 0.0) {
        return None;
    }
    let stops = libm::floor((most - least) / step + 1e-6) + 1.0;
    // Also false where one of them is no number.
    let fine = (2.0..=MOST_GUESS_STOPS as f64).contains(&stops);
    if !fine {
        let told = Problem::error(part.at.clone(), "problem-lesson-guess-stops").with("stops", stops.max(0.0));
        part.sheet.tell(told.with("most", MOST_GUESS_STOPS));
        return None;
    }
    if let Some(usual) = usual.filter(|usual| *usual < least || *usual > most) {
        let told = Problem::error(part.at.clone(), "problem-lesson-usual-outside").with("value", usual);
        part.sheet.tell(told.with("least", least).with("most", most));
    }
    Some(Guess { reading, least, step, stops: stops as u8, near, usual, if_far: None })
}

fn expectation(part: &Section<'_>, around: &Around<'_, '_>, year: usize) -> Option<(Expectation, Location)> {
    #[derive(Clone, Copy)]
    enum Is {
        Above,
        Below,
        Between,
        None,
    }
    let reading = reading(part, around);
    let choices = [("above", Is::Above), ("below", Is::Below), ("between", Is::Between), ("none", Is::None)];
    if part.peek("is").is_none() {
        part.tell_missing("is");
    }
    let is = part.choice("is", &choices);
    let at = |key: &'static str| match &reading {
        Some(reading) => {
            if part.peek(key).is_none() {
                part.tell_missing(key);
            }
            level(part, key, reading, around, year)
        }
        None => part.get(key).and(None),
    };
    let relation = match is?.0 {
        Is::Above => Relation::Above(at("value")?),
        Is::Below => Relation::Below(at("value")?),
        Is::Between => {
            let (least, most) = (at("least"), at("most"));
            Relation::Between(least?, most?)
        }
        Is::None => Relation::None,
    };
    Some((Expectation { reading: reading?, relation }, part.at.clone()))
}

/// A number in the reading's unit; the value of a date is written as month and day.
fn level(
    part: &Section<'_>,
    key: &'static str,
    reading: &Reading,
    around: &Around<'_, '_>,
    year: usize,
) -> Option<f64> {
    let value = part.get(key)?;
    if reading.quantity() != Quantity::Date {
        let number = part.checked_number(key, value, PLAIN[0], LEVELS).value;
        return number.is_finite().then_some(number);
    }
    let day = month_day(part, key, value)?;
    Some(day_of_water_year(day, around.water_year(year), around.valley().water_year_start_month))
}

/// What is read: `sign`, `canal`, `of` and `over`.
fn reading(part: &Section<'_>, around: &Around<'_, '_>) -> Option<Reading> {
    let shape = part.choice("of", &[("value", Shape::Value), ("change", Shape::Change)]);
    let over = part.choice("over", &[("year", Over::Year), ("all_years", Over::AllYears)]);
    let canal = part.text("canal");
    let gate = canal.as_ref().and_then(|(word, at)| gate(part, word, at, around));
    let (word, at) = part.need_text("sign")?;
    let known: Vec<&str> = match canal {
        Some(_) => CanalSign::ALL.map(CanalSign::key).into_iter().chain([LessonSign::YearsEnough.key()]).collect(),
        None => Sign::ALL.map(Sign::key).into_iter().chain(LessonSign::ALL.map(LessonSign::key)).collect(),
    };
    if !known.contains(&word) {
        let message = if canal.is_some() { "problem-lesson-canal-sign" } else { "problem-lesson-sign" };
        part.sheet.tell(Problem::error(at, message).with("value", word).with_nearest(word, known));
        return None;
    }
    let measure = match canal {
        None => Sign::from_key(word).map(Measure::Sign).or_else(|| LessonSign::from_key(word).map(Measure::Lesson))?,
        Some(_) => match CanalSign::from_key(word) {
            Some(sign) => Measure::Canal(gate?, sign),
            None => Measure::CanalYearsEnough(gate?),
        },
    };
    Some(Reading {
        measure,
        over: over.map_or(Over::Year, |(over, _)| over),
        shape: shape.map_or(Shape::Value, |(shape, _)| shape),
    })
}

/// The gate that a word means: a role that every valley has, or a key of the place.
fn gate(part: &Section<'_>, word: &str, at: &Location, around: &Around<'_, '_>) -> Option<usize> {
    let valley = around.valley();
    let is_town = |gate: &usize| valley.gates[*gate].is_town();
    let by_right = gates_by_right(valley);
    let found = match word {
        "oldest" => by_right.iter().copied().find(|gate| !is_town(gate)),
        "newest" => by_right.iter().rev().copied().find(|gate| !is_town(gate)),
        "town" => by_right.iter().copied().find(is_town),
        key => around.waters.place().gates.iter().position(|names| names.key == key),
    };
    if found.is_none() {
        let keys = around.waters.place().gates.iter().map(|names| names.key.clone());
        let told = Problem::error(at.clone(), "problem-lesson-canal").with("value", word);
        part.sheet.tell(told.with_nearest(word, keys.chain(["oldest", "newest"].map(str::to_owned))));
    }
    found
}
