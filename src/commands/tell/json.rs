//! Everything that `tell` knows, as JSON: SI units, ISO dates, stable keys whatever the language.

use std::borrow::Cow;

use super::canal_signs::{CANAL_SIGNS, Reading, is_date};
use super::columns::{flow_key, store_keys};
use super::means::{canal_performance, of_canal, of_change, of_sign, overall_performance, whole_ledger};
use super::node::Node;
use super::runs::{Run, Told};
use super::table::mean_date;
use crate::place::{GateNames, Place, Text, Years};
use crate::signs::{CanalSigns, Performance, Sign, SignKind, Spread, YearReport};
use crate::water::calendar::CalendarDay;
use crate::water::canals::SharingRule;
use crate::water::dials::Dial;
use crate::water::ledger::{Flow, Ledger, Store};

/// Writes the answer; with days in one line, since they would be a million lines otherwise.
pub(super) fn write(told: &Told) -> String {
    let mut entries = vec![("place", place(told)), ("dials", dials(told))];
    if let Some(setting) = &told.setting {
        entries.push(("setting", Node::table([("name", text(&setting.name))])));
    }
    entries.push(("years_shown", years_shown(told.asked)));
    entries.push(("as_it_was", run(told, &told.as_it_was)));
    entries.push(("with_changes", run(told, &told.with_changes)));
    entries.push(("change", change(told)));
    if let Some(ranges) = &told.ranges {
        entries.push(("ranges", ranges.node()));
    }
    let node = Node::table(entries);
    let daily = told.as_it_was.days.is_some();
    let written = if daily { serde_json::to_string(&node) } else { serde_json::to_string_pretty(&node) };
    // Numbers and strings in memory always have a JSON form.
    written.unwrap_or_default() + "\n"
}

fn place(told: &Told) -> Node {
    let place = &told.place;
    let valley = &place.valley;
    let rule = match valley.rule {
        SharingRule::Seniority => "seniority",
        SharingRule::Proportional => "proportional",
        SharingRule::Rotation => "rotation",
    };
    let (first, last, count) = told.record_years;
    let gate = |(names, gate): (&GateNames, &crate::water::valley::Gate)| {
        Node::table([
            ("key", names.key.as_str().into()),
            ("name", text(&names.name)),
            ("right_year", names.right_year.into()),
            ("town", gate.is_town().into()),
            ("field_area_ha", gate.field_area_ha().into()),
        ])
    };
    Node::table([
        ("name", text(&place.name)),
        ("region", place.region.as_str().into()),
        ("invented", place.invented.into()),
        ("source", place.source.as_ref().map(text).into()),
        ("record_first_date", place.first_date.to_string().into()),
        ("record_days", place.days.len().into()),
        ("water_year_starts_month", i32::from(valley.water_year_start_month).into()),
        ("first_water_year", first.into()),
        ("last_water_year", last.into()),
        ("water_years", count.into()),
        ("sharing_rule", rule.into()),
        ("enough_share", valley.enough_share.into()),
        ("evaporation_method", place.notes.evaporation.choice.key().into()),
        ("evaporation_percent_per_degree_c", told.percent_per_degree.into()),
        ("fitted", told.fit.is_some().into()),
        ("fit_is_stale", told.fit.as_ref().map(|fit| fit.stale).into()),
        ("gauge", place.gauge.is_some().into()),
        ("filled_days", place.notes.filled_gaps.iter().map(|gaps| gaps.days).sum::<usize>().into()),
        ("gates", Node::List(place.gates.iter().zip(&valley.gates).map(gate).collect())),
    ])
}

fn text(text: &Text) -> Node {
    Node::Table(text.all().map(|(tag, words)| (Cow::Owned(tag.to_owned()), words.into())).collect())
}

fn dials(told: &Told) -> Node {
    Node::table(Dial::ALL.map(|dial| (dial.key(), told.dials.get(dial).into())))
}

fn years_shown(asked: Years) -> Node {
    match asked {
        Years::All => "all".into(),
        Years::Dry => "dry".into(),
        Years::Middling => "middling".into(),
        Years::Wet => "wet".into(),
        Years::Span(first, last) if first == last => first.to_string().into(),
        Years::Span(first, last) => format!("{first}..{last}").into(),
    }
}

fn run(told: &Told, run: &Run) -> Node {
    let years = run.years.iter().map(|report| year(&told.place, report)).collect();
    let mut entries = vec![("years", Node::List(years)), ("all", all(told, run))];
    if let Some(days) = &run.days {
        entries.push(("days", days.node(&told.place)));
    }
    Node::table(entries)
}

