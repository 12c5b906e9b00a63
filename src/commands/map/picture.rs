//! The map as a PNG picture: the page of the instrument, drawn once.

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use super::sheet::Sheet;
use crate::commands::failure::Failure;
use crate::commands::fitted::PlaceFit;
use crate::commands::tell::usual_system;
use crate::picture::views::Scene;
use crate::picture::views::facts::PlaceFacts;
use crate::picture::views::grid::{Cell, GridShown, SideShown, draw};
use crate::picture::views::scene::{DialSetting, YearKind};
use crate::picture::{Canvas, Theme};
use crate::place::Place;
use crate::session::Answers;
use crate::session::answer::Source;
use crate::session::scene::{Moment, PlaceTold, Stage, facts_of};
use crate::signs::Reading;
use crate::words::{System, Words};

/// Draws the sheet, `wide` × `high` pixels.
pub(super) fn png(
    sheet: &Sheet,
    reading: Reading,
    place: &Place,
    units: Option<System>,
    (wide, high): (u16, u16),
    fit: Option<&PlaceFit>,
    words: &Words,
) -> Result<Vec<u8>, Failure> {
    let failed = || Failure::input(words.say("error-png-failed", &[]));
    let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
    let answers = Answers::new(&source).map_err(|_| failed())?;
    let names: Vec<&str> = place.gates.iter().map(|gate| gate.name.get(words.tag())).collect();
    let (name, fitted) = (place.name.get(words.tag()), fit.is_some());
    let told = PlaceTold { name, invented: place.invented, fitted, gate_names: &names };
    let stage = Stage::new(told, &source, &answers);
    let props = stage.props();
    let dials: Vec<DialSetting> =
        place.dials.open().map(|(dial, range)| DialSetting { dial, value: sheet.dials.get(dial), range }).collect();
    let moment = Moment {
        dials: &dials,
        chosen: None,
        kind: YearKind::Any,
        day: 0,
        playing: false,
        stale: false,
        units: units.unwrap_or(usual_system(place)),
        second: None,
        doubt: None,
    };
    let facts = PlaceFacts { old_fit: fit.is_some_and(|fit| fit.stale), ..facts_of(place, None, words.tag()) };
    let scene = Scene { facts, ..stage.scene(&props, moment) };
    let (Some(across), Some(up)) = (sheet.dial(0), sheet.dial(1)) else { return Err(failed()) };
    let cells: Vec<Cell> = sheet.values.iter().map(|value| Cell::from(*value)).collect();
    let grid = GridShown {
        reading,
        gate_name: reading.gate().and_then(|gate| names.get(gate).copied()),
        years: sheet.years.water_years.len(),
        across: SideShown { dial: across, values: &sheet.over[0].values },
        up: SideShown { dial: up, values: &sheet.over[1].values },
        cells: &cells,
        as_it_was: sheet.as_it_was,
        enough_share: sheet.enough_share,
        dials: sheet.dials,
    };
    let mut pixels = vec![Rgb565::WHITE; usize::from(wide) * usize::from(high)];
    let mut canvas = Canvas::new(&mut pixels, wide, high).map_err(|_| failed())?;
    draw(&mut canvas, &scene, &grid, &Theme::LIGHT, words);
    encode(&pixels, wide, high).map_err(|_| failed())
}

/// Red, green and blue of 8 bits; the highest bits fill the lowest, so that black stays black and white white.
fn encode(pixels: &[Rgb565], wide: u16, high: u16) -> Result<Vec<u8>, png::EncodingError> {
    let mut out = Vec::new();
    let mut encoder = png::Encoder::new(&mut out, wide.into(), high.into());
    encoder.set_color(png::ColorType::Rgb);
    encoder.set_depth(png::BitDepth::Eight);
    let mut writer = encoder.write_header()?;
    let eight = |colour: &Rgb565| {
        let (red, green, blue) = (colour.r(), colour.g(), colour.b());
        [red << 3 | red >> 2, green << 2 | green >> 4, blue << 3 | blue >> 2]
    };
    writer.write_image_data(&pixels.iter().flat_map(eight).collect::<Vec<u8>>())?;
    writer.finish()?;
    Ok(out)
}
