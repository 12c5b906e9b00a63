//! Runs candidate sets of parameters through the engine and scores them, several side by side.
//!
//! A run is what the product runs: the whole record from its first day, after the place's settling years, up to the last
//! day that counts. Lanes share the arithmetic of a day, not its numbers: a set has the same score, to the bit, alone and
//! in any company (the recharge power is in steps of a half for this).

use super::objective::Objective;
use super::parameters::{Parameter, reset, set, values_of};
use super::record::{Record, SnowAt, Target};
use crate::water::basin::{BasinDay, Basins};
use crate::water::dials::Dials;
use crate::water::run::settling_days;
use crate::water::units::SECONDS_PER_DAY;
use crate::water::valley::{Band, Valley};

/// Sets that are run side by side.
pub const LANES: usize = 4;
/// Days that are run at a time, so that their results stay close to the processor.
const CHUNK_DAYS: usize = 128;

/// What is the same for all sets of a fit.
#[derive(Clone, Debug)]
pub struct Trial<'r> {
    record: Record<'r>,
    target: &'r Target,
    objective: Objective,
    parameters: &'r [Parameter],
    basin: Valley,
    spot: Option<Valley>,
}

/// Room that a thread runs in, used again from set to set.
#[derive(Clone, Debug)]
pub struct Room {
    values: Vec<f64>,
    valleys: Vec<Valley>,
    spots: Vec<Valley>,
    days: [[BasinDay; CHUNK_DAYS]; LANES],
    flow_m3s: [Vec<f64>; LANES],
    snow_mm: [Vec<f64>; LANES],
}

/// A modelled record, from its first day on.
#[derive(Clone, Debug, PartialEq)]
pub struct Modelled {
    /// Natural flow at the dam, m³/s.
    pub flow_m3s: Vec<f64>,
    /// Snow water, mm, where it is scored; empty if the objective does not look at snow.
    pub snow_mm: Vec<f64>,
}

impl<'r> Trial<'r> {
    /// Trials of `parameters` in `valley`; whatever lies below the dam is left out.
    pub fn new(
        valley: &Valley,
        parameters: &'r [Parameter],
        record: Record<'r>,
        target: &'r Target,
        objective: Objective,
    ) -> Self {
        let mut basin = valley.clone();
        basin.gates.clear();
        basin.reservoir = None;
        let spot = target.snow_mm.as_ref().and_then(|(at, _)| match *at {
            SnowAt::Basin => None,
            SnowAt::Spot { elevation_m, melt_exposure } => {
                let band = Band { area_km2: 1.0, elevation_m, melt_exposure, evaporation_factor: 1.0 };
                let mut spot = basin.clone();
                spot.bands.clear();
                // One band always has room.
                let _ = spot.bands.push(band);
                Some(spot)
            }
        });
        Self { record, target, objective, parameters, basin, spot }
    }

    /// How many numbers a point has.
    pub fn dimensions(&self) -> usize {
        self.parameters.len()
    }

    /// Room for this trial's runs.
    pub fn room(&self) -> Room {
        let days = self.target.days();
        let snow_days = if self.target.snow_mm.is_some() { days } else { 0 };
        Room {
            values: vec![0.0; self.parameters.len()],
            valleys: vec![self.basin.clone(); LANES],
            spots: self.spot.iter().flat_map(|spot| vec![spot.clone(); LANES]).collect(),
            days: [[BasinDay::default(); CHUNK_DAYS]; LANES],
            flow_m3s: std::array::from_fn(|_| vec![0.0; days]),
            snow_mm: std::array::from_fn(|_| vec![0.0; snow_days]),
        }
    }

    /// The values at a point of the unit cube.
    pub fn values_at(&self, point: &[f64]) -> Vec<f64> {
        self.parameters.iter().zip(point).map(|(parameter, at)| parameter.value_at(*at)).collect()
    }

    /// The point of the place as it stands before the fit, brought within the bounds: a first guess like any other.
    pub fn own_point(&self) -> Vec<f64> {
        let values = values_of(&self.basin, self.parameters);
        let coordinate = |(parameter, value): (&Parameter, f64)| {
            let at = parameter.coordinate_of(value);
            if at.is_nan() { 0.5 } else { at.clamp(0.0, 1.0) }
        };
        self.parameters.iter().zip(values).map(coordinate).collect()
    }

