//! Who gets the water below the dam.
//!
//! One call of [`River::day`] settles one day; all volumes are cubic metres in that day, and a capacity or a decreed
//! rate is cubic metres per day. Positions along the river are numbered downstream: `0` is the dam, `1..=n` are the
//! head gates, `n + 1` is the river's end.
//!
//! The order of the day:
//!
//! 1. *Returns.* Each canal's return store gives back `store · (1 − exp(−1/T))` above the gate that the set-up names.
//!    Only what lay in the store this morning can come back, so a loss returns on the next day at the earliest.
//! 2. *Lake.* Evaporation less rain is debited from the accounts in proportion to what they hold; a surplus of rain is
//!    credited by shares, and rain that finds no room passes on as natural flow.
//! 3. *Detention.* Natural flow that the outlet cannot pass is held back while there is room below the spillway.
//! 4. *Natural flow* goes to the dam, the gates and the river's minimum under the [`SharingRule`].
//! 5. *Stored water* covers what is still wanted, from the gate's own account (seniority) or from the one pool.
//! 6. *Fill.* The reservoir's share of natural flow is credited: by storage shares, the rest to the pool.
//! 7. *Minimum.* Where the set-up says so, the pool completes the river's minimum.
//! 8. *Flood space and spill.* Content above the day's limit leaves as the outlet allows; content above the active
//!    volume spills. Neither is offered to gates.
//!
//! After the day, [`River::settle`] puts each canal's losses into its return store. It is a call of its own since the
//! fields decide what is lost; a town, or a canal without fields, uses [`Gate::plain_canal`].
//!
//! Source: common practice, no source, for all of it: allocation by date, equal fractions, turns, crediting by shares,
//! and the linear return store.

mod accounts;
mod bounds;
mod date;
mod day;
mod gate;
mod losses;
mod proportional;
mod reaches;
mod river;
mod rotation;
mod seniority;
mod state;
mod width;
#[cfg(test)]
mod worked;

pub use date::PriorityDate;
pub use gate::{Gate, MinimumPlace, RiverSetup, SharingRule};
pub use losses::CanalUse;
pub use river::{River, RiverFault};
pub use state::{RiverDay, RiverInput, RiverState};

/// The most head gates that one river can have.
pub const MOST_GATES: usize = 24;
/// The most positions along one river: the dam, the gates and the river's end.
const MOST_POSITIONS: usize = MOST_GATES + 2;
