//! Mistakes in a board file: each at its line, all at once, and never a panic.

use std::path::Path;

use deshielo::board::file::read_board;
use deshielo::place::problem::Severity;
use deshielo::words::KNOWN_TAGS;
use proptest::prelude::*;

/// Messages with line and column, in the order in which they are told.
fn told(text: &str) -> Vec<(&'static str, usize, usize)> {
    let outcome = read_board(Path::new("board.toml"), text, &KNOWN_TAGS);
    let wrong = outcome.problems.iter().any(|problem| problem.severity == Severity::Error);
    assert_eq!(outcome.board.is_none(), wrong);
    outcome.problems.iter().map(|problem| (problem.message, problem.at.line, problem.at.column)).collect()
}

const GOOD: &str = "[board]
processor = \"bcm2835\"
[[screen]]
kind = \"panel\"
chip = \"ili9341\"
bus = \"spi0\"
data_command_pin = 25
";

#[test]
fn everything_is_told_at_once_and_at_its_place() {
    let text = "[board]
processor = \"bcm2835\"
gpio_chip = \"gpiochip0\"
reserved_pins = [24, 99]
[start]
language = \"es-PE\"
[night]
from = \"9pm\"
light = \"dark\"
[[screen]]
kind = \"panel\"
chip = \"ili9340\"
rotation_deg = 45
bus = \"spi9\"
data_command_pin = 24
backlight_pin = 18.5
backligth_pin = 3
[[screen]]
kind = \"panel\"
chip = \"st7789\"
width_px = 172
offset_x_px = 100
word_bits = 16
bus = \"spi0\"
data_command_pin = 10
[[hand]]
kind = \"knob\"
a_pin = 3
[[hand]]
kind = \"encoder\"
a_pin = 24
bounce = 4
[[hand]]
kind = \"ads1115\"
bus = \"i2c1\"
[[hand.dial]]
input = 4
turns = \"warming\"
[[hand.dial]]
input = 1
turns = \"warming\"
[[hand]]
kind = \"touchscreen\"
screen = 3
left_right_raw = [1, 1]
";
    let want = [
        ("problem-board-device", 3, 13),
        ("problem-number-range", 4, 22),
        ("problem-choice", 6, 12),
        ("problem-key-missing", 7, 1),
        ("problem-board-time", 8, 8),
        ("problem-choice", 9, 9),
        ("problem-choice", 12, 8),
        ("problem-board-rotation", 13, 16),
        ("problem-choice", 14, 7),
        ("problem-board-pin-twice", 15, 20),
        ("problem-not-whole", 16, 17),
        ("problem-key-unknown", 17, 1),
        ("problem-board-too-small", 21, 12),
        ("problem-board-beyond-memory", 22, 15),
        ("problem-board-word-bits", 23, 13),
        ("problem-board-pin-of-bus", 25, 20),
        ("problem-choice", 27, 8),
        ("problem-key-missing", 29, 1),
        ("problem-board-pin-twice", 31, 9),
        ("problem-key-unit", 32, 1),
        ("problem-number-range", 37, 9),
        ("problem-board-dial-twice", 41, 9),
        ("problem-key-missing", 42, 1),
        ("problem-key-missing", 42, 1),
        ("problem-number-range", 44, 10),
        ("problem-board-edges-same", 45, 22),
    ];
    assert_eq!(told(text), want);
}

