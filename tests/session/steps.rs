//! What single events do.

use super::host::{everything, offer, voice};
use deshielo::session::keys::Key;
use deshielo::session::knob::End;
use deshielo::session::*;
use deshielo::water::dials::{Dial, DialRange, Dials, Stage};
use deshielo::words::System;

const SLOW: u32 = u32::MAX;

fn turn(state: &mut State, offer: &Offer, detents: i32) -> Needs {
    state.step(Event::Turn { detents, since_ms: SLOW }, offer)
}

fn key(state: &mut State, offer: &Offer, letter: char) -> Needs {
    state.step(Event::Key(Key::Char(letter)), offer)
}

fn tap(state: &mut State, offer: &Offer, target: Target) {
    state.step(Event::TouchDown(target), offer);
    state.step(Event::TouchUp(target), offer);
}

#[test]
fn the_first_turn_of_a_stranger_warms_the_valley() {
    let offer = offer();
    let mut state = State::new(&offer);
    let needs = turn(&mut state, &offer, 2);
    assert_eq!(state.shown().dials, Dials::REST.with(Dial::Warming, 1.0));
    assert_eq!(needs, Needs { stage: Some(Stage::Basin), redraw: true, ..Needs::default() });
}

#[test]
fn a_press_opens_the_ring_and_a_press_takes_what_is_there() {
    let offer = offer();
    let mut state = State::new(&offer);
    state.step(Event::Press, &offer);
    assert_eq!(state.shown().focus, Focus::Ring(Item::Dial(Dial::Warming)));
    turn(&mut state, &offer, 3);
    assert_eq!(state.shown().dials, Dials::REST, "on the ring nothing turns");
    state.step(Event::Press, &offer);
    assert_eq!(state.shown().chosen, Some(Dial::Diversion));
    let needs = turn(&mut state, &offer, 1);
    assert_eq!((needs.stage, state.shown().dials.diversion), (Some(Stage::Works), 5.0));
    // Backwards past the first thing is the last.
    state.step(Event::Press, &offer);
    turn(&mut state, &offer, -4);
    assert_eq!(state.shown().focus, Focus::Ring(Item::Help));
    state.step(Event::Press, &offer);
    assert_eq!(state.shown().card, Some(Card::Help { page: 0 }));
    turn(&mut state, &offer, 1);
    assert_eq!(state.shown().card, Some(Card::Help { page: 1 }));
    state.step(Event::Press, &offer);
    assert_eq!((state.shown().card, state.shown().focus), (None, Focus::In(Item::Dial(Dial::Diversion))));
}

#[test]
fn a_dial_stops_at_its_ends_and_says_so() {
    let offer = offer();
    let mut state = State::new(&offer);
    turn(&mut state, &offer, -1);
    assert_eq!((state.shown().at_end, state.shown().dials), (Some(End::First), Dials::REST));
    assert_eq!(turn(&mut state, &offer, -1), Needs::default(), "the same again is nothing to draw");
    turn(&mut state, &offer, 12);
    assert_eq!((state.shown().at_end, state.shown().dials.warming), (None, 6.0));
    turn(&mut state, &offer, i32::MAX);
    assert_eq!((state.shown().at_end, state.shown().dials.warming), (Some(End::Last), 6.0));
    turn(&mut state, &offer, -1);
    assert_eq!((state.shown().at_end, state.shown().dials.warming), (None, 5.5));
}

#[test]
fn a_fast_turn_goes_further() {
    let offer = offer();
    let mut state = State::new(&offer);
    state.step(Event::TurnDial { dial: Dial::TownGrowth, detents: 1, since_ms: 40 }, &offer);
    assert_eq!(state.shown().dials.town_growth, 40.0);
    state.step(Event::TurnDial { dial: Dial::TownGrowth, detents: -1, since_ms: 90 }, &offer);
    assert_eq!(state.shown().dials.town_growth, 20.0);
    state.step(Event::TurnDial { dial: Dial::TownGrowth, detents: -1, since_ms: 900 }, &offer);
    assert_eq!(state.shown().dials.town_growth, 10.0);
}

