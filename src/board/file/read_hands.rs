//! Reading the hands of a board file.

use super::hands::{
    ButtonDoes, ButtonPart, ConverterChip, ConverterPart, DialInput, EncoderPart, HandPart, InputDevicePart, Pull,
    TouchCalibration, TouchscreenPart, Turns,
};
use super::pins::{Uses, whole};
use super::read_screens::{HZ_PER_MHZ, bus_number, spi};
use super::units::{MEGAHERTZ, MILLISECONDS, PER_SECOND, SHARE};
use crate::place::problem::{Location, Problem};
use crate::place::section::{Limits, Number, Section, unknown_choice};
use crate::place::unit_suffix::PLAIN;
use crate::water::dials::Dial;

/// Raw values that a touchscreen can give.
const RAW: Limits = Limits(-1_000_000.0, 1_000_000.0);
/// How long contacts bounce, ms; the usual values are common practice, no source.
const BOUNCE_MS: Limits = Limits(0.0, 200.0);
const USUAL_ENCODER_BOUNCE_MS: f64 = 1.0;
const USUAL_BUTTON_BOUNCE_MS: f64 = 15.0;
/// Readings a second: the eye wants a dozen, and more only wakes the processor.
const READS_PER_S: Limits = Limits(1.0, 200.0);
const USUAL_READS_PER_S: f64 = 25.0;
/// Shares of the supply at the ends of a potentiometer, and of the turn that noise may move; common practice, no source.
const USUAL_LOW_END: f64 = 0.02;
const USUAL_HIGH_END: f64 = 0.98;
const USUAL_HYSTERESIS: f64 = 0.01;
/// The converter's clock, MHz: 1.35 at 2.7 V and 3.6 at 5 V (Microchip, MCP3004/3008 data sheet, from memory).
const MCP3008_MHZ: Limits = Limits(0.01, 3.6);
const USUAL_MCP3008_MHZ: f64 = 1.0;
/// The four addresses that its address pin chooses (Texas Instruments, ADS111x data sheet, from memory).
const ADS1115_ADDRESS: Limits = Limits(72.0, 75.0);
const USUAL_ADS1115_ADDRESS: f64 = 72.0;
/// Converters have eight inputs at most.
const MOST_INPUT: f64 = 7.0;

#[derive(Clone, Copy)]
enum Kind {
    InputDevice,
    Touchscreen,
    Encoder,
    Button,
    Ads1115,
    Mcp3008,
}

const KINDS: [(&str, Kind); 6] = [
    ("input_device", Kind::InputDevice),
    ("touchscreen", Kind::Touchscreen),
    ("encoder", Kind::Encoder),
    ("button", Kind::Button),
    ("ads1115", Kind::Ads1115),
    ("mcp3008", Kind::Mcp3008),
];

