//! Fingers and mice: what lies under them is what was drawn there, and no tap or drag at all breaks anything.

use deshielo::picture::views::hand::{Focus, Item};
use deshielo::picture::views::touch::{Touched, touched};
use deshielo::picture::views::{Layout, Scene, View as Page};
use deshielo::session::hand::{HandTold, Told};
use deshielo::session::point::{Finger, Phase};
use deshielo::session::*;
use deshielo::water::dials::Dial;
use deshielo::words::Words;
use embedded_graphics::geometry::{Point, Size};

use super::host::{everything, random_event};
use super::scenes::{Land, Play, steep_valley};
use super::valleys::numbers;

const SIZES: [(u32, u32); 7] = [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];
const VIEWS_DRAWN: [View; 7] =
    [View::Valley, View::Season, View::Canals, View::Ledger, View::Years, View::Trust, View::About];

fn land() -> Land {
    Land::new(steep_valley(), 4, 5)
}

/// An offer for the years of the land.
fn offer() -> Offer {
    let mut input = everything();
    input.years = super::host::years(4, numbers(3));
    input.settings.retain(|named| named.setting.year != Some(YearChoice::Any(7)));
    input.views = VIEWS_DRAWN.to_vec();
    Offer::new(input).unwrap()
}

/// A screen with a session on it, as a host holds them.
struct Desk<'a> {
    scene: &'a Scene<'a>,
    words: &'a Words,
    offer: &'a Offer,
    state: State,
    finger: Finger,
    size: Size,
}

impl Desk<'_> {
    /// The scene of the state.
    fn look<T>(&self, look: impl FnOnce(&Scene<'_>) -> T) -> T {
        let voices = ["English".to_owned(), "español".to_owned(), "English + español".to_owned()];
        let told = Told {
            offer: self.offer,
            settings: &[],
            voices: &voices,
            gates: &[],
            words: self.words,
            second: None,
            stale: false,
        };
        let in_hand = HandTold::of(&self.state, &told);
        let shown = self.state.shown();
        let dials = deshielo::session::scene::settings(self.offer, &shown.dials);
        let chosen = dials.iter().position(|setting| Some(setting.dial) == shown.chosen);
        look(&Scene { hand: in_hand.hand(), dials: &dials, chosen, day: shown.day.into(), ..*self.scene })
    }

    /// What lies there.
    fn at(&self, x: i32, y: i32) -> Touched {
        let view = Page::ALL[self.state.shown().view as usize];
        self.look(|scene| touched(self.size, scene, view, self.words, Point::new(x, y)))
    }

    /// Lets a finger do something; gives the needs.
    fn point(&mut self, phase: Phase, x: i32, y: i32) -> Needs {
        let mut finger = self.finger;
        let event =
            self.look(|scene| finger.event((phase, Point::new(x, y)), self.size, &self.state, scene, self.words));
        self.finger = finger;
        self.state.step(event, self.offer)
    }

    fn tap(&mut self, x: i32, y: i32) {
        self.point(Phase::Down, x, y);
        self.point(Phase::Up, x, y);
    }

    /// The middle of what answers to `wanted`, looked for pixel by pixel.
    fn find(&self, wanted: impl Fn(Touched) -> bool) -> Option<(i32, i32)> {
        let view = Page::ALL[self.state.shown().view as usize];
        let (wide, high) = (self.size.width as i32, self.size.height as i32);
        let spots = (0..high).step_by(3).flat_map(|y| (0..wide).step_by(3).map(move |x| (x, y)));
        let hits: Vec<(i32, i32)> = self.look(|scene| {
            let at = |x, y| touched(self.size, scene, view, self.words, Point::new(x, y));
            spots.filter(|(x, y)| wanted(at(*x, *y))).collect()
        });
        hits.get(hits.len() / 2).copied()
    }
}

