//! Stepping through a lesson: nothing is seen too early, guesses stay, and a kept progress is taken up again.

use deshielo::lesson::{Lesson, Moved, Page, Phase, Progress, Waters, WordFault};
use deshielo::water::dials::{Dial, Dials};
use proptest::prelude::*;

use super::{demo, shipped};

const GROUPS: u8 = 4;

fn at_first_guess(lesson: &Lesson) -> Progress {
    let mut progress = Progress::new(lesson, GROUPS).unwrap();
    while progress.phase() != Phase::Guess {
        assert_eq!(progress.forward(lesson, None), Moved::Done);
    }
    progress
}

#[test]
fn a_lesson_is_walked_from_start_to_end_and_back() {
    let lesson = shipped("who_is_cut_first");
    let mut progress = Progress::new(&lesson, GROUPS).unwrap();
    let mut pages = vec![(progress.step(), progress.phase())];
    loop {
        match progress.forward(&lesson, Some(0.0)) {
            Moved::Done => {}
            Moved::NeedsGuess => assert_eq!(progress.put(&lesson), Moved::Done),
            Moved::AtEnd => break,
            other => panic!("{other:?}"),
        }
        if pages.last() != Some(&(progress.step(), progress.phase())) {
            pages.push((progress.step(), progress.phase()));
        }
        assert!(pages.len() < 200);
    }
    assert_eq!(progress.step(), lesson.steps.len() - 1);
    let guesses = lesson.steps.iter().filter(|step| step.guess.is_some()).count();
    assert_eq!(pages.iter().filter(|(_, phase)| *phase == Phase::Reveal).count(), guesses);
    for page in pages.iter().rev().skip(1) {
        assert_eq!(progress.back(&lesson), Moved::Done);
        assert_eq!((progress.step(), progress.phase()), *page);
    }
    assert_eq!(progress.back(&lesson), Moved::AtStart);
}

#[test]
fn the_result_stays_hidden_until_a_guess_is_in_or_skipped_on_purpose() {
    let lesson = shipped("less_snow_more_rain");
    let mut progress = at_first_guess(&lesson);
    let result = Some(0.79);
    for _ in 0..3 {
        assert_eq!(progress.forward(&lesson, result), Moved::NeedsGuess);
        let page = Page::of(&lesson, &progress, result).unwrap();
        let guess = page.guess.unwrap();
        assert!(page.reveal.is_none() && page.talk.is_none());
        assert!(guess.result.is_none() && guess.usual.is_none() && guess.spread.is_none());
        assert!(guess.hand.is_some());
    }
    let mut skipping = progress.clone();
    assert_eq!(skipping.skip(&lesson), Moved::Done);
    assert_eq!(skipping.phase(), Phase::Reveal);
    let guess = Page::of(&lesson, &skipping, result).unwrap().guess.unwrap();
    assert!(guess.skipped && guess.result == result && guess.spread.is_none());

    progress.turn(&lesson, 3);
    assert_eq!(progress.put(&lesson), Moved::Done);
    // Another group must not see what the first one said.
    let guess = Page::of(&lesson, &progress, result).unwrap().guess.unwrap();
    assert!(guess.groups[0].is_in && guess.groups[0].value.is_none() && !guess.groups[1].is_in);
    assert_eq!(guess.group, 1);
    assert_eq!(progress.forward(&lesson, result), Moved::Done);
    let page = Page::of(&lesson, &progress, result).unwrap();
    assert!(page.reveal.is_some() && page.guess.as_ref().unwrap().result == result);
    // Who has seen the result cannot guess any more.
    assert_eq!(progress.back(&lesson), Moved::Done);
    assert_eq!(progress.phase(), Phase::Guess);
    for moved in [progress.turn(&lesson, 1), progress.put(&lesson), progress.skip(&lesson)] {
        assert_eq!(moved, Moved::Closed);
    }
}

