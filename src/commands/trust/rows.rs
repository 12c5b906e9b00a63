//! The parts of the answer that are tables.

use chrono::Month;

use crate::commands::fit::score;
use crate::commands::judged::{Judged, use_shown};
use crate::commands::tell::layout::{Column, Side, lay_out};
use crate::fit::trust::{FlowTrust, Ruling, StoreTrust};
use crate::picture::views::trust::uses;
use crate::place::Place;
use crate::words::{Quantity, System, Value, Words};

/// Letters of a name, of a value and of a heading before they are broken.
const MOST_NAME: usize = 34;
const MOST_REASON: usize = 52;
const MOST_VALUE: usize = 12;
const MOST_HEADING: usize = 12;
/// Letters of the longest bar.
const BAR: f64 = 24.0;

pub(super) fn heading(words: &Words, id: &str, side: Side) -> Column {
    let most = if side == Side::Left { MOST_NAME } else { MOST_VALUE };
    Column { heading: words.say(id, &[]), side, most, heading_most: MOST_HEADING }
}

pub(super) fn plain(columns: &[Column], rows: &[Vec<String>]) -> String {
    lay_out(columns, rows).replace('\u{202f}', " ")
}

/// For what it may be used, and why.
pub(super) fn rulings(rulings: &[Ruling], words: &Words) -> String {
    let columns = [
        Column { heading: String::new(), side: Side::Left, most: MOST_NAME, heading_most: MOST_HEADING },
        Column { heading: String::new(), side: Side::Left, most: MOST_VALUE, heading_most: MOST_HEADING },
        Column { heading: String::new(), side: Side::Left, most: MOST_REASON, heading_most: MOST_HEADING },
    ];
    let row = |ruling: &Ruling| {
        vec![
            words.say(&Words::key_id("trust-use", ruling.of.key()), &[]),
            uses::verdict(&use_shown(ruling), words),
            uses::reason(&use_shown(ruling), words),
        ]
    };
    let rows: Vec<Vec<String>> = rulings.iter().map(row).collect();
    // Headings would say nothing that the words do not.
    plain(&columns, &rows).trim_start_matches('\n').to_owned()
}

/// Daily, yearly and monthly scores.
pub(super) fn scores(judged: &Judged, words: &Words) -> String {
    let columns = [
        heading(words, "trust-scores", Side::Left),
        heading(words, "trust-nse", Side::Right),
        heading(words, "trust-kge", Side::Right),
        heading(words, "trust-correlation", Side::Right),
        heading(words, "trust-variability", Side::Right),
        heading(words, "trust-ratio", Side::Right),
        heading(words, "trust-bias", Side::Right),
    ];
    let mut rows = Vec::new();
    let mut row = |id: &str, daily: &crate::fit::trust::Daily| {
        let kge = daily.kling_gupta;
        let bias = daily.percent_bias.map_or_else(|| words.style().missing.clone(), |bias| words.number(-bias, 0));
        rows.push(vec![
            words.say(id, &[]),
            score(daily.nash_sutcliffe, words),
            score(kge.map(|kge| kge.efficiency), words),
            score(kge.map(|kge| kge.correlation), words),
            score(kge.map(|kge| kge.variability), words),
            score(kge.map(|kge| kge.bias), words),
            bias,
        ]);
    };
    if let Some(flow) = &judged.unseen {
        row("trust-daily-unseen", &flow.daily);
    }
    if let Some(flow) = &judged.flow {
        row("trust-daily", &flow.daily);
    }
    if let Some(flow) = judged.best_evidence() {
        if let Some(annual) = &flow.annual {
            row("trust-annual", annual);
        }
        row("trust-guess", &flow.guess);
    }
    plain(&columns, &rows)
}

/// Season by months, observed beside modelled, with bars.
pub(super) fn season(flow: &FlowTrust, system: System, words: &Words) -> String {
    let unit = words.unit_of(Quantity::Flow, system);
    let columns = [
        heading(words, "trust-month", Side::Left),
        heading(words, "trust-observed", Side::Right),
        heading(words, "trust-modelled", Side::Right),
        Column { heading: words.say("trust-bars", &[]), side: Side::Left, most: 60, heading_most: 60 },
    ];
    let most = flow.season.iter().flat_map(|month| [month.observed_m3s, month.modelled_m3s]).fold(0.0, f64::max);
    let number = |value: f64| words.significant(unit.convert(value), 3);
    let row = |month: &crate::fit::trust::MonthOfYear| {
        let name = Month::try_from(month.month).map_or_else(|_| String::new(), |month| words.month_name(month));
        vec![
            name,
            number(month.observed_m3s),
            number(month.modelled_m3s),
            bars(month.observed_m3s, month.modelled_m3s, most),
        ]
    };
    let rows: Vec<Vec<String>> = flow.season.iter().map(row).collect();
    let arguments = [("unit", words.say(unit.id(), &[]).into())];
    words.say("trust-season", &arguments) + "\n" + &plain(&columns, &rows)
}

