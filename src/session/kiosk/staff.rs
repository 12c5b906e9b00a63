//! The staff menu: a PIN, then a list that one knob goes through.

use super::wishes::{Wishes, turned_light, turned_time};
use super::{Order, Orders};
use crate::session::knob::{along, around};

/// Most digits of a PIN that can be typed.
pub const MOST_DIGITS: usize = 8;
/// Wrong PINs before one has to wait.
pub const FREE_TRIES: u32 = 5;

/// The first wait, ms; it doubles with every wrong PIN after it.
const FIRST_WAIT_MS: u32 = 60_000;
/// The longest wait, ms.
const LONGEST_WAIT_MS: u32 = 3_600_000;
/// The wheel has ten digits, then "done" and "back".
const WHEEL: usize = 12;

/// What the wheel of the PIN stands at.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Wheel {
    /// A digit.
    Digit(u8),
    /// The PIN is whole.
    Done,
    /// Take a digit back, or leave where there is none.
    Back,
}

impl Wheel {
    fn at(place: usize) -> Self {
        match place {
            10 => Wheel::Done,
            11 => Wheel::Back,
            digit => Wheel::Digit(digit as u8),
        }
    }
}

/// An entry of the menu.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Entry {
    /// Leave the menu.
    Close,
    /// How the board, its card and its clock are.
    Health,
    /// What was counted.
    Tally,
    /// Show the message of the day, or not.
    Message,
    /// Dim and sleep at night, or not.
    Night,
    /// When night begins.
    NightFrom,
    /// When it ends.
    NightUntil,
    /// How bright the screen is.
    Light,
    /// Save power.
    LowPower,
    /// Say that the clock is right.
    Clock,
    /// Forget the guesses of the lesson.
    ForgetGuesses,
    /// Everything of the visitors as at the first start.
    StartAgain,
    /// End the program.
    End,
}

impl Entry {
    /// All of them, in order.
    pub const ALL: [Entry; 13] = [
        Entry::Close,
        Entry::Health,
        Entry::Tally,
        Entry::Message,
        Entry::Night,
        Entry::NightFrom,
        Entry::NightUntil,
        Entry::Light,
        Entry::LowPower,
        Entry::Clock,
        Entry::ForgetGuesses,
        Entry::StartAgain,
        Entry::End,
    ];

    /// Whether a press takes it in hand, so that turning changes it.
    fn turns(self) -> bool {
        matches!(self, Entry::NightFrom | Entry::NightUntil | Entry::Light)
    }
}

/// The page of the menu that is open.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum StaffPage {
    /// No PIN was ever set, so that the menu stays closed.
    NoPin,
    /// Too many wrong PINs: so many seconds to wait.
    Wait {
        /// Seconds that are left.
        seconds: u32,
    },
    /// The PIN is asked for.
    Pin {
        /// Digits so far.
        digits: u8,
        /// What a press would take.
        wheel: Wheel,
        /// The last PIN was wrong.
        was_wrong: bool,
    },
    /// The list.
    Menu {
        /// The entry at hand.
        at: Entry,
        /// Whether turning changes it.
        in_hand: bool,
    },
    /// How the board is.
    Health,
    /// What was counted.
    Tally,
}

/// What a hand can do in the menu.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Act {
    Turn(i32),
    Press,
    Digit(u8),
    Done,
    Back,
}

#[derive(Clone, Debug, PartialEq)]
enum Page {
    NoPin,
    Pin { digits: heapless::String<MOST_DIGITS>, wheel: usize, was_wrong: bool },
    Menu { at: usize, in_hand: bool },
    Health,
    Tally,
}

/// The menu under way.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Staff {
    page: Page,
}

/// How many wrong PINs there were, and how long to wait after them.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub(super) struct Tries {
    pub wrong: u32,
    pub wait_ms: u32,
}

impl Tries {
    /// So many wrong PINs were kept from before the power went: the wait begins anew.
    pub fn after(wrong: u32) -> Self {
        let doublings = wrong.saturating_sub(FREE_TRIES).min(16);
        let wait_ms = if wrong < FREE_TRIES { 0 } else { (FIRST_WAIT_MS << doublings.min(6)).min(LONGEST_WAIT_MS) };
        Self { wrong, wait_ms }
    }

