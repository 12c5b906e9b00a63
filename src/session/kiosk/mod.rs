//! The unattended instrument: strolls by itself, gives way to whoever touches it, dims and sleeps at night, and lets the
//! staff in.
//!
//! A value of fixed size without files, words or a clock of its own: hands and ticks in, [`Orders`] to the host out. The
//! host passes hands on to the session where [`Reaction::pass`] says so, carries out the orders, and tells what the
//! session shows afterwards ([`Kiosk::noticed`]), from which the use is counted.
//!
//! * **Visit**: from a touch until nothing was touched for two minutes (a quarter of an hour while a lesson is under way).
//!   Shortly before the end it asks whether anyone is there. Then everything goes back to rest.
//! * **Stroll**: the script of `stroll`. A turn, a key or a finger takes over just where it is; a press only takes over.
//! * **Night**, only while the clock is believed ([`clock`]): the stroll is dim, and after ten minutes it sleeps, dark and
//!   nearly without waking. A touch wakes it and does nothing else. Should the clock become doubtful, it wakes.
//! * **Staff**: three holds in a row, or a finger held in the corner, then a PIN.

pub mod clock;
mod knock;
pub mod staff;
mod stroll;
pub mod wishes;

use super::event::Event;
use super::offer::Offer;
use super::state::Shown;
use super::view::View;
use super::whereabouts::Look;
use crate::water::dials::{DIALS, Dial};
use clock::{Belief, Doubt, Wall};
use knock::Knock;
use staff::{Act, Staff, StaffPage, Tries};
use stroll::Stroll;
pub use wishes::{Night, Wishes};

/// Left alone so long a visit is over, ms.
pub const VISIT_ENDS_MS: u32 = 120_000;
/// The same while a lesson is under way: a class talks longer than it turns.
pub const LESSON_ENDS_MS: u32 = 900_000;
/// So long before the end it asks whether anyone is there, ms.
pub const ASKS_BEFORE_MS: u32 = 15_000;
/// Left alone so long the staff menu closes, ms.
pub const STAFF_ENDS_MS: u32 = 60_000;
/// It strolls so long at night before it sleeps, ms.
pub const NIGHT_STROLL_MS: u64 = 600_000;

/// The longest time without a tick, awake and asleep, ms: the clock has to be looked at, and the watchdog fed.
const LONGEST_TICK_MS: u32 = 5000;
/// Backlight of the stroll at night, percent.
const DIM_PERCENT: u8 = 20;

/// What a hand did, as far as the kiosk has to know.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Hand {
    /// The knob was turned, or an arrow key pressed.
    Turn(i32),
    /// The button.
    Press,
    /// The enter key: like the button, but after digits that were typed it ends them.
    Enter,
    /// The button was held.
    Hold,
    /// A digit was typed.
    Digit(u8),
    /// Escape.
    Back,
    /// A key that stands for a hold, for boards with a keyboard alone.
    StaffKey,
    /// A finger was held in the corner long enough to mean it.
    Corner,
    /// Anything else that a person does.
    Other,
}

/// Something to be counted.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Count<'a> {
    /// A visit.
    Visit,
    /// Minutes of a visit.
    Minutes(u32),
    /// A view was opened in a visit.
    View(View),
    /// A dial was turned in a visit.
    Dial(Dial),
    /// A language was shown in a visit, by its tag.
    Language(&'a str),
    /// A lesson was begun in a visit, by its key.
    Lesson(&'a str),
}

/// What the host has to do.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Order {
    /// Send this to the session.
    Session(Event),
    /// Show this.
    Look(Look),
    /// A visit is over: the lesson ends, what was set goes back to rest, and what is kept is brought to the card.
    Leave,
    /// Count a visit.
    CountVisit,
    /// Count the minutes of one.
    CountMinutes(u32),
    /// Count a view.
    CountView(View),
    /// Count a dial.
    CountDial(Dial),
    /// Count the language at this index of the offer.
    CountVoice(usize),
    /// Check [`Kiosk::pin_digits`] and answer with [`Kiosk::pin_checked`].
    CheckPin,
    /// Keep the wishes.
    KeepWishes,
    /// Keep how many wrong PINs there were.
    KeepWrongPins(u32),
    /// Forget the guesses.
    ForgetGuesses,
    /// Forget where the visitors were and their settings.
    StartAgain,
    /// End the program.
    End,
}

