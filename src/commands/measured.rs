//! The records of a place, day beside day of its weather, as a fit and its judgement take them.

use crate::fit::{Measures, Record, SnowAt, SnowRecord};
use crate::place::{GaugeMeasures, Place, Series};

/// The measured series of a place, each as long as its weather; NaN on days without a value.
pub(super) struct Measured {
    /// Flow at the gauge, m³/s, and what it is.
    pub gauge: Option<(Measures, Vec<f64>)>,
    /// Snow water, mm, and where it was measured.
    pub snow: Option<(SnowAt, Vec<f64>)>,
    /// Content of the lake, dead storage and all, hm³.
    pub storage_hm3: Option<Vec<f64>>,
    /// Flow into canals, m³/s, by the gate's number.
    pub canals_m3s: Vec<(usize, Vec<f64>)>,
}

impl Measured {
    /// All that the place has.
    pub fn of(place: &Place) -> Self {
        let measures = |measures| match measures {
            GaugeMeasures::Natural => Measures::Natural,
            GaugeMeasures::ComputedInflow => Measures::ComputedInflow,
            GaugeMeasures::BelowDiversions => Measures::BelowDiversions,
        };
        let at = place
            .snow_elevation_m
            .map_or(SnowAt::Basin, |elevation_m| SnowAt::Spot { elevation_m, melt_exposure: 1.0 });
        Self {
            gauge: place.gauge.as_ref().map(|gauge| (measures(gauge.measures), beside_weather(place, &gauge.series))),
            snow: place.snow_record.as_ref().map(|series| (at, beside_weather(place, series))),
            storage_hm3: place.storage_record.as_ref().map(|series| beside_weather(place, series)),
            canals_m3s: place
                .diversions
                .iter()
                .map(|diversion| (diversion.gate, beside_weather(place, &diversion.series)))
                .collect(),
        }
    }

    /// The record that a fit takes; `None` without a gauge.
    pub fn record<'r>(&'r self, place: &'r Place) -> Option<Record<'r>> {
        let (measures, flow_m3s) = self.gauge.as_ref()?;
        Some(Record {
            calendar: &place.calendar,
            weather: &place.days,
            measures: *measures,
            flow_m3s,
            snow: self.snow.as_ref().map(|(at, swe_mm)| SnowRecord { at: *at, swe_mm }),
        })
    }
}

fn beside_weather(place: &Place, series: &Series) -> Vec<f64> {
    let ahead = (place.first_date - series.first_date).num_days();
    let value = |day: i64| usize::try_from(day + ahead).ok().and_then(|at| series.values.get(at)).copied();
    (0..place.days.len() as i64).map(|day| value(day).unwrap_or(f64::NAN)).collect()
}

/// A fingerprint of the records that a fit takes: weather, gauge and snow.
pub(super) fn checksum(place: &Place) -> String {
    let taken = 1 + usize::from(place.gauge.is_some()) + usize::from(place.snow_record.is_some());
    let sums = place.notes.records.iter().take(taken).map(|note| format!("{:016x}", note.checksum));
    sums.collect::<Vec<String>>().join("-")
}
