//! The year of each canal as a strip: full days solid, short days hatched, days without water an empty frame.

use super::{AS_IT_WAS, Legend, MONTHS_PT, Plot, TICK, each, months};
use crate::handout::flow::Block;
use crate::handout::model::{At, Ink, Node, Piece, Role};
use crate::handout::pen::{End, LABEL, area, centred, corners, dashed, edged, hatch, letters, straight};
use crate::picture::chart::DayMark;
use crate::picture::views::scene::Scene;
use crate::words::{DateStyle, Words};

/// Left of the strips, for names.
const SIDE: f64 = 128.0;
/// Right of the strips, for the last full day: wider where two languages say it.
const DATES: [f64; 2] = [96.0, 136.0];
/// Above the strips, for the heads of the columns.
const HEAD: f64 = 11.0;

/// Full, short, cut.
pub(in crate::handout) fn legend(changed: bool, voices: &[&Words], width: f64) -> Block {
    let mut legend = Legend::default();
    let say = |id: &str| each(voices, |words| words.say(id, &[])).join(" · ");
    for (mark, id) in [
        (DayMark::Full, "sign-canal-days-full.short"),
        (DayMark::Short, "sign-canal-days-short.short"),
        (DayMark::Cut, "sign-canal-days-cut.short"),
    ] {
        legend.entry(&say(id), move |x, y, wide, high| span(mark, x, y, wide, high));
    }
    if changed {
        legend.entry(&say("handout-full-as-it-was"), |x, y, wide, high| was_spans(&[(x, x + wide)], y + high / 2.0));
    }
    let (pieces, high) = legend.lay_out(0.0, width);
    Block::one(Node::of(Role::Artifact, pieces), high)
}

/// The strips, each in a row of that height, with `alt` as their words.
pub(in crate::handout) fn strips(scene: &Scene<'_>, voices: &[&Words], width: f64, row: f64, alt: String) -> Block {
    let count = scene.canals.len().max(1) as f64;
    let (from, to) = window(scene);
    let dates_wide = DATES[usize::from(voices.len() > 1)];
    let plot = Plot {
        left: SIDE,
        top: HEAD,
        wide: width - SIDE - dates_wide,
        high: row * count,
        across: (from as f64, to as f64),
        up: (0.0, 1.0),
    };
    let say = |id: &str| each(voices, |words| words.say(id, &[])).join(" · ");
    let head = say("tell-canal-last-full");
    let mut pieces = vec![letters(&head, At::new(width, HEAD - 3.5), End::Right, TICK.fitting(&head, dates_wide, 4.5))];
    for (index, (title, (was, now))) in
        scene.canals.iter().zip(scene.was.canals.iter().zip(scene.now.canals)).enumerate()
    {
        let top = plot.top + row * index as f64;
        let room = row * 0.30;
        let (strip_top, strip_high) =
            if scene.changed() { (top + room, row * 0.56) } else { (top + row * 0.18, row * 0.64) };
        let marks = now.marks.get(from..to).unwrap_or_default();
        spans(marks, |mark, begin, end| {
            let (x, next) = (plot.x((from + begin) as f64), plot.x((from + end) as f64));
            pieces.extend(span(mark, x, strip_top, next - x, strip_high));
        });
        if scene.changed() {
            let marks = was.marks.get(from..to).unwrap_or_default();
            let mut full = Vec::new();
            spans(marks, |mark, begin, end| {
                if mark == DayMark::Full {
                    full.push((plot.x((from + begin) as f64), plot.x((from + end) as f64)));
                }
            });
            pieces.extend(was_spans(&full, top + room * 0.55));
        }
        let middle = strip_top + strip_high / 2.0;
        let since = each(voices, |words| match title.right_year {
            Some(year) => words.say("picture-since", &[("year", words.year(year).into())]),
            None => words.say("tell-right-before-all", &[]),
        });
        let name_style = LABEL.fitting(title.name, SIDE - 10.0, 4.5);
        // The date of the right stands beside the name where there is room for both.
        let beside = since.join(" · ");
        let both = name_style.width(title.name) + 5.0 + TICK.width(&beside);
        pieces.push(letters(title.name, At::new(0.0, centred(middle, name_style)), End::Left, name_style));
        if both <= SIDE - 6.0 {
            let x = name_style.width(title.name) + 5.0;
            pieces.push(letters(&beside, At::new(x, centred(middle, TICK)), End::Left, TICK));
        }
        let date = each(voices, |words| last_full(scene, index, words)).join(" · ");
        let style = LABEL.fitting(&date, dates_wide - 6.0, 4.5);
        pieces.push(letters(&date, At::new(width, centred(middle, style)), End::Right, style));
    }
    pieces.extend(months(&plot, &scene.year, voices));
    pieces.push(straight(At::new(plot.left, plot.foot()), At::new(plot.left + plot.wide, plot.foot()), 0.5, Ink::Rule));
    Block::one(Node::of(Role::Figure(alt), pieces), HEAD + row * count + MONTHS_PT)
}

