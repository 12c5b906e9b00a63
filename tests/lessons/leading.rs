//! A lesson that is led with one encoder and one button: what a turn, a press and a hold do on every page.

use deshielo::lesson::{Phase, WORD_LETTERS};
use deshielo::picture::views::lesson::Body;
use deshielo::session::keys::Key;
use deshielo::session::lesson::{Choice, Kept, Note, Part};
use deshielo::session::{Command, Event, Item, View};
use deshielo::water::dials::Dial;
use deshielo::words::Words;

use super::room::{Room, course, offer};

fn begun(name: &str, groups: u8) -> Room {
    let mut room = Room::new(course(name));
    assert!(room.led.ask_groups(groups));
    room.press();
    room
}

fn phase(room: &Room) -> Option<Phase> {
    room.led.progress().map(|progress| progress.phase())
}

#[test]
fn an_hour_goes_by_with_presses_and_turns_alone() {
    for (name, _) in deshielo::lesson::lessons() {
        let mut room = begun(name, 2);
        let mut looked = 0;
        let mut pages = 0;
        while room.led.part() != Part::Over {
            pages += 1;
            assert!(pages < 200, "{name} has no end");
            if room.led.is_looking() {
                looked += 1;
                assert_ne!(room.state.shown().view, View::Lesson);
            } else {
                assert_eq!(room.state.shown().view, View::Lesson);
            }
            if phase(&room) == Some(Phase::Guess) && room.led.choices().is_empty() {
                room.turn(3);
            }
            room.press();
        }
        let steps = room.led.course().unwrap().lesson.steps.len();
        assert!(looked + 1 >= steps, "{name}: {looked} looks in {steps} steps");
    }
}

#[test]
fn a_step_sets_dials_year_and_view_and_limits_what_turns() {
    let mut room = begun("less_snow_more_rain", 1);
    let step = room.led.course().unwrap().lesson.steps.iter().position(|step| step.key == "turn").unwrap();
    while room.led.progress().unwrap().step() != step || !room.led.is_looking() {
        room.press();
    }
    let shown = room.state.shown();
    assert_eq!((shown.view, shown.dials.get(Dial::Warming)), (View::Valley, Some(4.0)));
    assert_eq!(room.offer.dials().collect::<Vec<_>>(), [Dial::Warming]);
    assert_eq!(shown.day, 183, "the day of the snow survey, 1 April of a leap year");
    for _ in 0..20 {
        room.turn(1);
    }
    assert_eq!(room.state.shown().dials.get(Dial::Warming), Some(6.0));
    room.step(Event::TurnDial { dial: Dial::WinterPrecipitation, detents: 3, since_ms: u32::MAX });
    assert_eq!(room.state.shown().dials.get(Dial::WinterPrecipitation), Some(0.0));
    // Another page and back: the step stands as its file says.
    room.press();
    assert_eq!(phase(&room), Some(Phase::Talk));
    room.step(Event::Key(Key::Left));
    assert!(room.led.is_looking());
    assert_eq!(room.state.shown().dials.get(Dial::Warming), Some(4.0));
}

#[test]
fn the_dials_stand_as_before_until_the_result_is_shown() {
    let mut room = begun("less_snow_more_rain", 1);
    let of = |room: &Room| room.state.shown().dials.get(Dial::Warming);
    while room.led.course().unwrap().lesson.steps[room.led.progress().unwrap().step()].key != "total" {
        room.press();
    }
    room.until_guess();
    assert_eq!(of(&room), Some(0.0));
    // Looking at the season meanwhile shows nothing of the answer, and a press leads back.
    room.step(Event::Command(Command::Show(View::Season)));
    assert_eq!((room.state.shown().view, of(&room)), (View::Season, Some(0.0)));
    room.press();
    assert_eq!((room.state.shown().view, phase(&room)), (View::Lesson, Some(Phase::Guess)));
    room.press();
    room.press();
    assert_eq!((phase(&room), of(&room)), (Some(Phase::Reveal), Some(2.0)));
}

#[test]
fn no_result_before_a_guess_is_in_or_skipped_on_purpose() {
    let words = Words::new("en-US").0;
    let mut room = begun("who_is_cut_first", 3);
    room.until_guess();
    let hides = |room: &Room| !matches!(room.scene(&words, None).body, Body::Reveal(_));
    // Right is "on" elsewhere; while groups guess it is the next group.
    room.step(Event::Key(Key::Right));
    assert_eq!(room.led.progress().unwrap().group(), 1);
    // Holding offers more; nothing in it shows the result without saying so.
    room.hold();
    assert!(room.led.choices().contains(&Choice::Skip) && !room.led.choices().contains(&Choice::Show));
    assert_eq!(room.led.choice(), Some(Choice::Guess));
    room.press();
    assert!(hides(&room) && room.led.choices().is_empty());
    // One of three is in: now it can be shown.
    room.turn(1);
    room.press();
    assert_eq!(room.led.note(), Some(Note::In(1)));
    room.hold();
    assert_eq!(room.led.choice(), Some(Choice::Show));
    room.press();
    assert!(!hides(&room));
    let Body::Reveal(shown) = room.scene(&words, None).body else { panic!("the result") };
    assert_eq!(shown.guesses.len(), 1);
    // Back to the guess: it is closed now.
    room.step(Event::Key(Key::Left));
    let before = room.led.progress().unwrap().clone();
    room.turn(2);
    assert_eq!(room.led.progress().unwrap().guesses_of(before.step()).count(), 1);
    assert_eq!(*room.led.progress().unwrap(), before);
}

