//! Event streams of input devices, written by hand after the kernel's rules; none was recorded on a board.

use std::time::Duration;

use deshielo::board::file::{InputDevicePart, TouchCalibration, TouchscreenPart, Turned, Turns};
use deshielo::board::hands::input::{Abilities, Ask, InputDecoder, RawInput};
use deshielo::board::hands::touch::{TouchAbilities, TouchDecoder};
use deshielo::board::placing::Placing;
use deshielo::board::{FrameSize, HandEvent, Key, PointerPhase};
use deshielo::water::dials::Dial;
use proptest::prelude::*;

const SYN: u16 = 0;
const KEY: u16 = 1;
const REL: u16 = 2;
const ABS: u16 = 3;
/// Kind, code and value of the report that ends a set of events, and of the news that some were dropped.
const REPORT: (u16, u16, i32) = (SYN, 0, 0);
const DROPPED: (u16, u16, i32) = (SYN, 3, 0);
const ENTER: u16 = 28;
const UP: u16 = 103;
const LETTER_L: u16 = 38;
const SHIFT: u16 = 42;
const COMMA: u16 = 51;

fn part() -> InputDevicePart {
    InputDevicePart { name: "knob".into(), turns: Turns::Chosen, reversed: false, counts_per_detent: 1 }
}

fn raw(at_ms: u64, (kind, code, value): (u16, u16, i32)) -> RawInput {
    RawInput { at: Duration::from_millis(at_ms), kind, code, value }
}

/// Plays events, 10 ms apart, into a decoder that is never asked anything.
fn play(decoder: &mut InputDecoder, from_ms: u64, events: &[(u16, u16, i32)]) -> Vec<HandEvent> {
    let mut out = Vec::new();
    for (index, event) in events.iter().enumerate() {
        assert_eq!(decoder.event(raw(from_ms + index as u64 * 10, *event), &mut out), Ask::Nothing);
    }
    out
}

#[test]
fn an_encoder_turns_and_its_button_presses() {
    let mut decoder = InputDecoder::new(&part(), Abilities::default(), None, &[]);
    let turns = [(REL, 0, 1), REPORT, (REL, 7, -2), REPORT, (REL, 8, 1), (REL, 11, 120), REPORT];
    let want = [1, -2, 1].map(HandEvent::Turn);
    assert_eq!(play(&mut decoder, 0, &turns), want);
    let press = [(KEY, ENTER, 1), REPORT, (KEY, ENTER, 0), REPORT];
    assert_eq!(play(&mut decoder, 1_000, &press), [HandEvent::Press]);
    let mut out = Vec::new();
    // A key of a row of buttons that was never given a meaning (116 is the power key).
    for (at, event) in [(2_000, (KEY, 116, 1)), (2_900, (KEY, 116, 0))] {
        assert_eq!(decoder.event(raw(at, event), &mut out), Ask::Nothing);
    }
    assert_eq!(out, [HandEvent::LongPress]);
}

#[test]
fn counts_make_detents_and_may_belong_to_a_dial() {
    let dial = InputDevicePart { turns: Turns::Dial(Dial::Warming), reversed: true, counts_per_detent: 4, ..part() };
    let mut decoder = InputDecoder::new(&dial, Abilities::default(), None, &[]);
    let counts = [(REL, 0, 3), (REL, 0, -1), (REL, 0, 2), REPORT, (REL, 0, -4), REPORT];
    let turned = |detents| HandEvent::TurnDial { dial: Dial::Warming, detents };
    assert_eq!(play(&mut decoder, 0, &counts), [turned(-1), turned(1)]);
}

#[test]
fn a_knob_with_places_turns_the_shorter_way_round() {
    let abilities = Abilities { places: Some((0, 23)), ..Abilities::default() };
    let mut decoder = InputDecoder::new(&part(), abilities, Some(22), &[]);
    let places = [(ABS, 0, 23), REPORT, (ABS, 0, 0), REPORT, (ABS, 0, 2), REPORT, (ABS, 0, 21), REPORT];
    assert_eq!(play(&mut decoder, 0, &places), [1, 1, 2, -5].map(HandEvent::Turn));
}