/// The last full day as it was and with your changes: "May 9 → Apr 30".
fn last_full(scene: &Scene<'_>, index: usize, words: &Words) -> String {
    let Some(title) = scene.canals.get(index) else { return String::new() };
    let date = |signs: Option<&crate::signs::CanalSigns>| {
        let day = signs.and_then(|signs| signs.last_full_date);
        day.map_or_else(
            || words.say("tell-never", &[]),
            |day| words.date(day.date(scene.year.start_month), DateStyle::Short),
        )
    };
    let (was, now) = (date(scene.was.canal_signs(title)), date(scene.now.canal_signs(title)));
    if scene.changed() && was != now { format!("{was} → {now}") } else { now }
}

/// Calls `see` for every unbroken span of days of one kind: kind, first day, day after the last.
fn spans(marks: &[DayMark], mut see: impl FnMut(DayMark, usize, usize)) {
    let mut from = 0;
    for day in 1..=marks.len() {
        if marks.get(day) != marks.get(from) {
            if let Some(mark) = marks.get(from) {
                see(*mark, from, day);
            }
            from = day;
        }
    }
}

fn span(mark: DayMark, x: f64, y: f64, wide: f64, high: f64) -> Vec<Piece> {
    let area_of = || vec![corners(x, y, wide, high)];
    match mark {
        DayMark::Idle => {
            let middle = y + high / 2.0;
            vec![straight(At::new(x, middle), At::new(x + wide, middle), 0.4, Ink::Faint)]
        }
        DayMark::Full => vec![area(area_of(), Ink::Water)],
        DayMark::Short => vec![hatch(&area_of(), 2.4, 0.6, Ink::Lack), edged(area_of(), None, 0.35, Ink::Lack)],
        DayMark::Cut => vec![edged(area_of(), Some(Ink::Paper), 0.55, Ink::Lack)],
    }
}

/// Days that were full: dashed lines, with a tick after the last of them.
fn was_spans(spans: &[(f64, f64)], y: f64) -> Vec<Piece> {
    let Some((_, end)) = spans.last() else { return Vec::new() };
    let runs = spans.iter().map(|(from, to)| vec![At::new(*from, y), At::new(*to, y)]).collect();
    vec![
        dashed(runs, 0.8, Ink::Black, AS_IT_WAS),
        straight(At::new(*end, y - 1.7), At::new(*end, y + 1.7), 0.9, Ink::Black),
    ]
}

/// The first day on show and the one after the last: whole months, from the first in which a field asks for water or
/// anybody lacks any to the last.
fn window(scene: &Scene<'_>) -> (usize, usize) {
    let calendar = scene.year.calendar;
    let told = |day: usize| {
        [scene.was.canals, scene.now.canals].iter().flat_map(|canals| scene.canals.iter().zip(*canals)).any(
            |(title, canal)| match canal.marks.get(day) {
                Some(DayMark::Full) => !title.is_town,
                Some(DayMark::Short | DayMark::Cut) => true,
                Some(DayMark::Idle) | None => false,
            },
        )
    };
    let days = 0..calendar.len();
    let (Some(first), Some(last)) = (days.clone().find(|day| told(*day)), days.rev().find(|day| told(*day))) else {
        return (0, calendar.len().max(1));
    };
    let begins = |day: &usize| calendar.get(*day).is_none_or(|day| day.month_day.day == 1);
    let from = (0..=first).rev().find(begins).unwrap_or(0);
    let to = (last + 1..calendar.len()).find(begins).unwrap_or(calendar.len());
    (from, to)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn days_of_one_kind_are_one_span() {
        use DayMark::{Cut, Full, Idle};
        let mut seen = Vec::new();
        spans(&[Idle, Full, Full, Cut], |mark, from, to| seen.push((mark, from, to)));
        assert_eq!(seen, [(Idle, 0, 1), (Full, 1, 3), (Cut, 3, 4)]);
        spans(&[], |_, _, _| panic!());
    }
}
