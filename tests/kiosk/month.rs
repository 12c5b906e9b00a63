//! A month of the kiosk under a clock of our own: hands at random, nights, power cuts, a clock that jumps.

use std::collections::BTreeMap;

use deshielo::keep::{Folder, Keep, Settings, Tally};
use deshielo::session::kiosk::clock::{RELEASED_UNIX_S, Wall};
use deshielo::session::kiosk::{Count, Hand, Kiosk, Order, Orders, Over, Wishes};
use deshielo::session::{Event, Offer, State};

use super::{everything, held_bytes, random_event};

/// The host of the tests: what `show --kiosk` does, without screens.
struct Host {
    offer: Offer,
    state: State,
    kiosk: Kiosk,
    keep: Keep<Folder>,
    settings: Settings,
    tally: Tally,
    wakes: BTreeMap<&'static str, (u64, u64)>,
    saves: u32,
    visits: u32,
    scenes: BTreeMap<&'static str, u32>,
    voices: [u32; 3],
}

impl Host {
    fn start(folder: &std::path::Path) -> Self {
        let offer = Offer::new(everything()).unwrap();
        let mut keep = Keep::new(Folder::new(folder.to_owned()));
        let (settings, tally) = (keep.settings(), keep.tally());
        assert_eq!(keep.take_notes(), []);
        let mut state = State::new(&offer);
        if let Some(whereabouts) = &settings.whereabouts {
            state.return_to(whereabouts, &offer);
        }
        let kiosk = Kiosk::new(settings.wishes, settings.pin.is_some(), settings.wrong_pins);
        let (wakes, scenes) = (BTreeMap::new(), BTreeMap::new());
        Self { offer, state, kiosk, keep, settings, tally, wakes, saves: 0, visits: 0, scenes, voices: [0; 3] }
    }

    fn obey(&mut self, orders: &Orders) {
        let day = self.kiosk.clock().ok().map(|wall| wall.local_day);
        for order in orders.iter() {
            match *order {
                Order::Session(event) => _ = self.state.step(event, &self.offer),
                Order::Look(look) => _ = self.state.look(look, &self.offer),
                Order::Leave => {
                    self.state.step(Event::LongPress, &self.offer);
                    self.save();
                }
                Order::CountVisit => {
                    self.visits += 1;
                    self.tally.add(&Count::Visit, day);
                }
                Order::CountMinutes(minutes) => self.tally.add(&Count::Minutes(minutes), day),
                Order::CountView(view) => self.tally.add(&Count::View(view), day),
                Order::CountDial(dial) => self.tally.add(&Count::Dial(dial), day),
                Order::CountVoice(voice) => {
                    let tag = self.offer.voices()[voice].first.clone();
                    self.tally.add(&Count::Language(&tag), day);
                }
                Order::KeepWishes => self.settings.wishes = *self.kiosk.wishes(),
                Order::KeepWrongPins(wrong) => self.settings.wrong_pins = wrong,
                Order::CheckPin => drop(self.kiosk.pin_checked(false)),
                Order::ForgetGuesses | Order::StartAgain | Order::End => {}
            }
        }
    }

    fn save(&mut self) {
        self.settings.whereabouts = Some(self.state.whereabouts(&self.offer));
        assert_eq!(self.keep.keep_settings(&self.settings), None);
        assert_eq!(self.keep.keep_tally(&self.tally), None);
        self.saves += 1;
    }

    /// Bytes in hand without the tally, which grows with its days up to a bound of its own.
    fn held_beside_tally(&mut self) -> isize {
        assert_eq!(self.keep.keep_tally(&self.tally), None);
        drop(std::mem::take(&mut self.tally));
        let held = held_bytes();
        self.tally = self.keep.tally();
        held
    }