#[test]
fn a_mouse_turns_by_its_wheel_alone() {
    let abilities = Abilities { is_mouse: true, ..Abilities::default() };
    let mut decoder = InputDecoder::new(&part(), abilities, None, &[]);
    let moves = [(REL, 0, 14), (REL, 1, -3), REPORT, (REL, 8, -1), REPORT];
    assert_eq!(play(&mut decoder, 0, &moves), [HandEvent::Turn(-1)]);
}

#[test]
fn held_keys_repeat_where_a_repeat_makes_sense() {
    let abilities = Abilities { is_keyboard: true, ..Abilities::default() };
    let mut decoder = InputDecoder::new(&part(), abilities, None, &[]);
    let held = |code| [(KEY, code, 1), REPORT, (KEY, code, 2), REPORT, (KEY, code, 2), REPORT, (KEY, code, 0), REPORT];
    assert_eq!(play(&mut decoder, 0, &held(UP)), [HandEvent::Key(Key::Up); 3]);
    assert_eq!(play(&mut decoder, 200, &held(LETTER_L)), [HandEvent::Key(Key::Char('l'))]);
    assert_eq!(play(&mut decoder, 400, &held(ENTER)), [HandEvent::Key(Key::Enter)]);
    let week = [(KEY, SHIFT, 1), REPORT, (KEY, COMMA, 1), REPORT, (KEY, COMMA, 0), (KEY, SHIFT, 0), REPORT];
    assert_eq!(play(&mut decoder, 600, &week), [HandEvent::Key(Key::Char('<'))]);
    assert_eq!(play(&mut decoder, 800, &[(KEY, COMMA, 1), REPORT]), [HandEvent::Key(Key::Char(','))]);
    // The button of a knob that repeats is one press all the same.
    let mut knob = InputDecoder::new(&part(), Abilities::default(), None, &[]);
    assert_eq!(play(&mut knob, 0, &held(ENTER)), [HandEvent::Press]);
}

#[test]
fn after_dropped_events_only_what_is_true_now_counts() {
    let abilities = Abilities { places: Some((0, 99)), ..Abilities::default() };
    let mut decoder = InputDecoder::new(&part(), abilities, Some(10), &[]);
    let mut out = Vec::new();
    assert_eq!(play(&mut decoder, 0, &[(KEY, ENTER, 1), REPORT]), []);
    // The button came up, and the knob went on, in what was dropped; what stands before the next report is half a tale.
    let torn = [DROPPED, (ABS, 0, 40), (KEY, UP, 1), (REL, 0, 5)];
    assert_eq!(play(&mut decoder, 100, &torn), []);
    assert_eq!(decoder.event(raw(150, REPORT), &mut out), Ask::State);
    decoder.stands(Some(13), &[], &mut out);
    assert_eq!(out, [HandEvent::Turn(3)], "the place is true, and nothing was pressed");
    let next = [(ABS, 0, 14), REPORT, (KEY, ENTER, 1), REPORT, (KEY, ENTER, 0), REPORT];
    assert_eq!(play(&mut decoder, 200, &next), [HandEvent::Turn(1), HandEvent::Press]);
    // A button that went down meanwhile presses nothing as it comes up: nobody knows for how long it was down.
    assert_eq!(play(&mut decoder, 300, &[DROPPED]), []);
    assert_eq!(decoder.event(raw(310, REPORT), &mut out), Ask::State);
    out.clear();
    decoder.stands(Some(14), &[ENTER], &mut out);
    assert_eq!(play(&mut decoder, 320, &[(KEY, ENTER, 0), REPORT]), []);
    assert_eq!(out, []);
}

