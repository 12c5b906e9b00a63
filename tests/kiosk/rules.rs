//! The rules of the kiosk one by one: when it strolls, dims, sleeps and wakes, and whom it lets in.

use deshielo::session::kiosk::clock::{Doubt, RELEASED_UNIX_S, Wall};
use deshielo::session::kiosk::staff::{FREE_TRIES, StaffPage};
use deshielo::session::kiosk::{
    ASKS_BEFORE_MS, Hand, Kiosk, LESSON_ENDS_MS, NIGHT_STROLL_MS, Order, Over, STAFF_ENDS_MS, VISIT_ENDS_MS, Wishes,
};
use deshielo::session::{Event, Offer, State};

use super::everything;

/// A kiosk with its session and a clock that can be set.
struct Room {
    offer: Offer,
    state: State,
    kiosk: Kiosk,
    unix_s: i64,
    has_source: bool,
    rest_ms: i64,
    orders: Vec<Order>,
}

impl Room {
    /// At that hour of the day of the release.
    fn at(hour: i64, kiosk: Kiosk) -> Self {
        let offer = Offer::new(everything()).unwrap();
        let state = State::new(&offer);
        let unix_s = RELEASED_UNIX_S + hour * 3600;
        Self { offer, state, kiosk, unix_s, has_source: true, rest_ms: 0, orders: Vec::new() }
    }

    fn obey(&mut self, orders: Vec<Order>) {
        for order in &orders {
            match *order {
                Order::Session(event) => _ = self.state.step(event, &self.offer),
                Order::Look(look) => _ = self.state.look(look, &self.offer),
                _ => {}
            }
        }
        self.orders.extend(orders);
    }

    /// Lets so much time go by, as the kiosk wants its ticks.
    fn wait(&mut self, all_ms: u64) {
        let mut left = all_ms;
        while left > 0 {
            let step = left.min(self.kiosk.due_ms().into()) as u32;
            left -= u64::from(step);
            self.rest_ms += i64::from(step);
            self.unix_s += self.rest_ms / 1000;
            self.rest_ms %= 1000;
            let (day, second) = (self.unix_s.div_euclid(86_400), self.unix_s.rem_euclid(86_400));
            let (local_day, local_minute) = (day as i32, (second / 60) as u16);
            let wall = Wall { unix_s: self.unix_s, local_day, local_minute, has_source: self.has_source };
            self.state.step(Event::Tick { elapsed_ms: step }, &self.offer);
            let orders = self.kiosk.tick(step, Some(wall), &self.offer);
            self.obey(orders.iter().copied().collect());
        }
    }

    /// A hand; whether the session gets it.
    fn hand(&mut self, hand: Hand) -> bool {
        let reaction = self.kiosk.hand(hand);
        self.obey(reaction.orders.iter().copied().collect());
        let shown = *self.state.shown();
        let orders = self.kiosk.noticed(&shown, &shown);
        self.obey(orders.iter().copied().collect());
        reaction.pass
    }

    fn count(&self, wanted: Order) -> usize {
        self.orders.iter().filter(|order| **order == wanted).count()
    }
}

fn kiosk() -> Kiosk {
    Kiosk::new(Wishes::default(), true, 0)
}

#[test]
fn left_alone_it_asks_and_then_strolls_and_a_touch_takes_over() {
    let mut room = Room::at(10, kiosk());
    assert!(room.hand(Hand::Turn(1)), "the first turn already moves the valley");
    room.wait(u64::from(VISIT_ENDS_MS - ASKS_BEFORE_MS) - 1);
    assert_eq!(room.kiosk.over(), Over::Nothing);
    room.wait(1);
    assert_eq!(room.kiosk.over(), Over::AnyoneThere);
    room.hand(Hand::Other);
    assert_eq!(room.kiosk.over(), Over::Nothing, "somebody is");
    room.wait(VISIT_ENDS_MS.into());
    assert!(matches!(room.kiosk.over(), Over::Says { message: "stroll-hello", .. }));
    assert_eq!((room.count(Order::Leave), room.count(Order::CountVisit)), (1, 1));
    for (hand, passes) in [(Hand::Press, false), (Hand::Turn(-1), true), (Hand::Other, true)] {
        assert_eq!(room.hand(hand), passes, "{hand:?}");
        assert_eq!(room.kiosk.over(), Over::Nothing);
        room.wait(VISIT_ENDS_MS.into());
    }
    assert_eq!(room.count(Order::CountVisit), 4);
}

#[test]
fn a_lesson_has_more_patience() {
    let mut room = Room::at(10, kiosk());
    room.hand(Hand::Turn(1));
    room.kiosk.set_lesson(true);
    room.wait(u64::from(LESSON_ENDS_MS) - 1);
    assert!(!room.kiosk.strolls());
    room.wait(1);
    assert!(room.kiosk.strolls());
}

