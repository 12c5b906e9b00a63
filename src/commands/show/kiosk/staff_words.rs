//! The staff menu in words.

use std::io::ErrorKind;

use chrono::{Duration, NaiveDate};

use super::KioskPlayer;
use crate::commands::show::view_key;
use crate::picture::views::staff::{Body, Line, StaffCard};
use crate::session::kiosk::clock::Doubt;
use crate::session::kiosk::staff::{Entry, StaffPage, Wheel};
use crate::session::kiosk::wishes::Wishes;
use crate::water::dials::Dial;
use crate::words::Words;

/// Everything that a page of the menu says.
#[derive(Debug, Default)]
pub(super) struct StaffWords {
    title: String,
    foot: String,
    text: String,
    pin: Option<(u8, String, String)>,
    lines: Vec<Line>,
    at: Option<usize>,
    in_hand: bool,
}

impl StaffWords {
    /// The words of a page.
    pub fn of(page: StaffPage, host: &KioskPlayer) -> Self {
        let words = host.player.words();
        let say = |id: &str| words.say(id, &[]);
        let page_of =
            |title: &str, lines| Self { title: say(title), foot: say("staff-foot-page"), lines, ..Self::default() };
        match page {
            StaffPage::NoPin => {
                let (title, foot, text) = (say("staff-title"), say("staff-foot-page"), say("staff-no-pin"));
                Self { title, foot, text, ..Self::default() }
            }
            StaffPage::Wait { seconds } => {
                let time = format!("{}:{:02}", seconds / 60, seconds % 60);
                let text = words.say("staff-wait", &[("time", time.into())]);
                Self { title: say("staff-pin-title"), foot: say("staff-foot-page"), text, ..Self::default() }
            }
            StaffPage::Pin { digits, wheel, was_wrong } => {
                let wheel = match wheel {
                    Wheel::Digit(digit) => digit.to_string(),
                    Wheel::Done => say("staff-pin-done"),
                    Wheel::Back => say("staff-pin-back"),
                };
                let note = if was_wrong { say("staff-pin-wrong") } else { String::new() };
                let (title, foot) = (say("staff-pin-title"), say("staff-foot-pin"));
                Self { title, foot, pin: Some((digits, wheel, note)), ..Self::default() }
            }
            StaffPage::Menu { at, in_hand } => {
                let wishes = host.kiosk.wishes();
                let line = |entry: &Entry| Line { name: say(entry_id(*entry)), value: value(*entry, wishes, words) };
                Self {
                    title: say("staff-title"),
                    foot: say(if in_hand { "staff-foot-value" } else { "staff-foot-menu" }),
                    lines: Entry::ALL.iter().map(line).collect(),
                    at: Entry::ALL.iter().position(|entry| *entry == at),
                    in_hand,
                    ..Self::default()
                }
            }
            StaffPage::Health => page_of("staff-health-title", health(host, words)),
            StaffPage::Tally => page_of("staff-tally-title", uses(host, words)),
        }
    }

    /// As the picture wants it.
    pub fn card(&self) -> StaffCard<'_> {
        let body = match &self.pin {
            Some((digits, wheel, note)) => Body::Pin { digits: *digits, wheel, note },
            None if self.lines.is_empty() => Body::Text(&self.text),
            None => Body::List { lines: &self.lines, at: self.at, in_hand: self.in_hand },
        };
        StaffCard { title: &self.title, body, foot: &self.foot }
    }
}

fn entry_id(entry: Entry) -> &'static str {
    match entry {
        Entry::Close => "staff-close",
        Entry::Health => "staff-health",
        Entry::Tally => "staff-tally",
        Entry::Message => "staff-message",
        Entry::Night => "staff-night",
        Entry::NightFrom => "staff-night-from",
        Entry::NightUntil => "staff-night-until",
        Entry::Light => "staff-light",
        Entry::LowPower => "staff-low-power",
        Entry::Clock => "staff-clock",
        Entry::ForgetGuesses => "staff-forget-guesses",
        Entry::StartAgain => "staff-start-again",
        Entry::End => "staff-end",
    }
}

