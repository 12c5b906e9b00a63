//! Encoders whose contacts bounce and potentiometers that are noisy: no detent too many, none too few, no chatter.

use std::time::Duration;

use deshielo::board::file::{DialInput, EncoderPart, Pin, Pull, Turns};
use deshielo::board::hands::potentiometer::Potentiometer;
use deshielo::board::hands::quadrature::Quadrature;
use deshielo::water::dials::Dial;
use proptest::prelude::*;

fn encoder(edges_per_detent: u8, reversed: bool) -> EncoderPart {
    EncoderPart {
        a_pin: Pin(5),
        b_pin: Pin(6),
        button_pin: None,
        turns: Turns::Chosen,
        edges_per_detent,
        reversed,
        pull: Pull::Up,
        bounce_ms: 1,
    }
}

/// A real encoder: it knows where its shaft is, and its contacts lie about it for a while after each change.
struct Shaft {
    position: i32,
    now_us: u64,
    contacts: (bool, bool),
}

impl Shaft {
    fn contacts_at(position: i32) -> (bool, bool) {
        [(false, false), (true, false), (true, true), (false, true)][position.rem_euclid(4) as usize]
    }

    /// Turns by one edge; the contact that changes bounces at the given times, µs after one another. Gives what is seen.
    fn edge(&mut self, way: i32, pause_us: u64, bounces_us: &[u64]) -> Vec<(Duration, bool, bool)> {
        self.position += way;
        let (before, after) = (self.contacts, Self::contacts_at(self.position));
        self.now_us += pause_us;
        let mut seen = vec![(Duration::from_micros(self.now_us), after.0, after.1)];
        for pair in bounces_us.chunks(2) {
            for (us, (a, b)) in pair.iter().zip([before, after]) {
                self.now_us += us;
                seen.push((Duration::from_micros(self.now_us), a, b));
            }
        }
        // However many times it bounced, in the end it is where it belongs.
        if bounces_us.len() % 2 == 1 {
            self.now_us += 10;
            seen.push((Duration::from_micros(self.now_us), after.0, after.1));
        }
        self.contacts = after;
        seen
    }
}

/// A turn to the right or not, by so many detents; each edge after a pause, with its bounces, µs.
type Turn = (bool, u8, Vec<(u64, Vec<u64>)>);

