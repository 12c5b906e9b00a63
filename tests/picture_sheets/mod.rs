//! What the specimen sheets show. All numbers and names on them are made up.

use deshielo::picture::area::{Between, between, polygon};
use deshielo::picture::chart::{
    BarPair, DayMark, EndLabel, Field, LinePair, Months, Plot, bar_pair, contour, day_cursor, end_labels, level_axis,
    level_steps, line_pair, month_axis, range_band, shade, swatch, swatch_as_it_was, swatch_with_changes, year_strip,
};
use deshielo::picture::lettering::{Across, SIZES_PX, draw, draw_in, measure, paragraph};
use deshielo::picture::line::{polyline, segment};
use deshielo::picture::paint::Pattern;
use deshielo::picture::shape::{arrow, bead, diamond, disc, ring, rounded_box, rounded_frame, triangle};
use deshielo::picture::{Align, Canvas, Face, Hatch, Paint, Spot, Stroke, Theme};
use embedded_graphics::geometry::{OriginDimensions, Point, Size};
use embedded_graphics::primitives::Rectangle;

fn area(x: i32, y: i32, width: u32, height: u32) -> Rectangle {
    Rectangle::new(Point::new(x, y), Size::new(width, height))
}

pub fn type_large(canvas: &mut Canvas<'_>, theme: &Theme) {
    let mut y = 8;
    for px in SIZES_PX {
        let (regular, bold) = (Face::regular(px), Face::bold(px));
        y += bold.ascent_px();
        let text = if px < 40 { "Presa 61 % · 2 420 hm³" } else { "61 %" };
        let drawn = draw(canvas, text, Point::new(12, y), regular, theme.ink, Align::LEFT);
        let next = 12 + drawn.advance_px as i32 + i32::from(px);
        draw(canvas, if px < 25 { text } else { "Año 9" }, Point::new(next, y), bold, theme.ink, Align::LEFT);
        if px > 40 {
            draw(canvas, "−2½ °C", Point::new(788, y), bold, theme.water_ink, Align::RIGHT);
        } else {
            let note = if px < 20 { "¿Cuándo se corta el agua?" } else { "Ñuble, güiro" };
            draw(canvas, note, Point::new(788, y), regular, theme.quiet, Align::RIGHT);
        }
        y += if px > 40 { 4 } else { bold.descent_px() };
    }
}

pub fn type_small(canvas: &mut Canvas<'_>, theme: &Theme) {
    let mut y = 4;
    for (px, text) in [
        (9, "9  Wednesday’s snow water equivalent was 118 mm, −18 days"),
        (10, "10  El embalse llega a 61 % el 14 de junio"),
        (11, "11  With your changes the canal runs 4.4 m³/s"),
        (12, "12  ¡Cuidado! El hielo de primavera mata."),
        (13, "13  Half the year’s water comes sooner"),
    ] {
        let face = Face::regular(px);
        y += face.ascent_px() + 1;
        draw(canvas, text, Point::new(6, y), face, theme.ink, Align::LEFT);
        y += face.descent_px();
    }
    for (px, text) in
        [(11, "11  The youngest right is cut 42 days sooner"), (15, "15  Nieve 118 mm"), (22, "22  24 ago")]
    {
        let face = Face::bold(px);
        y += face.ascent_px() + 1;
        draw(canvas, text, Point::new(6, y), face, theme.ink, Align::LEFT);
        y += face.descent_px();
    }
    draw(canvas, "18 d antes", Point::new(314, y - 6), Face::bold(13), theme.lack_ink, Align::RIGHT);
    let words = "Con dos grados más, la mitad del agua del año pasa 14 días antes y la presa no se llena.";
    paragraph(canvas, words, area(6, y + 4, 190, 80), Face::regular(12), theme.quiet, Across::Left);
    let card = area(206, y + 6, 108, 54);
    rounded_box(canvas, card, 4.0, theme.chosen);
    draw_in(canvas, "calentamiento", area(206, y + 10, 108, 18), Face::regular(11), theme.on_chosen, Across::Centre);
    draw_in(canvas, "+2.0 °C", area(206, y + 28, 108, 28), Face::bold(22), theme.on_chosen, Across::Centre);
}

pub fn characters(canvas: &mut Canvas<'_>, theme: &Theme) {
    let all: String = (' '..='~').chain("áéíóúñüÁÉÍÓÚÑÜ¿¡«»°²³·–—−×÷→←↑↓½¼¾…‘’“”‰±≥≤•".chars()).collect();
    for (weight, top) in [(Face::regular(13), 4), (Face::bold(13), 122)] {
        for (i, character) in all.chars().enumerate() {
            let at = Point::new(12 + (i as i32 % 20) * 16, top + weight.ascent_px() + (i as i32 / 20) * 16);
            draw(canvas, character.encode_utf8(&mut [0; 4]), at, weight, theme.ink, Align::CENTRE);
        }
    }
}