fn year(place: &Place, report: &YearReport) -> Node {
    let start_month = place.valley.water_year_start_month;
    let signs = Sign::ALL.map(|sign| {
        let value = match sign.kind() {
            SignKind::Date => date(sign.date_of(&report.signs), start_month),
            SignKind::Days => sign.of(&report.signs).map(|days| days as i32).into(),
            _ => sign.of(&report.signs).into(),
        };
        (sign.key(), value)
    });
    let canals = report.signs.canals.iter().zip(&place.gates).map(|(canal, names)| {
        let values = CANAL_SIGNS.into_iter().map(|(key, reading)| {
            let value = match reading {
                Reading::Date(read) => date(read(canal), start_month),
                Reading::Number(read) if key.starts_with("days_") => read(canal).map(|days| days as i32).into(),
                Reading::Number(read) => read(canal).into(),
            };
            (key, value)
        });
        Node::table(named(names).into_iter().chain(values))
    });
    Node::table([
        ("water_year", report.year.water_year.into()),
        ("signs", Node::table(signs)),
        ("canals", Node::List(canals.collect())),
        ("ledger", ledger(&report.ledger)),
    ])
}

/// Names in English: the output is the same in every language.
fn named(names: &GateNames) -> Vec<(&'static str, Node)> {
    vec![("name", names.name.get("en").into()), ("right_year", names.right_year.into())]
}

fn date(day: Option<CalendarDay>, start_month: u8) -> Node {
    day.map(|day| day.date(start_month).to_string()).into()
}

fn ledger(ledger: &Ledger) -> Node {
    let mut entries: Vec<(Cow<'static, str>, Node)> =
        Flow::ALL.into_iter().map(|flow| (flow_key(flow).into(), ledger.of(flow).into())).collect();
    for store in Store::ALL {
        let [start, end] = store_keys(store);
        entries.push((start.into(), ledger.start.of(store).into()));
        entries.push((end.into(), ledger.end.of(store).into()));
    }
    entries.push(("in_m3".into(), ledger.in_m3().into()));
    entries.push(("out_m3".into(), ledger.out_m3().into()));
    entries.push(("residual_m3".into(), ledger.residual_m3().into()));
    entries.push(("residual_share".into(), ledger.residual_share().into()));
    Node::Table(entries)
}

/// Means and ranges over the years shown. What asks for the year after, and one ledger for all, is there only where the
/// years follow one another.
fn all(told: &Told, run: &Run) -> Node {
    let place = &told.place;
    let start_month = place.valley.water_year_start_month;
    let spread_of = |key: &str, spread: Option<Spread>| self::spread(spread, is_date(key).then_some(start_month));
    let signs = Sign::ALL.map(|sign| (sign.key(), spread_of(sign.key(), of_sign(run, sign))));
    let canals = place.gates.iter().enumerate().map(|(gate, names)| {
        let mut entries = named(names);
        entries.extend(CANAL_SIGNS.map(|(key, reading)| {
            (key, spread_of(key, of_canal(run, gate, |canal: &CanalSigns| reading.number(canal))))
        }));
        entries.extend(performance(told, canal_performance(run, gate, place.valley.enough_share)));
        Node::table(entries)
    });
    let mut entries = vec![
        ("years", run.years.len().into()),
        ("signs", Node::table(signs)),
        ("canals", Node::List(canals.collect())),
    ];
    entries.extend(performance(told, overall_performance(run, place.valley.enough_share)));
    let whole = whole_ledger(run).filter(|_| told.is_unbroken());
    entries.push(("ledger", whole.as_ref().map(ledger).into()));
    Node::table(entries)
}

fn performance(told: &Told, found: Option<Performance>) -> [(&'static str, Node); 3] {
    let in_order = found.filter(|_| told.is_unbroken());
    [
        ("reliability", found.map(|found| found.reliability).into()),
        ("resilience", in_order.and_then(|found| found.resilience).into()),
        ("vulnerability_hm3", in_order.map(|found| found.vulnerability_hm3).into()),
    ]
}

/// A spread; of dates, in days of the water year, with the month and day of the mean.
fn spread(spread: Option<Spread>, date_from_month: Option<u8>) -> Node {
    let Some(spread) = spread else { return Node::Null };
    let mut entries: Vec<(&'static str, Node)> = vec![
        ("mean", spread.mean.into()),
        ("least", spread.least.into()),
        ("most", spread.most.into()),
        ("years", spread.years.into()),
    ];
    if let Some(start_month) = date_from_month {
        let date = mean_date(spread.mean, start_month).format("%m-%d").to_string();
        entries.push(("mean_month_day", date.into()));
    }
    Node::table(entries)
}

/// Changes year by year against the run at rest: mean and range; dates in days, negative is sooner.
fn change(told: &Told) -> Node {
    let signs = Sign::ALL.map(|sign| (sign.key(), spread(of_change(told, |year| sign.of(year)), None)));
    let canals = told.place.gates.iter().enumerate().map(|(gate, names)| {
        let values = CANAL_SIGNS.map(|(key, reading)| {
            let change = of_change(told, |year| year.canals.get(gate).and_then(|canal| reading.number(canal)));
            (key, spread(change, None))
        });
        Node::table(named(names).into_iter().chain(values))
    });
    Node::table([("signs", Node::table(signs)), ("canals", Node::List(canals.collect()))])
}