#[test]
fn skipping_is_a_choice_of_its_own() {
    let words = Words::new("es-CL").0;
    let mut room = begun("who_is_cut_first", 2);
    room.until_guess();
    room.hold();
    while room.led.choice() != Some(Choice::Skip) {
        room.turn(1);
    }
    room.press();
    assert_eq!(phase(&room), Some(Phase::Reveal));
    let Body::Reveal(shown) = room.scene(&words, None).body else { panic!("the result") };
    assert_eq!((shown.guesses.len(), shown.spread), (0, None));
    assert_eq!(shown.verdict, words.say("lesson-skipped", &[]));
}

#[test]
fn a_change_of_language_units_and_colours_loses_nothing() {
    let mut room = begun("earlier_water", 3);
    room.until_guess();
    room.turn(-4);
    room.press();
    room.turn(2);
    let before = room.led.clone();
    for key in ['l', 'u', 't', 'l'] {
        room.step(Event::Key(Key::Char(key)));
        assert_eq!(room.led, before, "{key}");
    }
    assert_eq!(room.state.shown().voice, 2);
    room.press();
    room.step(Event::Key(Key::Char('l')));
    assert_eq!(room.state.shown().view, View::Lesson);
    let english = room.scene(&Words::new("en-US").0, None);
    let spanish = room.scene(&Words::new("es-US").0, None);
    assert_ne!(english.title, spanish.title);
}

#[test]
fn a_word_of_another_board_comes_in_with_keys_and_with_the_knob() {
    let mut there = begun("line_the_canal", 4);
    there.until_guess();
    there.step(Event::Key(Key::Right));
    there.step(Event::Key(Key::Right));
    there.turn(5);
    there.press();
    let lesson = &there.led.course().unwrap().lesson;
    let word = there.led.progress().unwrap().word(lesson, 2).unwrap();

    let mut here = begun("line_the_canal", 4);
    here.until_guess();
    let open_word = |room: &mut Room| {
        room.hold();
        while room.led.choice() != Some(Choice::Word) {
            room.turn(1);
        }
        room.press();
    };
    open_word(&mut here);
    for letter in word.chars() {
        here.step(Event::Key(Key::Char(letter)));
    }
    assert_eq!(here.led.note(), Some(Note::In(2)));
    let kept = |room: &Room| room.led.progress().unwrap().guesses_of(there.led.progress().unwrap().step()).next();
    assert_eq!(kept(&here), kept(&there));

    let mut knob = begun("line_the_canal", 4);
    knob.until_guess();
    open_word(&mut knob);
    for letter in word.chars() {
        for _ in 0..12 {
            if knob.led.word().and_then(|entry| entry.at_hand()) == Some(letter) {
                break;
            }
            knob.turn(1);
        }
        knob.press();
    }
    assert_eq!((knob.led.note(), kept(&knob)), (Some(Note::In(2)), kept(&there)));

    // A wrong word is refused and changes nothing; letters that cannot stand there are told at once.
    let mut wrong = begun("line_the_canal", 4);
    wrong.until_guess();
    open_word(&mut wrong);
    wrong.step(Event::Key(Key::Char('a')));
    assert_eq!(wrong.led.note(), Some(Note::WrongLetter));
    let other = if word.ends_with('k') { 'v' } else { 'k' };
    for letter in word[..WORD_LETTERS - 1].chars().chain([other]) {
        wrong.step(Event::Key(Key::Char(letter)));
    }
    assert_eq!((wrong.led.note(), kept(&wrong)), (Some(Note::WrongWord), None));
    wrong.hold();
    assert_eq!(wrong.led.word(), None);
}

