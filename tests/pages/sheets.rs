//! Everything that must be reachable is: all cautions on the about page and the help card, every key in its table.

use std::collections::BTreeSet;

use deshielo::picture::Theme;
use deshielo::picture::views::about::CAUTIONS;
use deshielo::picture::views::term::{Explained, terms};
use deshielo::picture::views::{Scene, View, about, help};
use deshielo::session::help::key_lines;
use deshielo::session::keys::KEYS;
use deshielo::session::{self, Command, Event, Item, Offer, OfferInput, State, YearList};
use deshielo::water::dials::Dial;
use deshielo::words::{KNOWN_TAGS, Words};
use embedded_graphics::geometry::Size;

use super::goldens::paint;
use super::scenes::{Land, Play, steep_valley};
use super::{draw, draw_help, draw_term, facts};

/// All that was written, without blanks, so that it does not matter where lines break.
fn written(strict: &deshielo::picture::strict::Strict) -> String {
    strict.seen().iter().flat_map(|seen| seen.text.chars()).filter(|letter| !letter.is_whitespace()).collect()
}

fn pressed(text: &str) -> String {
    text.chars().filter(|letter| !letter.is_whitespace()).collect()
}

#[test]
fn every_caution_is_on_a_sheet_in_every_language_and_size() {
    let land = Land::new(steep_valley(), 2, 9);
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        land.show(Play::warm(), |scene| {
            for (wide, high) in [(240, 240), (320, 240), (800, 480)] {
                let size = Size::new(wide.into(), high.into());
                let mut on_help = String::new();
                for sheet in 0..help::sheet_count(size, &key_lines(), (&words, None)) {
                    let (_, strict) = paint(wide, high, |canvas| draw_help(canvas, sheet, &Theme::LIGHT, &words));
                    on_help += &written(&strict);
                }
                let (mut on_about, mut sheet) = (String::new(), 0);
                loop {
                    let open = Scene { sheet, facts: facts(), ..*scene };
                    let mut count = 0;
                    let (_, strict) = paint(wide, high, |canvas| {
                        draw(View::About, canvas, &open, &Theme::LIGHT, &words);
                        count = about::sheet_count(canvas, &open, &words);
                    });
                    on_about += &written(&strict);
                    sheet += 1;
                    if sheet >= count {
                        break;
                    }
                }
                for id in CAUTIONS {
                    let caution = pressed(&words.say(id, &[]));
                    assert!(on_about.contains(&caution), "{tag} {wide}x{high}: about lacks {id}");
                    assert!(on_help.contains(&caution), "{tag} {wide}x{high}: help lacks {id}");
                }
                for fact in ["tell-storms-kept", "tell-invented", "tell-method-hargreaves-samani"] {
                    assert!(on_about.contains(&pressed(&words.say(fact, &[]))), "{tag} {wide}x{high}: {fact}");
                }
            }
        });
    }
}

#[test]
fn every_sheet_is_reached_by_turning_on_through_the_views() {
    let views = session::View::ALL.to_vec();
    let range = Dial::Warming.widest();
    let input = OfferInput {
        dials: vec![(Dial::Warming, range)],
        years: YearList::by_flow([(365, 1.0)]).unwrap(),
        views,
        terms: session::View::ALL.map(|_| 0),
        voices: vec![session::Voice { first: "en".into(), second: None }],
        system: deshielo::words::System::Metric,
        shade: session::Shade::Light,
        settings: Vec::new(),
        help_pages: 1,
    };
    let offer = Offer::new(input).unwrap().with_about_sheets(4);
    let mut state = State::new(&offer);
    state.step(Event::Command(Command::Choose(Item::View)), &offer);
    let mut seen = Vec::new();
    for _ in 0..session::VIEWS + 3 {
        seen.push((state.shown().view, state.shown().sheet));
        state.step(Event::Turn { detents: 1, since_ms: u32::MAX }, &offer);
        state.check(&offer).unwrap();
    }
    assert_eq!(seen.iter().collect::<BTreeSet<_>>().len(), session::VIEWS + 3);
    assert_eq!((state.shown().view, state.shown().sheet), seen[0], "the circle closes");
    state.step(Event::Turn { detents: -2, since_ms: u32::MAX }, &offer);
    assert_eq!((state.shown().view, state.shown().sheet), (session::View::About, 3));
    // On a larger screen there are fewer sheets.
    state.refit(&offer.with_about_sheets(2));
    assert_eq!(state.shown().sheet, 1);
}

#[test]
fn the_first_caution_is_on_the_first_sheet() {
    let (words, _) = Words::new("en");
    Land::new(steep_valley(), 2, 9).show(Play::warm(), |scene| {
        let (_, strict) = paint(320, 240, |canvas| draw(View::About, canvas, scene, &Theme::LIGHT, &words));
        assert!(written(&strict).contains(&pressed(&words.say(CAUTIONS[0], &[]))));
    });
}

#[test]
fn the_cautions_are_those_of_the_words() {
    let (words, _) = Words::new("en");
    assert_eq!(CAUTIONS.iter().collect::<BTreeSet<_>>().len(), 11);
    for id in CAUTIONS {
        assert!(words.has(id) && words.has(&format!("{id}.title")) && words.has(&format!("{id}.print")), "{id}");
    }
}

#[test]
fn the_key_table_names_every_key_once_in_words() {
    let lines = key_lines();
    assert_eq!(lines.iter().map(|line| line.keys.len()).sum::<usize>(), KEYS.len());
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        for line in &lines {
            assert!(words.has(line.message), "{tag} lacks {}", line.message);
        }
        let mut seen = String::new();
        for sheet in 0..help::sheet_count(Size::new(320, 240), &lines, (&words, None)) {
            let (_, strict) = paint(320, 240, |canvas| draw_help(canvas, sheet, &Theme::LIGHT, &words));
            seen += &written(&strict);
        }
        for line in &lines {
            assert!(seen.contains(&pressed(&words.say(line.message, &[]))), "{tag}: {}", line.message);
        }
        assert_eq!(words.take_errors(), [], "{tag}");
    }
}

#[test]
fn an_explanation_is_there_to_its_last_word_on_the_smallest_screen() {
    Land::new(steep_valley(), 2, 9).show(Play::warm(), |scene| {
        for tag in KNOWN_TAGS {
            let (words, _) = Words::new(tag);
            for id in View::ALL.into_iter().flat_map(|view| terms(view)) {
                let explained = Explained::Term(id);
                let (_, strict) = paint(240, 240, |canvas| draw_term(canvas, explained, scene, &Theme::LIGHT, &words));
                let part = if id.starts_with("caution-") { "print" } else { "plain" };
                let text = words.say(&format!("{id}.{part}"), &[]);
                assert!(written(&strict).contains(&pressed(&text)), "{tag} {id}");
            }
        }
    });
}

#[test]
fn every_term_of_a_page_has_its_plain_words() {
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        for view in View::ALL {
            assert!(!terms(view).is_empty(), "{view:?}");
            for id in terms(view) {
                let plain = if id.starts_with("caution-") { "print" } else { "plain" };
                assert!(words.has(&format!("{id}.{plain}")), "{tag} {id}");
            }
        }
    }
}