#[test]
fn starting_storage_turns_from_off_to_empty_and_back() {
    let offer = offer();
    let mut state = State::new(&offer);
    let storage = |state: &State| state.shown().dials.starting_storage;
    let mut go = |detents| {
        state.step(Event::TurnDial { dial: Dial::StartingStorage, detents, since_ms: SLOW }, &offer);
        (storage(&state), state.shown().at_end)
    };
    assert_eq!(go(-1), (None, Some(End::First)));
    assert_eq!(go(1), (Some(0.0), None));
    assert_eq!(go(1), (Some(5.0), None));
    assert_eq!(go(-2), (None, None));
}

#[test]
fn turns_without_a_pause_are_one_turn_to_undo() {
    let offer = offer();
    let mut state = State::new(&offer);
    for _ in 0..3 {
        turn(&mut state, &offer, 1);
        state.step(Event::Tick { elapsed_ms: 500 }, &offer);
    }
    assert_eq!(state.shown().dials.warming, 1.5);
    state.step(Event::Tick { elapsed_ms: 1500 }, &offer);
    turn(&mut state, &offer, 1);
    turn(&mut state, &offer, 1);
    assert_eq!(state.shown().dials.warming, 2.5);
    key(&mut state, &offer, 'z');
    assert_eq!(state.shown().dials.warming, 1.5);
    assert!(state.shown().undo.unwrap().undone);
    key(&mut state, &offer, 'z');
    assert_eq!(state.shown().dials.warming, 2.5, "undo twice and it is done again");
    // A pause that only the encoder knows of, and a look at another dial, end a turn too.
    state.step(Event::Turn { detents: 1, since_ms: 3000 }, &offer);
    key(&mut state, &offer, 'z');
    assert_eq!(state.shown().dials.warming, 2.5);
}

#[test]
fn holding_sets_everything_back_and_undo_brings_it_again() {
    let offer = offer();
    let mut state = State::new(&offer);
    for letter in ['2', 'l', 'u', 't', ']', ' ', '?'] {
        key(&mut state, &offer, letter);
    }
    state.step(Event::TurnDial { dial: Dial::CropMix, detents: 3, since_ms: SLOW }, &offer);
    key(&mut state, &offer, 'k');
    state.step(Event::TurnDial { dial: Dial::StartingStorage, detents: 3, since_ms: SLOW }, &offer);
    key(&mut state, &offer, ' ');
    let before = *state.shown();
    let needs = state.step(Event::LongPress, &offer);
    assert_eq!((needs.stage, needs.beside), (Some(Stage::Works), true));
    let after = *state.shown();
    assert_eq!((after.dials, after.beside, after.card), (Dials::REST, None, None));
    assert_eq!(
        (after.view, after.voice, after.system, after.shade, after.year, after.day),
        (before.view, before.voice, before.system, before.shade, before.year, before.day)
    );
    // At rest there is nothing more to reset, and nothing to forget.
    assert_eq!(state.step(Event::LongPress, &offer), Needs::default());
    key(&mut state, &offer, 'z');
    assert_eq!((state.shown().dials, state.shown().beside), (before.dials, before.beside));
}

#[test]
fn a_year_plays_to_its_last_day_and_begins_again() {
    let offer = offer();
    let mut state = State::new(&offer);
    assert_eq!(state.step(Event::Tick { elapsed_ms: 1000 }, &offer), Needs::default(), "paused");
    key(&mut state, &offer, ' ');
    // Twelve days a second.
    assert_eq!(state.step(Event::Tick { elapsed_ms: 50 }, &offer), Needs::default(), "not a day yet");
    let needs = state.step(Event::Tick { elapsed_ms: 50 }, &offer);
    assert_eq!((state.shown().day, needs.redraw, needs.answer()), (1, true, false));
    for _ in 0..9 {
        state.step(Event::Tick { elapsed_ms: 100 }, &offer);
    }
    assert_eq!(state.shown().day, 12, "no part of a day is lost");
    state.step(Event::Tick { elapsed_ms: u32::MAX }, &offer);
    let last = offer.years().days(state.shown().year_index).unwrap() - 1;
    assert_eq!((state.shown().day, state.shown().playing), (last, false));
    key(&mut state, &offer, ' ');
    assert_eq!((state.shown().day, state.shown().playing), (0, true));
    key(&mut state, &offer, '>');
    assert_eq!((state.shown().day, state.shown().playing), (7, false), "a hand on the day stops the play");
}

