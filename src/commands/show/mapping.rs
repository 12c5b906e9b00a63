//! The map of two dials, worked out on another thread while the instrument goes on.

use std::sync::Arc;
use std::sync::atomic::{AtomicBool, Ordering};
use std::sync::mpsc::{Receiver, TryRecvError, channel};
use std::time::Duration;

use crate::picture::views::grid::{Cell, GridShown, SideShown};
use crate::place::Place;
use crate::session::{MapChoice, MapOffer, Shown};
use crate::signs::{Reading, YearReport};
use crate::water::dials::{Dial, DialRange, Dials};
use crate::whatif::{Axis, Question, Source};

/// Most values from left to right and from bottom to top: few enough for a small board to fill in while people watch.
const MOST_VALUES: (usize, usize) = (13, 11);
/// How often it is asked what has come in the meantime.
pub(super) const LOOKS: Duration = Duration::from_millis(60);

/// What decides every cell of a map.
#[derive(Clone, Copy, Debug, PartialEq)]
struct Asked {
    sides: [Dial; 2],
    reading: Reading,
    base: Dials,
}

/// The map, as far as it is there.
#[derive(Debug, Default)]
pub(super) struct Mapper {
    asked: Option<Asked>,
    map: Option<Map>,
}

#[derive(Debug)]
struct Map {
    asked: Asked,
    sides: [Axis; 2],
    cells: Vec<Cell>,
    as_it_was: Option<f64>,
    years: usize,
    /// Gone once every cell is there.
    work: Option<Work>,
}

/// The thread that fills a map in. It ends by itself soon after this is dropped.
#[derive(Debug)]
struct Work {
    cells: Receiver<(usize, Option<f64>)>,
    cancel: Arc<AtomicBool>,
}

impl Drop for Work {
    fn drop(&mut self) {
        self.cancel.store(true, Ordering::Relaxed);
    }
}

/// The numbers by which a map can be coloured at this place: how much water came, to all and to each canal, then every
/// other sign. What the place never has is left out.
pub(super) fn readings(place: &Place, at_rest: &[YearReport]) -> Vec<Reading> {
    let key = "supply_ratio";
    let gates = (0..place.gates.len()).map(|gate| Reading::from_key(key, Some(gate)));
    let others = Reading::keys(false).filter(|other| *other != key).map(|key| Reading::from_key(key, None));
    let all = [Reading::from_key(key, None)].into_iter().chain(gates).chain(others).flatten();
    all.filter(|reading| over_years(*reading, place, at_rest).is_some()).collect()
}

fn over_years(reading: Reading, place: &Place, years: &[YearReport]) -> Option<f64> {
    let unbroken = years.windows(2).all(|pair| pair[0].year.water_year + 1 == pair[1].year.water_year);
    reading.of(years.iter().map(|year| &year.signs), place.valley.enough_share, unbroken)
}

impl Mapper {
    /// Asks for the map that a state shows; what is being worked out for another one ends. `true` where it is a new one.
    pub fn ask(&mut self, shown: &Shown, offer: &MapOffer, place: &Arc<Place>, at_rest: &[YearReport]) -> bool {
        let asked = shown.map.map(|choice| {
            let MapChoice { across, up, .. } = choice;
            Asked { sides: [across, up], reading: offer.reading(choice), base: choice.base(&shown.dials) }
        });
        if self.asked == asked {
            return false;
        }
        self.asked = asked;
        // The old work stops before the new one begins.
        self.map = None;
        self.map = asked.and_then(|asked| Map::begin(asked, place, at_rest));
        true
    }

    /// Ends what is being worked out.
    pub fn stop(&mut self) {
        if self.is_working() {
            *self = Self::default();
        }
    }

    /// Whether cells are still to come.
    pub fn is_working(&self) -> bool {
        self.map.as_ref().is_some_and(|map| map.work.is_some())
    }

    /// Takes what has come; `true` where anything has.
    pub fn take(&mut self) -> bool {
        self.map.as_mut().is_some_and(Map::take)
    }

