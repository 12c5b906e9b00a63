//! A place held against everything that was measured there.

use super::fitted::PlaceFit;
use super::measured::Measured;
use crate::fit::trust::verdict::{Evidence, rule};
use crate::fit::trust::{FlowTrust, Known, Ruling, Score, SnowLink, StoreTrust, crossed, crossing, late_summer_months};
use crate::fit::{Measures, SnowAt, SplitTest};
use crate::picture::views::facts::{ScoreUnit, UseShown, Verdict};
use crate::place::Place;
use crate::signs::read_run;
use crate::water::basin::{Basin, BasinDay};
use crate::water::canals::RiverFault;
use crate::water::dials::Dials;
use crate::water::run::run_basin;
use crate::water::units::{M3_PER_HM3, SECONDS_PER_DAY};
use crate::water::valley::{Band, Valley};
use crate::water::works::Works;

/// What came of it.
pub(super) struct Judged {
    /// The river by the set in use, on all measured days; `None` without a gauge of natural flow.
    pub flow: Option<FlowTrust>,
    /// The river on years that the set had never seen: each half by the set of the other; only after a fit with tests.
    pub unseen: Option<FlowTrust>,
    /// Why there is no river to judge by although there is a gauge: it stands below diversions.
    pub below_diversions: bool,
    /// Halves judged by halves.
    pub tests: Vec<SplitTest>,
    /// Snow.
    pub snow: Option<StoreTrust>,
    /// Whether the error of a year comes with its snow.
    pub snow_link: Option<SnowLink>,
    /// The lake, and its active capacity, hm³.
    pub storage: Option<(StoreTrust, f64)>,
    /// The recorded canals, by the gate's number.
    pub canals: Vec<(usize, StoreTrust)>,
    /// What the model may be used for.
    pub rulings: Vec<Ruling>,
}

impl Judged {
    /// Runs the place as it was and scores it; with the halves' sets too where there is a fit.
    ///
    /// # Errors
    /// A river that makes no sense, which the reader of places lets through nowhere.
    pub fn of(place: &Place, fit: Option<&PlaceFit>) -> Result<Self, RiverFault> {
        let (valley, measured) = (&place.valley, Measured::of(place));
        let start_month = valley.water_year_start_month;
        let late = late_summer_months(valley.is_southern());
        let days = run(place, valley);
        let gauge = measured.gauge.as_ref().filter(|(measures, _)| *measures != Measures::BelowDiversions);
        let of_flow = |modelled: &[f64]| {
            let (_, observed) = gauge?;
            FlowTrust::of(&place.calendar, start_month, modelled, observed, late)
        };
        let flow = of_flow(&flows(&days.0));
        let tests: Vec<SplitTest> = fit.map(|fit| fit.file.tests.clone()).unwrap_or_default();
        let unseen = fit.zip(crossing(&tests)).and_then(|(fit, test)| {
            let [first, second] = [&test.halves[0], &test.halves[1]].map(|half| {
                let valley = fit.file.apply_half(&fit.before, half).ok()?;
                Some(flows(&run(place, &valley).0))
            });
            of_flow(&crossed(test, &place.calendar, [&first?, &second?]))
        });
        let snow = measured.snow.as_ref().and_then(|(at, observed)| {
            StoreTrust::of(&place.calendar, start_month, &snow_at(place, *at, &days.0), observed)
        });
        let snow_link =
            snow.as_ref().zip(flow.as_ref()).and_then(|(snow, flow)| SnowLink::of(&snow.peaks, &flow.years));
        let (storage_hm3, canals_m3s) = works(place, &days)?;
        let storage = measured.storage_hm3.as_ref().zip(storage_hm3).and_then(|(observed, (modelled, active_hm3))| {
            Some((StoreTrust::of(&place.calendar, start_month, &modelled, observed)?, active_hm3))
        });
        let canals = measured.canals_m3s.iter().filter_map(|(gate, observed)| {
            Some((*gate, StoreTrust::of(&place.calendar, start_month, canals_m3s.get(*gate)?, observed)?))
        });
        let canals: Vec<(usize, StoreTrust)> = canals.collect();
        let of_canals: Vec<StoreTrust> = canals.iter().map(|(_, canal)| canal.clone()).collect();
        let rulings = rule(&Evidence {
            flow: unseen.as_ref().or(flow.as_ref()),
            tests: &tests,
            storage: storage.as_ref().map(|(lake, active_hm3)| (lake, *active_hm3)),
            has_lake: valley.reservoir.is_some(),
            canals: &of_canals,
            has_canals: !valley.gates.is_empty(),
        });
        let below_diversions = measured.gauge.is_some() && gauge.is_none();
        Ok(Self { flow, unseen, below_diversions, tests, snow, snow_link, storage, canals, rulings })
    }

