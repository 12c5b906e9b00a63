//! The board files that are shipped.

use std::fs;
use std::path::{Path, PathBuf};

use deshielo::board::ScreenKind;
use deshielo::board::file::{
    BoardFile, ConverterChip, HandPart, MonitorWay, NightLight, PanelChip, Pin, Processor, ScreenPart, SpiAddress,
    TouchCalibration, Turned, Turns, WordBits, is_board_file, read_board,
};
use deshielo::water::dials::Dial;
use deshielo::words::KNOWN_TAGS;

fn shipped() -> Vec<PathBuf> {
    let mut files: Vec<PathBuf> = fs::read_dir("cross/boards").unwrap().map(|file| file.unwrap().path()).collect();
    files.retain(|file| file.extension().is_some_and(|extension| extension == "toml"));
    files.sort();
    files
}

fn read(name: &str) -> BoardFile {
    let path = Path::new("cross/boards").join(name);
    let outcome = read_board(&path, &fs::read_to_string(&path).unwrap(), &KNOWN_TAGS);
    assert_eq!(outcome.problems, []);
    outcome.board.unwrap()
}

#[test]
fn all_are_right_and_named_in_both_languages() {
    let files = shipped();
    assert!(files.len() >= 4);
    for file in files {
        let text = fs::read_to_string(&file).unwrap();
        assert!(is_board_file(&text), "{}", file.display());
        let board = read(file.file_name().unwrap().to_str().unwrap());
        let name = board.name.unwrap();
        assert_ne!(name.get("en"), name.get("es"));
        assert!(board.start.language.is_some() && board.start.place.is_some());
    }
}

#[test]
fn what_they_say_is_what_is_read() {
    let board = read("ili9486-480x320.toml");
    assert_eq!((board.processor, board.gpio_chip.as_str()), (Processor::Bcm2835, "/dev/gpiochip0"));
    assert_eq!((board.reserved_pins, board.idle.after_s), (vec![Pin(7), Pin(17)], 120));
    let night = board.night.unwrap();
    assert_eq!((night.from.minute, night.to.minute, night.light), (20 * 60 + 30, 6 * 60 + 30, NightLight::Dim));
    let [ScreenPart::Panel(panel)] = &board.screens[..] else { panic!("a panel") };
    assert_eq!((panel.chip, panel.turned, panel.word_bits), (PanelChip::Ili9486, Turned::By90, WordBits::Sixteen));
    assert_eq!((panel.width_px, panel.height_px, panel.speed_hz), (320, 480, 16_000_000));
    assert_eq!((panel.mirrored, panel.blue_first, panel.inverted), (true, true, false));
    assert_eq!((panel.at.device().as_str(), panel.data_command_pin), ("/dev/spidev0.0", Pin(24)));
    let [HandPart::Touchscreen(touch), HandPart::Encoder(encoder)] = &board.hands[..] else { panic!("two hands") };
    let calibration = TouchCalibration { left: 3936, right: 227, top: 268, bottom: 3880 };
    assert_eq!((touch.screen, touch.calibration, touch.axes_swapped), (0, Some(calibration), false));
    assert_eq!((encoder.a_pin, encoder.b_pin, encoder.button_pin), (Pin(5), Pin(6), Some(Pin(13))));
    assert_eq!((encoder.edges_per_detent, encoder.turns, encoder.bounce_ms), (4, Turns::Chosen, 1));

    let board = read("hdmi-1280x720-dials.toml");
    let [ScreenPart::Monitor(monitor)] = &board.screens[..] else { panic!("a monitor") };
    assert_eq!((monitor.connector.as_deref(), monitor.mode_px), (Some("HDMI-A-1"), Some((1280, 720))));
    assert_eq!((monitor.way, board.idle.after_s), (MonitorWay::Either, 300));
    let [HandPart::Converter(first), HandPart::Converter(second), ..] = &board.hands[..] else { panic!("converters") };
    assert_eq!(first.chip, ConverterChip::Ads1115 { bus: 1, address: 0x48 });
    assert_eq!(second.chip, ConverterChip::Ads1115 { bus: 1, address: 0x49 });
    assert_eq!((first.inputs.len(), first.inputs[0].dial, second.inputs[1].reversed), (4, Dial::Warming, true));
    approx::assert_relative_eq!(first.inputs[3].low_end_share, 0.03);

    let board = read("two-screens.toml");
    assert_eq!(board.screen_kinds(), [ScreenKind::Panel, ScreenKind::Framebuffer]);
    let Some(HandPart::Converter(converter)) = board.hands.first() else { panic!("a converter") };
    let at = SpiAddress { bus: 0, chip_select: 1 };
    assert_eq!(converter.chip, ConverterChip::Mcp3008 { at, speed_hz: 1_000_000 });
}

#[test]
fn the_page_for_people_explains_every_key() {
    let page = include_str!("../../cross/boards/README.md");
    let words: Vec<&str> = page.split(|c: char| !c.is_ascii_alphanumeric() && c != '_').collect();
    let mut asked = Vec::new();
    for file in fs::read_dir("src/board/file").unwrap() {
        let code = fs::read_to_string(file.unwrap().path()).unwrap();
        let code = code.split("#[cfg(test)]").next().unwrap();
        for question in ["number", "number_or", "need_number", "text", "need_text", "flag_or", "choice", "need_choice"]
        {
            let call = format!("section.{question}(\"");
            asked.extend(code.split(call.as_str()).skip(1).map(|rest| rest.split('"').next().unwrap().to_owned()));
        }
        // Pins and what is told of a number carry the key second; so do buses, whose kind is no key.
        let code = code.replace("bus_number(section, ", "");
        asked.extend(code.split("(section, \"").skip(1).map(|rest| rest.split('"').next().unwrap().to_owned()));
    }
    assert!(asked.len() > 35, "{asked:?}");
    let silent: Vec<&String> = asked
        .iter()
        .filter(|key| !words.iter().any(|word| word == key || word.starts_with(&format!("{key}_"))))
        .collect();
    assert!(silent.is_empty(), "README.md says nothing of {silent:?}");
}
