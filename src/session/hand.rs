//! What the hand is at, in words, for the picture: the ring, the thing in hand, the list of settings, the note at the foot.

use super::knob::End;
use super::offer::Offer;
use super::ring::Item;
use super::setting::{Setting, SettingEntry};
use super::state::{Act, Card, Done, Focus, Shown, State};
use super::view::{Shade, Speed};
use super::year::{Third, YearChoice};
use crate::picture::views::View as Page;
use crate::picture::views::grid::reading_name;
use crate::picture::views::hand::Hand;
use crate::picture::views::scene::DialSetting;
use crate::picture::views::setting_list::{SettingLine, SettingList};
use crate::picture::views::wording::{dial_name, dial_value};
use crate::place::Setting as PlaceSetting;
use crate::water::dials::{Dial, Dials};
use crate::words::{System, Words};

/// What the words are made of.
#[derive(Clone, Copy, Debug)]
pub struct Told<'a> {
    /// What is offered.
    pub offer: &'a Offer,
    /// The names and texts of the offer's settings, in its order.
    pub settings: &'a [PlaceSetting],
    /// The names of the offer's languages, in its order.
    pub voices: &'a [String],
    /// The names of the place's canals and towns, counted downstream.
    pub gates: &'a [&'a str],
    /// The language.
    pub words: &'a Words,
    /// The second language, where two are spoken.
    pub second: Option<&'a Words>,
    /// Whether the answer on show is an old one.
    pub stale: bool,
}

/// What the hand is at, owned.
#[derive(Clone, Debug)]
pub struct HandTold {
    focus: Focus,
    ring: Vec<Item>,
    pages: Vec<Page>,
    end: Option<End>,
    stands: String,
    place: Option<(usize, usize)>,
    note: String,
    lines: Vec<SettingLine>,
    open: usize,
}

impl HandTold {
    /// Puts into words what a state has in hand.
    pub fn of(state: &State, told: &Told<'_>) -> Self {
        let (shown, offer) = (state.shown(), told.offer);
        let (Focus::In(item) | Focus::Ring(item)) = shown.focus;
        let is_list = shown.focus == Focus::In(Item::Settings);
        Self {
            focus: shown.focus,
            ring: if matches!(shown.focus, Focus::Ring(_)) { state.ring(offer).collect() } else { Vec::new() },
            pages: offer.views().iter().map(|view| Page::ALL[*view as usize]).collect(),
            end: shown.at_end,
            stands: stands(item, shown, told),
            place: place(item, shown, offer),
            note: note_in_both(shown, told),
            lines: if is_list { lines(shown, told) } else { Vec::new() },
            open: shown.entry,
        }
    }

    /// The same, borrowed for a scene.
    pub fn hand(&self) -> Hand<'_> {
        let list = SettingList { lines: &self.lines, open: self.open };
        Hand {
            focus: self.focus,
            ring: &self.ring,
            pages: &self.pages,
            end: self.end,
            stands: &self.stands,
            place: self.place,
            note: &self.note,
            list: (!self.lines.is_empty()).then_some(list),
        }
    }
}

/// How the things other than dials, the year and the day stand.
fn stands(item: Item, shown: &Shown, told: &Told<'_>) -> String {
    let say = |id: &str| told.words.say(id, &[]);
    match item {
        Item::Dial(_) | Item::Year | Item::Day => String::new(),
        Item::View => say(&format!("view-{}", Page::ALL[shown.view as usize].key())),
        Item::MapSign => shown
            .map
            .map_or_else(String::new, |map| reading_name(told.offer.map().reading(map), told.gates, told.words)),
        Item::MapAcross => shown.map.map_or_else(String::new, |map| dial_name(map.across, told.words)),
        Item::MapUp => shown.map.map_or_else(String::new, |map| dial_name(map.up, told.words)),
        Item::Play if !shown.playing => say("ring-paused"),
        Item::Play => say(match shown.speed {
            Speed::Slow => "ring-slow",
            Speed::Middling => "ring-middling",
            Speed::Fast => "ring-fast",
        }),
        Item::Keep => say(if shown.beside.is_some() { "ring-kept" } else { "ring-nothing-kept" }),
        Item::Settings => {
            let count = told.offer.settings().len() + shown.own.count();
            told.words.say("ring-setting-count", &[("n", count.into())])
        }
        Item::Undo => match shown.undo.map(|undo| undo.act) {
            None => say("ring-nothing-to-undo"),
            Some(Act::Turn(dial)) => told.words.say("ring-undo-turn", &[("dial", dial_name(dial, told.words).into())]),
            Some(Act::Reset) => say("ring-undo-reset"),
            Some(Act::Recall) => say("ring-undo-recall"),
        },
        Item::Words => {
            let count = usize::from(told.offer.terms(shown.view)) + told.offer.dials().count();
            told.words.say("ring-word-count", &[("n", count.into())])
        }
        Item::Language => told.voices.get(shown.voice).cloned().unwrap_or_default(),
        Item::Units => say(match shown.system {
            System::Metric => "ring-metric",
            System::Us => "ring-us",
        }),
        Item::Shade => say(match shown.shade {
            Shade::Light => "ring-light",
            Shade::Dark => "ring-dark",
            Shade::Sunlight => "ring-sunlight",
        }),
        Item::Help => say("ring-help-told"),
    }
}