    pub fn tick(&mut self, elapsed_ms: u32) {
        self.wait_ms = self.wait_ms.saturating_sub(elapsed_ms);
    }
}

impl Staff {
    /// Asks for the PIN, or says that there is none.
    pub fn open(has_pin: bool) -> Self {
        let page = if has_pin { Self::asking(false) } else { Page::NoPin };
        Self { page }
    }

    fn asking(was_wrong: bool) -> Page {
        Page::Pin { digits: heapless::String::new(), wheel: 0, was_wrong }
    }

    /// What is seen of it.
    pub fn shown(&self, tries: Tries) -> StaffPage {
        match &self.page {
            Page::NoPin => StaffPage::NoPin,
            Page::Pin { .. } if tries.wait_ms > 0 => StaffPage::Wait { seconds: tries.wait_ms.div_ceil(1000) },
            Page::Pin { digits, wheel, was_wrong } => {
                StaffPage::Pin { digits: digits.len() as u8, wheel: Wheel::at(*wheel), was_wrong: *was_wrong }
            }
            Page::Menu { at, in_hand } => {
                StaffPage::Menu { at: Entry::ALL.get(*at).copied().unwrap_or(Entry::Close), in_hand: *in_hand }
            }
            Page::Health => StaffPage::Health,
            Page::Tally => StaffPage::Tally,
        }
    }

    /// The digits that were typed.
    pub fn digits(&self) -> &str {
        match &self.page {
            Page::Pin { digits, .. } => digits,
            _ => "",
        }
    }

    /// The host says whether they are the PIN.
    pub fn checked(&mut self, right: bool) {
        if let Page::Pin { .. } = self.page {
            self.page = if right { Page::Menu { at: 0, in_hand: false } } else { Self::asking(true) };
        }
    }

    /// Takes what a hand did; `false` where the menu closes.
    pub fn act(&mut self, act: Act, tries: Tries, wishes: &mut Wishes, orders: &mut Orders) -> bool {
        match &mut self.page {
            Page::NoPin => false,
            Page::Pin { .. } if tries.wait_ms > 0 => !matches!(act, Act::Press | Act::Done | Act::Back),
            Page::Pin { digits, wheel, .. } => {
                let act = match (act, Wheel::at(*wheel)) {
                    (Act::Turn(steps), _) => {
                        *wheel = around(*wheel, WHEEL, steps.into());
                        return true;
                    }
                    (Act::Press, Wheel::Digit(digit)) => Act::Digit(digit),
                    (Act::Press, Wheel::Done) => Act::Done,
                    (Act::Press, Wheel::Back) => Act::Back,
                    (act, _) => act,
                };
                match act {
                    Act::Digit(digit) => {
                        // A digit too many is left out: no PIN is so long.
                        let _ = digits.push(char::from(b'0' + digit.min(9)));
                    }
                    Act::Done if !digits.is_empty() => orders.give(Order::CheckPin),
                    Act::Back => return digits.pop().is_some(),
                    _ => {}
                }
                true
            }
            Page::Health | Page::Tally => {
                if !matches!(act, Act::Turn(_) | Act::Digit(_)) {
                    let entry = if self.page == Page::Health { Entry::Health } else { Entry::Tally };
                    let at = Entry::ALL.iter().position(|other| *other == entry).unwrap_or(0);
                    self.page = Page::Menu { at, in_hand: false };
                }
                true
            }
            Page::Menu { at, in_hand } => {
                let entry = Entry::ALL.get(*at).copied().unwrap_or(Entry::Close);
                match act {
                    Act::Turn(steps) if *in_hand => turn(entry, steps, wishes, orders),
                    Act::Turn(steps) => *at = along(*at, Entry::ALL.len(), steps.into()).0,
                    Act::Back if *in_hand => *in_hand = false,
                    Act::Back => return false,
                    Act::Press | Act::Done if entry.turns() => *in_hand = !*in_hand,
                    Act::Press | Act::Done => return self.take(entry, wishes, orders),
                    Act::Digit(_) => {}
                }
                true
            }
        }
    }

