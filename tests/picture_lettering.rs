//! Type: measuring, alignment, shortening, missing letters, and the same picture wherever a text stands.

use deshielo::picture::lettering::{Across, SIZES_PX, draw, draw_in, ink, measure, paragraph, paragraph_height};
use deshielo::picture::strict::Strict;
use deshielo::picture::{Align, Canvas, Face};
use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::Rectangle;
use proptest::prelude::*;

const WIDE: u16 = 200;
const HIGH: u16 = 60;

/// Draws on white and gives what the drawing answers, the smallest box around all that is not white, and the faults.
fn drawn<T>(draw: impl FnOnce(&mut Canvas<'_>) -> T) -> (T, Rectangle, Vec<String>) {
    let mut pixels = vec![Rgb565::WHITE; usize::from(WIDE) * usize::from(HIGH)];
    let mut strict = Strict::default();
    let answer = draw(&mut Canvas::new(&mut pixels, WIDE, HIGH).unwrap().with_witness(&mut strict));
    let inked = || (0..pixels.len()).filter(|&i| pixels[i] != Rgb565::WHITE);
    let columns = || inked().map(|i| (i % usize::from(WIDE)) as i32);
    let rows = || inked().map(|i| (i / usize::from(WIDE)) as i32);
    let found = match (columns().min(), columns().max(), rows().min(), rows().max()) {
        (Some(left), Some(right), Some(top), Some(bottom)) => {
            Rectangle::with_corners(Point::new(left, top), Point::new(right, bottom))
        }
        _ => Rectangle::zero(),
    };
    (answer, found, strict.faults().to_vec())
}

#[test]
fn the_box_that_is_told_is_the_box_that_is_inked() {
    for px in SIZES_PX.into_iter().filter(|&px| px <= 36) {
        for face in [Face::regular(px), Face::bold(px)] {
            let (answer, found, faults) =
                drawn(|canvas| draw(canvas, "Ágil", Point::new(100, 45), face, Rgb565::BLACK, Align::CENTRE));
            assert_eq!(answer.ink, found, "{face:?}");
            assert_eq!(ink("Ágil", Point::new(100, 45), face, Align::CENTRE), found);
            assert_eq!(faults, Vec::<String>::new());
            let (above, below) = (45 - found.top_left.y, found.top_left.y + found.size.height as i32 - 45);
            assert!(above <= face.ascent_px() && below <= face.descent_px(), "{face:?}: {above} above, {below} below");
        }
    }
}

#[test]
fn capitals_stand_where_they_are_put() {
    let face = Face::bold(22);
    let cap = face.cap_px();
    for (align, top) in [(Align::LEFT, 40 - cap), (Align::LEFT.cap_top(), 40), (Align::LEFT.cap_middle(), 40 - cap / 2)]
    {
        let (_, found, _) = drawn(|canvas| draw(canvas, "H", Point::new(10, 40), face, Rgb565::BLACK, align));
        assert_eq!((found.top_left.y, found.size.height as i32), (top, cap));
    }
}

#[test]
fn figures_keep_their_columns() {
    for px in SIZES_PX {
        for face in [Face::regular(px), Face::bold(px)] {
            let width = |text: &str| measure(text, face).width;
            assert_eq!(width("1111.71"), width("8888.08"));
            assert_eq!(width("11111") - width("1111"), width("0000") - width("000"));
        }
    }
}

#[test]
fn a_letter_that_the_face_lacks_is_seen_and_counted() {
    let (answer, found, faults) =
        drawn(|canvas| draw(canvas, "漢", Point::new(20, 40), Face::regular(22), Rgb565::BLACK, Align::LEFT));
    assert_eq!((answer.missing, answer.ink), (1, found));
    assert!(found.size.width >= 8 && found.size.height >= 12);
    assert_eq!(faults.len(), 1);
}

#[test]
fn nothing_is_shortened_in_silence() {
    let place = Rectangle::new(Point::new(5, 5), Size::new(60, 20));
    let fitted =
        |text: &str| drawn(|canvas| draw_in(canvas, text, place, Face::regular(13), Rgb565::BLACK, Across::Left));
    let (short, _, faults) = fitted("embalse");
    assert!(!short.shortened && faults.is_empty());
    let (long, found, faults) = fitted("embalse del valle alto");
    assert!(long.shortened && faults.len() == 1, "{faults:?}");
    assert!(long.advance_px <= 60 && found.top_left.x + found.size.width as i32 <= 65);
}

#[test]
fn a_paragraph_fits_the_height_that_it_asks_for() {
    let text = "La última agua llega dieciocho días antes que sin cambios.";
    let face = Face::regular(11);
    let high = paragraph_height(text, face, 90);
    let at = |high: u32| Rectangle::new(Point::new(4, 2), Size::new(90, high));
    let (whole, _, faults) = drawn(|canvas| paragraph(canvas, text, at(high), face, Rgb565::BLACK, Across::Left));
    assert!(!whole.shortened && faults.is_empty(), "{faults:?}");
    let (cut, _, _) = drawn(|canvas| paragraph(canvas, text, at(high - 1), face, Rgb565::BLACK, Across::Left));
    assert!(cut.shortened);
    let (none, found, faults) = drawn(|canvas| paragraph(canvas, text, at(3), face, Rgb565::BLACK, Across::Left));
    assert!(none.shortened && found == Rectangle::zero() && faults.len() == 1);
}

#[test]
fn text_over_text_and_text_cut_off_are_found() {
    let (_, _, faults) = drawn(|canvas| {
        draw(canvas, "nieve", Point::new(20, 40), Face::regular(13), Rgb565::BLACK, Align::LEFT);
        draw(canvas, "agua", Point::new(40, 44), Face::regular(13), Rgb565::BLACK, Align::LEFT);
        draw(canvas, "presa", Point::new(190, 20), Face::regular(13), Rgb565::BLACK, Align::LEFT);
    });
    assert_eq!(faults.len(), 2, "{faults:?}");
}

proptest! {
    #[test]
    fn no_text_and_no_place_does_harm(text in ".{0,40}", x in any::<i32>(), y in any::<i32>(), size in 0usize..13) {
        let face = Face::regular(SIZES_PX[size]);
        drawn(|canvas| {
            draw(canvas, &text, Point::new(x, y), face, Rgb565::BLACK, Align::CENTRE.cap_middle());
            let place = Rectangle::new(Point::new(x, y), Size::new(x.unsigned_abs(), y.unsigned_abs() % 500));
            draw_in(canvas, &text, place, face, Rgb565::BLACK, Across::Right);
            paragraph(canvas, &text, place, face, Rgb565::BLACK, Across::Centre);
        });
    }

    #[test]
    fn the_same_text_is_the_same_picture_everywhere(text in "[a-z0-9 .ñ]{1,12}", dx in 0i32..60, dy in 0i32..20) {
        let at = |x: i32, y: i32| {
            let mut pixels = vec![Rgb565::WHITE; usize::from(WIDE) * usize::from(HIGH)];
            let mut canvas = Canvas::new(&mut pixels, WIDE, HIGH).unwrap();
            draw(&mut canvas, &text, Point::new(x, y), Face::regular(11), Rgb565::BLACK, Align::LEFT);
            pixels
        };
        let (here, there) = (at(5, 20), at(5 + dx, 20 + dy));
        let shift = dy as usize * usize::from(WIDE) + dx as usize;
        prop_assert!(here[..here.len() - shift] == there[shift..]);
    }
}