#[test]
fn one_slip_gives_one_problem() {
    assert_eq!(told(GOOD), []);
    for (more, problem, line) in [
        ("reset_pin = 25\n", "problem-board-pin-twice", 8),
        ("reset_pin = 11\n", "problem-board-pin-of-bus", 8),
        ("backlight_pin = 8\n", "problem-board-pin-of-bus", 8),
        ("backlight_pin = 28\n", "problem-number-range", 8),
        ("backlight_pin = 18\nbacklight_device = \"x\"\n", "problem-either", 9),
        ("backlight_device = \"../x\"\n", "problem-board-name", 8),
        ("speed_mhz = 200\n", "problem-number-range", 8),
        ("speed = 20\n", "problem-key-unit", 8),
        ("rotation_deg = \"90\"\n", "problem-not-number", 8),
        ("word_bits = 12\n", "problem-board-word-bits", 8),
        ("width_px = 241\n", "problem-number-range", 8),
        ("subpixels = \"grb\"\n", "problem-choice", 8),
        ("inverted = 1\n", "problem-not-flag", 8),
        ("[[screen]]\nkind = \"monitor\"\n[[screen]]\nkind = \"monitor\"\n", "problem-board-two-monitors", 10),
        ("[[screen]]\nkind = \"monitor\"\nwidth_px = 800\n", "problem-key-missing", 8),
        ("[[screen]]\nkind = 3\n", "problem-not-text", 9),
        ("[screen]\nkind = \"monitor\"\n", "problem-key-twice", 8),
        ("[[hand]]\nkind = \"encoder\"\na_pin = 5\nb_pin = 5\n", "problem-board-pin-twice", 11),
        (
            "[[hand]]\nkind = \"encoder\"\na_pin = 5\nb_pin = 6\nedges_per_detent = 3\n",
            "problem-board-edges-per-detent",
            12,
        ),
        (
            "[[hand]]\nkind = \"mcp3008\"\nbus = \"spi0\"\n[[hand.dial]]\ninput = 0\nturns = \"warming\"\n",
            "problem-board-place-twice",
            10,
        ),
        ("[[hand]]\nkind = \"mcp3008\"\nbus = \"spi0\"\nchip_select = 1\n", "problem-tables-missing", 8),
        (
            "[[hand]]\nkind = \"button\"\npin = 7\n[[hand]]\nkind = \"mcp3008\"\nbus = \"spi0\"\nchip_select = 1\n[[hand.dial]]\ninput = 0\nturns = \"warming\"\n",
            "problem-board-pin-of-bus",
            10,
        ),
        (
            "[[hand]]\nkind = \"button\"\npin = 3\n[[hand]]\nkind = \"ads1115\"\nbus = \"i2c1\"\n[[hand.dial]]\ninput = 0\nturns = \"warming\"\n",
            "problem-board-pin-of-bus",
            10,
        ),
        (
            "[[hand]]\nkind = \"ads1115\"\nbus = \"spi1\"\n[[hand.dial]]\ninput = 0\nturns = \"warming\"\n",
            "problem-choice",
            10,
        ),
        (
            "[[hand]]\nkind = \"ads1115\"\nbus = \"i2c1\"\n[[hand.dial]]\ninput = 0\nturns = \"warmth\"\n",
            "problem-choice",
            13,
        ),
        (
            "[[hand]]\nkind = \"ads1115\"\nbus = \"i2c1\"\n[[hand.dial]]\ninput = 0\nturns = \"warming\"\n[[hand.dial]]\ninput = 0\nturns = \"diversion\"\n",
            "problem-board-input-twice",
            15,
        ),
        ("[[hand]]\nkind = \"touchscreen\"\nname = \"x\"\nleft_right_raw = [1, 2]\n", "problem-key-missing", 8),
        (
            "[[hand]]\nkind = \"touchscreen\"\nname = \"x\"\nleft_right_raw = [1]\ntop_bottom_raw = [1, 2]\n",
            "problem-list-length",
            11,
        ),
        ("[[hands]]\nkind = \"button\"\n", "problem-table-unknown", 8),
        ("[night]\nfrom = \"21:00\"\nto = \"21:00\"\n", "problem-board-night-empty", 10),
        ("[idle]\nafter_s = 1\n", "problem-number-range", 9),
    ] {
        let told = told(&format!("{GOOD}{more}"));
        assert!(told.len() == 1 && (told[0].0, told[0].1) == (problem, line), "{more}: {told:?}");
    }
    assert_eq!(told("[board]\n"), [("problem-board-no-screen", 0, 0)]);
}

#[test]
fn a_picture_with_bars_is_a_note_and_no_mistake() {
    let text = GOOD.replace("ili9341", "ili9488");
    assert_eq!(told(&text), [("problem-board-bars", 3, 1)]);
    assert!(read_board(Path::new("board.toml"), &text, &KNOWN_TAGS).board.is_some());
}

const FULL: &str = include_str!("../../cross/boards/hdmi-1280x720-dials.toml");
const TOUCH: &str = include_str!("../../cross/boards/ili9486-480x320.toml");

proptest! {
    #![proptest_config(ProptestConfig { cases: 400, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn whatever_stands_in_it_is_answered(
        which in any::<bool>(),
        cuts in prop::collection::vec((0..1800_usize, 0..40_usize, "[-=\\[\\]\"a-z0-9.\n ]{0,9}"), 1..5),
    ) {
        let mut text = if which { FULL } else { TOUCH }.to_owned();
        for (at, length, put) in cuts {
            let at = at.min(text.len());
            let end = (at + length).min(text.len());
            // The example files are plain ASCII but for the letter in "táctil".
            if text.is_char_boundary(at) && text.is_char_boundary(end) {
                text.replace_range(at..end, &put);
            }
        }
        told(&text);
    }
}