/// Most orders that one event can give: every dial and view of a setting that was called up, and a few more.
const MOST_ORDERS: usize = DIALS + 8;

/// Orders in the order in which they are to be carried out.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Orders(heapless::Vec<Order, MOST_ORDERS>);

impl Orders {
    pub(self) fn give(&mut self, order: Order) {
        // There is room for all that one event can give.
        let _ = self.0.push(order);
    }

    /// One after the other.
    pub fn iter(&self) -> impl Iterator<Item = &Order> {
        self.0.iter()
    }
}

/// What comes of a hand.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Reaction {
    /// Whether the session gets it too.
    pub pass: bool,
    /// What has to be done, before it is passed on.
    pub orders: Orders,
}

/// What lies over the page.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Over {
    /// Nothing.
    Nothing,
    /// The question whether anyone is there.
    AnyoneThere,
    /// A line of the stroll.
    Says {
        /// The message.
        message: &'static str,
        /// The dial that turns by itself.
        dial: Option<Dial>,
    },
    /// The message of the day.
    MessageOfDay,
    /// The staff menu.
    Staff(StaffPage),
    /// Everything is dark.
    Dark,
}

#[derive(Clone, Debug, PartialEq)]
enum Phase {
    Visit { idle_ms: u32 },
    Stroll(Stroll),
    Asleep,
    Staff { staff: Staff, idle_ms: u32 },
}

/// What was used in a visit, so that it counts once.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
struct Used {
    /// Whether the visit itself was counted: what goes on after a restart is none before the first touch.
    is_counted: bool,
    all_ms: u32,
    views: u16,
    dials: u16,
    voices: u32,
}

/// The kiosk.
#[derive(Clone, Debug, PartialEq)]
pub struct Kiosk {
    wishes: Wishes,
    phase: Phase,
    belief: Belief,
    knock: Knock,
    tries: Tries,
    used: Used,
    voice: usize,
    has_pin: bool,
    has_lesson: bool,
    has_message: bool,
}

impl Kiosk {
    /// A kiosk that goes on where it was: it takes whoever set it up for a visitor who is not counted, so that a restart
    /// shows at once what was there before.
    pub fn new(wishes: Wishes, has_pin: bool, wrong_pins: u32) -> Self {
        Self {
            wishes: wishes.sound(),
            phase: Phase::Visit { idle_ms: 0 },
            belief: Belief::default(),
            knock: Knock::default(),
            tries: Tries::after(wrong_pins),
            used: Used::default(),
            voice: 0,
            has_pin,
            has_lesson: false,
            has_message: false,
        }
    }

    /// The same for one that was left alone before the power went: it strolls at once.
    #[must_use]
    pub fn left_alone(self) -> Self {
        Self { phase: Phase::Visit { idle_ms: VISIT_ENDS_MS }, ..self }
    }

    /// A lesson is under way, or is over.
    pub fn set_lesson(&mut self, under_way: bool) {
        self.has_lesson = under_way;
    }

    /// There is a message of the day in the language at hand, or not.
    pub fn set_message(&mut self, there: bool) {
        self.has_message = there;
    }

    /// What the staff wishes.
    pub fn wishes(&self) -> &Wishes {
        &self.wishes
    }

    /// The digits of the PIN that was typed.
    pub fn pin_digits(&self) -> &str {
        match &self.phase {
            Phase::Staff { staff, .. } => staff.digits(),
            _ => "",
        }
    }

    /// Answers [`Order::CheckPin`].
    pub fn pin_checked(&mut self, right: bool) -> Orders {
        let mut orders = Orders::default();
        if let Phase::Staff { staff, .. } = &mut self.phase {
            let wrong = if right { 0 } else { self.tries.wrong.saturating_add(1) };
            if wrong != self.tries.wrong {
                orders.give(Order::KeepWrongPins(wrong));
            }
            self.tries = Tries::after(wrong);
            staff.checked(right);
        }
        orders
    }