/// `=` up to the lower of the two, then `o` where more was observed and `m` where more was modelled.
fn bars(observed: f64, modelled: f64, most: f64) -> String {
    let letters = |value: f64| if most > 0.0 && value > 0.0 { (BAR * value / most) as usize } else { 0 };
    let (observed, modelled) = (letters(observed), letters(modelled));
    let more = if observed > modelled { "o" } else { "m" };
    "=".repeat(observed.min(modelled)) + &more.repeat(observed.abs_diff(modelled))
}

/// The duration curve.
pub(super) fn duration(flow: &FlowTrust, system: System, words: &Words) -> String {
    let unit = words.unit_of(Quantity::Flow, system);
    let columns = [
        heading(words, "trust-exceeded", Side::Left),
        heading(words, "trust-observed", Side::Right),
        heading(words, "trust-modelled", Side::Right),
    ];
    let number = |value: f64| words.significant(unit.convert(value), 3);
    let row = |point: &crate::fit::trust::DurationPoint| {
        vec![words.percent(100.0 * point.share, 0), number(point.observed_m3s), number(point.modelled_m3s)]
    };
    let rows: Vec<Vec<String>> = flow.duration.iter().map(row).collect();
    let arguments = [("unit", words.say(unit.id(), &[]).into())];
    words.say("trust-duration", &arguments) + "\n" + &plain(&columns, &rows)
}

/// Skill by year.
pub(super) fn years(flow: &FlowTrust, system: System, words: &Words) -> String {
    let unit = words.unit_of(Quantity::StoredVolume, system);
    let columns = [
        heading(words, "trust-year", Side::Left),
        heading(words, "trust-observed", Side::Right),
        heading(words, "trust-modelled", Side::Right),
        heading(words, "trust-half-day", Side::Right),
        heading(words, "trust-nse", Side::Right),
        heading(words, "trust-kge", Side::Right),
    ];
    let number = |value: f64| words.significant(unit.convert(value), 3);
    let row = |year: &crate::fit::trust::YearSkill| {
        let days = f64::from(year.modelled_half_day) - f64::from(year.observed_half_day);
        vec![
            words.year(year.water_year),
            number(year.observed_hm3),
            number(year.modelled_hm3),
            words.number_signed(days, 0),
            score(year.nash_sutcliffe, words),
            score(year.kling_gupta, words),
        ]
    };
    let rows: Vec<Vec<String>> = flow.years.iter().map(row).collect();
    let arguments = [("unit", words.say(unit.id(), &[]).into())];
    words.say("trust-years", &arguments) + "\n" + &plain(&columns, &rows)
}

/// Snow, lake and canals beside their records.
pub(super) fn stores(judged: &Judged, place: &Place, words: &Words) -> String {
    let columns = [
        heading(words, "trust-records", Side::Left),
        heading(words, "trust-days", Side::Right),
        heading(words, "trust-nse", Side::Right),
        heading(words, "trust-kge", Side::Right),
        heading(words, "trust-bias", Side::Right),
        heading(words, "trust-guess-nse", Side::Right),
    ];
    let mut rows = Vec::new();
    let mut row = |name: String, store: &StoreTrust| {
        let bias = store.percent_bias.map_or_else(|| words.style().missing.clone(), |bias| words.number(-bias, 0));
        rows.push(vec![
            name,
            words.number(store.days as f64, 0),
            score(store.nash_sutcliffe, words),
            score(store.kling_gupta, words),
            bias,
            score(store.guess, words),
        ]);
    };
    if let Some(snow) = &judged.snow {
        row(words.say("trust-snow", &[]), snow);
    }
    if let Some((lake, _)) = &judged.storage {
        row(words.say("trust-lake", &[]), lake);
    }
    for (gate, canal) in &judged.canals {
        let name = place.gates.get(*gate).map_or("", |gate| gate.name.get(words.tag()));
        row(name.to_owned(), canal);
    }
    if rows.is_empty() { String::new() } else { plain(&columns, &rows) }
}

/// A bias in words: too little, too much, right.
pub(super) fn bias(id: &str, bias: Option<f64>, words: &Words) -> Option<String> {
    let bias = bias.filter(|bias| bias.is_finite())?;
    let size = words.percent(bias.abs(), 0);
    let amount = match libm::round(bias) {
        bias if bias > 0.0 => words.say("trust-too-little", &[("percent", size.into())]),
        bias if bias < 0.0 => words.say("trust-too-much", &[("percent", size.into())]),
        _ => words.say("trust-even", &[]),
    };
    Some(words.say(id, &[("amount", Value::from(amount))]))
}