    fn take(&mut self, entry: Entry, wishes: &mut Wishes, orders: &mut Orders) -> bool {
        let switch = match entry {
            Entry::Message => &mut wishes.message_shown,
            Entry::Night => &mut wishes.night.sleeps,
            Entry::LowPower => &mut wishes.low_power,
            Entry::Clock => &mut wishes.clock_is_right,
            Entry::Health => {
                self.page = Page::Health;
                return true;
            }
            Entry::Tally => {
                self.page = Page::Tally;
                return true;
            }
            Entry::ForgetGuesses => {
                orders.give(Order::ForgetGuesses);
                return false;
            }
            Entry::StartAgain => {
                orders.give(Order::StartAgain);
                return false;
            }
            Entry::End => {
                orders.give(Order::End);
                return false;
            }
            Entry::Close | Entry::NightFrom | Entry::NightUntil | Entry::Light => return false,
        };
        *switch = !*switch;
        orders.give(Order::KeepWishes);
        true
    }
}

fn turn(entry: Entry, steps: i32, wishes: &mut Wishes, orders: &mut Orders) {
    match entry {
        Entry::NightFrom => wishes.night.from_minute = turned_time(wishes.night.from_minute, steps),
        Entry::NightUntil => wishes.night.until_minute = turned_time(wishes.night.until_minute, steps),
        Entry::Light => wishes.light_percent = turned_light(wishes.light_percent, steps),
        _ => return,
    }
    orders.give(Order::KeepWishes);
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn waits_double_up_to_an_hour_and_begin_anew_after_a_power_cut() {
        let waits: Vec<u32> =
            [0, 4, 5, 6, 7, 10, 11, 99, u32::MAX].map(|wrong| Tries::after(wrong).wait_ms / 1000).into();
        assert_eq!(waits, [0, 0, 60, 120, 240, 1920, 3600, 3600, 3600]);
    }

    #[test]
    fn one_knob_types_a_pin_and_goes_through_the_whole_menu() {
        let (mut staff, mut wishes) = (Staff::open(true), Wishes::default());
        let mut act = |staff: &mut Staff, act| {
            let mut orders = Orders::default();
            let stays = staff.act(act, Tries::default(), &mut wishes, &mut orders);
            (stays, orders.iter().copied().collect::<Vec<_>>())
        };
        for digit in [4, 7, 1, 1] {
            act(&mut staff, Act::Turn(digit));
            act(&mut staff, Act::Press);
            act(&mut staff, Act::Turn(-digit));
        }
        assert_eq!(staff.digits(), "4711");
        act(&mut staff, Act::Turn(-2));
        assert_eq!(act(&mut staff, Act::Press), (true, vec![Order::CheckPin]));
        staff.checked(true);
        for (index, entry) in Entry::ALL.into_iter().enumerate() {
            let shown = staff.shown(Tries::default());
            assert_eq!(shown, StaffPage::Menu { at: entry, in_hand: false });
            if entry.turns() {
                act(&mut staff, Act::Press);
                assert_eq!(act(&mut staff, Act::Turn(-1)), (true, vec![Order::KeepWishes]), "{index}");
                act(&mut staff, Act::Press);
            }
            act(&mut staff, Act::Turn(1));
        }
        assert_eq!(wishes.night.from_minute, 20 * 60 + 45);
        assert_eq!(wishes.light_percent, 90);
    }

    #[test]
    fn a_wrong_pin_asks_again_and_back_leaves() {
        let (mut staff, mut wishes, mut orders) = (Staff::open(true), Wishes::default(), Orders::default());
        let tries = Tries::default();
        for _ in 0..20 {
            assert!(staff.act(Act::Digit(1), tries, &mut wishes, &mut orders));
        }
        assert_eq!(staff.digits().len(), MOST_DIGITS);
        staff.checked(false);
        assert!(matches!(staff.shown(tries), StaffPage::Pin { digits: 0, was_wrong: true, .. }));
        assert!(!staff.act(Act::Back, tries, &mut wishes, &mut orders));
        assert!(!Staff::open(false).act(Act::Press, tries, &mut wishes, &mut orders));
    }
}
