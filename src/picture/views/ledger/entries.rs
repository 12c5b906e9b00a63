//! The lines of the accounts that the ledger page shows, in and out, with what the stores gave and kept.

use crate::water::ledger::{Flow, Ledger, Store};

/// What a line's branch looks like.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(crate) enum Look {
    Rain,
    River,
    Store,
    Air,
    Crop,
    Town,
    Ground,
}

/// One line.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(crate) struct Entry {
    /// The message that names it.
    pub id: &'static str,
    pub look: Look,
    /// Whether a part of it fell as snow.
    pub has_snow: bool,
    pub now_m3: f64,
    pub was_m3: f64,
}

/// Less than this share of the whole is the noise of sums, not water.
const NOISE_SHARE: f64 = 1e-9;

type Read = fn(&Ledger) -> f64;

const IN: [(&str, Look, Read); 6] = [
    ("ledger-precipitation.short", Look::Rain, |ledger| ledger.of(Flow::BasinPrecipitation)),
    ("ledger-field-rain.short", Look::Rain, |ledger| ledger.of(Flow::FieldRain)),
    ("ledger-lake-rain.short", Look::Rain, |ledger| ledger.of(Flow::LakeRain)),
    ("page-from-reservoir", Look::Store, |ledger| -lake_gain_m3(ledger)),
    ("page-from-ground", Look::Store, |ledger| -other_gain_m3(ledger)),
    ("ledger-set-storage.short", Look::Store, |ledger| ledger.of(Flow::StorageSetIn)),
];

const OUT: [(&str, Look, Read); 11] = [
    ("ledger-evaporation.short", Look::Air, |ledger| ledger.of(Flow::BasinEvaporation)),
    ("ledger-sublimation.short", Look::Air, |ledger| ledger.of(Flow::Sublimation)),
    ("ledger-lake-evaporation.short", Look::Air, |ledger| ledger.of(Flow::LakeEvaporation)),
    ("ledger-crop-evaporation.short", Look::Crop, |ledger| ledger.of(Flow::FieldEvaporation)),
    ("ledger-town-use.short", Look::Town, |ledger| ledger.of(Flow::TownUse)),
    ("ledger-deep-loss.short", Look::Ground, |ledger| ledger.of(Flow::DeepLoss)),
    ("ledger-river-loss.short", Look::Ground, |ledger| ledger.of(Flow::RiverLoss)),
    ("page-into-ground", Look::Store, |ledger| other_gain_m3(ledger)),
    ("page-into-reservoir", Look::Store, |ledger| lake_gain_m3(ledger)),
    ("ledger-set-storage.short", Look::Store, |ledger| ledger.of(Flow::StorageSetOut)),
    ("ledger-river-out.short", Look::River, |ledger| ledger.of(Flow::RiverOut)),
];

fn lake_gain_m3(ledger: &Ledger) -> f64 {
    ledger.end.of(Store::Reservoir) - ledger.start.of(Store::Reservoir)
}

fn other_gain_m3(ledger: &Ledger) -> f64 {
    let others = Store::ALL.into_iter().filter(|store| *store != Store::Reservoir);
    others.map(|store| ledger.end.of(store) - ledger.start.of(store)).sum()
}

/// What came in, and what the stores gave.
pub(crate) fn entries_in(now: &Ledger, was: &Ledger) -> Vec<Entry> {
    read(&IN, now, was)
}

/// What went out, and what the stores kept.
pub(crate) fn entries_out(now: &Ledger, was: &Ledger) -> Vec<Entry> {
    read(&OUT, now, was)
}

fn read(lines: &[(&'static str, Look, Read)], now: &Ledger, was: &Ledger) -> Vec<Entry> {
    let whole_m3 = now.in_m3().max(now.out_m3()).max(was.in_m3()).max(was.out_m3());
    let water = |value_m3: f64| if value_m3 > whole_m3 * NOISE_SHARE { value_m3 } else { 0.0 };
    let entry = |&(id, look, read): &(&'static str, Look, Read)| {
        let has_snow = id == IN[0].0;
        Entry { id, look, has_snow, now_m3: water(read(now)), was_m3: water(read(was)) }
    };
    lines.iter().map(entry).filter(|entry| entry.now_m3 > 0.0 || entry.was_m3 > 0.0).collect()
}

/// Joins the smallest lines into one, which gets this look, until there are no more than `most`.
pub(crate) fn merge_smallest(entries: &mut Vec<Entry>, most: usize, look: Look) {
    while entries.len() > most.max(2) {
        // The joined line, once it is there, takes the next smallest in, whatever its size.
        let joined = entries.iter().position(|entry| entry.id == "page-all-else");
        let smallest = |entries: &[Entry], but: Option<usize>| {
            let size = |index: &usize| entries[*index].now_m3 + entries[*index].was_m3;
            let others = (0..entries.len()).filter(|index| Some(*index) != but);
            others.min_by(|a, b| size(a).total_cmp(&size(b)))
        };
        let Some(first) = smallest(entries, joined) else { return };
        let taken = entries.remove(first);
        let joined = entries.iter().position(|entry| entry.id == "page-all-else");
        match joined.or_else(|| smallest(entries, None)) {
            Some(into) => {
                let into = &mut entries[into];
                *into = Entry {
                    id: "page-all-else",
                    look,
                    has_snow: false,
                    now_m3: into.now_m3 + taken.now_m3,
                    was_m3: into.was_m3 + taken.was_m3,
                };
            }
            None => return,
        }
    }
    // What is joined stands last.
    entries.sort_by_key(|entry| entry.id == "page-all-else");
}

/// What went through the works within the valley.
pub(crate) fn within(ledger: &Ledger) -> [(&'static str, f64); 4] {
    [
        ("ledger-inflow.short", ledger.of(Flow::NaturalInflow)),
        ("ledger-canal-take.short", ledger.of(Flow::Canals)),
        ("ledger-return-flow.short", ledger.of(Flow::ReturnFlow)),
        ("ledger-spill.short", ledger.of(Flow::Spill)),
    ]
}

#[cfg(test)]
mod tests {
    use super::*;

    fn entry(id: &'static str, now_m3: f64) -> Entry {
        Entry { id, look: Look::Air, has_snow: false, now_m3, was_m3: 0.0 }
    }

    #[test]
    fn what_is_joined_keeps_its_water() {
        let mut entries: Vec<Entry> = [5.0, 1.0, 3.0, 2.0, 9.0].map(|now_m3| entry("x", now_m3)).to_vec();
        merge_smallest(&mut entries, 3, Look::Ground);
        assert_eq!(entries.iter().map(|entry| entry.now_m3).collect::<Vec<_>>(), [5.0, 9.0, 6.0]);
        assert_eq!(entries[2].id, "page-all-else");
        merge_smallest(&mut entries, 9, Look::Ground);
        assert_eq!(entries.len(), 3);
    }
}
