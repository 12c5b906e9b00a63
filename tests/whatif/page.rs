//! The page of the map, pixel by pixel and under the strict witness.
//!
//! `DESHIELO_WRITE_GOLDEN=1 cargo test --test whatif` writes the pictures anew; look at them before you commit them.

use std::sync::atomic::AtomicBool;

use deshielo::picture::Theme;
use deshielo::picture::views::grid::{Cell, GridShown, SideShown, draw};
use deshielo::picture::views::scene::Scene;
use deshielo::signs::Reading;
use deshielo::water::dials::{Dial, Dials};
use deshielo::whatif::{Axis, Question, Source};
use deshielo::words::{KNOWN_TAGS, System, Words};

use super::support::goldens::{check, paint};
use super::support::scenes::{Land, Play, steep_valley};

const SIZES: [(u16, u16); 7] = [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];
static NEVER: AtomicBool = AtomicBool::new(false);

/// A map that owns what a shown one borrows.
struct Map {
    reading: Reading,
    axes: [Axis; 2],
    cells: Vec<Cell>,
    as_it_was: Option<f64>,
    dials: Dials,
}

impl Map {
    fn new(land: &Land, key: &str, gate: Option<usize>, axes: [Axis; 2], dials: Dials) -> Self {
        let source = Source { valley: &land.valley, calendar: &land.calendar, record: &land.record };
        let reading = Reading::from_key(key, gate).unwrap();
        let question = Question::new(source, dials, axes.clone(), reading, &[0, 1, 2, 3]).unwrap();
        let values = question.run(0..question.cells(), &NEVER, |_, _| {}).unwrap();
        let as_it_was = question.as_it_was(&NEVER).unwrap();
        Self { reading, axes, cells: values.into_iter().map(Cell::from).collect(), as_it_was, dials }
    }

    /// The same while only its sketch is there, and some of the next pass.
    fn half_done(mut self) -> Self {
        let columns = self.axes[0].values().len();
        for (at, cell) in self.cells.iter_mut().enumerate() {
            let (column, row) = (at % columns, at / columns);
            let sketched = column % 4 == 0 && row % 4 == 0;
            let begun = row < 5 && column % 2 == 0 && row % 2 == 0;
            if !sketched && !begun {
                *cell = Cell::Waiting;
            }
        }
        self
    }

    fn shown<'a>(&'a self, land: &'a Land) -> GridShown<'a> {
        let side = |at: usize| SideShown { dial: self.axes[at].dial(), values: self.axes[at].values() };
        GridShown {
            reading: self.reading,
            gate_name: self.reading.gate().map(|gate| land.names[gate].as_str()),
            years: 4,
            across: side(0),
            up: side(1),
            cells: &self.cells,
            as_it_was: self.as_it_was,
            enough_share: land.valley.enough_share,
            dials: self.dials,
        }
    }
}

fn land() -> Land {
    Land::new(steep_valley(), 4, 7)
}

fn weather() -> [Axis; 2] {
    [axis(Dial::Warming, 0.0, 6.0, 0.5), axis(Dial::WinterPrecipitation, -20.0, 20.0, 5.0)]
}

fn axis(dial: Dial, from: f64, to: f64, step: f64) -> Axis {
    Axis::new(dial, from, to, step).unwrap()
}

fn play(dials: Dials) -> Play<'static> {
    Play { dials, ..Play::warm() }
}

#[test]
fn the_map_in_both_languages() {
    let mut land = land();
    // So that the line runs through the map of this dry valley.
    land.valley.enough_share = 0.81;
    let warm = Dials::REST.with(Dial::Warming, 2.0);
    let map = Map::new(&land, "supply_ratio", None, weather(), warm);
    for (tag, units) in [("en-US", System::Us), ("es-CL", System::Metric)] {
        let (words, _) = Words::new(tag);
        land.show(Play { units, ..play(warm) }, |scene| {
            for (wide, high) in [(320, 240), (800, 480)] {
                let name = format!("view-grid-{tag}-{wide}x{high}");
                check(&name, wide, high, |canvas| draw(canvas, scene, &map.shown(&land), &Theme::LIGHT, &words));
            }
        });
    }
}

#[test]
fn the_map_at_other_sizes_at_night_and_half_done() {
    let land = land();
    let lined = Dials::REST.with(Dial::Diversion, 10.0);
    let sides = [axis(Dial::CanalLining, 0.0, 100.0, 10.0), axis(Dial::Warming, 0.0, 6.0, 0.5)];
    let canal = Map::new(&land, "last_full_date", Some(0), sides, lined);
    let (words, _) = Words::new("es-US");
    let (english, _) = Words::new("en-GB");
    land.show(play(lined), |scene| {
        let grid = canal.shown(&land);
        check("view-grid-dark-320x240", 320, 240, |canvas| draw(canvas, scene, &grid, &Theme::DARK, &words));
        for (wide, high) in [(240, 240), (240, 320), (480, 320)] {
            let name = format!("view-grid-en-GB-{wide}x{high}");
            check(&name, wide, high, |canvas| draw(canvas, scene, &grid, &Theme::LIGHT, &english));
        }
    });
    let half = Map::new(&land, "peak_swe_mm", None, weather(), Dials::REST).half_done();
    land.show(play(Dials::REST), |scene| {
        check("view-grid-half-done-320x240", 320, 240, |canvas| {
            draw(canvas, scene, &half.shown(&land), &Theme::LIGHT, &words);
        });
    });
}