    fn tick(&mut self, elapsed_ms: u32, wall: Option<Wall>) {
        self.state.step(Event::Tick { elapsed_ms }, &self.offer);
        let orders = self.kiosk.tick(elapsed_ms, wall, &self.offer);
        self.obey(&orders);
        let mode = match self.kiosk.over() {
            Over::Dark => "dark",
            Over::Says { message, .. } => {
                *self.scenes.entry(message).or_default() += 1;
                self.voices[self.state.shown().voice] += 1;
                "stroll"
            }
            Over::MessageOfDay => "stroll",
            Over::Nothing | Over::AnyoneThere => "visit",
            Over::Staff(_) => "staff",
        };
        let (wakes, all_ms) = self.wakes.entry(mode).or_default();
        (*wakes, *all_ms) = (*wakes + 1, *all_ms + u64::from(elapsed_ms));
    }

    fn hand(&mut self, hand: Hand, event: Event) {
        let reaction = self.kiosk.hand(hand);
        self.obey(&reaction.orders);
        let before = *self.state.shown();
        if reaction.pass {
            self.state.step(event, &self.offer);
        }
        let orders = self.kiosk.noticed(&before, self.state.shown());
        self.obey(&orders);
    }

    /// How long the host may sleep, ms: until the kiosk or a playing year wants it.
    fn sleeps_ms(&self) -> u32 {
        let shown = self.state.shown();
        let plays = shown.playing.then(|| 1000 / shown.speed.days_per_second());
        plays.unwrap_or(u32::MAX).min(self.kiosk.due_ms())
    }
}

/// The clock of a board with a battery clock, in a land without offsets.
fn wall(real_s: i64) -> Wall {
    let local_day = real_s.div_euclid(86_400) as i32;
    Wall { unix_s: real_s, local_day, local_minute: (real_s.rem_euclid(86_400) / 60) as u16, has_source: true }
}

const DAYS: i64 = 30;