/// Turns of which the bounces of an edge together take less than the bounce time.
fn turns() -> impl Strategy<Value = Vec<Turn>> {
    let edge = (1_300_u64..20_000, proptest::collection::vec(1_u64..100, 0..9));
    let turn = (any::<bool>(), 1_u8..6, proptest::collection::vec(edge, 24));
    proptest::collection::vec(turn, 1..12)
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 400, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn bounce_never_loses_or_adds_a_detent(
        turns in turns(),
        edges_per_detent in proptest::sample::select(vec![1_u8, 2, 4]),
        reversed in any::<bool>(),
        rests in any::<bool>(),
    ) {
        let part = encoder(edges_per_detent, reversed);
        let mut shaft = Shaft { position: 0, now_us: 0, contacts: (false, false) };
        let mut decoder = Quadrature::new(&part, false, false);
        let (mut wanted, mut counted) = (0, 0);
        for (right, detents, edges) in turns {
            let way = if right { 1 } else { -1 };
            for (pause, bounces) in edges.iter().take(usize::from(detents * edges_per_detent)) {
                for (at, a, b) in shaft.edge(way, *pause, bounces) {
                    while let Some(due) = decoder.due().filter(|due| *due <= at) {
                        counted += decoder.time(due);
                    }
                    counted += decoder.edge(at, a, b);
                }
            }
            wanted += way * i32::from(detents) * if reversed { -1 } else { 1 };
            if rests {
                // Left alone: whatever was waiting is told, and nothing waits for ever.
                shaft.now_us += 400_000;
                let now = Duration::from_micros(shaft.now_us);
                counted += decoder.time(now);
                prop_assert_eq!(decoder.due(), None);
                prop_assert_eq!(counted, wanted);
            }
        }
        counted += decoder.time(Duration::from_micros(shaft.now_us + 400_000));
        prop_assert_eq!(counted, wanted);
        prop_assert!(!decoder.is_one_contact_silent());
    }

    #[test]
    fn anything_may_come_and_the_count_stays_within_the_edges(
        seen in proptest::collection::vec((0_u64..3_000, any::<bool>(), any::<bool>()), 0..300),
        edges_per_detent in proptest::sample::select(vec![1_u8, 2, 4]),
    ) {
        let mut decoder = Quadrature::new(&encoder(edges_per_detent, false), false, false);
        let (mut now, mut most, most_detents) = (0, 0_i32, seen.len() as i32 * 2 / i32::from(edges_per_detent) + 1);
        for (pause, a, b) in seen {
            now += pause;
            most += decoder.edge(Duration::from_micros(now), a, b);
        }
        prop_assert!(most.abs() <= most_detents);
    }

    #[test]
    fn noise_at_an_end_stop_or_anywhere_yields_no_chatter(
        place in proptest::sample::select(vec![0.0, 0.004, 0.02, 0.021, 0.5, 0.513, 0.979, 0.98, 0.999, 1.0]),
        // Peak to peak just under the hysteresis, as a share of the whole supply.
        noise in proptest::collection::vec(-0.0047..0.0047_f64, 600),
    ) {
        let mut knob = Potentiometer::new(knob_of(false));
        let mut at = Duration::ZERO;
        let mut moves = 0;
        for noise in noise {
            at += Duration::from_millis(40);
            moves += u32::from(knob.read(at, (place + noise).clamp(0.0, 1.0)).moved.is_some());
        }
        // Once, where it was found a hair from the stop and settles on it.
        prop_assert!(moves <= 1, "{moves}");
    }
}

fn knob_of(reversed: bool) -> DialInput {
    DialInput {
        input: 0,
        dial: Dial::Warming,
        reversed,
        low_end_share: 0.02,
        high_end_share: 0.98,
        hysteresis_share: 0.01,
    }
}

#[test]
fn a_wire_that_is_off_is_noticed() {
    let mut decoder = Quadrature::new(&encoder(4, false), false, false);
    let mut detents = 0;
    for step in 0..40_u64 {
        detents += decoder.edge(Duration::from_millis(step * 20), step % 2 == 0, false);
    }
    assert!(decoder.is_one_contact_silent());
    assert_eq!(detents, 0);
    decoder.edge(Duration::from_millis(900), false, true);
    assert!(!decoder.is_one_contact_silent(), "both contacts speak again");
}

#[test]
fn an_edge_that_was_missed_costs_no_detent_for_long() {
    let mut decoder = Quadrature::new(&encoder(4, false), false, false);
    let ms = Duration::from_millis;
    // Of a whole turn the third state is never seen.
    assert_eq!(decoder.edge(ms(0), true, false), 0);
    assert_eq!(decoder.edge(ms(5), false, true), 0);
    assert_eq!(decoder.edge(ms(10), false, false), 1);
    // An edge is missed at the very beginning, where the way is not known: after a rest the next detents are whole.
    let mut decoder = Quadrature::new(&encoder(4, false), false, false);
    assert_eq!(decoder.edge(ms(0), true, true), 0);
    assert_eq!(decoder.edge(ms(5), false, true), 0);
    assert_eq!(decoder.edge(ms(10), false, false), 0);
    assert_eq!(decoder.time(ms(300)), 0);
    for (step, (a, b)) in [(true, false), (true, true), (false, true)].into_iter().enumerate() {
        assert_eq!(decoder.edge(ms(400 + step as u64), a, b), 0);
    }
    assert_eq!(decoder.edge(ms(404), false, false), 1);
}