#[test]
fn years_are_chosen_by_kind_or_one_by_one() {
    let offer = offer();
    let mut state = State::new(&offer);
    let standing = |third| offer.years().index(YearChoice::Of(third)).unwrap();
    assert_eq!(state.shown().year_index, standing(Third::Middling));
    let needs = key(&mut state, &offer, 'y');
    assert_eq!((state.shown().year_index, needs.year, needs.stage), (standing(Third::Wet), true, None));
    key(&mut state, &offer, 'y');
    assert_eq!(state.shown().year, YearChoice::Of(Third::Dry));
    key(&mut state, &offer, ']');
    assert_eq!(state.shown().year, YearChoice::Any(standing(Third::Dry) + 1));
    for _ in 0..50 {
        key(&mut state, &offer, ']');
    }
    assert_eq!((state.shown().year_index, state.shown().at_end), (39, Some(End::Last)));
    // Year 39 is a leap year: its last day stays the last.
    state.step(Event::Command(Command::StepDay(1000)), &offer);
    assert_eq!(state.shown().day, 365);
    key(&mut state, &offer, '[');
    assert_eq!(state.shown().day, 364);
}

#[test]
fn a_finger_chooses_drags_and_marks_a_day() {
    let offer = offer();
    let mut state = State::new(&offer);
    let at = |share| Target::Dial { dial: Dial::WinterPrecipitation, share };
    // Taken in hand off its mark (rest is in the middle, 0.5), it does not jump.
    state.step(Event::TouchDown(at(0.4)), &offer);
    assert_eq!((state.shown().chosen, state.shown().dials), (Some(Dial::WinterPrecipitation), Dials::REST));
    assert_eq!(state.held_dial(), Some(Dial::WinterPrecipitation));
    for step in 1..=4 {
        state.step(Event::TouchMove(at(0.4 - 0.05 * f64::from(step))), &offer);
        state.step(Event::Tick { elapsed_ms: 2000 }, &offer);
    }
    assert_eq!(state.shown().dials.winter_precipitation, -20.0);
    state.step(Event::TouchMove(at(-3.0)), &offer);
    assert_eq!((state.shown().dials.winter_precipitation, state.shown().at_end), (-50.0, Some(End::First)));
    state.step(Event::TouchUp(at(-3.0)), &offer);
    key(&mut state, &offer, 'z');
    assert_eq!(state.shown().dials, Dials::REST, "a drag is one turn, however slow");

    state.step(Event::TouchDown(Target::Day(100)), &offer);
    state.step(Event::TouchMove(Target::Day(120)), &offer);
    state.step(Event::TouchMove(Target::Nothing), &offer);
    state.step(Event::TouchUp(Target::Nothing), &offer);
    assert_eq!(state.shown().day, 120);
    state.step(Event::TouchMove(Target::Day(7)), &offer);
    assert_eq!(state.shown().day, 120, "nothing is held");

    tap(&mut state, &offer, Target::View(View::Canals));
    assert_eq!(state.shown().view, View::Canals);
    state.step(Event::TouchDown(Target::View(View::Ledger)), &offer);
    state.step(Event::TouchUp(Target::Nothing), &offer);
    assert_eq!(state.shown().view, View::Canals, "a tap counts where it ends on what it began on");
    tap(&mut state, &offer, Target::Term(2));
    assert_eq!(state.shown().card, Some(Card::Explain(Explained::Term(2))));
    tap(&mut state, &offer, Target::Day(3));
    assert_eq!((state.shown().card, state.shown().day), (None, 120), "a card covers what is under it");
    tap(&mut state, &offer, Target::Year(4));
    assert_eq!(state.shown().year_index, 4);
    tap(&mut state, &offer, Target::Button(Command::Help));
    assert_eq!(state.shown().card, Some(Card::Help { page: 0 }));
}

