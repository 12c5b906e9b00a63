//! One water year of a run, day by day: what the valley, season and canals views draw.
//!
//! Run again from the year's first morning, which every run keeps, so that a year costs a year and the days of all the
//! others need no room.

use super::Source;
use super::run::Run;
use super::strip::{Strip, Supply};
use crate::water::run::WaterYear;
use crate::water::units::{M2_PER_KM2, M3_PER_HM3, SECONDS_PER_DAY};
use crate::water::works::Evening;

/// The river, the reservoir and the sky on a day.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ValleyDay {
    /// Rain and snow over the bands, mm.
    pub precipitation_mm: f64,
    /// Snow water over the bands in the evening, mm.
    pub snow_water_mm: f64,
    /// Natural flow at the dam, m³/s.
    pub inflow_m3s: f64,
    /// All that passed the dam, m³/s.
    pub dam_outflow_m3s: f64,
    /// Flow at the river's end, m³/s.
    pub river_out_m3s: f64,
    /// River minimum, m³/s.
    pub minimum_m3s: f64,
    /// Whether it was met where it is asked for.
    pub minimum_met: bool,
    /// Natural flow above the outlet's capacity and stored water over the spillway, m³/s.
    pub spill_m3s: f64,
    /// Active content in the evening, hm³; 0 without a reservoir.
    pub content_hm3: f64,
    /// Level of the lake in the evening, m; `None` without a reservoir.
    pub lake_level_m: Option<f64>,
    /// Surface of the lake in the evening, km²; `None` without a reservoir.
    pub lake_area_km2: Option<f64>,
}

/// A gate on a day.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct GateDay {
    /// Asked for at the head, m³/s.
    pub demand_m3s: f64,
    /// Into the canal at its head, m³/s.
    pub delivered_m3s: f64,
    /// Stored water let go for the gate, m³/s.
    pub stored_draw_m3s: f64,
    /// In the gate's account in the evening, hm³.
    pub account_hm3: f64,
    /// Evaporation of the crops in their seasons, m³.
    pub crop_evaporation_m3: f64,
    /// What it would have been without stress, m³.
    pub full_crop_evaporation_m3: f64,
    /// Whether the day was full, short or cut; `None` without demand.
    pub supply: Option<Supply>,
}

impl GateDay {
    /// Share of what the crops could use that they used; `None` out of their seasons.
    pub fn crop_water_met(&self) -> Option<f64> {
        (self.full_crop_evaporation_m3 > 0.0).then(|| self.crop_evaporation_m3 / self.full_crop_evaporation_m3)
    }
}

/// A water year day by day.
#[derive(Clone, Debug, PartialEq)]
pub struct YearDetail {
    /// Where it lies in the record.
    pub year: WaterYear,
    /// Its number among the whole water years, counted from 0.
    pub index: usize,
    /// River, reservoir and sky, day by day.
    pub days: Vec<ValleyDay>,
    /// Gate by gate in downstream order, day by day.
    pub gates: Vec<Vec<GateDay>>,
    /// Active capacity of the reservoir, hm³; 0 without one.
    pub active_hm3: f64,
    /// Dead storage, hm³; 0 without a reservoir.
    pub dead_hm3: f64,
    bands: usize,
    band_snow_mm: Vec<f64>,
}

impl YearDetail {
    /// Looks into a year of a run; `None` for a year that is not there.
    pub(super) fn new(source: &Source<'_>, run: &Run, index: usize) -> Option<Self> {
        let year = run.years.get(index)?.year;
        let mut stores = run.mornings.get(index)?.clone();
        let (works, gates) = (&run.works, source.valley.gates.len());
        let (from, to) = (year.first, year.first + year.days);
        let mut days = Vec::with_capacity(year.days);
        let mut gate_days = vec![Vec::with_capacity(year.days); gates];
        let mut strips: Vec<Strip> =
            source.valley.gates.iter().enumerate().map(|(gate, on)| Strip::new(gate, on.is_town())).collect();
        let per_second = |m3: f64| m3 / SECONDS_PER_DAY;
        works.run(
            &mut stores,
            source.calendar.get(from..to)?,
            run.slopes.days.get(from..to)?,
            &mut Evening::default(),
            |evening, stores| {
                let river = &evening.river;
                let lake = works.vessel().map(|vessel| (vessel, vessel.dead_m3 + evening.content_m3));
                days.push(ValleyDay {
                    precipitation_mm: evening.basin.precipitation_mm,
                    snow_water_mm: evening.basin.snow_water_mm,
                    inflow_m3s: per_second(evening.basin.inflow_m3),
                    dam_outflow_m3s: per_second(river.dam_outflow_m3),
                    river_out_m3s: per_second(river.river_out_m3),
                    minimum_m3s: per_second(evening.minimum_m3),
                    minimum_met: river.minimum_met,
                    spill_m3s: per_second(evening.spill_m3),
                    content_hm3: evening.content_m3 / M3_PER_HM3,
                    lake_level_m: lake.map(|(vessel, volume_m3)| vessel.level_m(volume_m3)),
                    lake_area_km2: lake.map(|(vessel, volume_m3)| vessel.area_m2(volume_m3) / M2_PER_KM2),
                });
                for (gate, (out, strip)) in gate_days.iter_mut().zip(&mut strips).enumerate() {
                    strip.day(evening);
                    let fields = &evening.fields[gate];
                    out.push(GateDay {
                        demand_m3s: per_second(evening.demand_m3[gate]),
                        delivered_m3s: per_second(river.canal_m3[gate]),
                        stored_draw_m3s: per_second(river.stored_take_m3[gate]),
                        account_hm3: stores.river.account_m3[gate] / M3_PER_HM3,
                        crop_evaporation_m3: fields.crop_evaporation_m3,
                        full_crop_evaporation_m3: fields.full_crop_evaporation_m3,
                        supply: None,
                    });
                }
            },
        );
        for (out, strip) in gate_days.iter_mut().zip(strips) {
            out.iter_mut().zip(strip.close()).for_each(|(day, supply)| day.supply = supply);
        }
        Some(Self {
            year,
            index,
            days,
            gates: gate_days,
            active_hm3: works.active_m3() / M3_PER_HM3,
            dead_hm3: works.vessel().map_or(0.0, |vessel| vessel.dead_m3 / M3_PER_HM3),
            bands: source.valley.bands.len(),
            band_snow_mm: run.slopes.band_snow_mm(source, index),
        })
    }

    /// Snow water on each band in the evening of a day, mm, in the place's order; empty beyond the year.
    pub fn band_snow_mm(&self, day: usize) -> &[f64] {
        let from = day.saturating_mul(self.bands);
        self.band_snow_mm.get(from..from.saturating_add(self.bands)).unwrap_or(&[])
    }

    /// Bytes on the heap.
    pub(super) fn bytes(&self) -> usize {
        let gates: usize = self.gates.iter().map(|days| size_of_val(days.as_slice())).sum();
        size_of::<Self>() + size_of_val(self.days.as_slice()) + size_of_val(self.band_snow_mm.as_slice()) + gates
    }
}