/// What the dial is told by readings 40 ms apart.
fn told(knob: &mut Potentiometer, from_ms: u64, shares: &[f64]) -> Vec<f64> {
    let read =
        |(index, share): (usize, &f64)| knob.read(Duration::from_millis(from_ms + index as u64 * 40), *share).moved;
    shares.iter().enumerate().filter_map(read).collect()
}

#[test]
fn a_knob_says_nothing_until_it_is_moved_and_reaches_both_ends() {
    let mut knob = Potentiometer::new(knob_of(false));
    assert_eq!(told(&mut knob, 0, &[0.7; 20]), Vec::<f64>::new());
    let up: Vec<f64> = (0..60).map(|step| 0.7 + f64::from(step) * 0.005).collect();
    let moved = told(&mut knob, 1_000, &up);
    assert!(moved.windows(2).all(|pair| pair[0] < pair[1]) && moved.len() > 10, "{moved:?}");
    assert_eq!(moved.last(), Some(&1.0));
    let down: Vec<f64> = (0..100).map(|step| 0.99 - f64::from(step) * 0.01).collect();
    let moved = told(&mut knob, 4_000, &down);
    assert!(moved.windows(2).all(|pair| pair[0] > pair[1]), "{moved:?}");
    assert_eq!(moved.last(), Some(&0.0));
    // The line between the ends is straight.
    let middle = knob.turn_share(0.5);
    assert!((middle - 0.5).abs() < 1e-12);
    assert_eq!(Potentiometer::new(knob_of(true)).turn_share(0.01), 1.0);
    assert_eq!(told(&mut knob, 9_000, &[f64::NAN, f64::INFINITY]), Vec::<f64>::new());
}

#[test]
fn a_speck_of_dust_is_no_turn_and_a_loose_wire_turns_nothing() {
    let mut knob = Potentiometer::new(knob_of(false));
    assert_eq!(told(&mut knob, 0, &[0.4, 0.4, 0.4, 1.0, 0.4, 0.4, 0.0, 0.4, 0.4]), Vec::<f64>::new());
    // A wiper in the air.
    let mut knob = Potentiometer::new(knob_of(false));
    let (mut loose, mut moved_after) = (Vec::new(), 0);
    for step in 0..200_u64 {
        let read = knob.read(Duration::from_millis(step * 40), [0.1, 0.8][step as usize % 2]);
        loose.extend(read.loose);
        moved_after += u32::from(!loose.is_empty() && read.moved.is_some());
    }
    assert_eq!((loose.as_slice(), moved_after), ([true].as_slice(), 0));
    // It is soldered again: after a calm while it counts, from where it is found.
    let mut firm = None;
    for step in 0..100_u64 {
        let read = knob.read(Duration::from_millis(8_000 + step * 40), 0.3);
        assert_eq!(read.moved, None);
        firm = firm.or(read.loose);
    }
    assert_eq!(firm, Some(false));
    assert_eq!(told(&mut knob, 13_000, &[0.5, 0.5, 0.5]).len(), 1);
}

#[test]
fn a_fast_sweep_is_not_a_loose_wire() {
    let mut knob = Potentiometer::new(knob_of(false));
    for step in 0..200_u64 {
        // To and fro from stop to stop, twice a second, as children do.
        let along = (step as f64 * 0.16) % 2.0;
        let share = if along < 1.0 { along } else { 2.0 - along };
        assert_eq!(knob.read(Duration::from_millis(step * 40), share).loose, None, "{step}");
    }
}

#[cfg(all(feature = "board", target_os = "linux"))]
mod chips {
    //! The converters against stand-ins that know the registers by themselves.

    use std::convert::Infallible;

    use deshielo::board::hands::{Ads1115, Mcp3008, ReadsShare};
    use embedded_hal::delay::DelayNs;
    use embedded_hal::i2c::{ErrorType, I2c, Operation};
    use embedded_hal::spi::{self, SpiDevice};