    /// The clock, where it is believed.
    ///
    /// # Errors
    /// Why it is not.
    pub fn clock(&self) -> Result<Wall, Doubt> {
        self.belief.wall(self.wishes.clock_is_right)
    }

    /// What lies over the page.
    pub fn over(&self) -> Over {
        match &self.phase {
            Phase::Visit { idle_ms } if self.used.is_counted && self.visit_left_ms(*idle_ms) <= ASKS_BEFORE_MS => {
                Over::AnyoneThere
            }
            Phase::Visit { .. } => Over::Nothing,
            Phase::Stroll(stroll) => match stroll.says() {
                Some(message) => Over::Says { message, dial: stroll.dial() },
                None => Over::MessageOfDay,
            },
            Phase::Asleep => Over::Dark,
            Phase::Staff { staff, .. } => Over::Staff(staff.shown(self.tries)),
        }
    }

    /// Whether a visitor has it in hand.
    pub fn is_visit(&self) -> bool {
        matches!(self.phase, Phase::Visit { .. })
    }

    /// Whether it strolls.
    pub fn strolls(&self) -> bool {
        matches!(self.phase, Phase::Stroll(_))
    }

    /// How bright the backlight should be, percent; 0 is off.
    pub fn light_percent(&self) -> u8 {
        let full = self.wishes.light_percent;
        match &self.phase {
            Phase::Asleep => 0,
            Phase::Stroll(_) if self.is_night() => full.min(DIM_PERCENT),
            Phase::Stroll(_) if self.wishes.low_power => full / 5 * 3,
            _ => full,
        }
    }

    /// How long nothing happens by itself, ms. Playing needs ticks of its own.
    pub fn due_ms(&self) -> u32 {
        let due = match &self.phase {
            Phase::Visit { idle_ms } => match self.visit_left_ms(*idle_ms) {
                left if left > ASKS_BEFORE_MS => left - ASKS_BEFORE_MS,
                left => left,
            },
            Phase::Stroll(stroll) => stroll.due_ms(self.wishes.low_power),
            Phase::Asleep => LONGEST_TICK_MS,
            // The seconds of a wait are counted on the screen.
            Phase::Staff { .. } if self.tries.wait_ms > 0 => 1000,
            Phase::Staff { idle_ms, .. } => STAFF_ENDS_MS.saturating_sub(*idle_ms),
        };
        due.clamp(1, LONGEST_TICK_MS)
    }

    /// Time goes by. `wall` is the clock as it says now.
    pub fn tick(&mut self, elapsed_ms: u32, wall: Option<Wall>, offer: &Offer) -> Orders {
        let mut orders = Orders::default();
        self.belief.tick(elapsed_ms, wall);
        self.knock.tick(elapsed_ms);
        self.tries.tick(elapsed_ms);
        let is_night = self.is_night();
        match &mut self.phase {
            Phase::Visit { idle_ms } => {
                *idle_ms = idle_ms.saturating_add(elapsed_ms);
                self.used.all_ms = self.used.all_ms.saturating_add(elapsed_ms);
                let idle_ms = *idle_ms;
                if self.visit_left_ms(idle_ms) == 0 {
                    self.end_visit(idle_ms, offer, &mut orders);
                }
            }
            Phase::Stroll(stroll) => {
                stroll.tick(
                    elapsed_ms,
                    self.has_message && self.wishes.message_shown,
                    self.wishes.low_power,
                    offer,
                    &mut orders,
                );
                self.voice = stroll.voice();
                if !is_night {
                    // Ten minutes count from dusk, or from the last visit.
                    stroll.all_ms = 0;
                } else if stroll.all_ms >= NIGHT_STROLL_MS {
                    self.phase = Phase::Asleep;
                    // Nothing plays in the dark.
                    orders.give(Order::Session(Event::LongPress));
                }
            }
            Phase::Asleep if !is_night => self.stroll(offer, &mut orders),
            Phase::Asleep => {}
            Phase::Staff { idle_ms, .. } => {
                *idle_ms = idle_ms.saturating_add(elapsed_ms);
                if *idle_ms >= STAFF_ENDS_MS && self.tries.wait_ms == 0 || *idle_ms >= VISIT_ENDS_MS {
                    self.phase = Phase::Visit { idle_ms: 0 };
                }
            }
        }
        orders
    }

