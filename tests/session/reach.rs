//! Everything can be reached with one encoder and one button.
//!
//! The states are too many to visit all, so each search looks at one feature: it goes on from a state only where the
//! encoder's place, the open card or that feature is new. Every state it finds has really been reached by turns, presses
//! and holds from the start.

use super::host::offer;
use deshielo::session::*;
use deshielo::water::dials::{Dial, Dials};
use std::collections::BTreeSet;

/// All values of `feature` that turns by one detent, presses and holds lead to.
fn reached<K: Ord + Clone>(offer: &Offer, feature: impl Fn(&Shown) -> K) -> BTreeSet<K> {
    let hands = [
        Event::Turn { detents: 1, since_ms: u32::MAX },
        Event::Turn { detents: -1, since_ms: u32::MAX },
        Event::Press,
        Event::LongPress,
    ];
    let start = State::new(offer);
    let key = |state: &State| (state.shown().focus, state.shown().card, state.shown().entry, feature(state.shown()));
    let mut seen = BTreeSet::from([key(&start)]);
    let mut queue = std::collections::VecDeque::from([start]);
    while let Some(state) = queue.pop_front() {
        for hand in hands {
            let mut next = state;
            next.step(hand, offer);
            if seen.insert(key(&next)) {
                queue.push_back(next);
            }
        }
    }
    seen.into_iter().map(|(_, _, _, value)| value).collect()
}

#[test]
fn every_stop_of_every_dial() {
    let offer = offer();
    for dial in Dial::ALL {
        let scale = offer.scale(dial).unwrap();
        let stops: BTreeSet<_> = (0..scale.stops()).map(|stop| scale.value(stop).unwrap().map(f64::to_bits)).collect();
        assert_eq!(
            reached(&offer, |shown| shown.dials.get(dial).map(f64::to_bits)).intersection(&stops).count(),
            stops.len()
        );
    }
    assert_eq!(reached(&offer, |shown| shown.chosen).len(), Dial::ALL.len());
}

#[test]
fn every_view_year_day_language_unit_and_colour() {
    let offer = offer();
    assert_eq!(reached(&offer, |shown| shown.view), BTreeSet::from(View::ALL));
    let years = reached(&offer, |shown| shown.year);
    assert_eq!(years.len(), 3 + offer.years().count());
    assert!(Third::ALL.into_iter().all(|third| years.contains(&YearChoice::Of(third))));
    assert!(reached(&offer, |shown| shown.day).len() >= 365);
    assert_eq!(reached(&offer, |shown| shown.voice), BTreeSet::from([0, 1, 2]));
    assert_eq!(reached(&offer, |shown| format!("{:?}", shown.system)).len(), 2);
    assert_eq!(reached(&offer, |shown| shown.shade), BTreeSet::from(Shade::ALL));
    let plays = reached(&offer, |shown| (shown.playing, shown.speed));
    assert!(Speed::ALL.into_iter().all(|speed| plays.contains(&(true, speed))));
    assert!(plays.contains(&(false, Speed::Middling)));
}

#[test]
fn every_card_and_every_word() {
    let offer = offer();
    let cards = reached(&offer, |shown| (shown.view, shown.card));
    for page in 0..offer.help_pages() {
        assert!(cards.iter().any(|(_, card)| *card == Some(Card::Help { page })));
    }
    for view in View::ALL {
        for term in 0..offer.terms(view) {
            assert!(cards.contains(&(view, Some(Card::Explain(Explained::Term(term))))), "{view:?} {term}");
        }
        for dial in Dial::ALL {
            assert!(cards.contains(&(view, Some(Card::Explain(Explained::Dial(dial))))), "{view:?} {dial:?}");
        }
    }
}

#[test]
fn beside_undo_settings_and_the_way_back_from_all_of_them() {
    let offer = offer();
    let beside = reached(&offer, |shown| (shown.beside.map(|kept| kept != Dials::REST), shown.dials != Dials::REST));
    for kept in [None, Some(false), Some(true)] {
        for turned in [false, true] {
            assert!(beside.contains(&(kept, turned)), "kept beside, turned: {kept:?}; turned now: {turned}");
        }
    }

    let undo = reached(&offer, |shown| shown.undo.map(|undo| (format!("{:?}", undo.act), undo.undone)));
    for act in [Act::Reset, Act::Recall].into_iter().chain(Dial::ALL.map(Act::Turn)) {
        for undone in [false, true] {
            assert!(undo.contains(&Some((format!("{act:?}"), undone))), "{act:?}, undone: {undone}");
        }
    }

    let recalled = reached(&offer, |shown| offer.settings().iter().position(|s| s.setting.dials == shown.dials));
    assert_eq!(recalled.into_iter().flatten().count(), offer.settings().len());
    assert_eq!(reached(&offer, |shown| shown.own.count()), (0..=MOST_OWN_SETTINGS).collect());
    // One's own setting is called up after a reset: the dials are turned again without a hand on a dial.
    let own = reached(&offer, |shown| {
        let own = shown.own.get(0).map(|own| own.dials);
        let by_recall = shown.undo.is_some_and(|undo| undo.act == Act::Recall && !undo.undone);
        (own == Some(shown.dials), by_recall, own.is_some(), shown.dials == Dials::REST)
    });
    assert!(own.contains(&(true, true, true, false)));
}
