//! Reading the screens of a board file.

use super::chips::PanelChip;
use super::pins::{Uses, whole};
use super::screens::{Backlight, MonitorPart, MonitorWay, PanelPart, ScreenPart, SpiAddress, Turned, WordBits};
use super::units::{DEGREES, MEGAHERTZ, PIXELS};
use crate::board::size::FrameSize;
use crate::place::problem::{Location, Problem};
use crate::place::section::{Limits, Section, unknown_choice};
use crate::place::unit_suffix::PLAIN;

/// Columns and rows that a monitor can have.
const MONITOR_PX: Limits = Limits(240.0, 8_192.0);
/// Clock of the bus, MHz: slower ones would take seconds for a picture, faster ones no chip here bears.
const SPEED_MHZ: Limits = Limits(0.5, 80.0);
/// Hz in a MHz.
pub(super) const HZ_PER_MHZ: f64 = 1e6;
/// Chip-select lines of a bus, and the last bus that a board of this kind has.
const MOST_CHIP_SELECT: f64 = 2.0;
const MOST_BUS: u8 = 6;

#[derive(Clone, Copy)]
enum Kind {
    Panel,
    Monitor,
}

/// Reads one `[[screen]]`; `None` where it has errors, which were told.
pub(super) fn screen(section: &Section<'_>, uses: &Uses) -> Option<ScreenPart> {
    let kinds = [("panel", Kind::Panel), ("monitor", Kind::Monitor)];
    match section.need_choice("kind", &kinds) {
        Some((Kind::Panel, _)) => panel(section, uses).map(ScreenPart::Panel),
        Some((Kind::Monitor, _)) => monitor(section).map(ScreenPart::Monitor),
        None => {
            // Which keys it may have depends on the kind.
            section.allow_rest();
            None
        }
    }
}

fn panel(section: &Section<'_>, uses: &Uses) -> Option<PanelPart> {
    let chips = PanelChip::ALL.map(|chip| (chip.name(), chip));
    let chip = section.need_choice("chip", &chips);
    let (columns, rows) = chip.as_ref().map_or((480, 480), |(chip, _)| chip.memory_px());
    let size = |key, most: u16| section.number_or(key, PIXELS, Limits(1.0, most.into()), most.into());
    let (width, height) = (size("width", columns), size("height", rows));
    let offset = |key, most: u16| section.number_or(key, PIXELS, Limits(0.0, most.into()), 0.0);
    let (offset_x, offset_y) = (offset("offset_x", columns), offset("offset_y", rows));
    for (offset, length, memory) in [(&offset_x, &width, columns), (&offset_y, &height, rows)] {
        let sum = offset.value + length.value;
        if sum > f64::from(memory) {
            let told = Problem::error(offset.at.clone(), "problem-board-beyond-memory").with("sum", sum);
            section.sheet.tell(told.with("memory", usize::from(memory)));
        }
    }
    let turned = turned(section);
    let subpixels = [("rgb", false), ("bgr", true)];
    let blue_first = section.choice("subpixels", &subpixels).map(|(blue_first, _)| blue_first);
    let mirrored = section.flag_or("mirrored", chip.as_ref().is_some_and(|(chip, _)| chip.usually_mirrored()));
    let inverted = section.flag_or("inverted", chip.as_ref().is_some_and(|(chip, _)| chip.usually_inverted()));
    let word_bits = word_bits(section, chip.as_ref().map(|(chip, _)| *chip));
    let at = spi(section, uses);
    let usual_speed = chip.as_ref().map_or(f64::NAN, |(chip, _)| chip.usual_speed_mhz());
    let speed = section.number_or("speed", MEGAHERTZ, SPEED_MHZ, usual_speed).value;
    let data_command_pin = uses.need_pin(section, "data_command_pin");
    let reset_pin = uses.pin(section, "reset_pin");
    let backlight = backlight(section, uses);
    let pixels = |key, number| whole(section, key, number).map(|value| value as u16);
    let (width_px, height_px) = (pixels("width_px", &width)?, pixels("height_px", &height)?);
    let (offset_x_px, offset_y_px) = (pixels("offset_x_px", &offset_x)?, pixels("offset_y_px", &offset_y)?);
    let (chip, _) = chip?;
    has_a_layout(section, turned.picture(width_px, height_px), &width.at);
    Some(PanelPart {
        chip,
        width_px,
        height_px,
        offset_x_px,
        offset_y_px,
        turned,
        mirrored,
        blue_first: blue_first.unwrap_or(chip.usually_blue_first()),
        inverted,
        word_bits,
        at: at?,
        speed_hz: (speed * HZ_PER_MHZ) as u32,
        data_command_pin: data_command_pin?,
        reset_pin,
        backlight: backlight?,
    })
}

/// Tells where no layout goes onto glass of this size.
fn has_a_layout(section: &Section<'_>, (width, height): (u16, u16), at: &Location) {
    match FrameSize::largest_within(width.into(), height.into()) {
        None => {
            let told = Problem::error(at.clone(), "problem-board-too-small");
            section.sheet.tell(told.with("size", FrameSize::new(width, height).to_string()));
        }
        Some(layout) if layout != FrameSize::new(width, height) => {
            let told = Problem::warning(at.clone(), "problem-board-bars");
            let told = told.with("size", FrameSize::new(width, height).to_string());
            section.sheet.tell(told.with("layout", layout.to_string()));
        }
        Some(_) => {}
    }
}

