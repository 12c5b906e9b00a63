//! What is read off a run: annual indicators, comparisons and skill scores. Reads water; changes nothing.

mod canal;
mod many;
mod read;
mod reading;
mod sign;
pub mod skill;
mod year;

pub use canal::{CUT_SHARE, CanalSigns, FULL_SHARE};
pub use many::{Performance, Spread, performance, spread};
pub use read::{YearReport, read_run};
pub use reading::{Better, CANAL_SIGN_COUNT, CanalSign, Reading, SUPPLY_SIGN_COUNT, SupplySign};
pub use sign::{SIGNS, Sign, SignKind};
pub use year::{WHITE_MM, YearReader, YearSigns};