pub fn shapes(canvas: &mut Canvas<'_>, theme: &Theme) {
    let label = Face::regular(9);
    for (i, width) in [1.0, 1.5, 2.0, 3.0, 5.0].into_iter().enumerate() {
        let y = 10.5 + 11.0 * i as f64;
        segment(canvas, Spot::new(8.0, y), Spot::new(70.0, y), Stroke::solid(width), theme.water);
        segment(canvas, Spot::new(80.0, y + 4.0), Spot::new(150.0, y - 6.0), Stroke::solid(width), theme.ink);
    }
    let fan = Spot::new(160.0, 58.0);
    for i in 0..9 {
        let tip = [(52, 0), (51, 11), (48, 20), (43, 29), (37, 37), (29, 43), (20, 48), (11, 51), (0, 52)][i];
        segment(
            canvas,
            fan,
            Spot::new(160.0 + f64::from(tip.0), 58.0 - f64::from(tip.1)),
            Stroke::solid(1.0),
            theme.ink,
        );
    }
    let wave = |day: i32| {
        let t = f64::from(day) / 12.0;
        Spot::new(222.0 + f64::from(day), 34.0 - 60.0 * t * (t - 3.0) * (t - 7.0) / 45.0)
    };
    let flat = (0..90).map(|day| Spot::new(222.0 + f64::from(day), 34.0));
    between(canvas, flat.clone(), (0..90).map(wave), Between::FirstHigher, theme.water_pale);
    between(canvas, flat, (0..90).map(wave), Between::SecondHigher, theme.lack_hatch());
    polyline(canvas, (0..90).map(wave), Stroke::solid(2.5).with_round_ends(), theme.water);
    polyline(canvas, (0..90).map(wave).map(|s| Spot::new(s.x, s.y + 10.0)), Stroke::dashed(1.5, 5.0, 3.5), theme.ink);

    let patterns = [
        (Pattern::Rising, "rising"),
        (Pattern::Falling, "falling"),
        (Pattern::Level, "level"),
        (Pattern::Upright, "upright"),
        (Pattern::Crossed, "crossed"),
        (Pattern::Dots, "dots"),
    ];
    for (i, (pattern, name)) in patterns.into_iter().enumerate() {
        let x = 8 + 52 * i as i32;
        let hatch = Hatch { pattern, period_px: 5, width_px: 1.4, colour: theme.lack };
        rounded_box(canvas, area(x, 74, 44, 26), 3.0, theme.lack_pale);
        rounded_box(canvas, area(x, 74, 44, 26), 3.0, hatch);
        draw(canvas, name, Point::new(x + 22, 110), label, theme.quiet, Align::CENTRE);
    }

    let y = 140.0;
    disc(canvas, Spot::new(22.0, y), 14.0, theme.water);
    ring(canvas, Spot::new(60.0, y), 14.0, 3.0, theme.ink);
    bead(canvas, Spot::new(94.0, y), 5.0, theme.lack, theme.paper);
    diamond(canvas, Spot::new(120.0, y), 9.0, theme.town);
    triangle(canvas, [Spot::new(138.0, y + 9.0), Spot::new(148.0, y - 9.0), Spot::new(158.0, y + 9.0)], theme.crop);
    arrow(canvas, Spot::new(168.0, y + 10.0), Spot::new(206.0, y - 10.0), 3.0, 11.0, theme.ink);
    arrow(canvas, Spot::new(214.0, y), Spot::new(246.0, y), 2.0, 8.0, theme.water);
    rounded_frame(canvas, area(256, 128, 56, 24), 6.0, 1.5, theme.ink);
    draw_in(canvas, "frame", area(256, 128, 56, 24), Face::regular(11), theme.ink, Across::Centre);

    let ground = [(8, 226), (8, 180), (30, 172), (52, 184), (80, 168), (108, 196), (140, 200), (160, 226)];
    polygon(canvas, ground.into_iter().map(|(x, y)| Spot::new(f64::from(x), f64::from(y))), theme.rock);
    let cap = [(19, 176), (30, 172), (39, 177), (34, 181), (28, 178), (23, 182)];
    polygon(canvas, cap.into_iter().map(|(x, y)| Spot::new(f64::from(x), f64::from(y))), theme.snow);
    let roles = [
        ("water", theme.water, theme.on_water),
        ("lack", theme.lack, theme.on_lack),
        ("rock", theme.rock, theme.on_rock),
        ("far", theme.rock_far, theme.on_rock),
    ];
    for (i, (name, fill, text)) in roles.into_iter().enumerate() {
        let at = area(170 + 36 * i as i32, 164, 34, 18);
        canvas.fill(at, fill);
        draw_in(canvas, name, at, Face::bold(10), text, Across::Centre);
    }
    for (i, fill) in
        [theme.snow, theme.crop, theme.crop_dry, theme.town, theme.sky, theme.card, theme.faint].into_iter().enumerate()
    {
        canvas.fill(area(170 + 20 * i as i32, 186, 18, 12), fill);
    }
    let inks = [
        ("ink", theme.ink),
        ("quiet", theme.quiet),
        ("water", theme.water_ink),
        ("lack", theme.lack_ink),
        ("crop", theme.crop_ink),
    ];
    let mut x = 170;
    for (name, ink) in inks {
        x += draw(canvas, name, Point::new(x, 212), Face::bold(10), ink, Align::LEFT).advance_px as i32 + 5;
    }
    canvas.paint(area(170, 218, 142, 8), Paint::Wash { colour: theme.water, share: 96 });
}