fn on_every_size(view: View, test: impl Fn(&mut Desk<'_>)) {
    let (words, _) = Words::new("es-US");
    let offer = offer();
    land().show(Play::warm(), |scene| {
        for (width, height) in SIZES {
            let mut state = State::new(&offer);
            state.step(Event::Command(Command::Show(view)), &offer);
            let size = Size::new(width, height);
            test(&mut Desk { scene, words: &words, offer: &offer, state, finger: Finger::default(), size });
        }
    });
}

#[test]
fn a_tap_chooses_a_dial_and_a_drag_turns_it_by_the_way_along_its_card() {
    on_every_size(View::Valley, |desk| {
        let layout = Layout::of(desk.size, false);
        let (x, y) = (layout.dials.top_left.x + 12, layout.dials.top_left.y + 8);
        desk.tap(x, y);
        assert_eq!(desk.state.shown().chosen, Some(Dial::Warming));
        assert_eq!(desk.state.shown().dials.get(Dial::Warming), Some(0.0), "a tap turns nothing");
        desk.point(Phase::Down, x, y);
        desk.point(Phase::Move, x + 10_000, y + 500);
        assert_eq!(desk.state.shown().dials.get(Dial::Warming), Some(6.0), "to the end and no further");
        assert_eq!(desk.state.shown().at_end, Some(End::Last));
        desk.point(Phase::Move, x, y);
        assert_eq!(desk.state.shown().dials.get(Dial::Warming), Some(0.0), "and back to where it was taken in hand");
        desk.point(Phase::Up, x, y);
    });
}

#[test]
fn a_tap_on_a_year_marks_that_day_on_every_page_with_days() {
    for view in [View::Valley, View::Season, View::Canals] {
        on_every_size(view, |desk| {
            let (x, y) = desk.find(|touched| matches!(touched, Touched::Day(_))).expect("the page has days");
            let Touched::Day(day) = desk.at(x, y) else { panic!("a day") };
            desk.tap(x, y);
            assert_eq!(usize::from(desk.state.shown().day), day);
            // Days grow to the right and none is left out by more than the width of a pixel.
            let mut last = 0;
            for x in 0..desk.size.width as i32 {
                if let Touched::Day(day) = desk.at(x, y) {
                    assert!(day >= last && (last == 0 || day - last <= 4), "{view:?} {last} then {day}");
                    last = day;
                }
            }
            assert!(last > 200, "{view:?} ends on day {last}");
        });
    }
}

#[test]
fn a_tap_on_the_many_years_takes_a_year() {
    on_every_size(View::Years, |desk| {
        let (x, y) = desk.find(|touched| touched == Touched::Year(2)).expect("the third year is there");
        desk.tap(x, y);
        assert_eq!(desk.state.shown().year, YearChoice::Any(2));
    });
}

#[test]
fn edges_turn_pages_the_date_plays_and_the_small_knob_opens_the_ring() {
    on_every_size(View::Ledger, |desk| {
        let middle = desk.size.height as i32 / 2;
        desk.tap(desk.size.width as i32 - 3, middle);
        assert_eq!(desk.state.shown().view, View::Years);
        desk.state.step(Event::Command(Command::Show(View::Ledger)), desk.offer);
        desk.tap(2, middle);
        assert_eq!(desk.state.shown().view, View::Canals);
        let layout = Layout::of(desk.size, false);
        desk.tap(layout.margin + 3, layout.date.top_left.y + 4);
        assert!(desk.state.shown().playing);
        desk.tap(layout.margin + 3, layout.date.top_left.y + 4);
        assert!(!desk.state.shown().playing);
        let foot = desk.size.height as i32 - 4;
        desk.tap(layout.margin + 2, foot);
        assert_eq!(desk.state.shown().focus, Focus::Ring(Item::Dial(Dial::Warming)));
        // Right of the thing at hand the ring goes on, in its middle it is taken.
        let (x, y) = (layout.dials.top_left.x, layout.dials.top_left.y + 6);
        let wide = layout.dials.size.width as i32;
        (0..11).for_each(|_| desk.tap(x + 3, y));
        assert_eq!(desk.state.shown().focus, Focus::Ring(Item::Year));
        desk.tap(x + wide / 2, y);
        assert_eq!(desk.state.shown().focus, Focus::In(Item::Year));
        let before = desk.state.shown().year;
        desk.tap(x + 3, y);
        assert_ne!(desk.state.shown().year, before);
        desk.tap(layout.margin + 2, foot);
        assert_eq!(desk.state.shown().focus, Focus::In(Item::Dial(Dial::Warming)));
    });
}

#[test]
fn marks_of_pages_lead_to_their_pages_where_a_finger_can_tell_them_apart() {
    on_every_size(View::Valley, |desk| {
        let shown = desk.find(|touched| touched == Touched::Page(Page::Years));
        assert_eq!(shown.is_some(), desk.size.width >= 1280, "{:?}", desk.size);
        if let Some((x, y)) = shown {
            desk.tap(x, y);
            assert_eq!(desk.state.shown().view, View::Years);
        } else {
            let (x, y) = desk.find(|touched| touched == Touched::StepPage(1)).expect("a way on");
            desk.tap(x, y);
            assert_eq!(desk.state.shown().view, View::Season);
        }
    });
}

#[test]
fn the_list_of_settings_is_tapped_and_left() {
    on_every_size(View::Valley, |desk| {
        desk.state.step(Event::Key(keys::Key::Char('s')), desk.offer);
        // Whatever row is hit, a setting is called up or the list is left; beside it, it is left.
        desk.tap(0, 0);
        assert!(desk.state.shown().focus.is_in_dial());
        desk.state.step(Event::Key(keys::Key::Char('s')), desk.offer);
        let (mut y, mut recalled) = (0, 0);
        while y < desk.size.height as i32 {
            desk.state.step(Event::Key(keys::Key::Char('s')), desk.offer);
            desk.tap(desk.size.width as i32 / 2, y);
            recalled += usize::from(matches!(desk.state.shown().done, Some(Done::Recalled(_))));
            desk.state.step(Event::Command(Command::Close), desk.offer);
            y += 4;
        }
        assert!(recalled >= 3, "{recalled} at {:?}", desk.size);
    });
}

#[test]
fn a_hundred_thousand_events_with_fingers_leave_a_valid_state() {
    assert!(size_of::<State>() + size_of::<Finger>() <= 2048);
    let (words, _) = Words::new("en-US");
    let offer = offer();
    land().show(Play::warm(), |scene| {
        let mut next = numbers(77);
        let size = Size::new(320, 240);
        let mut desk =
            Desk { scene, words: &words, offer: &offer, state: State::new(&offer), finger: Finger::default(), size };
        let (mut x, mut y, mut turned) = (0, 0, 0);
        for _ in 0..100_000 {
            if next() < 0.002 {
                let (width, height) = SIZES[(next() * 7.0) as usize];
                desk.size = Size::new(width, height);
            }
            if next() < 0.3 {
                let phase = [Phase::Down, Phase::Move, Phase::Up, Phase::Up][(next() * 4.0) as usize];
                if phase != Phase::Up {
                    let across = f64::from(desk.size.width);
                    (x, y) = ((next() * across * 1.2) as i32 - 20, (next() * across) as i32 - 20);
                }
                if next() < 0.01 {
                    (x, y) = ([i32::MIN, i32::MAX][(next() * 2.0) as usize], i32::MAX);
                }
                turned += usize::from(desk.point(phase, x, y).stage.is_some());
            } else {
                let event = random_event(&mut next);
                desk.state.step(event, desk.offer);
            }
            assert_eq!(desk.state.check(&offer), Ok(()));
        }
        assert!(turned > 30, "fingers turned dials only {turned} times");
    });
}