    /// Waits for every cell; `true` where any came.
    pub fn wait(&mut self) -> bool {
        self.map.as_mut().is_some_and(Map::wait)
    }

    /// The map for the picture, as far as it is there.
    pub fn shown<'m>(&'m self, dials: Dials, gate_names: &[&'m str], place: &Place) -> Option<GridShown<'m>> {
        let map = self.map.as_ref()?;
        let Asked { sides: [across, up], reading, .. } = map.asked;
        Some(GridShown {
            reading,
            gate_name: reading.gate().and_then(|gate| gate_names.get(gate).copied()),
            years: map.years,
            across: SideShown { dial: across, values: map.sides[0].values() },
            up: SideShown { dial: up, values: map.sides[1].values() },
            cells: &map.cells,
            as_it_was: map.as_it_was,
            enough_share: place.valley.enough_share,
            dials,
        })
    }
}

impl Map {
    /// Starts the work; `None` where the place has no such map.
    fn begin(asked: Asked, place: &Arc<Place>, at_rest: &[YearReport]) -> Option<Self> {
        let range = |dial: Dial| -> Option<DialRange> { place.dials.range(dial) };
        let side = |dial, most| Axis::over(dial, range(dial)?, most).ok();
        let [across, up] = asked.sides;
        let sides = [side(across, MOST_VALUES.0)?, side(up, MOST_VALUES.1)?];
        let count = sides[0].values().len() * sides[1].values().len();
        let (tell, cells) = channel();
        let cancel = Arc::new(AtomicBool::new(false));
        let (place_there, cancel_there, sides_there) = (Arc::clone(place), Arc::clone(&cancel), sides.clone());
        let years: Vec<usize> = (0..at_rest.len()).collect();
        let work = move || {
            let place = &*place_there;
            let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
            let Ok(question) = Question::new(source, asked.base, sides_there, asked.reading, &years) else { return };
            // Whoever asked may have left; then nobody hears it, and a cell that cannot be run stays without a value.
            let _ = question.run(0..count, &cancel_there, |cell, value| {
                let _ = tell.send((cell, value));
            });
        };
        std::thread::Builder::new().name("map".to_owned()).spawn(work).ok()?;
        Some(Self {
            asked,
            sides,
            cells: vec![Cell::Waiting; count],
            as_it_was: over_years(asked.reading, place, at_rest),
            years: at_rest.len(),
            work: Some(Work { cells, cancel }),
        })
    }

    fn take(&mut self) -> bool {
        let mut any = false;
        while let Some(work) = &self.work {
            match work.cells.try_recv() {
                Ok(told) => self.put(told),
                Err(TryRecvError::Empty) => break,
                Err(TryRecvError::Disconnected) => self.close(),
            }
            any = true;
        }
        any
    }

    fn wait(&mut self) -> bool {
        let mut any = false;
        while let Some(work) = &self.work {
            match work.cells.recv() {
                Ok(told) => self.put(told),
                Err(_) => self.close(),
            }
            any = true;
        }
        any
    }

    fn put(&mut self, (cell, value): (usize, Option<f64>)) {
        if let Some(place) = self.cells.get_mut(cell) {
            *place = Cell::from(value);
        }
    }

    /// No more will come: what is still missing has no value.
    fn close(&mut self) {
        self.work = None;
        self.cells.iter_mut().filter(|cell| **cell == Cell::Waiting).for_each(|cell| *cell = Cell::Nothing);
    }
}

#[cfg(test)]
mod tests {
    use std::time::Instant;

    use super::super::player::Player;
    use super::*;
    use crate::board::{FrameSize, Instrument};
    use crate::commands::speech::Speech;
    use crate::place::demo::demo_files;
    use crate::place::{Source as PlaceSource, read};
    use crate::session::{Command, Event, Item, Shade, View};

    const SIZE: FrameSize = FrameSize::new(320, 240);

