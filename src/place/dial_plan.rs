//! Which dials a place offers, and how far each may be turned.

use super::problem::Problem;
use super::section::{Limits, Section};
use super::tree::{Kind, Value};
use super::unit_suffix::PLAIN;
use crate::water::dials::{DIALS, Dial, DialRange};
use crate::water::valley::{Purpose, Valley};

/// What a place does with a dial.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum DialOffer {
    /// It may be turned within this range.
    Open(DialRange),
    /// The place could have it and hides it.
    Hidden,
    /// The place has nothing for it to act on: no reservoir, no town, no canals, no minimum, no crops to swap.
    Lacking,
}

/// What a place does with every dial.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DialPlan {
    offers: [DialOffer; DIALS],
}

impl DialPlan {
    /// Every dial open at its widest, for when no place is at hand.
    pub const WIDEST: DialPlan = {
        let mut offers = [DialOffer::Hidden; DIALS];
        let mut index = 0;
        while index < DIALS {
            offers[index] = DialOffer::Open(Dial::ALL[index].widest());
            index += 1;
        }
        DialPlan { offers }
    };

    /// What the place does with `dial`.
    pub fn offer(&self, dial: Dial) -> DialOffer {
        self.offers[dial as usize]
    }

    /// The range of `dial`, if it may be turned.
    pub fn range(&self, dial: Dial) -> Option<DialRange> {
        match self.offer(dial) {
            DialOffer::Open(range) => Some(range),
            DialOffer::Hidden | DialOffer::Lacking => None,
        }
    }

    /// The dials that may be turned, in their usual order, each with its range.
    pub fn open(&self) -> impl Iterator<Item = (Dial, DialRange)> + '_ {
        Dial::ALL.into_iter().filter_map(|dial| self.range(dial).map(|range| (dial, range)))
    }
}

/// Reads `[dials]` for this valley.
pub(super) fn read(root: &Section<'_>, valley: &Valley) -> DialPlan {
    let mut section = root.section("dials");
    let mut plan = DialPlan::WIDEST;
    for dial in Dial::ALL {
        if is_lacking(dial, valley) {
            plan.offers[dial as usize] = DialOffer::Lacking;
        }
    }
    for entry in section.free_entries() {
        let Some(dial) = Dial::from_key(&entry.key) else {
            section.sheet.tell(unknown_dial(section.key_at(entry), &entry.key));
            continue;
        };
        let offer = offer(&section, dial, &entry.value);
        if plan.offer(dial) != DialOffer::Lacking {
            plan.offers[dial as usize] = offer;
        } else if offer != DialOffer::Hidden {
            let problem = Problem::warning(section.key_at(entry), "problem-dial-lacking");
            section.sheet.tell(problem.with("dial", dial.key()));
        }
    }
    plan
}

/// Tells that there is no such dial, with the nearest that there is.
pub(crate) fn unknown_dial(at: super::problem::Location, key: &str) -> Problem {
    Problem::error(at, "problem-dial-unknown").with("key", key).with_nearest(key, Dial::ALL.into_iter().map(Dial::key))
}

fn is_lacking(dial: Dial, valley: &Valley) -> bool {
    match dial {
        Dial::Warming | Dial::WinterPrecipitation | Dial::SummerPrecipitation => false,
        Dial::Diversion => valley.gates.is_empty(),
        Dial::CanalLining => !valley.gates.iter().any(|gate| gate.conveyance_loss_share > 0.0),
        Dial::CropMix => !valley.gates.iter().any(|gate| match &gate.purpose {
            Purpose::Fields(fields) => fields.iter().any(|field| field.swap_to.is_some()),
            Purpose::Town(_) => false,
        }),
        Dial::RiverMinimum => !valley.minimum.rate_m3s.iter().any(|(_, rate)| *rate > 0.0),
        Dial::ReservoirSize | Dial::StartingStorage => valley.reservoir.is_none(),
        Dial::TownGrowth => !valley.gates.iter().any(|gate| gate.is_town()),
    }
}

/// `"hidden"`, or a narrower range.
fn offer(section: &Section<'_>, dial: Dial, value: &Value) -> DialOffer {
    let widest = dial.widest();
    match &value.kind {
        Kind::Text(word) if word == "hidden" => DialOffer::Hidden,
        Kind::Table(_) => {
            let part = section.as_section(value, format!("dials.{}", dial.key()));
            let within = Limits(widest.least, widest.most);
            let least = part.number_or("least", PLAIN, within, widest.least);
            let most = part.number_or("most", PLAIN, within, widest.most);
            let step = part.number_or("step", PLAIN, Limits(0.1, widest.most - widest.least), widest.step);
            // At rest a dial must have a place to stand; starting storage rests by being off.
            let rests = dial == Dial::StartingStorage || !(least.value > 0.0 || most.value < 0.0);
            if least.value >= most.value || !rests {
                let problem = Problem::error(part.at.clone(), "problem-dial-range").with("dial", dial.key());
                section.sheet.tell(problem.with("least", least.value).with("most", most.value));
            }
            DialOffer::Open(DialRange { least: least.value, most: most.value, step: step.value })
        }
        _ => {
            let at = section.value_at(value);
            section.sheet.tell(Problem::error(at, "problem-dial-form").with("dial", dial.key()));
            DialOffer::Open(widest)
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn offers_stand_in_the_order_of_the_dials() {
        for (index, dial) in Dial::ALL.into_iter().enumerate() {
            assert_eq!(dial as usize, index);
            assert_eq!(DialPlan::WIDEST.range(dial), Some(dial.widest()));
        }
    }
}