#[test]
fn a_device_that_was_unplugged_begins_anew() {
    let mut decoder = InputDecoder::new(&part(), Abilities::default(), None, &[]);
    assert_eq!(play(&mut decoder, 0, &[(KEY, ENTER, 1), REPORT]), []);
    drop(decoder);
    // It comes back with its button still down, as the kernel says when asked.
    let mut decoder = InputDecoder::new(&part(), Abilities::default(), None, &[ENTER]);
    let back = [(KEY, ENTER, 0), REPORT, (REL, 0, 1), REPORT, (KEY, ENTER, 1), REPORT, (KEY, ENTER, 0), REPORT];
    assert_eq!(play(&mut decoder, 0, &back), [HandEvent::Turn(1), HandEvent::Press]);
}

#[test]
fn a_button_under_a_book_is_stuck() {
    let mut decoder = InputDecoder::new(&part(), Abilities::default(), None, &[]);
    assert_eq!(play(&mut decoder, 0, &[(KEY, ENTER, 1), REPORT]), []);
    assert_eq!(decoder.stuck_at(), Some(Duration::from_secs(60)));
    assert_eq!(play(&mut decoder, 70_000, &[(KEY, ENTER, 0), REPORT]), []);
    assert_eq!(decoder.stuck_at(), None);
}

fn touchscreen(calibration: Option<TouchCalibration>, axes_swapped: bool) -> TouchscreenPart {
    TouchscreenPart { name: "touch".into(), screen: 0, axes_swapped, calibration }
}

fn touch(part: &TouchscreenPart, one_finger: bool, turned: Turned) -> TouchDecoder {
    let abilities = TouchAbilities { one_finger, ranges: [(0, 319), (0, 479)] };
    TouchDecoder::new(part, abilities, Placing::new(320, 480, turned).unwrap())
}

fn feel(decoder: &mut TouchDecoder, events: &[(u16, u16, i32)]) -> Vec<(PointerPhase, i32, i32, FrameSize)> {
    let mut out = Vec::new();
    for event in events {
        assert_eq!(decoder.event(raw(0, *event), &mut out), Ask::Nothing);
    }
    pointers(&out)
}

fn pointers(out: &[HandEvent]) -> Vec<(PointerPhase, i32, i32, FrameSize)> {
    let pointer = |event: &HandEvent| match *event {
        HandEvent::Pointer { phase, x, y, on } => (phase, x, y, on),
        other => panic!("{other:?}"),
    };
    out.iter().map(pointer).collect()
}

const TOUCH: u16 = 330;
const LYING: FrameSize = FrameSize::new(480, 320);

#[test]
fn a_finger_is_followed_as_the_picture_is_turned() {
    let finger =
        [(ABS, 0, 10), (ABS, 1, 20), (KEY, TOUCH, 1), REPORT, (ABS, 0, 12), REPORT, REPORT, (KEY, TOUCH, 0), REPORT];
    let mut decoder = touch(&touchscreen(None, false), true, Turned::By90);
    // A quarter turn to the right: down the glass is across the picture, and the glass's left edge is its foot.
    let want = [
        (PointerPhase::Down, 20, 309, LYING),
        (PointerPhase::Move, 20, 307, LYING),
        (PointerPhase::Up, 20, 307, LYING),
    ];
    assert_eq!(feel(&mut decoder, &finger), want);
    let mut decoder = touch(&touchscreen(None, false), true, Turned::By270);
    assert_eq!(feel(&mut decoder, &finger)[0], (PointerPhase::Down, 459, 10, LYING));
}