    fn player() -> Player {
        let place = read(PlaceSource::Embedded(demo_files())).place.unwrap();
        let speech = Speech::choose(&["--lang".into(), "en-US".into()]);
        Player::new(crate::commands::places::Opened { place, fit: None }, &speech, Shade::Light, None).ok().unwrap()
    }

    fn cells(player: &Player) -> Vec<Cell> {
        player.mapper.map.as_ref().unwrap().cells.clone()
    }

    fn is_whole(cells: &[Cell]) -> bool {
        !cells.contains(&Cell::Waiting)
    }

    fn command(player: &mut Player, command: Command) {
        player.step(Event::Command(command));
        player.frame(SIZE, false);
    }

    #[test]
    fn the_map_fills_in_while_the_instrument_goes_on_and_only_other_dials_begin_it_anew() {
        let mut player = player();
        player.frame(SIZE, false);
        assert!(player.mapper.map.is_none() && player.wants_tick().is_none(), "nobody looks at the map");
        command(&mut player, Command::Show(View::Grid));
        assert_eq!((cells(&player).len(), player.wants_tick()), (13 * 11, Some(LOOKS)));
        let begun = Instant::now();
        while player.mapper.is_working() {
            assert!(begun.elapsed() < Duration::from_secs(60));
            std::thread::sleep(Duration::from_millis(2));
            player.frame(SIZE, false);
        }
        assert_eq!(player.wants_tick(), None);
        let whole = cells(&player);
        assert!(is_whole(&whole));
        // A cell is what the instrument answers with the same dials, and turning there moves the mark alone.
        let (reading, before) =
            (Reading::from_key("supply_ratio", None).unwrap(), player.frame(SIZE, false).pixels.to_vec());
        command(&mut player, Command::Turn(4));
        assert!(!player.mapper.is_working() && cells(&player) == whole);
        assert!(before != player.frame(SIZE, false).pixels, "the mark moved");
        player.settle();
        let warming = player.state.shown().dials.get(Dial::Warming).unwrap();
        let column =
            player.mapper.map.as_ref().unwrap().sides[0].values().iter().position(|at| *at == warming).unwrap();
        let middle = player.mapper.map.as_ref().unwrap().sides[1].values().iter().position(|at| *at == 0.0).unwrap();
        let alone = over_years(reading, &player.place, &player.answers.dialled().run.years).unwrap();
        assert_eq!(whole[middle * 13 + column], Cell::Value(alone));
        // Another dial makes another map.
        player.step(Event::TurnDial { dial: Dial::Diversion, detents: 2, since_ms: u32::MAX });
        player.frame(SIZE, false);
        assert!(player.mapper.is_working());
        assert!(!is_whole(&cells(&player)));
    }

    #[test]
    fn a_map_that_nobody_looks_at_any_more_is_given_up() {
        let mut player = player();
        command(&mut player, Command::Show(View::Grid));
        assert!(player.mapper.is_working());
        let cancel = Arc::clone(&player.mapper.map.as_ref().unwrap().work.as_ref().unwrap().cancel);
        command(&mut player, Command::Show(View::Valley));
        assert!(cancel.load(Ordering::Relaxed) && player.mapper.map.is_none());
        assert_eq!(player.wants_tick(), None);
        // Coming back begins again.
        command(&mut player, Command::Show(View::Grid));
        assert!(player.mapper.is_working());
    }

    #[test]
    fn number_and_sides_are_chosen_with_the_knob() {
        let mut player = player();
        command(&mut player, Command::Show(View::Grid));
        command(&mut player, Command::Choose(Item::MapUp));
        command(&mut player, Command::Turn(1));
        let map = player.mapper.map.as_ref().unwrap();
        assert_eq!(map.asked.sides, [Dial::Warming, Dial::SummerPrecipitation]);
        assert_eq!(map.sides[1].dial(), Dial::SummerPrecipitation);
        command(&mut player, Command::Choose(Item::MapSign));
        command(&mut player, Command::Turn(1));
        assert_eq!(
            player.mapper.map.as_ref().unwrap().asked.reading,
            Reading::from_key("supply_ratio", Some(0)).unwrap()
        );
    }
}