    /// What the verdicts look at: years that were never seen, where there are any.
    pub fn best_evidence(&self) -> Option<&FlowTrust> {
        self.unseen.as_ref().or(self.flow.as_ref())
    }
}

/// The slopes day by day at rest, and the evening before the first.
fn run(place: &Place, valley: &Valley) -> (Vec<BasinDay>, BasinDay) {
    let mut days = vec![BasinDay::default(); place.days.len()];
    let before = run_basin(valley, &Basin::new(valley, &Dials::REST), &place.calendar, &place.days, &mut days);
    (days, before)
}

fn flows(days: &[BasinDay]) -> Vec<f64> {
    days.iter().map(|day| day.inflow_m3 / SECONDS_PER_DAY).collect()
}

/// Snow water where it was measured, mm.
fn snow_at(place: &Place, at: SnowAt, basin: &[BasinDay]) -> Vec<f64> {
    let days = match at {
        SnowAt::Basin => return basin.iter().map(|day| day.snow_water_mm).collect(),
        SnowAt::Spot { elevation_m, melt_exposure } => {
            let mut spot = place.valley.clone();
            spot.bands.clear();
            // One band always has room.
            let _ = spot.bands.push(Band { area_km2: 1.0, elevation_m, melt_exposure, evaporation_factor: 1.0 });
            spot.reservoir = None;
            spot.gates.clear();
            run(place, &spot).0
        }
    };
    days.iter().map(|day| day.snow_water_mm).collect()
}

/// Content of the lake, hm³, with its active capacity, and the flow into every canal, m³/s.
type WorksSeries = (Option<(Vec<f64>, f64)>, Vec<Vec<f64>>);

fn works(place: &Place, (basin, before): &(Vec<BasinDay>, BasinDay)) -> Result<WorksSeries, RiverFault> {
    let valley = &place.valley;
    let works = Works::new(valley, &Dials::REST)?;
    let dead_m3 = works.vessel().map_or(0.0, |vessel| vessel.dead_m3);
    let (mut storage, mut canals) = (Vec::new(), vec![Vec::new(); valley.gates.len()]);
    read_run(
        valley,
        &works,
        &place.calendar,
        basin,
        before,
        |evening, _| {
            storage.push((dead_m3 + evening.content_m3) / M3_PER_HM3);
            for (canal, m3) in canals.iter_mut().zip(evening.river.canal_m3) {
                canal.push(m3 / SECONDS_PER_DAY);
            }
        },
        |_| {},
    );
    let lake = valley.reservoir.as_ref().map(|_| (storage, works.active_m3() / M3_PER_HM3));
    Ok((lake, canals))
}

/// A verdict as the pages show it.
pub(super) fn use_shown(ruling: &Ruling) -> UseShown {
    UseShown {
        key: ruling.of.key(),
        verdict: match ruling.known() {
            Known::Yes => Some(Verdict::Holds),
            Known::Partly => Some(Verdict::Weakens),
            Known::No => Some(Verdict::Fails),
            Known::Unknown => None,
        },
        score: ruling.score.key(),
        unit: match ruling.score {
            Score::LossWarmCold => ScoreUnit::Score,
            Score::HalfDayError => ScoreUnit::Days,
            _ => ScoreUnit::Percent,
        },
        value: ruling.value.map_err(|need| need.key()),
        thresholds: ruling.score.thresholds(),
        beaten: ruling.beaten,
    }
}
