//! The ten things that an audience may turn, and the range and rest of each.

use serde::{Deserialize, Serialize};

/// How many dials there are.
pub const DIALS: usize = 10;

/// One of the ten dials of the instrument.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Dial {
    /// °C added to the temperature of every day.
    Warming,
    /// % change of precipitation in the six cold-half months.
    WinterPrecipitation,
    /// % change of precipitation in the other six months.
    SummerPrecipitation,
    /// % change of each canal's demand and capacity.
    Diversion,
    /// % of every canal's remaining conveyance loss that lining removes.
    CanalLining,
    /// % of the area of the crop to swap that changes to the other crop.
    CropMix,
    /// % change of the river minimum's rate.
    RiverMinimum,
    /// % change of the reservoir's active volume.
    ReservoirSize,
    /// % of active capacity in store when every water year starts; off unless turned.
    StartingStorage,
    /// % change of the town's demand.
    TownGrowth,
}

/// What values a dial may take.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct DialRange {
    /// Lowest value, in the dial's unit.
    pub least: f64,
    /// Highest value, in the dial's unit.
    pub most: f64,
    /// Distance between two values.
    pub step: f64,
}

/// The unit a dial's value is in.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum DialUnit {
    /// A difference of temperature, °C.
    Celsius,
    /// Percent.
    Percent,
}

impl Dial {
    /// Every dial, in the order in which people meet them.
    pub const ALL: [Dial; DIALS] = [
        Dial::Warming,
        Dial::WinterPrecipitation,
        Dial::SummerPrecipitation,
        Dial::Diversion,
        Dial::CanalLining,
        Dial::CropMix,
        Dial::RiverMinimum,
        Dial::ReservoirSize,
        Dial::StartingStorage,
        Dial::TownGrowth,
    ];

    /// The stable key that files and the command line use.
    pub const fn key(self) -> &'static str {
        match self {
            Dial::Warming => "warming",
            Dial::WinterPrecipitation => "winter_precipitation",
            Dial::SummerPrecipitation => "summer_precipitation",
            Dial::Diversion => "diversion",
            Dial::CanalLining => "canal_lining",
            Dial::CropMix => "crop_mix",
            Dial::RiverMinimum => "river_minimum",
            Dial::ReservoirSize => "reservoir_size",
            Dial::StartingStorage => "starting_storage",
            Dial::TownGrowth => "town_growth",
        }
    }

    /// The dial with this key.
    pub fn from_key(key: &str) -> Option<Dial> {
        Dial::ALL.into_iter().find(|dial| dial.key() == key)
    }

    /// The widest range that the instrument allows; a place may narrow it.
    pub const fn widest(self) -> DialRange {
        let (least, most, step) = match self {
            Dial::Warming => (0.0, 6.0, 0.5),
            Dial::WinterPrecipitation | Dial::SummerPrecipitation => (-50.0, 50.0, 5.0),
            Dial::Diversion => (-50.0, 100.0, 5.0),
            Dial::CanalLining | Dial::CropMix => (0.0, 100.0, 10.0),
            Dial::RiverMinimum => (-100.0, 200.0, 10.0),
            Dial::ReservoirSize => (-50.0, 100.0, 10.0),
            Dial::StartingStorage => (0.0, 100.0, 5.0),
            Dial::TownGrowth => (0.0, 200.0, 10.0),
        };
        DialRange { least, most, step }
    }

    /// The unit of the dial's value.
    pub const fn unit(self) -> DialUnit {
        match self {
            Dial::Warming => DialUnit::Celsius,
            _ => DialUnit::Percent,
        }
    }

    /// The first stage of the run that the dial touches; everything before it need not be run again.
    pub const fn first_stage(self) -> Stage {
        match self {
            Dial::Warming | Dial::WinterPrecipitation | Dial::SummerPrecipitation => Stage::Basin,
            _ => Stage::Works,
        }
    }
}

/// The stages of a run, in order.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Stage {
    /// Weather, snow, soil, ground and channel: down to the flow that reaches the dam.
    Basin,
    /// Reservoir, canals, fields, town and river.
    Works,
}