#[test]
fn at_night_it_dims_then_sleeps_and_wakes_in_the_morning() {
    let mut room = Room::at(20, kiosk());
    room.wait(u64::from(VISIT_ENDS_MS));
    assert_eq!((room.kiosk.strolls(), room.kiosk.light_percent()), (true, 100));
    // After nine the stroll is dim, and ten minutes later all is dark.
    room.wait(3_600_000);
    assert_eq!((room.kiosk.strolls(), room.kiosk.light_percent()), (true, 20));
    room.wait(NIGHT_STROLL_MS);
    assert_eq!(room.kiosk.over(), Over::Dark);
    assert_eq!(room.kiosk.light_percent(), 0);
    assert!(!room.state.shown().playing, "nothing plays in the dark");
    assert!(!room.hand(Hand::Turn(1)), "a touch in the dark only wakes it");
    assert_eq!((room.kiosk.over(), room.kiosk.light_percent()), (Over::Nothing, 100));
    room.wait(u64::from(VISIT_ENDS_MS) + 1000);
    assert_eq!((room.kiosk.strolls(), room.kiosk.light_percent()), (true, 20));
    room.wait(NIGHT_STROLL_MS + 20_000);
    assert_eq!(room.kiosk.over(), Over::Dark);
    assert!(room.kiosk.due_ms() >= 1000, "nearly without waking");
    let to_seven = RELEASED_UNIX_S + (24 + 7) * 3600 - room.unix_s;
    room.wait(to_seven as u64 * 1000 - 30_000);
    assert_eq!(room.kiosk.over(), Over::Dark);
    room.wait(60_000);
    assert!(room.kiosk.strolls());
}

#[test]
fn without_a_clock_to_believe_it_never_sleeps_and_a_doubt_wakes_it() {
    let mut unsourced = Room::at(22, kiosk());
    unsourced.has_source = false;
    unsourced.wait(4 * 3_600_000);
    assert_eq!((unsourced.kiosk.clock(), unsourced.kiosk.light_percent()), (Err(Doubt::NoSource), 100));
    assert!(unsourced.kiosk.strolls());
    let mut early = Room::at(22, kiosk());
    early.unix_s = 22 * 3600;
    early.wait(4 * 3_600_000);
    assert_eq!((early.kiosk.clock(), early.kiosk.strolls()), (Err(Doubt::Year), true));
    let trusted = Wishes { clock_is_right: true, ..Wishes::default() };
    let mut told = Room::at(22, Kiosk::new(trusted, true, 0));
    told.has_source = false;
    told.wait(3_600_000);
    assert_eq!(told.kiosk.over(), Over::Dark, "the staff said that it is right");
    told.unix_s -= 5 * 3600;
    told.wait(5000);
    assert!(told.kiosk.strolls(), "it jumped");
}

#[test]
fn a_battery_lasts_longer_with_less_light_and_fewer_pictures() {
    let play_ticks = |low_power| {
        let mut room = Room::at(10, Kiosk::new(Wishes { low_power, ..Wishes::default() }, true, 0).left_alone());
        room.wait(20_000);
        assert!(room.state.shown().playing, "the year plays in the second scene");
        (room.state.shown().speed.days_per_second(), room.kiosk.light_percent())
    };
    assert_eq!((play_ticks(false), play_ticks(true)), ((12, 100), (4, 60)));
}

#[test]
fn three_holds_and_the_pin_open_the_menu_and_guessing_takes_hours() {
    let mut room = Room::at(10, kiosk());
    let knock = |room: &mut Room| (0..3).for_each(|_| _ = room.hand(Hand::Hold));
    let page = |room: &Room| match room.kiosk.over() {
        Over::Staff(page) => Some(page),
        _ => None,
    };
    knock(&mut room);
    assert!(matches!(page(&room), Some(StaffPage::Pin { .. })));
    room.wait(STAFF_ENDS_MS.into());
    assert_eq!(page(&room), None, "left alone it closes");
    knock(&mut room);
    for wrong in 1..=FREE_TRIES {
        [4, 2, 4, 2].into_iter().for_each(|digit| _ = room.hand(Hand::Digit(digit)));
        room.hand(Hand::Enter);
        assert_eq!(room.count(Order::CheckPin), wrong as usize);
        assert_eq!(room.kiosk.pin_digits(), "4242");
        let orders = room.kiosk.pin_checked(false);
        assert_eq!(orders.iter().copied().collect::<Vec<_>>(), [Order::KeepWrongPins(wrong)]);
    }
    assert!(matches!(page(&room), Some(StaffPage::Wait { seconds: 60 })));
    room.hand(Hand::Digit(1));
    room.hand(Hand::Turn(1));
    assert!(matches!(page(&room), Some(StaffPage::Wait { .. })), "nothing can be typed");
    // The power goes and comes: the wait begins anew, and not the tries.
    let mut again = Room::at(10, Kiosk::new(Wishes::default(), true, FREE_TRIES));
    knock(&mut again);
    assert!(matches!(page(&again), Some(StaffPage::Wait { seconds: 60 })));
    again.wait(60_000);
    again.hand(Hand::Other);
    knock(&mut again);
    [4, 7, 1, 1].into_iter().for_each(|digit| _ = again.hand(Hand::Digit(digit)));
    again.hand(Hand::Enter);
    assert_eq!(again.kiosk.pin_checked(true).iter().copied().collect::<Vec<_>>(), [Order::KeepWrongPins(0)]);
    assert!(matches!(page(&again), Some(StaffPage::Menu { .. })));
    // A thousand tries at that pace, at the longest wait of an hour, are six weeks.
    assert!(!room.hand(Hand::Back) && page(&room).is_none());

    let mut closed = Room::at(10, Kiosk::new(Wishes::default(), false, 0));
    closed.hand(Hand::Corner);
    assert_eq!(page(&closed), Some(StaffPage::NoPin));
    closed.hand(Hand::Press);
    assert_eq!(page(&closed), None);
}
