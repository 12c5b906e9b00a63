//! What lies under a finger on a lesson's page.

use embedded_graphics::geometry::{Point, Size};

use super::pages::{Rooms, chip_place, guess_line};
use super::{Body, LessonScene, layout_of};
use crate::picture::views::layout::right;

/// What lies under a finger.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum LessonTouched {
    /// What is at hand is done.
    Take,
    /// Another thing is brought to hand, so many further on.
    Step(i32),
    /// The guess goes to this share of the axis, 0 to 1.
    Guess(f64),
    /// Nothing.
    Nothing,
}

/// What lies at a place of a screen of that size.
pub fn touched(size: Size, scene: &LessonScene, at: Point) -> LessonTouched {
    let layout = layout_of(size);
    let Rooms { head: _, room, foot } = Rooms::of(size, &layout);
    if let Some((name, _, count)) = &scene.foot.choice {
        let chip = chip_place(&layout, foot, name, *count);
        let (low, high) = (chip.top_left.y, chip.top_left.y.saturating_add_unsigned(chip.size.height));
        if at.y >= low && at.y < high + layout.gap {
            // Fingers are wide: each arrow has all of the row on its side, as far as the arrow is wide twice.
            let reach = layout.label.line_px() * 2;
            return match at.x {
                x if x < chip.top_left.x => LessonTouched::Step(-1),
                x if x < right(chip) => LessonTouched::Take,
                x if x < right(chip) + reach && *count > 1 => LessonTouched::Step(1),
                _ => LessonTouched::Nothing,
            };
        }
    }
    match &scene.body {
        Body::Guess(shown) if shown.hand.is_some() => {
            let line = guess_line(&layout, room, shown);
            if at.y > line.y + layout.gap * 3 && room.contains(at) {
                // The row of groups: done.
                return LessonTouched::Take;
            }
            if room.contains(at) { LessonTouched::Guess(line.share_at(at.x)) } else { LessonTouched::Nothing }
        }
        Body::List { .. } | Body::Start { .. } | Body::Word { .. } if room.contains(at) => {
            // The left half goes back, the right half on, the foot takes.
            let middle = room.top_left.x + room.size.width as i32 / 2;
            LessonTouched::Step(if at.x < middle { -1 } else { 1 })
        }
        Body::List { .. } | Body::Start { .. } | Body::Word { .. } if foot.contains(at) => LessonTouched::Take,
        _ => LessonTouched::Nothing,
    }
}
