//! The map of two dials: its number and its sides are on the ring while it is on show, and nowhere else.

use deshielo::session::{Command, Event, Focus, Item, State, View};
use deshielo::signs::Reading;
use deshielo::water::dials::{Dial, Dials};

use super::host::offer;

fn command(state: &mut State, command: Command) {
    let offer = offer();
    state.step(Event::Command(command), &offer);
    assert_eq!(state.check(&offer), Ok(()));
}

fn of_map(state: &State) -> usize {
    state.ring(&offer()).filter(|item| item.is_of_map()).count()
}

#[test]
fn the_ring_has_the_map_only_where_the_map_is() {
    let mut state = State::new(&offer());
    assert_eq!(of_map(&state), 0);
    command(&mut state, Command::Choose(Item::MapSign));
    assert!(state.shown().focus.is_in_dial(), "there is no map to choose for");
    command(&mut state, Command::Show(View::Grid));
    assert_eq!(of_map(&state), 3);
    for leaves in [Focus::In(Item::MapUp), Focus::Ring(Item::MapUp)] {
        command(&mut state, Command::Choose(Item::MapUp));
        if leaves != state.shown().focus {
            command(&mut state, Command::Press);
        }
        assert_eq!(state.shown().focus, leaves);
        command(&mut state, Command::Show(View::Season));
        assert!(state.shown().focus.is_in_dial());
        command(&mut state, Command::Show(View::Grid));
    }
}

#[test]
fn sides_go_through_all_dials_but_the_other_and_nothing_of_it_asks_the_water() {
    let offer = offer();
    let mut state = State::new(&offer);
    command(&mut state, Command::Show(View::Grid));
    let map = state.shown().map.unwrap();
    assert_eq!((map.across, map.up), (Dial::Warming, Dial::WinterPrecipitation));
    command(&mut state, Command::Choose(Item::MapAcross));
    let mut seen = Vec::new();
    for _ in 0..offer.map().dials().len() - 1 {
        let needs = state.step(Event::Command(Command::Turn(1)), &offer);
        assert!(needs.redraw && !needs.answer());
        let map = state.shown().map.unwrap();
        assert!(map.across != map.up && !seen.contains(&map.across));
        seen.push(map.across);
    }
    assert_eq!(seen.last(), Some(&Dial::Warming), "round to where it began");
    assert_eq!(state.shown().dials, Dials::REST);
}

#[test]
fn a_map_is_the_same_wherever_its_own_two_dials_stand() {
    let mut state = State::new(&offer());
    command(&mut state, Command::Show(View::Grid));
    let map = state.shown().map.unwrap();
    command(&mut state, Command::Turn(3));
    assert!(state.shown().dials != Dials::REST);
    assert_eq!(map.base(&state.shown().dials), Dials::REST);
    let other = state.shown().dials.with(Dial::Diversion, 20.0);
    assert_eq!(map.base(&other), Dials::REST.with(Dial::Diversion, 20.0));
    assert_eq!(offer().map().reading(map), Reading::from_key("supply_ratio", None).unwrap());
}