#[test]
fn before_the_reveal_the_dials_stand_as_in_the_step_before() {
    let lesson = shipped("less_snow_more_rain");
    let mut progress = Progress::new(&lesson, 1).unwrap();
    let mut hidden = 0;
    loop {
        let stage = progress.stage(&lesson).unwrap();
        let step = &lesson.steps[progress.step()];
        if step.guess.is_some() && progress.phase() < Phase::Reveal {
            assert!(stage.hides_result);
            hidden += 1;
        } else {
            assert_eq!(stage.dials, step.dials);
        }
        // A session can be offered exactly this: the dials stand within their limits, and rest does too.
        for dial in Dial::ALL {
            let range = stage.ranges.iter().find(|(offered, _)| *offered == dial).map(|(_, range)| *range);
            match (range, stage.dials.get(dial)) {
                (Some(range), value) => {
                    let scale = deshielo::session::DialScale::new(dial, range).expect("a range with stops");
                    assert!(scale.holds(value), "{dial:?}");
                }
                (None, _) => assert!(stage.dials.rests(dial), "{dial:?}"),
            }
        }
        match progress.forward(&lesson, None) {
            Moved::NeedsGuess => assert_eq!(progress.skip(&lesson), Moved::Done),
            Moved::AtEnd => break,
            _ => {}
        }
    }
    assert!(hidden >= 8, "{hidden}");
    // The third step turns the heat up; while it is guessed at, everything is still at rest.
    let mut progress = Progress::new(&lesson, 1).unwrap();
    while progress.step() < 2 {
        if progress.forward(&lesson, None) == Moved::NeedsGuess {
            progress.skip(&lesson);
        }
    }
    assert_eq!(lesson.steps[2].dials, Dials::REST.with(Dial::Warming, 2.0));
    assert_eq!(progress.stage(&lesson).unwrap().dials, Dials::REST);
    assert!(progress.stage(&lesson).unwrap().ranges.is_empty());
}

#[test]
fn guesses_of_all_groups_are_kept_and_compared() {
    let lesson = shipped("less_snow_more_rain");
    let mut progress = at_first_guess(&lesson);
    let guess = lesson.steps[progress.step()].guess.unwrap();
    for (group, stop) in [(0, 2_u8), (1, 9), (2, 13)] {
        assert_eq!(progress.choose_group(&lesson, group), Moved::Done);
        progress.turn(&lesson, i32::from(stop) - i32::from(progress.hand()));
        assert_eq!(progress.put(&lesson), Moved::Done);
    }
    // A group may think again until the result is out.
    progress.choose_group(&lesson, 0);
    assert_eq!(progress.hand(), 2);
    progress.turn(&lesson, 1);
    progress.put(&lesson);
    assert_eq!(progress.choose_group(&lesson, GROUPS), Moved::NotHere);
    assert_eq!(progress.turn(&lesson, 1_000), Moved::AtEnd);
    assert_eq!(progress.turn(&lesson, -1_000), Moved::AtStart);

    let mut waters = Waters::new(demo()).unwrap();
    let result = waters.read(&guess.reading, &lesson.steps[progress.step()]).unwrap();
    progress.forward(&lesson, result);
    let page = Page::of(&lesson, &progress, result).unwrap().guess.unwrap();
    let values: Vec<_> = page.groups.iter().map(|group| group.value).collect();
    assert_eq!(values, [guess.value(3), guess.value(9), guess.value(13), None]);
    let spread = page.spread.unwrap();
    assert_eq!((spread.least, spread.middle, spread.most), (0.25, 0.55, 0.75));
    assert!(spread.off_by.unwrap() < -0.2 && !spread.holds_result);

    // Going on and coming back keeps them; a reset forgets them and nothing else.
    while progress.step() < 3 {
        if progress.forward(&lesson, result) == Moved::NeedsGuess {
            progress.skip(&lesson);
        }
    }
    assert_eq!(progress.guesses_of(1).count(), 3);
    progress.reset();
    assert_eq!(progress, Progress::new(&lesson, GROUPS).unwrap());
}

#[test]
fn a_far_guess_leads_another_way() {
    let lesson = shipped("less_snow_more_rain");
    let asks = lesson.steps.iter().position(|step| step.key == "wetter").unwrap();
    let guess = lesson.steps[asks].guess.unwrap();
    let result = Some(-12.8);
    let walk = |stop: u8| {
        let mut progress = Progress::new(&lesson, 1).unwrap();
        while progress.step() < asks || progress.phase() != Phase::Guess {
            if progress.forward(&lesson, None) == Moved::NeedsGuess {
                progress.skip(&lesson);
            }
        }
        progress.turn(&lesson, i32::from(stop) - i32::from(progress.hand()));
        progress.put(&lesson);
        while progress.step() == asks {
            progress.forward(&lesson, result);
        }
        lesson.steps[progress.step()].key.clone()
    };
    let stop_of = |value: f64| (0..guess.stops).find(|stop| guess.value(*stop) == Some(value)).unwrap();
    assert_eq!(walk(stop_of(-20.0)), "enough");
    assert_eq!(walk(stop_of(60.0)), "why_not");
}

