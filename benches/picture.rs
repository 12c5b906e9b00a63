//! How long drawing takes: a year's line, type, the difference of two frames, and whole pages, at 320×240.

#[path = "../tests/support/scenes.rs"]
mod scenes;
#[path = "../tests/support/valleys.rs"]
mod valleys;

use criterion::{Criterion, criterion_group, criterion_main};
use deshielo::picture::area::under;
use deshielo::picture::changes::changes;
use deshielo::picture::chart::{LinePair, Plot, line_pair};
use deshielo::picture::lettering::draw;
use deshielo::picture::line::polyline;
use deshielo::picture::views::valley;
use deshielo::picture::{Align, Canvas, Face, Spot, Stroke, Theme};
use deshielo::words::Words;
use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::Rectangle;
use scenes::{Land, PAGES, Play, draw as draw_page, steep_valley};

/// A made-up year of 365 places across the frame.
fn year() -> impl Iterator<Item = Spot> + Clone {
    (0..365).map(|day| {
        let t = (f64::from(day) - 200.0) / 60.0;
        Spot::new(5.0 + f64::from(day) * 0.85, 100.0 - 70.0 / (1.0 + t * t) + f64::from(day * 7 % 5))
    })
}

fn drawing(c: &mut Criterion) {
    let theme = Theme::LIGHT;
    let mut pixels = vec![Rgb565::WHITE; 320 * 240];
    let mut canvas = Canvas::new(&mut pixels, 320, 240).unwrap();
    c.bench_function("line of 365 places, 2.5 px", |b| {
        b.iter(|| polyline(&mut canvas, year(), Stroke::solid(2.5), theme.water));
    });
    c.bench_function("dashed line of 365 places, 1.5 px", |b| {
        b.iter(|| polyline(&mut canvas, year(), Stroke::dashed(1.5, 5.0, 3.5), theme.ink));
    });
    c.bench_function("area under 365 places", |b| b.iter(|| under(&mut canvas, year(), 120.0, theme.water_pale)));
    let area = Rectangle::new(Point::new(5, 20), Size::new(310, 80));
    let plot = Plot { area, across: (0.0, 365.0), up: (0.0, 100.0) };
    let look = LinePair::water(2.0, &theme).with_lack(&theme);
    c.bench_function("pair of lines with areas", |b| {
        b.iter(|| line_pair(&mut canvas, &plot, year().map(|s| s.y), year().map(|s| s.y - 9.0), look, &theme));
    });
    let words = "La última agua llega 18 días antes, dice.";
    c.bench_function("41 characters, 13 px", |b| {
        b.iter(|| draw(&mut canvas, words, Point::new(4, 200), Face::regular(13), theme.ink, Align::LEFT));
    });
    c.bench_function("clear", |b| b.iter(|| canvas.fill(canvas.frame(), theme.paper)));
    let before = vec![Rgb565::WHITE; 320 * 240];
    let mut now = before.clone();
    now[320 * 100 + 40..320 * 100 + 90].fill(Rgb565::BLACK);
    c.bench_function("difference of two frames", |b| b.iter(|| changes(&before, &now, 320)));
}

/// The pages with made-up runs, words and all.
fn pages(c: &mut Criterion) {
    let (words, _) = Words::new("es-US");
    let theme = Theme::LIGHT;
    let mut pixels = vec![Rgb565::WHITE; 320 * 240];
    let mut large = vec![Rgb565::WHITE; 1920 * 1080];
    Land::new(steep_valley(), 3, 7).show(Play { day: 216, ..Play::warm() }, |scene| {
        for view in PAGES {
            c.bench_function(&format!("{} page, 320×240", view.key()), |b| {
                let mut canvas = Canvas::new(&mut pixels, 320, 240).unwrap();
                b.iter(|| draw_page(view, &mut canvas, scene, &theme, &words));
            });
        }
        c.bench_function("valley page, 1920×1080", |b| {
            let mut canvas = Canvas::new(&mut large, 1920, 1080).unwrap();
            b.iter(|| valley::draw(&mut canvas, scene, &theme, &words));
        });
    });
}

criterion_group!(benches, drawing, pages);
criterion_main!(benches);
