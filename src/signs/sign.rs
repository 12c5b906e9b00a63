//! The list of annual signs, each with its stable key and its kind.

use crate::water::keyed::keyed;

use super::YearSigns;
use crate::water::calendar::CalendarDay;

keyed! {
    /// An annual sign.
    Sign, SIGNS {
        /// Rain and snow over the bands, mm.
        Precipitation => "precipitation_mm",
        /// Snow's share of it.
        SnowShare => "snow_share",
        /// Snow water on the survey day, mm.
        SurveySwe => "survey_swe_mm",
        /// Most snow water, mm.
        PeakSwe => "peak_swe_mm",
        /// Day of most snow water.
        PeakSweDate => "peak_swe_date",
        /// Last day over 5 mm before the first bare week after the peak.
        MeltOutDate => "melt_out_date",
        /// First day with half of the year's natural flow past.
        HalfVolumeDate => "half_volume_date",
        /// Centroid of the natural flow, day of the water year.
        CentreOfVolumeDay => "centre_of_volume_day",
        /// Natural flow of the spring months, hm³.
        SpringVolume => "spring_volume_hm3",
        /// Highest daily natural flow, m³/s.
        PeakFlow => "peak_flow_m3s",
        /// Its day.
        PeakFlowDate => "peak_flow_date",
        /// Lowest mean natural flow of seven days in a row, m³/s.
        LowFlow7Day => "low_flow_7day_m3s",
        /// First day at 99 % of active capacity or more.
        FillDate => "fill_date",
        /// Active content on the last day, hm³.
        Carryover => "carryover_hm3",
        /// Natural flow above the outlet's capacity, and stored water over the spillway, hm³.
        Spill => "spill_hm3",
        /// Stored water let go for flood space, hm³.
        FloodRelease => "flood_release_hm3",
        /// Evaporation of the crops in their seasons, hm³.
        CropEvaporation => "crop_evaporation_hm3",
        /// Share of full harvest.
        YieldShare => "yield_share",
        /// Days on which the river minimum was met.
        RiverMinimumDaysMet => "river_minimum_days_met",
        /// Delivered over demanded at all head gates.
        SupplyRatio => "supply_ratio",
    }
}

/// What kind of quantity a sign is, for writing it and for taking differences.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum SignKind {
    /// Depth of water, mm.
    Depth,
    /// A share, 0 to 1.
    Share,
    /// A date; as a number, the day of the water year.
    Date,
    /// A day of the water year with decimals.
    Day,
    /// A volume, hm³.
    Volume,
    /// A flow, m³/s.
    Flow,
    /// A count of days.
    Days,
}

impl Sign {
    /// The sign with this key.
    pub fn from_key(key: &str) -> Option<Sign> {
        Sign::ALL.into_iter().find(|sign| sign.key() == key)
    }

    /// The sign's kind.
    pub const fn kind(self) -> SignKind {
        match self {
            Sign::Precipitation | Sign::SurveySwe | Sign::PeakSwe => SignKind::Depth,
            Sign::SnowShare | Sign::YieldShare | Sign::SupplyRatio => SignKind::Share,
            Sign::PeakSweDate | Sign::MeltOutDate | Sign::HalfVolumeDate | Sign::PeakFlowDate | Sign::FillDate => {
                SignKind::Date
            }
            Sign::CentreOfVolumeDay => SignKind::Day,
            Sign::SpringVolume | Sign::Carryover | Sign::Spill | Sign::FloodRelease | Sign::CropEvaporation => {
                SignKind::Volume
            }
            Sign::PeakFlow | Sign::LowFlow7Day => SignKind::Flow,
            Sign::RiverMinimumDaysMet => SignKind::Days,
        }
    }

    /// The sign of a year as a number in the unit of its key; a date as the day of the water year. `None` where the year
    /// has none (a reservoir that never filled).
    pub fn of(self, year: &YearSigns) -> Option<f64> {
        let day = |date: Option<CalendarDay>| date.map(|date| f64::from(date.day_of_water_year));
        match self {
            Sign::Precipitation => Some(year.precipitation_mm),
            Sign::SnowShare => year.snow_share,
            Sign::SurveySwe => year.survey_swe_mm,
            Sign::PeakSwe => Some(year.peak_swe_mm),
            Sign::PeakSweDate => day(year.peak_swe_date),
            Sign::MeltOutDate => day(year.melt_out_date),
            Sign::HalfVolumeDate => day(year.half_volume_date),
            Sign::CentreOfVolumeDay => year.centre_of_volume_day,
            Sign::SpringVolume => Some(year.spring_volume_hm3),
            Sign::PeakFlow => Some(year.peak_flow_m3s),
            Sign::PeakFlowDate => day(year.peak_flow_date),
            Sign::LowFlow7Day => year.low_flow_7day_m3s,
            Sign::FillDate => day(year.fill_date),
            Sign::Carryover => year.carryover_hm3,
            Sign::Spill => year.spill_hm3,
            Sign::FloodRelease => year.flood_release_hm3,
            Sign::CropEvaporation => year.crop_evaporation_hm3,
            Sign::YieldShare => year.yield_share,
            Sign::RiverMinimumDaysMet => year.river_minimum_days_met.map(f64::from),
            Sign::SupplyRatio => year.supply_ratio,
        }
    }

    /// The date of a year's sign, for the signs that are dates.
    pub fn date_of(self, year: &YearSigns) -> Option<CalendarDay> {
        match self {
            Sign::PeakSweDate => year.peak_swe_date,
            Sign::MeltOutDate => year.melt_out_date,
            Sign::HalfVolumeDate => year.half_volume_date,
            Sign::PeakFlowDate => year.peak_flow_date,
            Sign::FillDate => year.fill_date,
            _ => None,
        }
    }
}
