//! A finger, or a mouse, on a screen: what lies under it becomes an event.
//!
//! A dial is turned on the card on which it was touched, even where the cards then stand otherwise.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::command::Command;
use super::event::{Event, Target};
use super::state::{Focus, State};
use super::view::View;
use crate::picture::views::card::next_at;
use crate::picture::views::touch::{Touched, share_along, touched};
use crate::picture::views::{Scene, View as Page};
use crate::water::dials::Dial;
use crate::words::Words;

/// Where a finger is in its touch.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Phase {
    /// It went down.
    Down,
    /// It moved while down.
    Move,
    /// It was lifted.
    Up,
}

/// What a finger remembers between its events.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Finger {
    held: Option<(Dial, Rectangle)>,
}

impl Finger {
    /// The event for a finger at a place of a screen of that size, which shows `scene` with these words.
    pub fn event(
        &mut self,
        (phase, at): (Phase, Point),
        size: Size,
        state: &State,
        scene: &Scene<'_>,
        words: &Words,
    ) -> Event {
        let target = self.target(phase, at, size, state, scene, words);
        match phase {
            Phase::Down => Event::TouchDown(target),
            Phase::Move => Event::TouchMove(target),
            Phase::Up => Event::TouchUp(target),
        }
    }

    fn target(
        &mut self,
        phase: Phase,
        at: Point,
        size: Size,
        state: &State,
        scene: &Scene<'_>,
        words: &Words,
    ) -> Target {
        if phase == Phase::Down {
            self.held = None;
        }
        if let Some((dial, card)) = self.held.filter(|(dial, _)| state.held_dial() == Some(*dial)) {
            return Target::Dial { dial, share: share_along(card, at.x) };
        }
        let shown = state.shown();
        if shown.card.is_some() {
            return if next_at(size, at) { Target::Button(Command::Turn(1)) } else { Target::Card };
        }
        match touched(size, scene, Page::ALL[shown.view as usize], words, at) {
            Touched::Dial { index, card } => match scene.dials.get(index) {
                Some(setting) => {
                    if phase == Phase::Down {
                        self.held = Some((setting.dial, card));
                    }
                    Target::Dial { dial: setting.dial, share: share_along(card, at.x) }
                }
                None => Target::Nothing,
            },
            // A year has far fewer days than the cast can hold.
            Touched::Day(day) => Target::Day(day.min(usize::from(u16::MAX)) as u16),
            Touched::Year(year) => Target::Year(year),
            Touched::Page(page) => Target::View(View::ALL[page as usize]),
            Touched::StepPage(pages) => Target::Button(Command::StepView(pages)),
            Touched::Play => Target::Button(Command::PlayOrPause),
            Touched::YearName => Target::Button(Command::NextThird),
            Touched::Ring if shown.focus.is_in_dial() => Target::Button(Command::Press),
            Touched::Ring | Touched::OffList => Target::Button(Command::Close),
            Touched::Step(steps) => Target::Button(Command::Turn(steps)),
            Touched::Take => Target::Button(match shown.focus {
                Focus::In(_) => Command::Close,
                Focus::Ring(_) => Command::Press,
            }),
            Touched::Entry(entry) => Target::Setting(entry),
            Touched::Nothing => Target::Nothing,
        }
    }
}