#[test]
fn a_potentiometer_that_trembles_turns_nothing() {
    let offer = offer();
    let mut state = State::new(&offer);
    let set = |state: &mut State, share| state.step(Event::SetDial { dial: Dial::CanalLining, share }, &offer);
    assert_eq!(set(&mut state, 0.049), Needs::default());
    assert_eq!(set(&mut state, 0.055), Needs::default(), "past the half, but not clearly");
    assert_eq!(set(&mut state, 0.07).stage, Some(Stage::Works));
    assert_eq!(state.shown().dials.canal_lining, 10.0);
    assert_eq!(set(&mut state, 0.045), Needs::default());
    assert_eq!(set(&mut state, f64::NAN), Needs::default());
    set(&mut state, 2.0);
    assert_eq!(state.shown().dials.canal_lining, 100.0);
}

#[test]
fn settings_are_called_up_saved_and_forgotten() {
    let offer = offer();
    let mut state = State::new(&offer);
    let pick = |state: &mut State, entry: SettingEntry| {
        let at = (0..20).find(|index| state.shown().own.entry(&offer, *index) == Some(entry)).unwrap();
        key(state, &offer, 's');
        turn(state, &offer, at as i32);
        state.step(Event::Press, &offer)
    };
    let needs = pick(&mut state, SettingEntry::Offered(1));
    assert_eq!(state.shown().dials, offer.settings()[1].setting.dials);
    assert_eq!((state.shown().year_index, needs.stage, needs.year), (7, Some(Stage::Basin), true));
    key(&mut state, &offer, 'z');
    assert_eq!((state.shown().dials, state.shown().year), (Dials::REST, YearChoice::Of(Third::Middling)));
    key(&mut state, &offer, 'z');
    assert_eq!((state.shown().dials, state.shown().year_index), (offer.settings()[1].setting.dials, 7));

    // A value between two stops turns to the stops on either side.
    pick(&mut state, SettingEntry::Offered(3));
    for (detents, to) in [(-1, 30.0), (1, 35.0)] {
        let mut copy = state;
        copy.step(Event::TurnDial { dial: Dial::StartingStorage, detents, since_ms: SLOW }, &offer);
        assert_eq!(copy.shown().dials.starting_storage, Some(to));
    }

    for saved in 1..=MOST_OWN_SETTINGS {
        assert_eq!(pick(&mut state, SettingEntry::Save).stage, None);
        assert_eq!(state.shown().own.count(), saved);
    }
    assert!((0..30).all(|entry| state.shown().own.entry(&offer, entry) != Some(SettingEntry::Save)), "no room");
    let dialled = state.shown().dials;
    state.step(Event::LongPress, &offer);
    pick(&mut state, SettingEntry::Own(2));
    assert_eq!(state.shown().dials, dialled);
    pick(&mut state, SettingEntry::ForgetLast);
    assert_eq!(state.shown().own.count(), MOST_OWN_SETTINGS - 1);
    pick(&mut state, SettingEntry::Back);
    assert_eq!(state.shown().own.count(), MOST_OWN_SETTINGS - 1);

    let mut next = State::new(&offer);
    for own in state.shown().own.iter() {
        assert_eq!(next.adopt(own, &offer), Ok(()));
    }
    assert_eq!(next.shown().own, state.shown().own);
    let too_warm = Setting { dials: Dials::REST.with(Dial::Warming, 9.0), year: None };
    assert_eq!(next.adopt(too_warm, &offer), Err(Misfit::OutOfRange(Dial::Warming)));
    let no_year = Setting { dials: Dials::REST, year: Some(YearChoice::Any(40)) };
    assert_eq!(next.adopt(no_year, &offer), Err(Misfit::NoSuchYear(40)));
}

#[test]
fn what_is_kept_beside_stays_while_dials_turn() {
    let offer = offer();
    let mut state = State::new(&offer);
    turn(&mut state, &offer, 2);
    assert!(key(&mut state, &offer, 'k').beside);
    turn(&mut state, &offer, 2);
    assert_eq!(state.shown().beside, Some(Dials::REST.with(Dial::Warming, 1.0)));
    key(&mut state, &offer, 'k');
    assert_eq!(state.shown().beside, None);
}

