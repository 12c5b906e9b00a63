//! What holds after any events at all.

use super::host::{offer, random_event, random_offer};
use super::valleys::numbers;
use deshielo::session::keys::Key;
use deshielo::session::*;
use deshielo::water::dials::{Dial, Dials};
use proptest::prelude::*;

/// Walks through `count` events and calls `each` with the state before, the event, what it needs, and the state after.
fn walk(offer: &Offer, seed: u32, count: usize, mut each: impl FnMut(&State, Event, Needs, &State)) -> State {
    let mut next = numbers(seed);
    let mut state = State::new(offer);
    for _ in 0..count {
        let before = state;
        let event = random_event(&mut next);
        let needs = state.step(event, offer);
        assert_eq!(state.check(offer), Ok(()), "after {event:?} in {before:?}");
        each(&before, event, needs, &state);
    }
    state
}

fn bits(dials: &Dials) -> [Option<u64>; 10] {
    Dial::ALL.map(|dial| dials.get(dial).map(f64::to_bits))
}

/// The state is a value that owns nothing elsewhere: however long a session lasts, it cannot grow.
fn assert_holds_no_memory<T: Copy + 'static>() {}

#[test]
fn a_hundred_thousand_events_leave_a_valid_state_and_no_memory() {
    assert_holds_no_memory::<State>();
    assert!(size_of::<State>() <= 2048, "{} bytes", size_of::<State>());
    let offer = offer();
    let (mut answers, mut redraws, mut views) = (0, 0, std::collections::BTreeSet::new());
    walk(&offer, 1, 100_000, |before, event, needs, after| {
        assert_eq!(needs.redraw, before.shown() != after.shown(), "{event:?}");
        assert!(needs.redraw || !needs.answer(), "an answer is never asked for without a change");
        answers += usize::from(needs.answer());
        redraws += usize::from(needs.redraw);
        views.insert(after.shown().view);
    });
    assert!(answers > 10_000 && redraws > 30_000, "{answers} answers, {redraws} redraws: the walk stood still");
    assert_eq!(views.len(), VIEWS);
}

#[test]
fn the_same_events_give_the_same_state() {
    let offer = offer();
    assert_eq!(walk(&offer, 9, 20_000, |_, _, _, _| {}), walk(&offer, 9, 20_000, |_, _, _, _| {}));
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(500))]

    #[test]
    fn any_place_stays_valid(place: u32, seed: u32) {
        walk(&random_offer(place), seed, 200, |_, _, _, _| {});
    }

    #[test]
    fn any_place_takes_over_from_any_other(from: u32, to: u32, seed: u32) {
        let (first, second) = (random_offer(from), random_offer(to));
        let mut state = walk(&first, seed, 100, |_, _, _, _| {});
        let before = *state.shown();
        // Even the wrong offer breaks nothing, though the state is then no good.
        let mut astray = state;
        let mut next = numbers(seed);
        for _ in 0..100 {
            astray.step(random_event(&mut next), &second);
        }

        let refit = state.refit(&second);
        assert_eq!(state.check(&second), Ok(()));
        for dial in Dial::ALL {
            let stays = before.dials.get(dial) == state.shown().dials.get(dial);
            assert_eq!(stays, !refit.moved.contains(&dial), "{dial:?}");
        }
        assert_eq!(refit.beside_gone, before.beside != state.shown().beside);
        assert_eq!(state.shown().own.count() + refit.own_gone.count(), before.own.count());
        let again = state.refit(&second);
        assert_eq!(again, Refit::default(), "what fits stays");
    }

    #[test]
    fn undo_restores_what_a_turn_changed_and_nothing_else(
        seed: u32, dial in 0..10_usize, detents in -20..20_i32, since_ms: u32,
    ) {
        let offer = offer();
        let mut state = walk(&offer, seed, 50, |_, _, _, _| {});
        state.step(Event::TouchUp(Target::Nothing), &offer);
        state.step(Event::Tick { elapsed_ms: TURN_ENDS_MS }, &offer);
        let before = *state.shown();
        state.step(Event::TurnDial { dial: Dial::ALL[dial], detents, since_ms }, &offer);
        let turned = *state.shown();
        prop_assume!(turned.dials != before.dials);
        state.step(Event::Key(Key::Char('z')), &offer);
        let after = *state.shown();
        assert_eq!(bits(&after.dials), bits(&before.dials));
        let seen = Shown { dials: turned.dials, undo: turned.undo, at_end: turned.at_end, done: turned.done, ..after };
        assert_eq!(seen, turned);
        state.step(Event::Key(Key::Char('z')), &offer);
        assert_eq!(bits(&state.shown().dials), bits(&turned.dials));
    }

    #[test]
    fn holding_is_rest_to_the_bit_and_undo_restores(seed: u32) {
        let offer = offer();
        let mut state = walk(&offer, seed, 80, |_, _, _, _| {});
        let before = *state.shown();
        state.step(Event::LongPress, &offer);
        assert_eq!(bits(&state.shown().dials), bits(&Dials::REST));
        assert_eq!((state.shown().beside, state.shown().card, state.shown().playing), (None, None, false));
        if before.dials != Dials::REST || before.beside.is_some() {
            state.step(Event::Command(Command::Undo), &offer);
            assert_eq!(bits(&state.shown().dials), bits(&before.dials));
            assert_eq!(state.shown().beside, before.beside);
        }
    }

    #[test]
    fn another_language_changes_nothing_else(seed: u32) {
        let offer = offer();
        let mut state = walk(&offer, seed, 80, |_, _, _, _| {});
        let before = *state.shown();
        let needs = state.step(Event::Key(Key::Char('l')), &offer);
        let after = *state.shown();
        assert!(after.voice != before.voice && needs.redraw && !needs.answer());
        assert_eq!(Shown { voice: before.voice, at_end: before.at_end, done: before.done, ..after }, before);
        let needs = state.step(Event::Key(Key::Char('u')), &offer);
        assert!(state.shown().system != after.system && needs.redraw && !needs.answer());
        assert_eq!(Shown { system: after.system, ..*state.shown() }, after);
    }
}