#[test]
fn a_month_of_hands_nights_and_power_cuts() {
    let folder = tempfile::tempdir().unwrap();
    let mut next = super::valleys::numbers(2026);
    let mut host = Host::start(folder.path());
    let (mut wakes, mut saves, mut visits, mut voices) = (BTreeMap::<_, (u64, u64)>::new(), 0, 0, [0; 3]);
    let mut scenes = BTreeMap::<&str, u32>::new();
    let start_ms: i64 = (RELEASED_UNIX_S + 9 * 3600) * 1000;
    let (mut now_ms, mut events, mut most_bytes, mut wrong_by_s) = (start_ms, 0_u64, 0_u64, 0);
    let mut settled = None;
    let mut cuts = 0;
    while now_ms < start_ms + DAYS * 86_400_000 {
        let day = (now_ms - start_ms) / 86_400_000;
        let hour = now_ms.rem_euclid(86_400_000) / 3_600_000;
        // Visitors come by day, in bursts; a few mash every button.
        if (9..17).contains(&hour) && next() < 0.002 {
            for _ in 0..(next() * 1500.0) as u32 {
                let (hand, event) = match (next() * 8.0) as u32 {
                    0 => (Hand::Press, Event::Press),
                    1 if next() < 0.3 => (Hand::Hold, Event::LongPress),
                    2 => (Hand::Digit((next() * 10.0) as u8), Event::Press),
                    3 => (Hand::Other, random_event(&mut next)),
                    4 => (Hand::Back, Event::Press),
                    _ => {
                        let detents = (next() * 5.0) as i32 - 2;
                        (Hand::Turn(detents), Event::Turn { detents, since_ms: 80 })
                    }
                };
                host.hand(hand, event);
                let pause = (next() * next() * 900.0) as u32;
                host.tick(pause, Some(wall(now_ms / 1000 + wrong_by_s)));
                now_ms += i64::from(pause);
                events += 2;
            }
        }
        let sleeps = host.sleeps_ms();
        assert!(sleeps > 0);
        now_ms += i64::from(sleeps);
        host.tick(sleeps, Some(wall(now_ms / 1000 + wrong_by_s)));
        events += 1;
        if next() < 2e-5 {
            // The clock jumps, by up to a year either way, and may jump back.
            wrong_by_s = if wrong_by_s == 0 { ((next() - 0.3) * 3.0e7) as i64 } else { 0 };
        }
        if next() < 1e-5 {
            // The power goes; what is on the card is all that comes back.
            let before = host.state.whereabouts(&host.offer);
            let was_saved = host.settings.whereabouts.as_ref() == Some(&before);
            cuts += 1;
            host.wakes.iter().for_each(|(mode, (count, ms))| {
                let all = wakes.entry(*mode).or_default();
                *all = (all.0 + count, all.1 + ms);
            });
            host.scenes.iter().for_each(|(scene, count)| *scenes.entry(scene).or_default() += count);
            (0..3).for_each(|voice| voices[voice] += host.voices[voice]);
            (saves, visits) = (saves + host.saves, visits + host.visits);
            host = Host::start(folder.path());
            assert!(!was_saved || host.state.whereabouts(&host.offer) == before);
        }
        if day >= 8 && settled.is_none() {
            settled = Some(host.held_beside_tally());
        }
        if events % 4096 == 0 {
            let files = std::fs::read_dir(folder.path()).unwrap();
            most_bytes = most_bytes.max(files.map(|file| file.unwrap().metadata().unwrap().len()).sum());
        }
    }
    host.wakes.iter().for_each(|(mode, (count, ms))| {
        let all = wakes.entry(*mode).or_default();
        *all = (all.0 + count, all.1 + ms);
    });
    host.scenes.iter().for_each(|(scene, count)| *scenes.entry(scene).or_default() += count);
    (0..3).for_each(|voice| voices[voice] += host.voices[voice]);
    let (saves, visits) = (saves + host.saves, visits + host.visits);
    let grown = host.held_beside_tally() - settled.unwrap();
    println!(
        "{events} events, {visits} visits, {saves} saves, {cuts} cuts, {most_bytes} bytes on the card, {grown} bytes grown"
    );
    println!("wakes {wakes:?}\nscenes {scenes:?}\nvoices {voices:?}");
    assert!(events > 1_000_000, "{events}");
    assert!(grown < 4096, "{grown} bytes more than after the first week");
    assert!(most_bytes < 120_000, "{most_bytes}");
    let per_second = |mode: &str| wakes[mode].0 as f64 * 1000.0 / wakes[mode].1 as f64;
    assert!(wakes["dark"].1 > 100 * 3_600_000 && per_second("dark") <= 0.5, "{wakes:?}");
    assert!(wakes["stroll"].1 > 100 * 3_600_000 && per_second("stroll") <= 6.0, "{wakes:?}");
    // Never a save more often than a visit ends.
    assert!(saves <= visits + cuts + 1 && visits > 50, "{saves} saves, {visits} visits");
    assert_eq!(scenes.len(), 10, "every scene: {scenes:?}");
    assert!(voices[0] > 0 && voices[1] * 2 > voices[0] && voices[0] * 2 > voices[1] && voices[2] == 0, "{voices:?}");
    let counted = host.keep.tally().sum(None, None).visits;
    assert!(counted > 0 && counted <= visits, "{counted} of {visits}");
}

#[test]
fn a_stroll_of_a_day_holds_not_one_byte_more() {
    let offer = Offer::new(everything()).unwrap();
    let (mut kiosk, mut state) = (Kiosk::new(Wishes::default(), false, 0), State::new(&offer));
    let before = held_bytes();
    for _ in 0..500_000 {
        for order in kiosk.tick(173, None, &offer).iter() {
            match *order {
                Order::Session(event) => _ = state.step(event, &offer),
                Order::Look(look) => _ = state.look(look, &offer),
                _ => {}
            }
        }
        state.step(Event::Tick { elapsed_ms: 173 }, &offer);
        assert_ne!(kiosk.over(), Over::Dark, "no sleep without a clock");
    }
    assert_eq!(held_bytes(), before);
}
