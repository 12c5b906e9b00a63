//! Reads a whole run: the signs and the ledger of every whole water year.

use super::{YearReader, YearSigns};
use crate::water::basin::BasinDay;
use crate::water::calendar::CalendarDay;
use crate::water::ledger::Ledger;
use crate::water::run::{WaterYear, run_works};
use crate::water::valley::Valley;
use crate::water::works::{Evening, Works, WorksStores};

/// What a whole water year was.
#[derive(Clone, Debug, PartialEq)]
pub struct YearReport {
    /// Where it lies in the record.
    pub year: WaterYear,
    /// Its signs.
    pub signs: YearSigns,
    /// Its accounts.
    pub ledger: Ledger,
}

/// Runs the second stage and tells `each_year` what every whole water year was, and `each_day` every evening.
pub fn read_run(
    valley: &Valley,
    works: &Works,
    calendar: &[CalendarDay],
    basin: &[BasinDay],
    before: &BasinDay,
    mut each_day: impl FnMut(&Evening, &WorksStores),
    mut each_year: impl FnMut(YearReport),
) {
    let mut evening = Evening::default();
    let reader = core::cell::RefCell::new(YearReader::new(valley));
    run_works(
        valley,
        works,
        calendar,
        basin,
        before,
        &mut evening,
        |evening, stores| {
            let mut reader = reader.borrow_mut();
            if evening.today.day_of_water_year == 1 {
                reader.start_over();
            }
            reader.day(evening, stores);
            each_day(evening, stores);
        },
        |year, ledger| {
            each_year(YearReport { year, signs: reader.borrow().close(), ledger: *ledger });
        },
    );
}