/// Reads every `[[hand]]` of a board with `screens` screens; `None` where any has errors, which were told.
pub(super) fn hands(sections: &[Section<'_>], screens: usize, uses: &Uses) -> Option<Vec<HandPart>> {
    let mut dials: Vec<(Dial, Location)> = Vec::new();
    let hands: Vec<Option<HandPart>> =
        sections.iter().map(|section| hand(section, screens, uses, &mut dials)).collect();
    hands.into_iter().collect()
}

fn hand(section: &Section<'_>, screens: usize, uses: &Uses, dials: &mut Vec<(Dial, Location)>) -> Option<HandPart> {
    let Some((kind, _)) = section.need_choice("kind", &KINDS) else {
        // Which keys it may have depends on the kind.
        section.allow_rest();
        return None;
    };
    match kind {
        Kind::InputDevice => input_device(section, dials).map(HandPart::InputDevice),
        Kind::Touchscreen => touchscreen(section, screens).map(HandPart::Touchscreen),
        Kind::Encoder => encoder(section, uses, dials).map(HandPart::Encoder),
        Kind::Button => button(section, uses).map(HandPart::Button),
        Kind::Ads1115 | Kind::Mcp3008 => converter(section, kind, uses, dials).map(HandPart::Converter),
    }
}

fn input_device(section: &Section<'_>, dials: &mut Vec<(Dial, Location)>) -> Option<InputDevicePart> {
    let name = section.need_text("name");
    let turns = turns(section, dials);
    let reversed = section.flag_or("reversed", false);
    let counts = section.number_or("counts_per_detent", PLAIN, Limits(1.0, 4.0), 1.0);
    let counts_per_detent = whole(section, "counts_per_detent", &counts)? as u8;
    Some(InputDevicePart { name: name?.0.trim().to_owned(), turns, reversed, counts_per_detent })
}

fn touchscreen(section: &Section<'_>, screens: usize) -> Option<TouchscreenPart> {
    let name = section.need_text("name");
    // People count screens from 1.
    let screen = section.number_or("screen", PLAIN, Limits(1.0, screens.max(1) as f64), 1.0);
    let axes_swapped = section.flag_or("axes_swapped", false);
    let across = edges(section, "left_right_raw");
    let down = edges(section, "top_bottom_raw");
    let calibration = match (across, down) {
        (Some(across), Some(down)) => {
            let ((left, right), (top, bottom)) = (across?, down?);
            Some(TouchCalibration { left, right, top, bottom })
        }
        (None, None) => None,
        (across, _) => {
            section.tell_missing(if across.is_none() { "left_right_raw" } else { "top_bottom_raw" });
            return None;
        }
    };
    let screen = whole(section, "screen", &screen)? as usize - 1;
    Some(TouchscreenPart { name: name?.0.trim().to_owned(), screen, axes_swapped, calibration })
}

/// Two raw values that differ; the outer `None` where the file does not say them, the inner where it says them wrong.
fn edges(section: &Section<'_>, key: &'static str) -> Option<Option<(i32, i32)>> {
    let values = section.numbers(key, PLAIN, RAW)?;
    let [first, last] = values.as_slice() else {
        let at = section.peek(key).map_or_else(|| section.at.clone(), |value| section.value_at(value));
        let told = Problem::error(at, "problem-list-length").with("key", key);
        section.sheet.tell(told.with("found", values.len()).with("wanted", 2_usize));
        return Some(None);
    };
    let pair = |number: &Number| whole(section, key, number).map(|value| value as i32);
    let (Some(from), Some(to)) = (pair(first), pair(last)) else { return Some(None) };
    if from == to {
        section.sheet.tell(Problem::error(last.at.clone(), "problem-board-edges-same").with("key", key));
        return Some(None);
    }
    Some(Some((from, to)))
}

fn encoder(section: &Section<'_>, uses: &Uses, dials: &mut Vec<(Dial, Location)>) -> Option<EncoderPart> {
    let (a_pin, b_pin) = (uses.need_pin(section, "a_pin"), uses.need_pin(section, "b_pin"));
    let button_pin = uses.pin(section, "button_pin");
    let turns = turns(section, dials);
    let reversed = section.flag_or("reversed", false);
    let pull = pull(section);
    let bounce = section.number_or("bounce", MILLISECONDS, BOUNCE_MS, USUAL_ENCODER_BOUNCE_MS);
    let edges = section.number_or("edges_per_detent", PLAIN, Limits(1.0, 4.0), 4.0);
    let edges_per_detent = whole(section, "edges_per_detent", &edges)? as u8;
    if edges_per_detent == 3 {
        section.sheet.tell(Problem::error(edges.at.clone(), "problem-board-edges-per-detent"));
    }
    let bounce_ms = whole(section, "bounce_ms", &bounce)? as u16;
    Some(EncoderPart { a_pin: a_pin?, b_pin: b_pin?, button_pin, turns, edges_per_detent, reversed, pull, bounce_ms })
}

fn button(section: &Section<'_>, uses: &Uses) -> Option<ButtonPart> {
    let pin = uses.need_pin(section, "pin");
    let does = section.choice("does", &ButtonDoes::ALL).map_or_else(ButtonDoes::default, |(does, _)| does);
    let pull = pull(section);
    let bounce = section.number_or("bounce", MILLISECONDS, BOUNCE_MS, USUAL_BUTTON_BOUNCE_MS);
    let bounce_ms = whole(section, "bounce_ms", &bounce)? as u16;
    Some(ButtonPart { pin: pin?, does, pull, bounce_ms })
}

fn pull(section: &Section<'_>) -> Pull {
    let pulls =
        [("up", Pull::Up), ("down", Pull::Down), ("outside_up", Pull::OutsideUp), ("outside_down", Pull::OutsideDown)];
    section.choice("pull", &pulls).map_or_else(Pull::default, |(pull, _)| pull)
}

fn converter(
    section: &Section<'_>,
    kind: Kind,
    uses: &Uses,
    dials: &mut Vec<(Dial, Location)>,
) -> Option<ConverterPart> {
    let chip = match kind {
        Kind::Mcp3008 => {
            let at = spi(section, uses);
            let speed = section.number_or("speed", MEGAHERTZ, MCP3008_MHZ, USUAL_MCP3008_MHZ).value;
            at.map(|at| ConverterChip::Mcp3008 { at, speed_hz: (speed * HZ_PER_MHZ) as u32 })
        }
        _ => {
            let bus = bus_number(section, "i2c");
            let address = section.number_or("address", PLAIN, ADS1115_ADDRESS, USUAL_ADS1115_ADDRESS);
            let address = whole(section, "address", &address).map(|address| address as u8);
            bus.zip(address).map(|((bus, at), address)| {
                uses.take_i2c(section, bus, address, &at);
                ConverterChip::Ads1115 { bus, address }
            })
        }
    };
    let reads = section.number_or("reads", PER_SECOND, READS_PER_S, USUAL_READS_PER_S);
    let inputs = section.sections("dial");
    if inputs.is_empty() {
        section.tell_missing_tables("dial");
    }
    let most = chip.map_or(MOST_INPUT, |chip| f64::from(chip.inputs()) - 1.0);
    let mut taken: Vec<(u8, Location)> = Vec::new();
    let inputs: Vec<Option<DialInput>> =
        inputs.iter().map(|input| dial_input(input, most, &mut taken, dials)).collect();
    let reads_per_s = whole(section, "reads_per_s", &reads)? as u16;
    Some(ConverterPart { chip: chip?, reads_per_s, inputs: inputs.into_iter().collect::<Option<_>>()? })
}

fn dial_input(
    section: &Section<'_>,
    most: f64,
    taken: &mut Vec<(u8, Location)>,
    dials: &mut Vec<(Dial, Location)>,
) -> Option<DialInput> {
    let input = section.need_number("input", PLAIN, Limits(0.0, most));
    if section.peek("turns").is_none() {
        section.tell_missing("turns");
    }
    let dial = one_dial(section, dials);
    let reversed = section.flag_or("reversed", false);
    let low = section.number_or("low_end", SHARE, Limits(0.0, 0.4), USUAL_LOW_END).value;
    let high = section.number_or("high_end", SHARE, Limits(0.6, 1.0), USUAL_HIGH_END).value;
    let hysteresis = section.number_or("hysteresis", SHARE, Limits(0.0, 0.2), USUAL_HYSTERESIS).value;
    let number = whole(section, "input", &input)? as u8;
    if let Some((_, before)) = taken.iter().find(|(other, _)| *other == number) {
        let told = Problem::error(input.at.clone(), "problem-board-input-twice").with("input", usize::from(number));
        section.sheet.tell(told.with("line", before.line));
    }
    taken.push((number, input.at.clone()));
    Some(DialInput {
        input: number,
        dial: dial?,
        reversed,
        low_end_share: low,
        high_end_share: high,
        hysteresis_share: hysteresis,
    })
}

/// What a hand turns: the chosen dial unless the file names one.
fn turns(section: &Section<'_>, dials: &mut Vec<(Dial, Location)>) -> Turns {
    if section.peek("turns").is_none() {
        section.get("turns");
        return Turns::Chosen;
    }
    one_dial(section, dials).map_or(Turns::Chosen, Turns::Dial)
}

/// The dial named under `turns`, which no other hand may turn alone.
fn one_dial(section: &Section<'_>, dials: &mut Vec<(Dial, Location)>) -> Option<Dial> {
    let (key, at) = section.text("turns")?;
    let Some(dial) = Dial::from_key(key) else {
        section.sheet.tell(unknown_choice(at, "turns", key, Dial::ALL.iter().map(|dial| dial.key())));
        return None;
    };
    if let Some((_, before)) = dials.iter().find(|(other, _)| *other == dial) {
        let told = Problem::error(at.clone(), "problem-board-dial-twice").with("dial", dial.key());
        section.sheet.tell(told.with("line", before.line));
    }
    dials.push((dial, at));
    Some(dial)
}