/// A made-up year that fills in spring and empties in summer, shifted and scaled.
fn year(shift: f64, scale: f64) -> impl Iterator<Item = f64> + Clone {
    (0..365).map(move |day| {
        let t = (f64::from(day) + shift - 215.0) / 70.0;
        let hump = 1.0 / (1.0 + t * t * t * t);
        let ripple = if day % 90 < 40 { 0.0 } else { f64::from((day % 90 - 40) * (90 - day % 90)) * 0.00005 };
        scale * (0.08 + 0.86 * hump + ripple * hump)
    })
}

const BEGINS: [f64; 13] = [0.0, 31.0, 61.0, 92.0, 123.0, 151.0, 182.0, 212.0, 243.0, 273.0, 304.0, 335.0, 365.0];
const NAMES: [&str; 12] = ["oct", "nov", "dic", "ene", "feb", "mar", "abr", "may", "jun", "jul", "ago", "sep"];

pub fn charts(canvas: &mut Canvas<'_>, theme: &Theme) {
    let size = canvas.size();
    let large = size.width > 400;
    let (small, strong) = if large { (Face::regular(15), Face::bold(22)) } else { (Face::regular(10), Face::bold(15)) };
    let (wide, high) = (size.width as i32, size.height as i32);
    let margin = if large { 16 } else { 6 };
    draw(
        canvas,
        "La presa se llena 14 días antes",
        Point::new(margin, margin),
        strong,
        theme.ink,
        Align::LEFT.cap_top(),
    );
    let rule = margin + strong.cap_px() + margin;
    canvas.fill(area(0, rule, size.width, 1), theme.faint);

    let left = margin + measure("000", small).width as i32 + 6;
    let right = wide - margin - measure("sin cambios", small).width as i32 - 8;
    let top = rule + margin + small.px() as i32 * 2;
    let plot = Plot {
        area: area(left, top, (right - left) as u32, (high / if large { 5 } else { 4 }) as u32),
        across: (0.0, 365.0),
        up: (0.0, 5.2),
    };
    draw(canvas, "embalse, hm³", Point::new(margin, rule + margin), small, theme.quiet, Align::LEFT.cap_top());
    let steps = level_steps(&plot, small).unwrap();
    let write = |value: f64| {
        let mut text = heapless::String::<8>::new();
        std::fmt::Write::write_fmt(&mut text, format_args!("{value:.0}")).unwrap();
        text
    };
    level_axis(canvas, &plot, &steps, write, small, 5, theme);
    let width = if large { 3.0 } else { 2.0 };
    let look = LinePair::water(width, theme).with_lack(theme);
    line_pair(canvas, &plot, year(0.0, 5.0), year(16.0, 4.4), look, theme);
    let used = month_axis(canvas, &plot, Months { begins: &BEGINS, names: &NAMES }, small, theme);
    let last = |values: &mut dyn Iterator<Item = f64>| plot.y(values.last().unwrap());
    let labels = [
        EndLabel { text: "sin cambios", y: last(&mut year(0.0, 5.0)), face: small, colour: theme.ink },
        EndLabel { text: "con cambios", y: last(&mut year(16.0, 4.4)), face: small, colour: theme.water_ink },
    ];
    let bottom = plot.area.top_left.y + plot.area.size.height as i32;
    assert!(end_labels(canvas, &labels, right + 8, f64::from(right) + 1.0, top, bottom));
    let x = day_cursor(canvas, &plot, 198.5, theme.lack);
    let level = plot.y(year(16.0, 4.4).nth(198).unwrap());
    bead(canvas, Spot::new(x, level), width * 1.6, theme.lack, theme.paper);

    let mut y = bottom + used as i32 + margin * 2;
    let name_wide = measure("Molino", small).width as i32 + margin;
    let half = wide / 2 + wide / 10;
    for (i, (name, full, short)) in
        [("Norte", 365, 365), ("Vega", 300, 318), ("Llano", 262, 281)].into_iter().enumerate()
    {
        let high = if large { 22 } else { 12 };
        let strip = Plot {
            area: area(margin + name_wide, y, (half - margin * 2 - name_wide) as u32, high),
            across: (0.0, 365.0),
            up: (0.0, 1.0),
        };
        draw(canvas, name, Point::new(margin, y + high as i32 / 2), small, theme.ink, Align::LEFT.cap_middle());
        let days = (0..365).map(move |day| match day {
            0..180 => DayMark::Idle,
            _ if day < full => DayMark::Full,
            _ if day < short => DayMark::Short,
            _ => DayMark::Cut,
        });
        year_strip(canvas, &strip, days, theme);
        let bar = area(half, y, (wide - half - margin - if large { 60 } else { 40 }) as u32, high);
        let (was, now) = [(1.0, 1.0), (0.95, 0.7), (0.8, 0.35)][i];
        bar_pair(canvas, bar, BarPair { was: Some(was), now, fill: theme.water }, theme);
        let share = format!("{:.0} %", now * 100.0);
        let at = Point::new(wide - margin, y + high as i32 / 2);
        let colour = if now < 0.9 { theme.lack_ink } else { theme.ink };
        draw(
            canvas,
            &share,
            at,
            if large { Face::bold(15) } else { Face::bold(11) },
            colour,
            Align::RIGHT.cap_middle(),
        );
        y += high as i32 + margin + 2;
    }
    let box_high = small.cap_px() as u32 + 2;
    let mut x = margin;
    for (mark, name) in [(DayMark::Full, "lleno"), (DayMark::Short, "corto"), (DayMark::Cut, "cortado")] {
        swatch(canvas, area(x, y, box_high * 2, box_high), mark, theme);
        x += box_high as i32 * 2 + 4;
        let middle = y + box_high as i32 / 2;
        x += draw(canvas, name, Point::new(x, middle), small, theme.quiet, Align::LEFT.cap_middle()).advance_px as i32
            + 8;
    }
    swatch_as_it_was(canvas, area(x, y, box_high * 3, box_high), width, theme);
    swatch_with_changes(canvas, area(x, y + box_high as i32, box_high * 3, 6), width, theme.water);
    y += box_high as i32 + margin + 4;

    let band = Plot {
        area: area(half, if large { y } else { y - 10 }, (wide - half - margin) as u32, if large { 70 } else { 24 }),
        across: (0.0, 365.0),
        up: (0.0, 5.6),
    };
    let least = year(8.0, 3.6);
    let most = year(0.0, 5.2);
    range_band(canvas, &band, least, most, theme.water, theme);
    line_pair(
        canvas,
        &band,
        year(0.0, 4.9),
        year(4.0, 4.4),
        LinePair { area: None, ..LinePair::water(width, theme) },
        theme,
    );
    if large {
        let values: Vec<f64> = (0..13 * 7)
            .map(|i| {
                let (warm, wet) = (f64::from(i % 13) / 2.0, f64::from(3 - i / 13));
                0.9 - 0.09 * warm + 0.06 * wet + 0.004 * warm * wet
            })
            .collect();
        let field = Field { area: area(margin, y, 200, (high - y - margin) as u32), columns: 13, values: &values };
        shade(canvas, &field, |value| theme.ramp((value - 0.2) / 0.85));
        contour(canvas, &field, 0.6, Stroke::solid(3.0), theme.ink);
        ring(canvas, field.middle(4, 3), 8.0, 2.0, theme.ink);
        disc(canvas, field.middle(4, 3), 6.0, theme.paper);
        let note = "La línea separa los años con agua de los años sin agua.";
        paragraph(
            canvas,
            note,
            area(margin + 212, y, (half - margin * 2 - 212) as u32, (high - y) as u32),
            small,
            theme.quiet,
            Across::Left,
        );
    }
}