#[test]
fn one_long_press_makes_ready_for_the_next_group_and_undo_brings_the_guesses_back() {
    let mut room = begun("grow_the_town", 2);
    room.until_guess();
    room.press();
    room.press();
    room.press();
    assert_eq!(phase(&room), Some(Phase::Reveal));
    let before = room.led.progress().cloned();
    room.hold();
    assert_eq!((room.led.part(), room.led.progress()), (Part::Start, None));
    assert_eq!((room.led.groups(), room.led.note()), (2, Some(Note::Cleared)));
    assert_eq!(room.state.shown().dials, deshielo::water::dials::Dials::REST);
    room.step(Event::Key(Key::Char('z')));
    assert_eq!(room.led.progress().cloned(), before);
    // From the valley too.
    room.press();
    assert!(room.led.is_looking());
    room.hold();
    assert_eq!((room.led.part(), room.state.shown().view), (Part::Start, View::Lesson));
    // Left for the list, everything is offered again.
    room.hold();
    assert_eq!(room.led.part(), Part::List);
    assert_eq!(room.offer.dials().count(), offer().dials().count());
}

#[test]
fn everything_else_can_be_reached_from_a_page() {
    let mut room = begun("earlier_water", 1);
    while room.led.choice() != Some(Choice::More) {
        room.turn(1);
    }
    room.press();
    assert!(matches!(room.state.shown().focus, deshielo::session::Focus::Ring(_)));
    assert_ne!(room.state.shown().view, View::Lesson);
    // The ring is the session's own until something is taken; then a press leads back to the lesson.
    while room.state.shown().focus != deshielo::session::Focus::Ring(Item::Language) {
        room.turn(1);
    }
    room.press();
    room.turn(1);
    assert_eq!(room.state.shown().voice, 1);
    room.press();
    assert_eq!(room.state.shown().view, View::Lesson);
}

#[test]
fn a_power_cut_loses_no_guess() {
    let mut room = begun("change_the_crops", 3);
    let mut cuts = 0;
    while room.led.part() != Part::Over {
        if phase(&room) == Some(Phase::Guess) && room.led.choices().is_empty() {
            room.turn(-2);
        }
        let kept = room.led.kept().expect("a step is open");
        let text = serde_json::to_string(&kept).unwrap();
        assert!(text.len() < 2000, "{} bytes", text.len());
        let back: Kept = serde_json::from_str(&text).unwrap();
        assert_eq!(back, kept);
        let mut again = Room::new(course("change_the_crops"));
        assert!(again.led.take_up(course("change_the_crops"), back));
        assert_eq!(again.led.progress(), room.led.progress());
        assert_eq!(again.led.is_looking(), room.led.is_looking());
        cuts += 1;
        room.press();
    }
    assert!(cuts > 30, "{cuts}");
    // A file that was changed meanwhile begins anew.
    let mut room = begun("change_the_crops", 3);
    room.until_guess();
    let kept = Kept { stamp: room.led.kept().unwrap().stamp.wrapping_add(1), ..room.led.kept().unwrap() };
    assert!(!room.led.take_up(course("change_the_crops"), kept));
    assert_eq!(room.led.part(), Part::Start);
}

#[test]
fn whatever_is_done_the_result_stays_hidden_and_the_session_sound() {
    let words = Words::new("en-US").0;
    let mut state = 5_u64;
    let mut next = move || {
        // A plain generator of numbers (Knuth's constants, from memory).
        state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        (state >> 33) as u32
    };
    let keys = [Key::Up, Key::Down, Key::Left, Key::Right, Key::Enter, Key::Escape, Key::Tab, Key::Char('z')];
    let letters = ['v', 'a', 'k', 'l', 'u', 'h', 'w', 'r', 'y', ' ', '1', '8', 'ñ'];
    let mut reveals = 0;
    for round in 0..12 {
        let names = deshielo::lesson::lessons();
        let mut room = begun(names[round % names.len()].0, 1 + (round % 5) as u8);
        for _ in 0..1500 {
            let event = match next() % 12 {
                0..4 => Event::Press,
                4 | 5 => Event::Turn { detents: next() as i32 % 9 - 4, since_ms: 200 },
                6 if next() % 6 == 0 => Event::LongPress,
                7 => Event::Key(letters.map(Key::Char)[next() as usize % letters.len()]),
                8 => Event::Tick { elapsed_ms: 50 },
                9 => Event::Command(Command::Show(View::ALL[next() as usize % 9])),
                _ => Event::Key(keys[next() as usize % keys.len()]),
            };
            room.step(event);
            if room.led.part() == Part::List {
                room.led.begin(course("who_is_cut_first"));
            }
            let Some((progress, course)) = room.led.progress().zip(room.led.course()) else { continue };
            let step = progress.step();
            if course.lesson.steps[step].guess.is_some() {
                let scene = room.scene(&words, None);
                let may = progress.is_skipped(step) || progress.guesses_of(step).next().is_some();
                if matches!(scene.body, Body::Reveal(_)) || room.led.is_looking() {
                    assert!(may);
                    reveals += 1;
                } else if !progress.is_revealed(step) {
                    let stage = progress.stage(&course.lesson).unwrap();
                    assert!(stage.hides_result);
                }
            }
        }
    }
    assert!(reveals > 100, "{reveals}");
}
