//! Scenes for tests of the pages: a valley run over its record, as it was and under some dials.
#![allow(dead_code, reason = "each test takes what it needs")]

use deshielo::picture::views::scene::{DialSetting, Scene, YearKind};
use deshielo::picture::views::{View, canals, season, valley};
use deshielo::picture::{Canvas, Theme};
use deshielo::session::Answers;
use deshielo::session::answer::{Asked, Source};
use deshielo::session::scene::{Moment, PlaceTold, Stage};
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::valley::Valley;
use deshielo::water::weather::StationDay;
use deshielo::words::{System, Words};

/// A valley with its record.
pub struct Land {
    pub valley: Valley,
    pub calendar: Vec<CalendarDay>,
    pub record: Vec<StationDay>,
    pub place_name: String,
    pub names: Vec<String>,
}

impl Land {
    pub fn new(valley: Valley, years: i32, seed: u32) -> Self {
        let (calendar, record) = super::valleys::record(&valley, years, seed);
        let stock = ["Molino", "Vega", "Llano", "Acequia Norte", "Pueblo", "Cerro", "Rincón", "Alameda"];
        let names = (0..valley.gates.len()).map(|gate| match stock.get(gate) {
            Some(name) => (*name).to_owned(),
            None => format!("Canal {}", gate + 1),
        });
        let names = names.collect();
        Self { valley, calendar, record, place_name: "Valle Claro".to_owned(), names }
    }

    /// Runs the valley and hands the scene of a year to `look`.
    pub fn show<T>(&self, play: Play<'_>, look: impl FnOnce(&Scene<'_>) -> T) -> T {
        let source = Source { valley: &self.valley, calendar: &self.calendar, record: &self.record };
        let mut answers = Answers::new(&source).unwrap();
        assert!(answers.ask(Asked { dials: play.dials, beside: play.beside, year: play.year }));
        answers.finish(&source).unwrap();
        let gate_names: Vec<&str> = self.names.iter().map(String::as_str).collect();
        let place = PlaceTold { name: &self.place_name, invented: true, fitted: play.fitted, gate_names: &gate_names };
        let stage = Stage::new(place, &source, &answers);
        let dials: Vec<DialSetting> = Dial::ALL
            .into_iter()
            .map(|dial| DialSetting { dial, value: play.dials.get(dial), range: dial.widest() })
            .collect();
        let props = stage.props();
        let moment = Moment {
            dials: &dials,
            chosen: Some(play.chosen),
            kind: play.kind,
            day: play.day,
            playing: play.playing,
            stale: false,
            units: play.units,
            second: play.second,
            doubt: None,
        };
        look(&stage.scene(&props, moment))
    }
}

/// A valley whose mountain narrows towards its top, as mountains do.
pub fn steep_valley() -> Valley {
    let mut valley = super::valleys::whole_valley();
    let shares = [26.0, 36.0, 40.0, 38.0, 32.0, 25.0, 18.0, 12.0, 7.0, 4.0];
    for (index, (band, area_km2)) in valley.bands.iter_mut().zip(shares).enumerate() {
        band.area_km2 = area_km2;
        band.elevation_m = 1900.0 + 190.0 * index as f64;
    }
    valley
}

/// What a test wants to see of a land.
#[derive(Clone, Copy)]
pub struct Play<'a> {
    pub dials: Dials,
    pub beside: Option<Dials>,
    pub year: usize,
    pub kind: YearKind,
    pub day: usize,
    pub chosen: usize,
    pub playing: bool,
    pub fitted: bool,
    pub units: System,
    pub second: Option<&'a Words>,
}

impl Play<'_> {
    /// Mid-June of the second year, two degrees warmer, a little more demand.
    pub fn warm() -> Self {
        let dials = Dials::REST.with(Dial::Warming, 2.0).with(Dial::Diversion, 15.0);
        Self {
            dials,
            beside: None,
            year: 1,
            kind: YearKind::Dry,
            day: 256,
            chosen: 0,
            playing: false,
            fitted: false,
            units: System::Metric,
            second: None,
        }
    }
}

/// Draws one of the pages of this test.
pub fn draw(view: View, canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    match view {
        View::Valley => valley::draw(canvas, scene, theme, words),
        View::Season => season::draw(canvas, scene, theme, words),
        View::Canals => canals::draw(canvas, scene, theme, words),
        other => panic!("{other:?} has its own test"),
    }
}

/// The pages of this test.
pub const PAGES: [View; 3] = [View::Valley, View::Season, View::Canals];
