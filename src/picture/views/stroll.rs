//! What lies over a page while the instrument strolls by itself: a line that says what is seen and how to take over, or
//! the message of the day.

use embedded_graphics::geometry::{OriginDimensions, Size};
use embedded_graphics::primitives::Rectangle;

use super::card::CardPlace;
use super::emblem::{Hand, knob};
use super::layout::{Layout, area, bottom, right};
use super::scene::DialSetting;
use super::wording::{dial_name, dial_value, fit};
use crate::picture::lettering::{Across, Face, lines, measure, paragraph_height};
use crate::picture::shape::{rounded_box, rounded_frame};
use crate::picture::{Canvas, Paint, Spot, Theme};
use crate::words::{System, Words};

/// How much of the page behind the message of the day is veiled, of 255.
const BEHIND: u8 = 170;

/// A dial that the stroll turns, with the units that it is told in.
pub type Turned<'a> = (&'a DialSetting, System);

/// The strip along the bottom that the line stands on; the page's dials and footer lie under it.
pub fn strip(size: Size) -> Rectangle {
    let layout = Layout::of(size, false);
    let top = layout.dials.top_left.y - layout.gap / 2;
    area(0, top, size.width as i32, size.height as i32 - top)
}

/// Draws the line over the page that is there. Under it stands where the dial is that the stroll turns, else how to take
/// over.
pub fn draw(canvas: &mut Canvas<'_>, says: &str, turned: Option<Turned<'_>>, theme: &Theme, words: &Words) {
    let size = canvas.size();
    let layout = Layout::of(size, false);
    let strip = strip(size);
    canvas.fill(strip, theme.chosen);
    let on_strip = Theme { ink: theme.on_chosen, lack: theme.on_chosen, ..*theme };
    let high = strip.size.height as i32;
    let radius = f64::from(high) * 0.26;
    let middle =
        Spot::new(f64::from(layout.margin) + radius * 1.25, f64::from(strip.top_left.y) + f64::from(high) / 2.0);
    knob(canvas, middle, radius, Hand::Turn, &on_strip);
    let x = layout.margin * 2 + (radius * 2.5) as i32;
    let wide = right(strip) - layout.margin - x;
    let below = turned.map_or_else(
        || (words.say("stroll-take-over", &[]), Face::regular(layout.label.px())),
        |(setting, units)| (told(setting, units, words), Face::bold(layout.strong.px() + layout.strong.px() / 4)),
    );
    let (text, face) = below;
    let low = area(x, bottom(strip) - face.line_px() - layout.gap, wide, face.line_px() + layout.gap / 2);
    let room = area(x, strip.top_left.y + layout.gap / 2, wide, low.top_left.y - strip.top_left.y - layout.gap / 2);
    sentence(canvas, says, room, Face::bold(layout.title.px()), &on_strip);
    fit(canvas, &text, low, face, theme.on_chosen, Across::Left);
}

/// The dial and where it stands.
fn told(setting: &DialSetting, units: System, words: &Words) -> String {
    format!("{}: {}", dial_name(setting.dial, words), dial_value(setting, units, words))
}

/// As large as it goes into the room, level with its middle.
fn sentence(canvas: &mut Canvas<'_>, text: &str, room: Rectangle, largest: Face, theme: &Theme) {
    let face = fitting(text, room, largest);
    let high = paragraph_height(text, face, room.size.width) as i32;
    let mut y = room.top_left.y + (room.size.height as i32 - high).max(0) / 2;
    for line in lines(text, face, room.size.width) {
        let place = area(room.top_left.x, y, room.size.width as i32, face.line_px());
        fit(canvas, line, place, face, theme.ink, Across::Left);
        y += face.line_px();
    }
}

fn fitting(text: &str, room: Rectangle, largest: Face) -> Face {
    let fits = |face: Face| {
        paragraph_height(text, face, room.size.width) <= room.size.height
            && lines(text, face, room.size.width).all(|line| measure(line, face).width <= room.size.width)
    };
    let mut face = largest;
    while !fits(face) {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    face
}

/// Draws the message of the day over the page that is there.
pub fn draw_message(canvas: &mut Canvas<'_>, text: &str, theme: &Theme, words: &Words) {
    let size = canvas.size();
    let layout = Layout::of(size, false);
    let place = CardPlace::around(size, &layout, size.height as i32 / 2);
    canvas.paint(canvas.frame(), Paint::Wash { colour: theme.paper, share: BEHIND });
    let radius = f64::from(layout.margin);
    rounded_box(canvas, place.card, radius, theme.card);
    rounded_frame(canvas, place.card, radius, layout.line_px, theme.water);
    let title = words.say("stroll-message-of-day", &[]);
    fit(canvas, &title, place.title, Face::bold(layout.strong.px()), theme.water_ink, Across::Left);
    // A message is the staff's own text: one word longer than the card is cut with an ellipsis, as names are.
    let room = place.body;
    let face = fitting(text, room, Face::bold(layout.title.px() + layout.title.px() / 3));
    let high = paragraph_height(text, face, room.size.width) as i32;
    let mut y = room.top_left.y + (room.size.height as i32 - high).max(0) / 2;
    for line in lines(text, face, room.size.width) {
        let line = super::wording::name_within(line, face, room.size.width);
        let place = area(room.top_left.x, y, room.size.width as i32, face.line_px());
        fit(canvas, &line, place, face, theme.ink, Across::Left);
        y += face.line_px();
    }
    fit(canvas, &words.say("stroll-take-over", &[]), place.foot, layout.note, theme.quiet, Across::Left);
}