fn value(entry: Entry, wishes: &Wishes, words: &Words) -> String {
    let switch = |on: bool| words.say(if on { "staff-yes" } else { "staff-no" }, &[]);
    match entry {
        Entry::Message => switch(wishes.message_shown),
        Entry::Night => switch(wishes.night.sleeps),
        Entry::NightFrom => time_of_day(wishes.night.from_minute),
        Entry::NightUntil => time_of_day(wishes.night.until_minute),
        Entry::Light => words.percent(wishes.light_percent.into(), 0),
        Entry::LowPower => switch(wishes.low_power),
        Entry::Clock => switch(wishes.clock_is_right),
        _ => String::new(),
    }
}

fn time_of_day(minute: u16) -> String {
    format!("{}:{:02}", minute / 60, minute % 60)
}

fn health(host: &KioskPlayer, words: &Words) -> Vec<Line> {
    let line = |id: &str, value: String| Line { name: words.say(id, &[]), value };
    let part = |id: &str, part: &str| line(id, words.say(&format!("{id}.{part}"), &[]));
    let supply = host.power.supply();
    let power = match (supply.is_low, supply.was_low) {
        (Some(true), _) => "low",
        (_, true) => "was-low",
        (Some(false), false) => "fine",
        (None, false) => "unknown",
    };
    let trouble = host.keep.as_ref().map(|keep| keep.troubles().next().map(|trouble| trouble.reason));
    let card = match trouble {
        Some(Some(ErrorKind::StorageFull | ErrorKind::QuotaExceeded)) => "full",
        Some(Some(ErrorKind::ReadOnlyFilesystem | ErrorKind::PermissionDenied)) => "read-only",
        None | Some(Some(_)) => "other",
        Some(None) if host.found_damage => "damaged",
        Some(None) => "fine",
    };
    let clock = match host.kiosk.clock() {
        Ok(wall) => line("staff-wall-clock", time_of_day(wall.local_minute)),
        Err(Doubt::Missing) => part("staff-wall-clock", "missing"),
        Err(Doubt::Year) => part("staff-wall-clock", "year"),
        Err(Doubt::NoSource) => part("staff-wall-clock", "no-source"),
        Err(Doubt::Unsteady) => part("staff-wall-clock", "unsteady"),
    };
    let minutes = host.began.elapsed().as_secs() / 60;
    let running = format!("{}:{:02} h", minutes / 60, minutes % 60);
    vec![
        part("staff-power", power),
        part("staff-card", card),
        clock,
        line("staff-running", running),
        line("staff-version", env!("CARGO_PKG_VERSION").to_owned()),
    ]
}

fn uses(host: &KioskPlayer, words: &Words) -> Vec<Line> {
    let mut lines = Vec::new();
    let mut line = |id: &str, value: String| lines.push(Line { name: words.say(id, &[]), value });
    let number = |count: u32| words.number(count.into(), 0);
    if let Ok(wall) = host.kiosk.clock() {
        let today = NaiveDate::default().checked_add_signed(Duration::days(wall.local_day.into()));
        for (id, days) in [("staff-uses-today", 0), ("staff-uses-week", 6), ("staff-uses-month", 29)] {
            let from = today.and_then(|today| today.checked_sub_signed(Duration::days(days)));
            line(id, number(host.tally.sum(from, today).visits));
        }
    }
    let all = host.tally.sum(None, None);
    line("staff-uses-all", number(all.visits));
    line("staff-uses-minutes", number(all.minutes));
    if let Some((view, _)) = all.views.iter().max_by_key(|(_, count)| **count) {
        line("staff-most-view", words.say(&format!("view-{}", view_key(*view)), &[]));
    }
    let dial = all.dials.iter().max_by_key(|(_, count)| **count).and_then(|(key, _)| Dial::from_key(key));
    if let Some(dial) = dial {
        line("staff-most-dial", words.say(&format!("{}.short", Words::key_id("dial", dial.key())), &[]));
    }
    lines
}