    struct NoWait;

    impl DelayNs for NoWait {
        fn delay_ns(&mut self, _: u32) {}
    }

    /// An ADS1115 with voltages on its four inputs, read by the tables of its data sheet.
    struct FakeAds1115 {
        volts: [f64; 4],
        pointer: u8,
        converted: i16,
    }

    impl ErrorType for FakeAds1115 {
        type Error = Infallible;
    }

    impl I2c for FakeAds1115 {
        fn transaction(&mut self, address: u8, operations: &mut [Operation<'_>]) -> Result<(), Infallible> {
            assert_eq!(address, 0x49);
            for operation in operations {
                match operation {
                    Operation::Write([pointer]) => self.pointer = *pointer,
                    Operation::Write([1, high, low]) => {
                        assert_eq!(high >> 7, 1, "a conversion is started");
                        let input = (high >> 4) & 7;
                        assert!(input >= 4, "against ground");
                        let range = [6.144, 4.096, 2.048, 1.024, 0.512, 0.256, 0.256, 0.256];
                        let full = range[usize::from((high >> 1) & 7)];
                        assert_eq!(high & 1, 1, "one at a time");
                        assert_eq!(low & 3, 3, "without comparator");
                        let count = self.volts[usize::from(input - 4)] / full * 32768.0;
                        self.converted = count.round().clamp(-32768.0, 32767.0) as i16;
                    }
                    Operation::Read(bytes) => {
                        assert_eq!((self.pointer, bytes.len()), (0, 2));
                        bytes.copy_from_slice(&self.converted.to_be_bytes());
                    }
                    other => panic!("{other:?}"),
                }
            }
            Ok(())
        }
    }

    /// An MCP3008, bit by bit as its data sheet draws it.
    struct FakeMcp3008([u16; 8]);

    impl spi::ErrorType for FakeMcp3008 {
        type Error = Infallible;
    }

    impl SpiDevice for FakeMcp3008 {
        fn transaction(&mut self, operations: &mut [spi::Operation<'_, u8>]) -> Result<(), Infallible> {
            let [spi::Operation::TransferInPlace(bytes)] = operations else { panic!("one transfer") };
            let sent = bytes.iter().fold(0_u32, |all, byte| all << 8 | u32::from(*byte));
            // Leading zeros, the start bit, single-ended, three bits of the input; then a pause, a null bit and ten bits.
            let start = 31 - sent.leading_zeros();
            assert_eq!(sent >> (start - 1) & 1, 1, "against ground");
            let count = self.0[(sent >> (start - 4) & 7) as usize];
            // The null bit comes one clock after the sampling pause, so that ten bits end the third byte.
            assert_eq!(start, 16);
            bytes.copy_from_slice(&[0xff, 0xf8 | (count >> 8) as u8, count as u8]);
            Ok(())
        }
    }

    #[test]
    fn an_ads1115_gives_shares_of_the_supply() {
        let bus = FakeAds1115 { volts: [0.0, 1.65, 3.3, -0.01], pointer: 9, converted: 0 };
        let mut chip = Ads1115::new(bus, NoWait, 0x49);
        for (input, share) in [(0, 0.0), (1, 0.5), (2, 1.0), (3, -0.01 / 3.3)] {
            let read = chip.read_share(input).unwrap();
            assert!((read - share).abs() < 1e-4, "{input}: {read}");
        }
    }

    #[test]
    fn an_mcp3008_gives_shares_of_its_supply() {
        let mut chip = Mcp3008::new(FakeMcp3008([0, 1023, 512, 1, 2, 300, 700, 1000]));
        for (input, count) in [0, 1023, 512, 1, 2, 300, 700, 1000].into_iter().enumerate() {
            let share = chip.read_share(input as u8).unwrap();
            assert!((share - f64::from(count) / 1023.0).abs() < 1e-9, "{input}: {share}");
        }
    }
}