/// Where every dial stands.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Dials {
    /// °C.
    pub warming: f64,
    /// %.
    pub winter_precipitation: f64,
    /// %.
    pub summer_precipitation: f64,
    /// %.
    pub diversion: f64,
    /// %.
    pub canal_lining: f64,
    /// %.
    pub crop_mix: f64,
    /// %.
    pub river_minimum: f64,
    /// %.
    pub reservoir_size: f64,
    /// % of active capacity; `None` carries storage over from year to year.
    pub starting_storage: Option<f64>,
    /// %.
    pub town_growth: f64,
}

impl Dials {
    /// Every dial at rest.
    pub const REST: Dials = Dials {
        warming: 0.0,
        winter_precipitation: 0.0,
        summer_precipitation: 0.0,
        diversion: 0.0,
        canal_lining: 0.0,
        crop_mix: 0.0,
        river_minimum: 0.0,
        reservoir_size: 0.0,
        starting_storage: None,
        town_growth: 0.0,
    };

    /// Where `dial` stands; `None` only for a starting storage that carries over.
    pub fn get(&self, dial: Dial) -> Option<f64> {
        match dial {
            Dial::Warming => Some(self.warming),
            Dial::WinterPrecipitation => Some(self.winter_precipitation),
            Dial::SummerPrecipitation => Some(self.summer_precipitation),
            Dial::Diversion => Some(self.diversion),
            Dial::CanalLining => Some(self.canal_lining),
            Dial::CropMix => Some(self.crop_mix),
            Dial::RiverMinimum => Some(self.river_minimum),
            Dial::ReservoirSize => Some(self.reservoir_size),
            Dial::StartingStorage => self.starting_storage,
            Dial::TownGrowth => Some(self.town_growth),
        }
    }

    /// The same dials with `dial` at `value`. The value must have been checked against the place's range.
    #[must_use]
    pub fn with(mut self, dial: Dial, value: f64) -> Dials {
        match dial {
            Dial::Warming => self.warming = value,
            Dial::WinterPrecipitation => self.winter_precipitation = value,
            Dial::SummerPrecipitation => self.summer_precipitation = value,
            Dial::Diversion => self.diversion = value,
            Dial::CanalLining => self.canal_lining = value,
            Dial::CropMix => self.crop_mix = value,
            Dial::RiverMinimum => self.river_minimum = value,
            Dial::ReservoirSize => self.reservoir_size = value,
            Dial::StartingStorage => self.starting_storage = Some(value),
            Dial::TownGrowth => self.town_growth = value,
        }
        self
    }

    /// The same dials with `dial` back at rest.
    #[must_use]
    pub fn at_rest(mut self, dial: Dial) -> Dials {
        match dial {
            Dial::StartingStorage => self.starting_storage = None,
            _ => self = self.with(dial, 0.0),
        }
        self
    }

    /// Whether `dial` is at rest.
    pub fn rests(&self, dial: Dial) -> bool {
        self.get(dial) == Dials::REST.get(dial)
    }

    /// The first stage to run again when these dials follow `before`; `None` when nothing changed.
    pub fn first_stage_since(&self, before: &Dials) -> Option<Stage> {
        Dial::ALL.into_iter().filter(|dial| self.get(*dial) != before.get(*dial)).map(Dial::first_stage).min()
    }
}

impl Default for Dials {
    fn default() -> Self {
        Dials::REST
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_dial_is_found_by_its_key_and_rests_inside_its_range() {
        for dial in Dial::ALL {
            assert_eq!(Dial::from_key(dial.key()), Some(dial));
            let range = dial.widest();
            assert!(range.least < range.most && range.step > 0.0);
            if let Some(rest) = Dials::REST.get(dial) {
                assert!(range.least <= rest && rest <= range.most);
            }
            let turned = Dials::REST.with(dial, range.most);
            assert!(!turned.rests(dial) && turned.at_rest(dial) == Dials::REST);
        }
        assert_eq!(Dial::from_key("snowiness"), None);
    }

    #[test]
    fn a_dial_runs_again_from_the_first_stage_it_touches() {
        let rest = Dials::REST;
        assert_eq!(rest.first_stage_since(&rest), None);
        assert_eq!(rest.with(Dial::TownGrowth, 10.0).first_stage_since(&rest), Some(Stage::Works));
        let both = rest.with(Dial::TownGrowth, 10.0).with(Dial::Warming, 1.0);
        assert_eq!(both.first_stage_since(&rest), Some(Stage::Basin));
    }
}
