//! The ring, the thing in hand, the end of a turn and the list of settings: their pictures and their room.

use deshielo::picture::views::frame::draw_frame;
use deshielo::picture::views::{Answer, Scene, View, canals, layout_of, season, setting_list, valley};
use deshielo::picture::{Canvas, Theme};
use deshielo::place::demo::droughts;
use deshielo::place::{DialPlan, Setting, read_setting};
use deshielo::session::hand::{HandTold, Told};
use deshielo::session::keys::Key;
use deshielo::session::{
    Command, Event, NamedSetting, Offer, OfferInput, Shade, State, View as SessionView, Voice, YearList,
};
use deshielo::signs::YearReport;
use deshielo::water::dials::Dial;
use deshielo::words::{KNOWN_TAGS, System, Words};
use std::path::Path;

use super::goldens::{check, paint};
use super::pictures::over;
use super::room::SIZES;
use super::scenes::{Land, Play, steep_valley};
use super::{PAGES, draw};

const VIEWS: [SessionView; 7] = [
    SessionView::Valley,
    SessionView::Season,
    SessionView::Canals,
    SessionView::Ledger,
    SessionView::Years,
    SessionView::Trust,
    SessionView::About,
];

fn drought_settings() -> Vec<Setting> {
    droughts()
        .iter()
        .map(|(key, text)| read_setting(Path::new(key), text, &DialPlan::WIDEST).setting.unwrap())
        .collect()
}

fn offer(years: &[YearReport], system: System) -> Offer {
    let named = drought_settings().into_iter().zip(droughts()).map(|(setting, (key, _))| NamedSetting {
        key: (*key).to_owned(),
        setting: deshielo::session::Setting { dials: setting.dials, year: None },
    });
    let input = OfferInput {
        dials: Dial::ALL.into_iter().map(|dial| (dial, dial.widest())).collect(),
        years: YearList::of(years).unwrap(),
        views: VIEWS.to_vec(),
        terms: [9; 9],
        voices: ["en", "es", "en"].map(|tag| Voice { first: tag.to_owned(), second: None }).to_vec(),
        system,
        shade: Shade::Light,
        settings: named.collect(),
        help_pages: 3,
    };
    Offer::new(input).unwrap()
}

/// Draws a page with whatever is open over it.
fn draw_all(view: View, canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    match view {
        View::Valley => valley::draw(canvas, scene, theme, words),
        View::Season => season::draw(canvas, scene, theme, words),
        View::Canals => canals::draw(canvas, scene, theme, words),
        other => draw(other, canvas, scene, theme, words),
    }
}

/// A session on a land, and what is drawn of it.
struct Table<'a> {
    offer: Offer,
    state: State,
    settings: Vec<Setting>,
    words: &'a Words,
    second: Option<&'a Words>,
}

impl<'a> Table<'a> {
    fn new(scene: &Scene<'_>, words: &'a Words, second: Option<&'a Words>) -> Self {
        let offer = offer(scene.now.years, scene.units);
        let state = State::new(&offer);
        Self { offer, state, settings: drought_settings(), words, second }
    }

    fn key(&mut self, letter: char) {
        self.step(Event::Key(Key::Char(letter)));
    }

    fn step(&mut self, event: Event) {
        self.state.step(event, &self.offer);
    }

    fn turn(&mut self, detents: i32) {
        self.step(Event::Turn { detents, since_ms: u32::MAX });
    }

    /// Hands over the scene with what the hand is at.
    fn show<T>(&self, scene: &Scene<'_>, look: impl FnOnce(&Scene<'_>) -> T) -> T {
        let name = |words: &Words| words.say("language-name", &[]);
        let both = format!("{} + {}", name(self.words), self.second.map(name).unwrap_or_default());
        let voices = [name(self.words), name(self.words), both];
        let told = Told {
            offer: &self.offer,
            settings: &self.settings,
            voices: &voices,
            gates: &[],
            words: self.words,
            second: self.second,
            stale: false,
        };
        let in_hand = HandTold::of(&self.state, &told);
        look(&Scene { hand: in_hand.hand(), ..*scene })
    }

    /// The faults of what every page has around it, or of the list where that is open.
    fn frame_faults(&self, scene: &Scene<'_>, (wide, high): (u16, u16), what: &str) -> Vec<String> {
        let (_, strict) = paint(wide, high, |canvas| {
            self.show(scene, |scene| match &scene.hand.list {
                None => {
                    let layout = layout_of(canvas, scene);
                    let answer = Answer::NothingYet;
                    draw_frame(canvas, &layout, scene, View::Valley, &answer, &Theme::LIGHT, self.words);
                }
                Some(list) => setting_list::draw(canvas, list, scene.hand.note, &Theme::LIGHT, self.words),
            });
        });
        let at = format!("{what} in {} at {wide}x{high}", self.words.tag());
        strict.faults().iter().map(|fault| format!("{at}: {fault}")).collect()
    }

    /// The faults of a whole page.
    fn faults(&self, view: View, scene: &Scene<'_>, (wide, high): (u16, u16), what: &str) -> Vec<String> {
        let (_, strict) = paint(wide, high, |canvas| {
            self.show(scene, |scene| draw_all(view, canvas, scene, &Theme::LIGHT, self.words));
        });
        let at = format!("{what}, {} in {} at {wide}x{high}", view.key(), self.words.tag());
        strict.faults().iter().map(|fault| format!("{at}: {fault}")).collect()
    }
}