    /// Scores `points` of the unit cube, at most [`LANES`] of them, into `scores`; minus infinity where a score is not
    /// defined. Lanes without a point repeat the first.
    pub fn score<'p>(&self, points: impl Iterator<Item = &'p [f64]>, room: &mut Room, scores: &mut [f64; LANES]) {
        let mut used = 0;
        for point in points.take(LANES) {
            for ((value, parameter), at) in room.values.iter_mut().zip(self.parameters).zip(point) {
                *value = parameter.value_at(*at);
            }
            self.take(used, room);
            used += 1;
        }
        self.run_lanes(used, room);
        for (lane, score) in scores.iter_mut().enumerate().take(used) {
            *score = self.score_of(lane, room);
        }
    }

    /// What one set of values gives on every day up to the last that counts.
    pub fn run(&self, values: &[f64]) -> Modelled {
        let mut room = self.room();
        room.values.copy_from_slice(values);
        self.take(0, &mut room);
        self.run_lanes(1, &mut room);
        let [flow_m3s, ..] = room.flow_m3s;
        let [snow_mm, ..] = room.snow_mm;
        Modelled { flow_m3s, snow_mm }
    }

    fn take(&self, lane: usize, room: &mut Room) {
        reset(&mut room.valleys[lane], &self.basin);
        set(&mut room.valleys[lane], self.parameters, &room.values);
        if let (Some(spot), Some(base)) = (room.spots.get_mut(lane), &self.spot) {
            reset(spot, base);
            set(spot, self.parameters, &room.values);
        }
    }

    fn score_of(&self, lane: usize, room: &Room) -> f64 {
        let score = self.objective.score(&room.flow_m3s[lane], &room.snow_mm[lane], self.target);
        score.filter(|score| !score.is_nan()).unwrap_or(f64::NEG_INFINITY)
    }

    fn run_lanes(&self, used: usize, room: &mut Room) {
        let Room { valleys, spots, days, flow_m3s, snow_mm, .. } = room;
        let of_lane = |lane: usize| if lane < used { lane } else { 0 };
        let wants_basin_snow = spots.is_empty() && !snow_mm[0].is_empty();
        self.run_days(std::array::from_fn(|lane| &valleys[of_lane(lane)]), days, |lane, day, basin| {
            flow_m3s[lane][day] = basin.inflow_m3 / SECONDS_PER_DAY;
            if wants_basin_snow {
                snow_mm[lane][day] = basin.snow_water_mm;
            }
        });
        if !spots.is_empty() {
            self.run_days(std::array::from_fn(|lane| &spots[of_lane(lane)]), days, |lane, day, spot| {
                snow_mm[lane][day] = spot.snow_water_mm;
            });
        }
    }

    fn run_days(
        &self,
        valleys: [&Valley; LANES],
        days: &mut [[BasinDay; CHUNK_DAYS]; LANES],
        mut take: impl FnMut(usize, usize, &BasinDay),
    ) {
        let basins = Basins::<LANES>::new(valleys, [&Dials::REST; LANES]);
        let mut stores = basins.start();
        let settle = settling_days(self.record.calendar, self.basin.start.settling_years);
        for (from, to, counts) in Self::chunks(settle, false).chain(Self::chunks(self.target.days(), true)) {
            let mut out = days.each_mut().map(|days| days.as_mut_slice());
            basins.run(&mut stores, &self.record.calendar[from..to], &self.record.weather[from..to], &mut out);
            if counts {
                for (lane, days) in days.iter().enumerate() {
                    for (day, basin) in (from..to).zip(days) {
                        take(lane, day, basin);
                    }
                }
            }
        }
    }

    /// The first `days` days in chunks: from, to and whether they count.
    fn chunks(days: usize, counts: bool) -> impl Iterator<Item = (usize, usize, bool)> {
        (0..days).step_by(CHUNK_DAYS).map(move |from| (from, (from + CHUNK_DAYS).min(days), counts))
    }
}
