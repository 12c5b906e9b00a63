//! The player as its screens and hands find it.

use super::*;
use crate::place::demo::demo_files;
use crate::place::{Source as PlaceSource, read};
use crate::session::Command;
use crate::water::dials::Dial;

const SIZE: FrameSize = FrameSize::new(320, 240);

fn player() -> Player {
    let place = read(PlaceSource::Embedded(demo_files())).place.unwrap();
    let speech = Speech::choose(&["--lang".into(), "en-US".into()]);
    Player::new(Opened { place, fit: None }, &speech, Shade::Light, None).ok().unwrap()
}

fn pixels(player: &mut Player) -> Vec<embedded_graphics::pixelcolor::Rgb565> {
    player.frame(SIZE, false).pixels.to_vec()
}

#[test]
fn a_slow_water_shows_its_old_answer_with_a_mark_and_then_the_new_one() {
    let mut player = player();
    player.patience = Duration::MAX;
    pixels(&mut player);
    player.step(Event::Command(Command::Turn(2)));
    let quick = pixels(&mut player);
    assert_eq!(player.wants_tick(), None, "a quick water needs no second look");
    player.step(Event::LongPress);
    pixels(&mut player);
    // Now every answer takes too long.
    (player.patience, player.work_takes) = (Duration::ZERO, Duration::from_secs(1));
    player.step(Event::Command(Command::Turn(2)));
    let marked = pixels(&mut player);
    assert!(marked != quick);
    assert!(!player.answers.is_current());
    assert_eq!(player.wants_tick(), Some(Duration::ZERO));
    assert!(pixels(&mut player) == marked, "nothing is worked out before the mark was seen");
    player.event(HandEvent::Time(Duration::from_millis(1)));
    assert!(pixels(&mut player) == quick, "then the new answer is there, and no mark");
    assert_eq!(player.wants_tick(), None);
    // Turned on and back before the water could answer: nothing is left to wait for.
    player.work_takes = Duration::from_secs(1);
    player.step(Event::Command(Command::Turn(1)));
    pixels(&mut player);
    player.step(Event::Command(Command::Turn(-1)));
    assert!(pixels(&mut player) == quick);
    assert_eq!(player.wants_tick(), None);
}

#[test]
fn nothing_is_drawn_again_when_nothing_changed() {
    let mut player = player();
    pixels(&mut player);
    let stamp = player.stamp;
    player.event(HandEvent::Time(Duration::from_secs(5)));
    player.event(HandEvent::Key(crate::board::Key::End));
    player.event(HandEvent::Pointer { phase: PointerPhase::Up, x: 3, y: 3, on: SIZE });
    pixels(&mut player);
    assert_eq!((player.stamp, player.drawings[0].stamp), (stamp, Some(stamp)));
}

#[test]
fn a_finger_drags_the_dial_that_it_went_down_on() {
    let mut player = player();
    pixels(&mut player);
    let point = |phase, x| HandEvent::Pointer { phase, x, y: 205, on: SIZE };
    player.event(point(PointerPhase::Down, 40));
    player.event(point(PointerPhase::Move, 140));
    player.event(point(PointerPhase::Up, 140));
    let warmer = player.state.shown().dials.get(Dial::Warming).unwrap();
    assert!((1.5..=2.5).contains(&warmer), "a third of the card is a third of the way: {warmer}");
}

#[test]
fn all_four_droughts_are_in_the_list_and_each_is_called_up() {
    let mut player = player();
    assert_eq!(player.settings.len(), 4);
    for entry in 1..=4 {
        player.step(Event::Command(Command::Settings));
        player.step(Event::Command(Command::Turn(entry)));
        player.step(Event::Press);
        let asked = player.offer.settings()[entry as usize - 1].setting;
        assert_eq!(player.state.shown().dials, asked.dials);
    }
}
