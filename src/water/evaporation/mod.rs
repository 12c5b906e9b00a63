//! Reference evaporation: how much water a field of well-watered short grass gives to the air in a day.
//!
//! Each file holds one published piece as small pure functions; [`reference_evaporation_mm`] is the daily form that a
//! run calls. What depends only on latitude and date is in a [`SkyTable`], what depends only on elevation in
//! [`PenmanMonteithTraits`]; both are built once.

pub mod air;
mod daily;
mod hargreaves_samani;
mod oudin;
mod penman_monteith;
pub mod radiation;
pub mod sun;

pub use daily::{DayBeforeWarming, EvaporationDay, Method, percent_per_degree, reference_evaporation_mm};
pub use hargreaves_samani::hargreaves_samani_mm;
pub use oudin::{LATENT_HEAT_OF_VAPORISATION_MJ_KG, oudin_mm};
pub use penman_monteith::{PenmanMonteithInputs, PenmanMonteithTraits, WIND_WHEN_MISSING_MS, penman_monteith_mm};
pub use sun::SkyTable;
