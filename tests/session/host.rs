//! What a host offers: everything, or a part of it drawn at random; and events at random.

use deshielo::session::keys::KEYS;
use deshielo::session::*;
use deshielo::water::dials::{Dial, DialRange, Dials};
use deshielo::words::System;

pub fn voice(first: &str, second: Option<&str>) -> Voice {
    Voice { first: first.into(), second: second.map(Into::into) }
}

/// Years of invented flow, every fourth of them a leap year.
pub fn years(count: usize, mut next: impl FnMut() -> f64) -> YearList {
    YearList::by_flow((0..count).map(|year| (if year % 4 == 3 { 366 } else { 365 }, next()))).unwrap()
}

/// Everything: ten dials, nine views, forty years, two languages and both, four named settings.
pub fn everything() -> OfferInput {
    let setting = |key: &str, dials, year| NamedSetting { key: key.into(), setting: Setting { dials, year } };
    let dry = Dials::REST.with(Dial::WinterPrecipitation, -40.0);
    OfferInput {
        dials: Dial::ALL.into_iter().map(|dial| (dial, dial.widest())).collect(),
        years: years(40, crate::valleys::numbers(3)),
        views: View::ALL.to_vec(),
        terms: [5, 4, 3, 2, 1, 0, 2, 0, 1],
        voices: vec![voice("en-US", None), voice("es-US", None), voice("en-US", Some("es-US"))],
        system: System::Us,
        shade: Shade::Light,
        settings: vec![
            setting("dry-winter", dry, Some(YearChoice::Of(Third::Dry))),
            setting("three-dry-years", dry.with(Dial::SummerPrecipitation, -30.0), Some(YearChoice::Any(7))),
            setting("early-heat", Dials::REST.with(Dial::Warming, 2.0), None),
            setting("dry-and-thirsty", dry.with(Dial::Diversion, 20.0).with(Dial::StartingStorage, 33.0), None),
        ],
        help_pages: 3,
    }
}

pub fn offer() -> Offer {
    Offer::new(everything()).unwrap()
}

/// A part of everything, with narrower dials.
pub fn random_offer(seed: u32) -> Offer {
    let mut next = crate::valleys::numbers(seed);
    let mut input = everything();
    input.dials.retain(|_| next() < 0.7);
    for (dial, range) in &mut input.dials {
        let (least, most) = (range.least * next(), range.most * (0.1 + 0.9 * next()));
        let step = range.step * (0.3 + next());
        *range = if *dial == Dial::StartingStorage {
            DialRange { least: 30.0 * next(), most: 40.0 + 60.0 * next(), step }
        } else {
            DialRange { least, most, step }
        };
    }
    input.views.retain(|view| *view == View::Valley || next() < 0.6);
    input.years = years(1 + (next() * 5.0) as usize, &mut next);
    input.settings.clear();
    input.help_pages = 1 + (next() * 3.0) as u8;
    input.terms = std::array::from_fn(|_| (next() * 3.0) as u16);
    Offer::new(input).unwrap()
}

/// An event at random, sensible or not.
pub fn random_event(next: &mut impl FnMut() -> f64) -> Event {
    let dial = Dial::ALL[(next() * 10.0) as usize];
    let view = View::ALL[(next() * 9.0) as usize];
    let small = (next() * 9.0) as i32 - 4;
    let wild = [i32::MIN, i32::MAX, 0, 1000, -1000][(next() * 5.0) as usize];
    let number = if next() < 0.9 { small } else { wild };
    let share = match (next() * 20.0) as u32 {
        0 => f64::NAN,
        1 => f64::INFINITY,
        2 => -1e300,
        _ => next() * 1.4 - 0.2,
    };
    let since_ms = [0, 30, 80, 300, 2000, u32::MAX][(next() * 6.0) as usize];
    let items = [
        Item::Dial(dial),
        Item::View,
        Item::MapSign,
        Item::MapAcross,
        Item::MapUp,
        Item::Year,
        Item::Day,
        Item::Play,
        Item::Keep,
        Item::Settings,
        Item::Undo,
        Item::Words,
        Item::Language,
        Item::Units,
        Item::Shade,
        Item::Help,
    ];
    let item = items[(next() * 16.0) as usize];
    let target = match (next() * 10.0) as u32 {
        0 => Target::Day((next() * 400.0) as u16),
        1 => Target::Year((next() * 50.0) as usize),
        2 => Target::View(view),
        3 => Target::Item(item),
        4 => Target::Setting((next() * 14.0) as usize),
        5 => Target::Term((next() * 7.0) as u16),
        6 => Target::Button(KEYS[(next() * KEYS.len() as f64) as usize].command),
        7 => Target::Card,
        8 => Target::Nothing,
        _ => Target::Dial { dial, share },
    };
    let command = match (next() * 8.0) as u32 {
        0 => Command::StepYear(number),
        1 => Command::StepDay(number),
        2 => Command::StepView(number),
        3 => Command::StepDial(number),
        4 => Command::Choose(item),
        5 => Command::Show(view),
        6 => Command::ShowNumber(number as u8),
        _ => Command::Turn(number),
    };
    match (next() * 16.0) as u32 {
        0..4 => Event::Turn { detents: number, since_ms },
        4 | 5 => Event::Press,
        6 if next() < 0.2 => Event::LongPress,
        7 => Event::TurnDial { dial, detents: number, since_ms },
        8 => Event::SetDial { dial, share },
        9 => Event::Key(KEYS[(next() * KEYS.len() as f64) as usize].key),
        10 => Event::TouchDown(target),
        11 => Event::TouchMove(target),
        12 => Event::TouchUp(target),
        13 => Event::Command(command),
        _ => Event::Tick { elapsed_ms: [0, 16, 400, 60_000, u32::MAX][(next() * 5.0) as usize] },
    }
}
