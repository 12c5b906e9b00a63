//! The wires of a board file as a table for the workbench.

use crate::board::file::{BoardFile, ConverterChip, HandPart, ScreenPart, WireEnd, WireTo, WiredPart};
use crate::commands::show::hand_name;
use crate::picture::views::wording::dial_name;
use crate::words::Words;

/// Letters of a line of a caution.
const WIDTH: usize = 78;
/// Spaces between two columns.
const GAP: usize = 3;

/// The name of the board, the cautions, and a table for every part.
pub(super) fn whole(board: &BoardFile, words: &Words) -> String {
    let say = |id: &str| words.say(id, &[]);
    let mut text = String::new();
    if let Some(name) = &board.name {
        text.push_str(name.get(words.tag()));
        text.push_str("\n\n");
    }
    text.push_str(&say("wiring-first"));
    text.push('\n');
    for id in ["wiring-unpowered", "wiring-volts", "wiring-mains", "wiring-look-twice"] {
        text.push_str(&item(&say(id)));
    }
    for wiring in board.wiring() {
        text.push('\n');
        text.push_str(&part_name(board, wiring.part, words));
        text.push('\n');
        if wiring.wires.is_empty() {
            text.push_str(&item(&say(without_wires(board, wiring.part))));
            continue;
        }
        let head = [say("wiring-column-end"), say("wiring-column-to"), say("wiring-column-place")];
        let rows = wiring.wires.iter().map(|(end, to)| row(board, *end, to, words));
        text.push_str(&columns(&std::iter::once(head).chain(rows).collect::<Vec<_>>()));
    }
    text
}

fn part_name(board: &BoardFile, part: WiredPart, words: &Words) -> String {
    match part {
        WiredPart::Screen(index) => match board.screens.get(index) {
            Some(ScreenPart::Panel(panel)) => {
                let chip = panel.chip.name().to_uppercase();
                words.say("wiring-panel", &[("n", (index + 1).into()), ("chip", chip.into())])
            }
            _ => words.say("wiring-monitor", &[("n", (index + 1).into())]),
        },
        WiredPart::Hand(index) => match board.hands.get(index) {
            Some(HandPart::Converter(converter)) => {
                let chip = match converter.chip {
                    ConverterChip::Ads1115 { address, .. } => format!("ADS1115, {address:#x}"),
                    ConverterChip::Mcp3008 { .. } => "MCP3008".to_owned(),
                };
                words.say("wiring-converter", &[("chip", chip.into())])
            }
            Some(hand) => hand_name(hand, 0, words),
            None => String::new(),
        },
    }
}

/// Why a part has no wires.
fn without_wires(board: &BoardFile, part: WiredPart) -> &'static str {
    match part {
        WiredPart::Screen(_) => "wiring-plugged-in",
        WiredPart::Hand(index) => match board.hands.get(index) {
            Some(HandPart::Touchscreen(_)) => "wiring-of-touchscreen",
            _ => "wiring-of-system",
        },
    }
}

fn row(board: &BoardFile, end: WireEnd, to: &WireTo, words: &Words) -> [String; 3] {
    let say = |id: &str| words.say(id, &[]);
    let end_id = match end {
        WireEnd::Supply => "wire-supply",
        WireEnd::Ground => "wire-ground",
        WireEnd::Clock => "wire-clock",
        WireEnd::DataIn => "wire-data-in",
        WireEnd::DataOut => "wire-data-out",
        WireEnd::ChipSelect => "wire-chip-select",
        WireEnd::DataCommand => "wire-data-command",
        WireEnd::Reset => "wire-reset",
        WireEnd::Backlight => "wire-backlight",
        WireEnd::SerialData => "wire-serial-data",
        WireEnd::SerialClock => "wire-serial-clock",
        WireEnd::AddressChoice => "wire-address",
        WireEnd::ContactA => "wire-contact-a",
        WireEnd::ContactB => "wire-contact-b",
        WireEnd::ShaftButton => "wire-shaft-button",
        WireEnd::Contact => "wire-contact",
        WireEnd::Common => "wire-common",
        WireEnd::LeftEnds => "wire-left-ends",
        WireEnd::RightEnds => "wire-right-ends",
        WireEnd::Input(_) => "wire-input",
    };
    let end = match end {
        WireEnd::Input(input) => words.say(end_id, &[("n", u32::from(input).into())]),
        _ => say(end_id),
    };
    let places = board.supply_places();
    let list = |places: &[u8]| places.iter().map(u8::to_string).collect::<Vec<_>>().join(", ");
    let (to, place) = match to {
        WireTo::Pin(pin, place) => {
            let place = place.map(|place| place.to_string()).unwrap_or_default();
            (words.say("wire-to-pin", &[("pin", u32::from(pin.0).to_string().into())]), place)
        }
        WireTo::BusLine(name) => (name.clone(), String::new()),
        WireTo::Supply => (say("wire-to-supply"), places.map(|(supply, _)| list(supply)).unwrap_or_default()),
        WireTo::Ground => (say("wire-to-ground"), places.map(|(_, ground)| list(ground)).unwrap_or_default()),
        WireTo::Wiper(dial) => (words.say("wire-to-wiper", &[("dial", dial_name(*dial, words).into())]), String::new()),
    };
    [end, to, place]
}

fn columns(rows: &[[String; 3]]) -> String {
    let wide = |column: usize| rows.iter().map(|row| row[column].chars().count()).max().unwrap_or(0);
    let widths = [wide(0), wide(1)];
    let mut text = String::new();
    for row in rows {
        let mut line = "  ".to_owned();
        for (cell, width) in row.iter().zip(widths) {
            line.push_str(cell);
            line.push_str(&" ".repeat(width + GAP - cell.chars().count()));
        }
        line.push_str(&row[2]);
        text.push_str(line.trim_end());
        text.push('\n');
    }
    text
}

/// A sentence with a dash before it, wrapped.
fn item(sentence: &str) -> String {
    let (mut text, mut line) = (String::new(), "  -".to_owned());
    for word in sentence.split(' ') {
        if line.chars().count() + 1 + word.chars().count() > WIDTH {
            text.push_str(&line);
            text.push('\n');
            line = "   ".to_owned();
        }
        line.push(' ');
        line.push_str(word);
    }
    text.push_str(&line);
    text.push('\n');
    text
}