/// Draws the map at every size in every language and gives the faults.
fn faults(what: &str, land: &Land, map: &Map, second: Option<&Words>) -> Vec<String> {
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        let play = Play { units: words.system(), second, ..play(map.dials) };
        land.show(play, |scene: &Scene<'_>| {
            for (wide, high) in SIZES {
                let grid = map.shown(land);
                let (_, strict) = paint(wide, high, |canvas| draw(canvas, scene, &grid, &Theme::LIGHT, &words));
                found.extend(strict.faults().iter().map(|fault| format!("{what}, {tag} at {wide}x{high}: {fault}")));
            }
        });
        found.extend(words.take_errors().iter().map(|error| format!("{what} in {tag}: {error:?}")));
    }
    found
}

#[test]
fn nothing_lies_over_anything_or_is_cut_off() {
    let mut land = land();
    let rest = Dials::REST;
    let far = rest.with(Dial::Warming, 6.0).with(Dial::WinterPrecipitation, -20.0);
    let mut found = Vec::new();
    let mut add = |what: &str, land: &Land, map: Map| found.extend(faults(what, land, &map, None));
    for key in Reading::keys(false) {
        add(key, &land, Map::new(&land, key, None, weather(), rest));
    }
    land.names[0] = "Canal Unificado de Nuestra Señora de los Ángeles y Ñuñoa de Arriba".to_owned();
    let works = || [axis(Dial::StartingStorage, 0.0, 100.0, 25.0), axis(Dial::RiverMinimum, -100.0, 200.0, 50.0)];
    for key in Reading::keys(true) {
        add(key, &land, Map::new(&land, key, Some(0), works(), far));
    }
    for dial in Dial::ALL {
        let range = dial.widest();
        let other = if dial == Dial::Warming { Dial::TownGrowth } else { Dial::Warming };
        let fifth = |range: deshielo::water::dials::DialRange| (range.most - range.least) / 5.0;
        let whole =
            |dial: Dial, range: deshielo::water::dials::DialRange| axis(dial, range.least, range.most, fifth(range));
        for sides in
            [[whole(dial, range), whole(other, other.widest())], [whole(other, other.widest()), whole(dial, range)]]
        {
            add(dial.key(), &land, Map::new(&land, "supply_ratio", Some(0), sides, rest));
        }
    }
    add("half done", &land, Map::new(&land, "supply_ratio", None, weather(), far).half_done());
    let mut nothing = Map::new(&land, "supply_ratio", None, weather(), rest);
    nothing.cells.fill(Cell::Nothing);
    nothing.as_it_was = None;
    add("nothing", &land, nothing);
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(60)].join("\n"));
}

#[test]
fn said_in_two_languages_at_once() {
    let land = land();
    let map = Map::new(&land, "supply_ratio", Some(1), weather(), Dials::REST.with(Dial::Warming, 3.0));
    let (spanish, _) = Words::new("es-US");
    let found = faults("twice", &land, &map, Some(&spanish));
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(60)].join("\n"));
}

#[test]
fn no_size_and_no_map_makes_it_panic() {
    let land = land();
    let map = Map::new(&land, "supply_ratio", None, weather(), Dials::REST);
    let (words, _) = Words::new("es-CL");
    let broken = |cells: &[Cell], columns: usize, rows: usize| {
        let whole = map.shown(&land);
        let across = SideShown { values: &whole.across.values[..columns], ..whole.across };
        let up = SideShown { values: &whole.up.values[..rows], ..whole.up };
        let grid = GridShown { cells, across, up, as_it_was: Some(f64::NAN), ..whole };
        land.show(play(Dials::REST), |scene| {
            for (wide, high) in [(0, 0), (1, 1), (7, 300), (300, 7), (64, 48), (120, 900), (4000, 20), (333, 251)] {
                paint(wide, high, |canvas| draw(canvas, scene, &grid, &Theme::DARK, &words));
            }
        });
    };
    for (columns, rows) in [(0, 0), (0, 3), (3, 0), (1, 1), (1, 9), (13, 1), (13, 9)] {
        broken(&[], columns, rows);
        broken(&map.cells, columns, rows);
        broken(&[Cell::Value(f64::INFINITY), Cell::Nothing, Cell::Value(f64::NAN)], columns, rows);
    }
}