#[test]
fn a_resistive_glass_is_calibrated_and_may_have_its_axes_swapped() {
    let calibration = TouchCalibration { left: 3936, right: 227, top: 268, bottom: 3880 };
    let mut decoder = touch(&touchscreen(Some(calibration), false), true, Turned::By90);
    let middle = [(ABS, 0, 2082), (ABS, 1, 2074), (KEY, TOUCH, 1), REPORT];
    let told = feel(&mut decoder, &middle);
    assert_eq!((told.len(), told[0].1, told[0].2), (1, 240, 160 - 1), "{told:?}");
    let mut swapped = touch(&touchscreen(Some(calibration), true), true, Turned::By90);
    let told = feel(&mut swapped, &[(ABS, 1, 2082), (ABS, 0, 2074), (KEY, TOUCH, 1), REPORT]);
    assert_eq!((told[0].1, told[0].2), (240, 159));
}

#[test]
fn of_many_fingers_the_first_is_followed() {
    let mut decoder = touch(&touchscreen(None, false), false, Turned::By0);
    let events = [
        (ABS, 47, 0),
        (ABS, 57, 45),
        (ABS, 53, 100),
        (ABS, 54, 200),
        REPORT,
        (ABS, 47, 1),
        (ABS, 57, 46),
        (ABS, 53, 5),
        (ABS, 54, 5),
        REPORT,
        (ABS, 53, 50),
        (ABS, 47, 0),
        (ABS, 53, 101),
        REPORT,
        (ABS, 47, 0),
        (ABS, 57, -1),
        REPORT,
        (ABS, 47, 1),
        (ABS, 53, 51),
        REPORT,
        (ABS, 57, -1),
        REPORT,
    ];
    let told: Vec<_> = feel(&mut decoder, &events).into_iter().map(|(phase, x, y, _)| (phase, x, y)).collect();
    let want = [(PointerPhase::Down, 100, 200), (PointerPhase::Move, 101, 200), (PointerPhase::Up, 101, 200)];
    assert_eq!(told, want);
}

#[test]
fn a_finger_never_stays_on_a_glass_that_is_gone_or_dropped_events() {
    let down = [(ABS, 0, 10), (ABS, 1, 20), (KEY, TOUCH, 1), REPORT];
    let mut decoder = touch(&touchscreen(None, false), true, Turned::By0);
    feel(&mut decoder, &down);
    let mut out = Vec::new();
    decoder.lost(&mut out);
    assert_eq!(pointers(&out)[0].0, PointerPhase::Up);
    feel(&mut decoder, &down);
    out.clear();
    assert_eq!(feel(&mut decoder, &[DROPPED, (KEY, TOUCH, 0)]), []);
    assert_eq!(decoder.event(raw(0, REPORT), &mut out), Ask::State);
    decoder.stands(false, [Some(90), Some(90)], &mut out);
    assert_eq!(pointers(&out)[0].0, PointerPhase::Up);
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 300, failure_persistence: None, ..ProptestConfig::default() })]

    /// Whatever a broken device says: no panic, and down and up take turns.
    #[test]
    fn any_stream_is_taken(
        events in proptest::collection::vec((0_u16..4, prop_oneof![0_u16..60, Just(330_u16), any::<u16>()], any::<i32>()), 0..200),
        one_finger in any::<bool>(),
    ) {
        let mut glass = touch(&touchscreen(None, false), one_finger, Turned::By180);
        let mut knob = InputDecoder::new(&part(), Abilities { places: Some((i32::MIN, i32::MAX)), ..Abilities::default() }, Some(0), &[]);
        let (mut felt, mut out) = (Vec::new(), Vec::new());
        for (index, event) in events.into_iter().enumerate() {
            if glass.event(raw(index as u64, event), &mut felt) == Ask::State {
                glass.stands(index % 2 == 0, [Some(1), Some(2)], &mut felt);
            }
            if knob.event(raw(index as u64, event), &mut out) == Ask::State {
                knob.stands(Some(7), &[30], &mut out);
            }
        }
        let mut is_down = false;
        for (phase, ..) in pointers(&felt) {
            prop_assert_eq!(is_down, phase != PointerPhase::Down);
            is_down = phase != PointerPhase::Up;
        }
    }
}
