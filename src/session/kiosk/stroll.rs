//! The stroll: what the instrument shows by itself while nobody touches it, unhurried, in each language in turn.

use super::{Order, Orders};
use crate::session::event::Event;
use crate::session::offer::Offer;
use crate::session::view::{Speed, View};
use crate::session::whereabouts::Look;
use crate::session::year::{Third, YearChoice};
use crate::water::dials::Dial;

/// One scene. What the place does not offer is passed over.
#[derive(Clone, Copy, Debug, PartialEq)]
struct Scene {
    /// The message that it says.
    says: &'static str,
    view: View,
    third: Third,
    /// Whether every dial goes back to rest before it.
    at_rest: bool,
    /// The dial that turns, and by how many detents.
    turns: Option<(Dial, i32)>,
    plays: bool,
    /// The day of the water year where it begins: most scenes stand where the snow melts.
    day: u16,
    /// How long it stays, ms; a turning dial adds its time.
    stays_ms: u32,
}

const PLAIN: Scene = Scene {
    says: "stroll-hello",
    view: View::Valley,
    third: Third::Middling,
    at_rest: false,
    turns: None,
    plays: false,
    day: 200,
    stays_ms: 14_000,
};

/// The script. The message of the day, where there is one, follows its last scene.
const SCRIPT: [Scene; 10] = [
    Scene { at_rest: true, day: 160, ..PLAIN },
    Scene { says: "stroll-year", plays: true, day: 0, stays_ms: 33_000, ..PLAIN },
    Scene { says: "stroll-season", view: View::Season, ..PLAIN },
    Scene { says: "stroll-warmer", turns: Some((Dial::Warming, 4)), ..PLAIN },
    Scene { says: "stroll-canals", view: View::Canals, ..PLAIN },
    Scene { says: "stroll-dry", view: View::Canals, third: Third::Dry, ..PLAIN },
    Scene {
        says: "stroll-lining",
        view: View::Canals,
        third: Third::Dry,
        turns: Some((Dial::CanalLining, 5)),
        ..PLAIN
    },
    Scene { says: "stroll-years", view: View::Years, ..PLAIN },
    Scene { says: "stroll-trust", view: View::Trust, at_rest: true, ..PLAIN },
    Scene { says: "stroll-caution", view: View::About, ..PLAIN },
];

/// Before a dial begins to turn, ms.
const BEFORE_TURN_MS: u32 = 4000;
/// From one detent to the next, ms.
const BETWEEN_TURNS_MS: u32 = 1500;
/// How long the message of the day stays, ms.
const MESSAGE_MS: u32 = 14_000;
/// The whole year plays in one scene at this speed, and at the other in battery operation.
const SPEEDS: [Speed; 2] = [Speed::Middling, Speed::Slow];

/// Where the stroll is.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Stroll {
    /// The scene; the script's length stands for the message of the day.
    scene: usize,
    in_scene_ms: u32,
    turned: i32,
    voice: usize,
    /// Since it began, ms.
    pub all_ms: u64,
}

impl Stroll {
    /// Begins with its first scene, in a language.
    pub fn begin(voice: usize, low_power: bool, offer: &Offer, orders: &mut Orders) -> Self {
        let stroll = Self { scene: 0, in_scene_ms: 0, turned: 0, voice, all_ms: 0 };
        stroll.enter(low_power, offer, orders);
        stroll
    }

    /// Time goes by.
    pub fn tick(&mut self, elapsed_ms: u32, has_message: bool, low_power: bool, offer: &Offer, orders: &mut Orders) {
        self.all_ms = self.all_ms.saturating_add(elapsed_ms.into());
        self.in_scene_ms = self.in_scene_ms.saturating_add(elapsed_ms);
        if self.in_scene_ms >= self.stays_ms(low_power) {
            // After a long time away the stroll does not hurry to catch up.
            (self.in_scene_ms, self.turned) = (0, 0);
            self.scene += 1;
            while self.passes_over(has_message, offer) {
                self.scene += 1;
            }
            if self.scene > SCRIPT.len() {
                self.scene = 0;
                self.voice = next_voice(self.voice, offer);
            }
            self.enter(low_power, offer, orders);
            return;
        }
        let Some((dial, detents)) = self.turns() else { return };
        if self.turned < detents && self.in_scene_ms >= self.turn_due_ms() {
            self.turned += 1;
            let event = Event::TurnDial { dial, detents: 1, since_ms: BETWEEN_TURNS_MS };
            orders.give(Order::Session(event));
        }
    }

    /// How long until something happens, ms.
    pub fn due_ms(&self, low_power: bool) -> u32 {
        let turn = self.turns().filter(|(_, detents)| self.turned < *detents).map(|_| self.turn_due_ms());
        let end = self.stays_ms(low_power);
        turn.map_or(end, |turn| turn.min(end)).saturating_sub(self.in_scene_ms)
    }

    /// The message that the scene says; `None` where the message of the day has its turn.
    pub fn says(&self) -> Option<&'static str> {
        SCRIPT.get(self.scene).map(|scene| scene.says)
    }

    /// The dial that the scene turns, once it has begun to.
    pub fn dial(&self) -> Option<Dial> {
        self.turns().filter(|_| self.turned > 0).map(|(dial, _)| dial)
    }

    /// The language.
    pub fn voice(&self) -> usize {
        self.voice
    }

    fn turns(&self) -> Option<(Dial, i32)> {
        SCRIPT.get(self.scene).and_then(|scene| scene.turns)
    }

    fn turn_due_ms(&self) -> u32 {
        BEFORE_TURN_MS + self.turned.unsigned_abs() * BETWEEN_TURNS_MS
    }

    fn stays_ms(&self, low_power: bool) -> u32 {
        let Some(scene) = SCRIPT.get(self.scene) else { return MESSAGE_MS };
        let turning = scene.turns.map_or(0, |(_, detents)| detents.unsigned_abs() * BETWEEN_TURNS_MS);
        // On a battery the year plays at a third of the speed.
        let slower = if scene.plays && low_power { 3 } else { 1 };
        scene.stays_ms * slower + turning
    }

    fn passes_over(&self, has_message: bool, offer: &Offer) -> bool {
        match SCRIPT.get(self.scene) {
            Some(scene) => {
                let dial_missing = scene.turns.is_some_and(|(dial, _)| offer.scale(dial).is_none());
                dial_missing || !offer.views().contains(&scene.view)
            }
            None => self.scene == SCRIPT.len() && !has_message,
        }
    }

    fn enter(&self, low_power: bool, offer: &Offer, orders: &mut Orders) {
        let Some(scene) = SCRIPT.get(self.scene) else { return };
        if scene.at_rest {
            orders.give(Order::Session(Event::LongPress));
        }
        let voice = (self.voice < offer.voices().len()).then_some(self.voice);
        let plays = scene.plays.then_some(SPEEDS[usize::from(low_power)]);
        let (view, year) = (Some(scene.view), Some(YearChoice::Of(scene.third)));
        let look = Look { view, year, day: Some(scene.day), voice, plays };
        orders.give(Order::Look(look));
    }
}

/// The next language that is spoken alone; two at once are for a room, not for a passer-by.
fn next_voice(voice: usize, offer: &Offer) -> usize {
    let voices = offer.voices();
    let after = (voice + 1..voices.len()).chain(0..=voice.min(voices.len() - 1));
    after.into_iter().find(|index| voices[*index].second.is_none()).unwrap_or(0)
}