#[test]
fn a_word_brings_the_guess_of_another_board() {
    let lesson = shipped("line_the_canal");
    let (mut here, mut there) = (at_first_guess(&lesson), at_first_guess(&lesson));
    there.choose_group(&lesson, 2);
    there.turn(&lesson, -4);
    assert_eq!(there.word(&lesson, 2), None, "no guess yet");
    there.put(&lesson);
    let word = there.word(&lesson, 2).unwrap();
    assert_eq!(here.put_word(&lesson, &word.to_uppercase()), Ok(Moved::Done));
    assert_eq!(here.guesses_of(1).collect::<Vec<_>>(), there.guesses_of(1).collect::<Vec<_>>());
    // A word of this step is nothing to the next, and a damaged one nothing at all.
    let mut damaged = word.clone().into_bytes();
    damaged.swap(0, 2);
    let damaged = String::from_utf8(damaged).unwrap();
    if damaged != word {
        assert_eq!(here.put_word(&lesson, &damaged), Err(WordFault::Check));
    }
    here.forward(&lesson, Some(-13.6));
    assert_eq!(here.put_word(&lesson, &word), Ok(Moved::NotHere));
    while here.step() < 2 || here.phase() != Phase::Guess {
        here.forward(&lesson, Some(-13.6));
    }
    assert_eq!(here.put_word(&lesson, &word), Err(WordFault::Nothing));
    assert_eq!(here.guesses_of(2).count(), 0);
}

#[test]
fn a_progress_survives_being_kept_and_does_not_fit_another_lesson() {
    let lesson = shipped("grow_the_town");
    let mut progress = at_first_guess(&lesson);
    progress.turn(&lesson, 2);
    progress.put(&lesson);
    progress.forward(&lesson, Some(3.0));
    let kept = serde_json::to_string(&progress).unwrap();
    let back: Progress = serde_json::from_str(&kept).unwrap();
    assert_eq!(back.resume(&lesson), Some(progress.clone()));
    // What a damaged or an edited file may hold is refused and shows nothing too early.
    for (from, to) in [
        ("\"path\":[0,1]", "\"path\":[0,7]"),
        ("\"path\":[0,1]", "\"path\":[]"),
        ("\"path\":[0,1]", "\"path\":[0,200]"),
        ("\"stop\":", "\"stop\":1"),
        ("\"groups\":4", "\"groups\":0"),
        ("\"groups\":4", "\"groups\":99"),
        ("\"revealed\":2", "\"revealed\":0"),
        ("\"revealed\":2", "\"revealed\":10"),
        ("\"revealed\":2", "\"revealed\":4294967295"),
    ] {
        assert!(kept.contains(from), "{from}: {kept}");
        let other: Progress = serde_json::from_str(&kept.replacen(from, to, 1)).unwrap();
        assert_eq!(other.resume(&lesson), None, "{from} → {to}");
    }
}

#[derive(Clone, Debug)]
enum Wish {
    Forward(Option<f64>),
    Back,
    Turn(i32),
    Group(u8),
    Put,
    Skip,
    Reset,
    Word(String),
    Keep,
}

fn wish() -> impl Strategy<Value = Wish> {
    prop_oneof![
        5 => proptest::option::of(-100.0..100.0).prop_map(Wish::Forward),
        2 => Just(Wish::Back),
        3 => any::<i32>().prop_map(Wish::Turn),
        1 => any::<u8>().prop_map(Wish::Group),
        3 => Just(Wish::Put),
        1 => Just(Wish::Skip),
        1 => Just(Wish::Reset),
        1 => "[a-z]{0,9}".prop_map(Wish::Word),
        1 => Just(Wish::Keep),
    ]
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(128))]
    #[test]
    fn whatever_a_room_does_no_result_is_seen_too_early(wishes in proptest::collection::vec(wish(), 0..120)) {
        static LESSON: std::sync::OnceLock<Lesson> = std::sync::OnceLock::new();
        let lesson = LESSON.get_or_init(|| shipped("less_snow_more_rain"));
        let mut progress = Progress::new(lesson, GROUPS).unwrap();
        for wish in wishes {
            match wish {
                Wish::Forward(result) => drop(progress.forward(lesson, result)),
                Wish::Back => drop(progress.back(lesson)),
                Wish::Turn(by) => drop(progress.turn(lesson, by)),
                Wish::Group(group) => drop(progress.choose_group(lesson, group)),
                Wish::Put => drop(progress.put(lesson)),
                Wish::Skip => drop(progress.skip(lesson)),
                Wish::Reset => progress.reset(),
                Wish::Word(word) => drop(progress.put_word(lesson, &word)),
                Wish::Keep => {
                    let kept = progress.clone().resume(lesson);
                    prop_assert_eq!(kept.as_ref(), Some(&progress));
                }
            }
            let step = progress.step();
            let page = Page::of(lesson, &progress, Some(1.0)).unwrap();
            if let Some(guess) = &page.guess {
                let given = progress.guesses_of(step).count();
                prop_assert!(guess.result.is_none() || given > 0 || progress.is_skipped(step));
                prop_assert!(given <= usize::from(GROUPS));
                prop_assert_eq!(guess.result.is_some(), progress.phase() >= Phase::Reveal);
                prop_assert_eq!(progress.stage(lesson).unwrap().hides_result, guess.result.is_none());
            }
        }
    }
}