#[test]
fn every_thing_on_the_ring_and_in_hand_has_room() {
    let land = Land::new(steep_valley(), 3, 9);
    let mut found = Vec::new();
    let (spanish, _) = Words::new("es-US");
    let spoken = KNOWN_TAGS.into_iter().map(|tag| (tag, None)).chain([("en-US", Some(&spanish))]);
    for (tag, second) in spoken {
        let (words, _) = Words::new(tag);
        land.show(Play { units: words.system(), second, ..Play::warm() }, |scene| {
            let mut table = Table::new(scene, &words, second);
            table.turn(1);
            table.key('k');
            table.step(Event::Press);
            for _ in 0..table.state.ring(&table.offer).count() {
                for size in SIZES {
                    found.extend(table.frame_faults(scene, size, "on the ring"));
                }
                let mut inside = Table::new(scene, &words, second);
                inside.state = table.state;
                inside.step(Event::Press);
                for (turn, what) in [(0, "in hand"), (-60, "at its first"), (600, "at its last")] {
                    inside.turn(turn);
                    for size in SIZES {
                        if inside.state.shown().card.is_none() {
                            found.extend(inside.frame_faults(scene, size, what));
                        }
                    }
                }
                table.turn(1);
            }
        });
        found.extend(words.take_errors().iter().map(|error| format!("{tag}: {error:?}")));
    }
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"));
}

#[test]
fn every_page_has_room_for_the_ring_and_for_every_note() {
    let land = Land::new(steep_valley(), 3, 9);
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        land.show(Play { units: words.system(), ..Play::warm() }, |scene| {
            let mut table = Table::new(scene, &words, None);
            let acts: [(&str, &[Event]); 8] = [
                ("nothing to undo", &[Event::Key(Key::Char('z'))]),
                ("at the end", &[Event::Turn { detents: -9, since_ms: u32::MAX }]),
                ("kept", &[Event::Key(Key::Char('k'))]),
                ("let go", &[Event::Key(Key::Char('k'))]),
                ("set back", &[Event::Turn { detents: 2, since_ms: u32::MAX }, Event::LongPress]),
                ("undone", &[Event::Key(Key::Char('z'))]),
                (
                    "recalled",
                    &[Event::Command(Command::Settings), Event::Turn { detents: 4, since_ms: 9 }, Event::Press],
                ),
                ("on the ring", &[Event::Press, Event::Turn { detents: -3, since_ms: u32::MAX }]),
            ];
            for (what, events) in acts {
                events.iter().for_each(|event| table.step(*event));
                for size in SIZES {
                    found.extend(table.frame_faults(scene, size, what));
                    // The whole page once, with the ring over its foot.
                    if what == "on the ring" {
                        for view in [View::Valley, View::Season, View::Canals].into_iter().chain(PAGES) {
                            found.extend(table.faults(view, scene, size, what));
                        }
                    }
                }
            }
        });
    }
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"));
}

#[test]
fn every_entry_of_the_list_has_room_in_one_language_and_in_two() {
    let land = Land::new(steep_valley(), 3, 9);
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        let (other, _) = Words::new(if words.language() == "es" { "en-US" } else { "es-US" });
        land.show(Play { units: words.system(), ..Play::warm() }, |scene| {
            for second in [None, Some(&other)] {
                let mut table = Table::new(scene, &words, second);
                // As many settings of one's own as there is room for, each with several dials turned.
                for dial in Dial::ALL {
                    table.step(Event::TurnDial { dial, detents: 3, since_ms: u32::MAX });
                    table.step(Event::Command(Command::Settings));
                    let save = 5 + table.state.shown().own.count() as i32;
                    table.turn(save);
                    table.step(Event::Press);
                }
                table.step(Event::Command(Command::Close));
                table.step(Event::Command(Command::Settings));
                assert_eq!(table.show(scene, |scene| scene.hand.list.map(|list| list.lines.len())), Some(12));
                for entry in 0..12 {
                    for size in SIZES {
                        let what = if second.is_some() { "entry in two" } else { "entry" };
                        found.extend(table.frame_faults(scene, size, &format!("{what} {entry}")));
                    }
                    table.turn(1);
                }
            }
        });
    }
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"));
}

#[test]
fn pictures_of_the_ring_and_the_list() {
    let land = Land::new(steep_valley(), 6, 7);
    for (tag, units) in [("en-US", System::Us), ("es-CL", System::Metric)] {
        let (words, _) = Words::new(tag);
        land.show(Play { units, day: 216, ..Play::warm() }, |scene| {
            for (wide, high) in [(320, 240), (800, 480), (240, 240)] {
                let mut table = Table::new(scene, &words, None);
                let picture = |table: &Table<'_>, view: View, what: &str| {
                    check(&format!("ring-{what}-{tag}-{wide}x{high}"), wide, high, |canvas| {
                        table.show(scene, |scene| match &scene.hand.list {
                            None => draw_all(view, canvas, scene, &Theme::LIGHT, &words),
                            Some(list) => over(canvas, scene, &words, |canvas| {
                                setting_list::draw(canvas, list, scene.hand.note, &Theme::LIGHT, &words);
                            }),
                        });
                    });
                };
                table.turn(-1);
                picture(&table, View::Season, "end");
                table.step(Event::Press);
                table.turn(11);
                picture(&table, View::Valley, "open");
                table.step(Event::Press);
                picture(&table, View::Years, "year-in-hand");
                table.step(Event::Command(Command::Settings));
                table.turn(2);
                picture(&table, View::Valley, "settings");
            }
        });
    }
}
