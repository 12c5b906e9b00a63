//! The lines above and below the tables: what is shown, where the dials stand, how far the accounts close.

use super::dials::say_value;
use super::grid::broken;
use super::means::closure_m3;
use super::runs::{Run, Told};
use crate::place::Years;
use crate::water::canals::SharingRule;
use crate::water::dials::Dial;
use crate::water::units::M3_PER_HM3;
use crate::words::{Quantity, System, Unit, Words};

/// Letters of a line.
const WIDTH: usize = 78;

/// Title, the note that a valley is invented, the setting, the dials.
pub(super) fn heading(told: &Told, system: System, words: &Words) -> String {
    let place = told.place.name.get(words.tag()).to_owned();
    let years = years_shown(told, words);
    let mut text = wrapped(&words.say("tell-title", &[("place", place.into()), ("years", years.into())]), "");
    if told.place.invented {
        text.push_str(&wrapped(&words.say("tell-invented", &[]), ""));
    }
    if let Some(setting) = &told.setting {
        let name = setting.name.get(words.tag()).to_owned();
        text.push('\n');
        text.push_str(&wrapped(&words.say("tell-setting", &[("name", name.into())]), ""));
        if let Some(about) = &setting.text {
            text.push_str(&wrapped(about.get(words.tag()), "  "));
        }
    }
    text.push('\n');
    if !told.is_turned() {
        text.push_str(&wrapped(&words.say("tell-dials-at-rest", &[]), ""));
        return text;
    }
    text.push_str(&wrapped(&words.say("tell-dials", &[]), ""));
    for dial in Dial::ALL.into_iter().filter(|dial| !told.dials.rests(*dial)) {
        let Some(value) = told.dials.get(dial) else { continue };
        let name = words.say(&Words::key_id("dial", dial.key()), &[]);
        let value = say_value(dial, value, system, words);
        let line = words.say("tell-dial-line", &[("dial", name.into()), ("value", value.into())]);
        text.push_str(&wrapped(&line, "  "));
    }
    text
}

/// Which years are shown: "all 41 water years, 1980 to 2020".
fn years_shown(told: &Told, words: &Words) -> String {
    let years = &told.as_it_was.years;
    let ends = [years.first(), years.last()].map(|year| year.map_or(0, |year| year.year.water_year));
    let count = || ("n", years.len().into());
    let kind = |id: &str| words.say(id, &[count(), ("of", told.record_years.2.into())]);
    match told.asked {
        Years::Dry => kind("tell-years-dry"),
        Years::Middling => kind("tell-years-middling"),
        Years::Wet => kind("tell-years-wet"),
        Years::Span(..) | Years::All if years.len() == 1 => {
            words.say("tell-year-one", &[("year", words.year(ends[0]).into())])
        }
        Years::All => {
            let [first, last] = ends.map(|year| words.year(year));
            words.say("tell-years-all", &[count(), ("first", first.into()), ("last", last.into())])
        }
        Years::Span(..) => {
            let [first, last] = ends.map(|year| words.year(year));
            words.say("tell-years-between", &[("first", first.into()), ("last", last.into())])
        }
    }
}

/// How far the accounts close, how water is shared, how evaporation is had, and the first caution.
pub(super) fn footer(told: &Told, system: System, words: &Words) -> String {
    let mut text = wrapped(&closure(told, system, words), "");
    let say = |id: &str| words.say(id, &[]);
    if !told.place.valley.gates.is_empty() {
        let rule = match told.place.valley.rule {
            SharingRule::Seniority => "tell-rule-seniority",
            SharingRule::Proportional => "tell-rule-proportional",
            SharingRule::Rotation => "tell-rule-rotation",
        };
        text.push_str(&wrapped(&words.say("tell-rule", &[("rule", say(rule).into())]), ""));
    }
    text.push_str(&wrapped(&fitting(told, words), ""));
    if told.fit.as_ref().is_some_and(|fit| fit.stale) {
        text.push_str(&wrapped(&say("tell-fit-stale"), ""));
    }
    let choice = told.place.notes.evaporation.choice.key();
    let method = say(&Words::key_id("tell-method", choice));
    text.push_str(&wrapped(&words.say("tell-method", &[("method", method.into())]), ""));
    if let Some(percent) = told.percent_per_degree {
        let degree = words.quantity(1.0, Quantity::TemperatureChange, system, 2);
        // The percent is for one °C; in °F it is that of 1.8 °F.
        let arguments = [("degree", degree.into()), ("percent", words.percent(percent, 1).into())];
        text.push_str(&wrapped(&words.say("tell-method-per-degree", &arguments), ""));
    }
    if told.is_turned() {
        text.push_str(&wrapped(&say("tell-rounded"), ""));
        if fills(&told.as_it_was) != fills(&told.with_changes) && told.as_it_was.years.len() > 1 {
            text.push_str(&wrapped(&say("tell-fill-dates"), ""));
        }
    }
    let weather = [Dial::Warming, Dial::WinterPrecipitation, Dial::SummerPrecipitation];
    if weather.into_iter().any(|dial| !told.dials.rests(dial)) {
        text.push_str(&wrapped(&say("tell-storms-kept"), ""));
    }
    let filled: usize = told.place.notes.filled_gaps.iter().map(|gaps| gaps.days).sum();
    if filled > 0 {
        text.push_str(&wrapped(&words.say("tell-gaps", &[("n", filled.into())]), ""));
    }
    text.push('\n');
    text.push_str(&wrapped(&say("caution-not-a-forecast"), ""));
    text
}

/// Whether the place runs with a fit, and to what.
fn fitting(told: &Told, words: &Words) -> String {
    match &told.fit {
        Some(fit) => {
            let years = &fit.file.water_years;
            let [first, last] = [years.first(), years.last()].map(|year| year.map_or(0, |year| *year));
            words.say("tell-fitted", &[("first", words.year(first).into()), ("last", words.year(last).into())])
        }
        None if told.place.gauge.is_none() => words.say("tell-no-gauge", &[]),
        None => words.say("tell-not-fitted", &[]),
    }
}

/// In which of the years shown the reservoir fills.
fn fills(run: &Run) -> Vec<bool> {
    run.years.iter().map(|year| year.signs.fill_date.is_some()).collect()
}

fn closure(told: &Told, system: System, words: &Words) -> String {
    let (residual_m3, throughput_m3) = closure_m3(&told.with_changes);
    let throughput = words.quantity(throughput_m3 / M3_PER_HM3, Quantity::StoredVolume, system, 3);
    // A remainder smaller than a litre is rounding in the last digits, not water.
    let residual = if residual_m3 < 0.001 {
        words.say("tell-less-than-a-liter", &[])
    } else {
        words.amount(residual_m3, Unit::CubicMetres, 2)
    };
    words.say("tell-ledger-closes", &[("residual", residual.into()), ("throughput", throughput.into())])
}

/// A sentence in lines, each with `indent` before it. A gap that must not break keeps its words together and is an
/// ordinary blank in the end: consoles of small boards show a box for the thin one.
pub(in crate::commands) fn wrapped(sentence: &str, indent: &str) -> String {
    let mut text = String::new();
    for line in broken(sentence.trim_start(), WIDTH - indent.len()) {
        text.push_str(indent);
        text.push_str(&line);
        text.push('\n');
    }
    text.replace('\u{202f}', " ")
}