fn turned(section: &Section<'_>) -> Turned {
    let Some(number) = section.number("rotation", DEGREES, Limits(0.0, 270.0)) else { return Turned::default() };
    let found = Turned::ALL.into_iter().find(|turned| f64::from(turned.degrees()) == number.value);
    if found.is_none() && !number.value.is_nan() {
        section.sheet.tell(Problem::error(number.at, "problem-board-rotation").with("value", number.value));
    }
    found.unwrap_or_default()
}

fn word_bits(section: &Section<'_>, chip: Option<PanelChip>) -> WordBits {
    let Some(number) = section.number("word_bits", PLAIN, Limits(8.0, 16.0)) else { return WordBits::Eight };
    let sixteen = number.value == 16.0;
    if number.value != 8.0 && !sixteen && !number.value.is_nan()
        || sixteen && chip.is_some_and(|chip| chip != PanelChip::Ili9486)
    {
        section.sheet.tell(Problem::error(number.at, "problem-board-word-bits").with("value", number.value));
    }
    if sixteen { WordBits::Sixteen } else { WordBits::Eight }
}

/// The bus and the chip-select line of a part.
pub(super) fn spi(section: &Section<'_>, uses: &Uses) -> Option<SpiAddress> {
    let bus = bus_number(section, "spi");
    let line = section.number_or("chip_select", PLAIN, Limits(0.0, MOST_CHIP_SELECT), 0.0);
    let line = whole(section, "chip_select", &line)? as u8;
    let (bus, at) = bus?;
    uses.take_spi(section, bus, line, &at);
    Some(SpiAddress { bus, chip_select: line })
}

/// The number of a bus that the file names with its kind: `spi0`, `i2c1`.
pub(super) fn bus_number(section: &Section<'_>, kind: &'static str) -> Option<(u8, Location)> {
    let (word, at) = section.need_text("bus")?;
    let number = word.strip_prefix(kind).and_then(|rest| rest.parse::<u8>().ok()).filter(|bus| *bus <= MOST_BUS);
    if number.is_none() {
        const KNOWN: [&str; 4] = ["spi0", "spi1", "i2c0", "i2c1"];
        let fitting = KNOWN.iter().copied().filter(|name| name.starts_with(kind));
        section.sheet.tell(unknown_choice(at.clone(), "bus", word, fitting));
    }
    number.map(|number| (number, at))
}

/// What lights it; `None` where the file says it wrong.
fn backlight(section: &Section<'_>, uses: &Uses) -> Option<Option<Backlight>> {
    let pin = uses.pin(section, "backlight_pin");
    let device = section.text("backlight_device");
    let active_low = section.flag_or("backlight_active_low", false);
    match (pin, device) {
        (Some(_), Some((_, at))) => {
            let told = Problem::error(at, "problem-either").with("key", "backlight_device");
            section.sheet.tell(told.with("other", "backlight_pin"));
            None
        }
        (Some(pin), None) => Some(Some(Backlight::Pin { pin, active_low })),
        (None, Some((name, at))) => {
            if name.contains('/') || name.starts_with('.') {
                let told = Problem::error(at, "problem-board-name").with("key", "backlight_device");
                section.sheet.tell(told.with("value", name));
            }
            Some(Some(Backlight::Device(name.to_owned())))
        }
        (None, None) => Some(None),
    }
}

fn monitor(section: &Section<'_>) -> Option<MonitorPart> {
    let connector = section.text("connector").map(|(name, _)| name.trim().to_owned());
    let (width, height) = (section.number("width", PIXELS, MONITOR_PX), section.number("height", PIXELS, MONITOR_PX));
    let mode_px = match (width, height) {
        (None, None) => None,
        (Some(width), Some(height)) => {
            let (columns, rows) = (whole(section, "width_px", &width)?, whole(section, "height_px", &height)?);
            Some((columns as u16, rows as u16))
        }
        (Some(_), None) => {
            section.tell_missing("height_px");
            None
        }
        (None, Some(_)) => {
            section.tell_missing("width_px");
            None
        }
    };
    let turned = turned(section);
    let ways = [
        ("either", MonitorWay::Either),
        ("mode_setting", MonitorWay::ModeSetting),
        ("framebuffer", MonitorWay::Framebuffer),
    ];
    let way = section.choice("way", &ways).map_or_else(MonitorWay::default, |(way, _)| way);
    let subpixels = [("rgb", false), ("bgr", true)];
    let blue_first = section.choice("subpixels", &subpixels).is_some_and(|(blue_first, _)| blue_first);
    if let Some((width, height)) = mode_px {
        let (width, height) = turned.picture(width, height);
        if FrameSize::largest_within(width.into(), height.into()).is_none() {
            has_a_layout(section, (width, height), &section.at);
        }
    }
    Some(MonitorPart { connector, mode_px, turned, blue_first, way })
}