/// Where in its own list a thing stands.
fn place(item: Item, shown: &Shown, offer: &Offer) -> Option<(usize, usize)> {
    Some(match item {
        Item::View => (offer.views().iter().position(|view| *view == shown.view)?, offer.views().len()),
        Item::MapSign | Item::MapAcross | Item::MapUp => shown.map?.place(item, offer.map())?,
        Item::Year => (offer.years().place(shown.year), offer.years().count() + Third::ALL.len()),
        Item::Day => (shown.day.into(), offer.years().days(shown.year_index)?.into()),
        Item::Play => (if shown.playing { 1 + shown.speed as usize } else { 0 }, 1 + Speed::ALL.len()),
        Item::Language => (shown.voice, offer.voices().len()),
        Item::Units => (usize::from(shown.system == System::Us), 2),
        Item::Shade => (shown.shade as usize, Shade::ALL.len()),
        Item::Dial(_) | Item::Keep | Item::Settings | Item::Undo | Item::Words | Item::Help => return None,
    })
}

fn note_in_both(shown: &Shown, told: &Told<'_>) -> String {
    let first = note(shown, told);
    match told.second {
        Some(second) if !first.is_empty() => format!("{first}\n{}", note(shown, &Told { words: second, ..*told })),
        _ => first,
    }
}

/// What is said at the foot: what was done, an end, or how to go on where that is not plain.
fn note(shown: &Shown, told: &Told<'_>) -> String {
    let say = |id: &str| told.words.say(id, &[]);
    if let Some(done) = shown.done {
        return done_note(done, shown, told);
    }
    if let Some(end) = shown.at_end {
        let id = match (shown.focus, end) {
            (Focus::In(Item::Dial(_)), End::First) => "ring-end-lowest",
            (Focus::In(Item::Dial(_)), End::Last) => "ring-end-highest",
            (_, End::First) => "ring-end-first",
            (_, End::Last) => "ring-end-last",
        };
        return say(id);
    }
    match shown.focus {
        _ if matches!(shown.card, Some(Card::Help { .. } | Card::Explain(_))) => String::new(),
        Focus::Ring(item) if item.acts_at_once() => say("ring-hint-acts"),
        Focus::Ring(_) => say("ring-hint-on-ring"),
        Focus::In(Item::Settings) => String::new(),
        Focus::In(Item::Dial(_)) if told.stale => say("ring-working"),
        Focus::In(Item::Dial(_)) => String::new(),
        Focus::In(_) => say("ring-hint-in"),
    }
}

fn done_note(done: Done, shown: &Shown, told: &Told<'_>) -> String {
    let say = |id: &str| told.words.say(id, &[]);
    match done {
        Done::Kept => say("ring-done-kept"),
        Done::LetGo => say("ring-done-let-go"),
        Done::Undone => say("ring-done-undone"),
        Done::DoneAgain => say("ring-done-again"),
        Done::NothingToUndo => say("ring-done-nothing"),
        Done::Reset => say("ring-done-reset"),
        Done::Saved(index) => told.words.say("ring-done-saved", &[("n", (index + 1).into())]),
        Done::Forgot => say("ring-done-forgot"),
        Done::Recalled(entry) => line(entry, shown, &Told { second: None, ..*told }).name,
    }
}

/// The list of settings, entry by entry.
fn lines(shown: &Shown, told: &Told<'_>) -> Vec<SettingLine> {
    let entries = (0..).map_while(|index| shown.own.entry(told.offer, index));
    entries.map(|entry| line(entry, shown, told)).collect()
}

fn line(entry: SettingEntry, shown: &Shown, told: &Told<'_>) -> SettingLine {
    let both = |say: &dyn Fn(&Words) -> String| match told.second {
        Some(second) => format!("{}\n{}", say(told.words), say(second)),
        None => say(told.words),
    };
    let name = |id: &str| both(&|words| words.say(id, &[]));
    let plain = |id: &str| SettingLine { name: name(id), text: String::new() };
    match entry {
        SettingEntry::Back => plain("setting-back"),
        SettingEntry::Offered(index) => match told.settings.get(index) {
            None => SettingLine::default(),
            Some(setting) => SettingLine {
                name: both(&|words| setting.name.get(words.tag()).to_owned()),
                text: both(&|words| told_text(setting, words)),
            },
        },
        SettingEntry::Own(index) => SettingLine {
            name: both(&|words| words.say("setting-own", &[("n", (index + 1).into())])),
            text: shown.own.get(index).map(|own| in_words(&own, shown, told)).unwrap_or_default(),
        },
        SettingEntry::Save => {
            let now = Setting { dials: shown.dials, year: Some(shown.year) };
            SettingLine { name: name("setting-save"), text: in_words(&now, shown, told) }
        }
        SettingEntry::ForgetLast => plain("setting-forget"),
    }
}

fn told_text(setting: &PlaceSetting, words: &Words) -> String {
    setting.text.as_ref().map(|text| text.get(words.tag()).to_owned()).unwrap_or_default()
}

/// The turned dials of a setting and its year, in the first language.
fn in_words(setting: &Setting, shown: &Shown, told: &Told<'_>) -> String {
    let words = told.words;
    let turned = |dial: &Dial| setting.dials.get(*dial) != Dials::REST.get(*dial);
    let mut parts: Vec<String> = Dial::ALL
        .into_iter()
        .filter(turned)
        .map(|dial| {
            let range = told.offer.scale(dial).map_or(dial.widest(), |scale| scale.range());
            let stands = DialSetting { dial, value: setting.dials.get(dial), range };
            format!("{} {}", dial_name(dial, words), dial_value(&stands, shown.system, words))
        })
        .collect();
    if parts.is_empty() {
        parts.push(words.say("dial-at-rest", &[]));
    }
    if let Some(YearChoice::Of(third)) = setting.year {
        parts.push(words.say(
            match third {
                Third::Dry => "term-dry-year.short",
                Third::Middling => "term-middling-year.short",
                Third::Wet => "term-wet-year.short",
            },
            &[],
        ));
    }
    parts.join(" · ")
}