    /// A hand did something.
    pub fn hand(&mut self, hand: Hand) -> Reaction {
        let mut reaction = Reaction::default();
        let knocks = match hand {
            Hand::Hold | Hand::StaffKey => self.knock.hold(),
            Hand::Corner => true,
            _ => {
                self.knock.other();
                false
            }
        };
        match &mut self.phase {
            Phase::Staff { staff, idle_ms } => {
                *idle_ms = 0;
                let act = match hand {
                    Hand::Turn(steps) => Act::Turn(steps),
                    Hand::Press => Act::Press,
                    Hand::Enter => Act::Done,
                    Hand::Digit(digit) => Act::Digit(digit),
                    Hand::Back | Hand::Hold => Act::Back,
                    Hand::StaffKey | Hand::Corner | Hand::Other => return reaction,
                };
                let stays = staff.act(act, self.tries, &mut self.wishes, &mut reaction.orders);
                if !stays {
                    self.phase = Phase::Visit { idle_ms: 0 };
                }
                return reaction;
            }
            Phase::Visit { idle_ms } => {
                // The first touch after a restart begins a visit as well.
                *idle_ms = 0;
                reaction.pass = true;
                if !self.used.is_counted {
                    self.used.is_counted = true;
                    reaction.orders.give(Order::CountVisit);
                }
            }
            Phase::Stroll(_) | Phase::Asleep => {
                let in_the_dark = self.phase == Phase::Asleep;
                reaction.pass = !in_the_dark && !matches!(hand, Hand::Press | Hand::Enter | Hand::Hold);
                self.used = Used { is_counted: true, ..Used::default() };
                self.phase = Phase::Visit { idle_ms: 0 };
                reaction.orders.give(Order::CountVisit);
            }
        }
        if knocks {
            self.phase = Phase::Staff { staff: Staff::open(self.has_pin), idle_ms: 0 };
            reaction.pass = false;
        }
        reaction
    }

    /// What the session showed before a hand and shows after it: what is new in this visit is counted.
    pub fn noticed(&mut self, before: &Shown, after: &Shown) -> Orders {
        let mut orders = Orders::default();
        if !self.is_visit() {
            return orders;
        }
        self.voice = after.voice;
        let mut first = |bits: &mut u16, index: usize, order| {
            let bit = 1 << index;
            if *bits & bit == 0 {
                *bits |= bit;
                orders.give(order);
            }
        };
        first(&mut self.used.views, after.view as usize, Order::CountView(after.view));
        for dial in Dial::ALL {
            if before.dials.get(dial) != after.dials.get(dial) {
                first(&mut self.used.dials, dial as usize, Order::CountDial(dial));
            }
        }
        let bit = 1_u32.checked_shl(after.voice as u32).unwrap_or(0);
        if self.used.voices & bit == 0 {
            self.used.voices |= bit;
            orders.give(Order::CountVoice(after.voice));
        }
        orders
    }

    fn visit_left_ms(&self, idle_ms: u32) -> u32 {
        let whole = if self.has_lesson { LESSON_ENDS_MS } else { VISIT_ENDS_MS };
        whole.saturating_sub(idle_ms)
    }

    fn end_visit(&mut self, idle_ms: u32, offer: &Offer, orders: &mut Orders) {
        if self.used.is_counted {
            // Nobody was there while it was left alone.
            let minutes = self.used.all_ms.saturating_sub(idle_ms).saturating_add(30_000) / 60_000;
            orders.give(Order::CountMinutes(minutes));
        }
        orders.give(Order::Leave);
        self.has_lesson = false;
        self.stroll(offer, orders);
    }

    fn stroll(&mut self, offer: &Offer, orders: &mut Orders) {
        self.used = Used::default();
        // The last visitor's language, where it is one alone.
        let alone = offer.voices().get(self.voice).is_some_and(|voice| voice.second.is_none());
        let voice = if alone { self.voice } else { 0 };
        self.phase = Phase::Stroll(Stroll::begin(voice, self.wishes.low_power, offer, orders));
    }

    fn is_night(&self) -> bool {
        self.clock().is_ok_and(|wall| self.wishes.night.holds(wall.local_minute))
    }
}