#[test]
fn words_of_the_view_and_the_dials_are_explained_in_turn() {
    let offer = offer();
    let mut state = State::new(&offer);
    key(&mut state, &offer, '5');
    key(&mut state, &offer, 'w');
    let mut seen = Vec::new();
    for _ in 0..11 {
        seen.extend(state.shown().card);
        turn(&mut state, &offer, 1);
    }
    assert_eq!(seen[0], Card::Explain(Explained::Term(0)));
    assert_eq!(seen[1..].to_vec(), Dial::ALL.map(|dial| Card::Explain(Explained::Dial(dial))));
    assert_eq!(state.shown().card, Some(seen[0]), "round and round");
    key(&mut state, &offer, '1');
    assert_eq!(state.shown().card, None, "the words of another view are others");
}

#[test]
fn a_place_without_dials_is_still_a_picture() {
    let mut input = everything();
    (input.dials, input.settings) = (Vec::new(), Vec::new());
    let offer = Offer::new(input).unwrap();
    let mut state = State::new(&offer);
    turn(&mut state, &offer, 1);
    assert_eq!(state.shown().view, View::Season, "the view is in hand");
    state.step(Event::Key(Key::Right), &offer);
    state.step(Event::Key(Key::Home), &offer);
    assert_eq!(state.check(&offer), Ok(()));
}

#[test]
fn an_offer_that_makes_no_sense_is_refused() {
    let refused = |change: &dyn Fn(&mut OfferInput)| {
        let mut input = everything();
        change(&mut input);
        Offer::new(input).unwrap_err()
    };
    let range = DialRange { least: 1.0, most: 2.0, step: 0.5 };
    assert_eq!(refused(&|input| input.dials[0].1 = range), OfferFault::Range(Dial::Warming));
    assert_eq!(
        refused(&|input| input.dials.push((Dial::CropMix, Dial::CropMix.widest()))),
        OfferFault::DialTwice(Dial::CropMix)
    );
    assert_eq!(refused(&|input| input.views.clear()), OfferFault::NoView);
    assert_eq!(refused(&|input| input.views.push(View::Trust)), OfferFault::ViewTwice(View::Trust));
    assert_eq!(refused(&|input| input.voices.clear()), OfferFault::NoVoice);
    assert_eq!(refused(&|input| input.help_pages = 0), OfferFault::NoHelp);
    assert_eq!(
        refused(&|input| input.dials.retain(|(dial, _)| *dial != Dial::Diversion)),
        OfferFault::Setting(3, Misfit::DialNotOffered(Dial::Diversion))
    );
    let one = OfferInput { voices: vec![voice("es-CL", None)], system: System::Metric, ..everything() };
    assert_eq!(State::new(&Offer::new(one).unwrap()).shown().system, System::Metric);
}

#[test]
fn the_marked_day_stays_the_same_date_from_year_to_year() {
    // Every fourth year has 366 days; its 29 February is day 151 of a water year from October.
    let offer = offer().with_leap_day(151);
    let mut state = State::new(&offer);
    let go = |state: &mut State, command| state.step(Event::Command(command), &offer);
    state.step(Event::TouchDown(Target::Year(3)), &offer);
    state.step(Event::TouchUp(Target::Year(3)), &offer);
    for (leap, plain) in [(10, 10), (150, 150), (152, 151), (200, 199), (365, 364)] {
        go(&mut state, Command::StepDay(-400));
        go(&mut state, Command::StepDay(leap));
        go(&mut state, Command::StepYear(1));
        assert_eq!(i32::from(state.shown().day), plain);
        go(&mut state, Command::StepYear(-1));
        assert_eq!(i32::from(state.shown().day), leap, "and back");
    }
    // 29 February itself is 1 March in a plain year.
    go(&mut state, Command::StepDay(-400));
    go(&mut state, Command::StepDay(151));
    go(&mut state, Command::StepYear(1));
    assert_eq!(state.shown().day, 151);
    assert_eq!(state.check(&offer), Ok(()));
}
