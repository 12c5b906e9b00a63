//! Chart pieces: what they show is what they are given, names keep clear of each other, and no number does harm.

use deshielo::picture::chart::{
    BarPair, DayMark, EndLabel, Field, LinePair, Months, Plot, bar_pair, contour, end_labels, level_axis, level_steps,
    line_pair, month_axis, shade, year_strip,
};
use deshielo::picture::strict::Strict;
use deshielo::picture::{Canvas, Face, Stroke, Theme};
use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;
use proptest::prelude::*;

const THEME: Theme = Theme::LIGHT;
const BEGINS: [f64; 13] = [0.0, 31.0, 61.0, 92.0, 123.0, 151.0, 182.0, 212.0, 243.0, 273.0, 304.0, 335.0, 365.0];
const LONG: [&str; 12] = [
    "octubre",
    "noviembre",
    "diciembre",
    "enero",
    "febrero",
    "marzo",
    "abril",
    "mayo",
    "junio",
    "julio",
    "agosto",
    "septiembre",
];

/// Draws on paper and gives the pixels and the faults.
fn drawn(width: u16, height: u16, draw: impl FnOnce(&mut Canvas<'_>)) -> (Vec<Rgb565>, Vec<String>) {
    let mut pixels = vec![THEME.paper; usize::from(width) * usize::from(height)];
    let mut strict = Strict::default();
    draw(&mut Canvas::new(&mut pixels, width, height).unwrap().with_witness(&mut strict));
    (pixels, strict.faults().to_vec())
}

fn plot(x: i32, y: i32, width: u32, height: u32, up: (f64, f64)) -> Plot {
    Plot { area: Rectangle::new(Point::new(x, y), Size::new(width, height)), across: (0.0, 365.0), up }
}

#[test]
fn months_never_meet_at_any_width() {
    for width in (60..800).step_by(7) {
        let (_, faults) = drawn(width + 20, 40, |canvas| {
            let months = Months { begins: &BEGINS, names: &LONG };
            month_axis(canvas, &plot(10, 5, u32::from(width), 10, (0.0, 1.0)), months, Face::regular(11), &THEME);
        });
        assert_eq!(faults, Vec::<String>::new(), "{width}");
    }
}

#[test]
fn a_tick_stands_where_its_month_begins() {
    let (pixels, _) = drawn(400, 40, |canvas| {
        let months = Months { begins: &BEGINS, names: &LONG };
        month_axis(canvas, &plot(10, 5, 365, 10, (0.0, 1.0)), months, Face::regular(11), &THEME);
    });
    let row = &pixels[400 * 17..400 * 18];
    let ticks: Vec<usize> = (0..400).filter(|&x| row[x] == THEME.rule).collect();
    assert_eq!(ticks, [10, 41, 71, 102, 133, 161, 192, 222, 253, 283, 314, 345, 374]);
}

#[test]
fn level_numbers_never_meet_at_any_height() {
    for height in 20..200 {
        let (_, faults) = drawn(100, 240, |canvas| {
            let plot = plot(50, 20, 40, height, (0.0, 731.0));
            let steps = level_steps(&plot, Face::regular(13)).unwrap();
            let write = |value: f64| heapless::String::<8>::try_from(format!("{value:.0}").as_str()).unwrap();
            level_axis(canvas, &plot, &steps, write, Face::regular(13), 4, &THEME);
        });
        assert_eq!(faults, Vec::<String>::new(), "{height}");
    }
}

#[test]
fn a_strip_has_as_much_of_each_as_the_year() {
    let days = (0..100).map(|day| match day {
        0..40 => DayMark::Full,
        40..65 => DayMark::Short,
        65..90 => DayMark::Cut,
        _ => DayMark::Idle,
    });
    let (pixels, _) = drawn(300, 20, |canvas| {
        let plot = Plot { across: (0.0, 100.0), ..plot(0, 4, 300, 12, (0.0, 1.0)) };
        year_strip(canvas, &plot, days, &THEME);
    });
    let count = |from: usize, to: usize, colour: Rgb565| {
        (4..16).flat_map(|y| &pixels[300 * y + from..300 * y + to]).filter(|p| **p == colour).count()
    };
    assert_eq!(count(0, 120, THEME.water), 120 * 12);
    assert_eq!(count(120, 195, THEME.water) + count(120, 195, THEME.paper), 0);
    assert_eq!(count(195, 270, THEME.card), 73 * 10);
    assert_eq!(count(270, 300, THEME.rule), 30);
}

#[test]
fn a_bar_shows_now_and_hatches_what_is_lost() {
    let (pixels, _) = drawn(120, 30, |canvas| {
        let area = Rectangle::new(Point::new(10, 10), Size::new(100, 10));
        bar_pair(canvas, area, BarPair { was: Some(0.8), now: 0.3, fill: THEME.water }, &THEME);
    });
    let row = &pixels[120 * 15..120 * 16];
    assert!(row[10..40].iter().all(|p| *p == THEME.water));
    assert!(row[40..85].iter().all(|p| *p != THEME.water && *p != THEME.card && *p != THEME.paper));
    assert!(row[93..109].iter().all(|p| *p == THEME.card));
}

#[test]
fn end_labels_keep_clear_and_refuse_a_crowd() {
    let label = |y: f64| EndLabel { text: "canal", y, face: Face::regular(11), colour: THEME.ink };
    let (_, faults) = drawn(100, 60, |canvas| {
        assert!(end_labels(canvas, &[label(30.0), label(31.0), label(29.0)], 40, 38.0, 0, 60));
        assert!(!end_labels(canvas, &[label(30.0); 6], 40, 38.0, 0, 60));
        assert!(!end_labels(canvas, &[label(f64::NAN)], 40, 38.0, 0, 60));
    });
    assert_eq!(faults, Vec::<String>::new());
}

proptest! {
    #[test]
    fn no_number_does_harm(
        was in prop::collection::vec(prop::num::f64::ANY, 0..40),
        now in prop::collection::vec(prop::num::f64::ANY, 0..40),
        low in prop::num::f64::ANY, high in prop::num::f64::ANY,
        x in any::<i32>(), y in any::<i32>(), width in any::<u32>(), height in any::<u32>(),
    ) {
        drawn(40, 30, |canvas| {
            for area in [
                Rectangle::new(Point::new(x, y), Size::new(width, height)),
                Rectangle::new(Point::new(x % 40, y % 30), Size::new(width % 60, height % 40)),
            ] {
                let plot = Plot { area, across: (0.0, 40.0), up: (low, high) };
                let look = LinePair::water(2.0, &THEME).with_lack(&THEME);
                line_pair(canvas, &plot, was.iter().copied(), now.iter().copied(), look, &THEME);
                bar_pair(canvas, area, BarPair { was: Some(low), now: high, fill: THEME.water }, &THEME);
                let field = Field { area, columns: 5, values: &was };
                shade(canvas, &field, |_| THEME.water);
                contour(canvas, &field, low, Stroke::solid(2.0), THEME.ink);
                let days = was.iter().map(|v| if *v > 0.0 { DayMark::Full } else { DayMark::Cut });
                year_strip(canvas, &plot, days, &THEME);
            }
        });
    }
}
