//! What lies under a finger: the boxes of the drawing, asked the other way round.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::dial_cards::{lead_place, places};
use super::foot::{Foot, page_at};
use super::frame::DateLine;
use super::hand::Focus;
use super::layout::{Form, Layout, area, bottom, right};
use super::ring_strip::RingPlace;
use super::scene::Scene;
use super::{View, canals, many_years, season, setting_list, valley};
use crate::words::Words;

/// Part of the screen's width at either side in which a tap turns the page, percent, and at least so many pixels.
const EDGE_PERCENT: i32 = 8;
const EDGE_PX: i32 = 20;
/// Marks of pages that stand closer are too small to be hit one by one: a tap goes a page on or back.
const APART_PX: i32 = 10;

/// What can be touched.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Touched {
    /// A dial, by its place in the scene, on its card.
    Dial {
        /// Which.
        index: usize,
        /// The card that it was touched on.
        card: Rectangle,
    },
    /// A day of the year, counted from 0.
    Day(usize),
    /// A year, counted from 0 in the years of the runs.
    Year(usize),
    /// The mark of a page.
    Page(View),
    /// The way to the page that many further on.
    StepPage(i32),
    /// The mark that plays the year, or the day.
    Play,
    /// The name of the year.
    YearName,
    /// The small knob that opens the ring.
    Ring,
    /// What turns the thing in hand, or the ring, by so many steps.
    Step(i32),
    /// What takes the thing in hand, or leaves it.
    Take,
    /// An entry of the open list of settings.
    Entry(usize),
    /// Beside the open list.
    OffList,
    /// Nothing that can be touched.
    Nothing,
}

/// How far along its card a dial is touched, 0 to 1; beyond the card below 0 and above 1.
pub fn share_along(card: Rectangle, x: i32) -> f64 {
    (f64::from(x) - f64::from(card.top_left.x) + 0.5) / f64::from(card.size.width.max(1))
}

/// What lies at a place of a page on a screen of this size.
pub fn touched(size: Size, scene: &Scene<'_>, view: View, words: &Words, at: Point) -> Touched {
    if let Some(list) = &scene.hand.list {
        return match setting_list::entry_at(size, list, at.x, at.y) {
            Some(entry) => Touched::Entry(entry),
            None if setting_list::is_on(size, list, at.x, at.y) => Touched::Nothing,
            None => Touched::OffList,
        };
    }
    let layout = Layout::of(size, scene.second.is_some());
    if layout.dials.contains(at) {
        return in_dials(&layout, scene, at);
    }
    if at.y >= bottom(layout.dials) {
        let foot = Foot::of(&layout, scene, view, words);
        return if layout.form != Form::Wide || at.x < right(foot.text) {
            Touched::Ring
        } else {
            on_marks(&layout, scene, view, foot.marks, at.x)
        };
    }
    if at.y < layout.content.top_left.y && at.y >= bottom(layout.headline) {
        return on_date_line(&layout, scene, view, words, at);
    }
    let under = match view {
        View::Valley => valley::day_at(&layout, scene, words, at.x, at.y).map(Touched::Day),
        View::Season => season::day_at(&layout, scene, words, at.x, at.y).map(Touched::Day),
        View::Canals => canals::day_at(&layout, scene, words, at.x, at.y).map(Touched::Day),
        View::Years => many_years::year_at(&layout, scene, words, at.x, at.y).map(Touched::Year),
        _ => None,
    };
    let (wide, edge) = (size.width as i32, (size.width as i32 * EDGE_PERCENT / 100).max(EDGE_PX));
    under.unwrap_or(match at.x {
        x if x < edge => Touched::StepPage(-1),
        x if x >= wide - edge => Touched::StepPage(1),
        _ => Touched::Nothing,
    })
}

fn in_dials(layout: &Layout, scene: &Scene<'_>, at: Point) -> Touched {
    if let Focus::Ring(_) = scene.hand.focus {
        let ring = RingPlace::of(layout);
        return match () {
            () if ring.before.contains(at) => Touched::Step(-1),
            () if ring.after.contains(at) => Touched::Step(1),
            () => Touched::Take,
        };
    }
    if let Some(lead) = lead_place(layout, scene).filter(|lead| lead.contains(at)) {
        return match share_along(lead, at.x) {
            share if share < 1.0 / 3.0 => Touched::Step(-1),
            share if share > 2.0 / 3.0 => Touched::Step(1),
            _ => Touched::Take,
        };
    }
    let found = places(layout, scene).find(|(_, card)| card.contains(at));
    found.map_or(Touched::Nothing, |(index, card)| Touched::Dial { index, card })
}

fn on_date_line(layout: &Layout, scene: &Scene<'_>, view: View, words: &Words, at: Point) -> Touched {
    let line = DateLine::of(layout, scene, words);
    if at.x < right(line.day) + layout.gap {
        return Touched::Play;
    }
    if layout.form != Form::Wide {
        let marks = Foot::of(layout, scene, view, words).marks;
        let reach = layout.gap * 2;
        let around = area(marks.top_left.x - reach, 0, marks.size.width as i32 + 2 * reach, i32::MAX >> 1);
        if around.contains(at) {
            return on_marks(layout, scene, view, marks, at.x);
        }
    }
    if at.x >= line.year.top_left.x - layout.gap { Touched::YearName } else { Touched::Nothing }
}

fn on_marks(layout: &Layout, scene: &Scene<'_>, view: View, marks: Rectangle, x: i32) -> Touched {
    let apart = marks.size.width as i32 / scene.hand.pages.len().max(1) as i32;
    if apart < APART_PX {
        let middle = marks.top_left.x + marks.size.width as i32 / 2;
        return Touched::StepPage(if x < middle { -1 } else { 1 });
    }
    let page = page_at(layout, scene, view, marks, x).and_then(|index| scene.hand.pages.get(index));
    page.map_or(Touched::Nothing, |page| Touched::Page(*page))
}

/// The day at an x of a plot whose values along the bottom are days, within its year.
pub(super) fn day_on(plot: &crate::picture::chart::Plot, scene: &Scene<'_>, x: i32) -> usize {
    // The cast takes what is below zero as zero.
    (plot.across_at(f64::from(x) + 0.5) as usize).min(scene.year.calendar.len().saturating_sub(1))
}
