//! The list of rights, where a place keeps it in a file of its own.

use super::dated::priority_from_text;
use super::gates::FLOW;
use super::problem::{Location, Problem};
use super::section::{Number, Section};
use super::small_table::SmallTable;
use super::source::Source;
use super::unit_suffix::FLOW_M3S;
use crate::water::canals::PriorityDate;

/// One row of the list.
#[derive(Clone, Debug)]
pub(super) struct ListedRight {
    key: String,
    at: Location,
    /// Its date.
    pub right: Option<PriorityDate>,
    /// Its rate.
    pub rate: Option<Number>,
}

/// Every row of the list; empty where there is none.
#[derive(Debug, Default)]
pub(super) struct RightsFile(Vec<ListedRight>);

impl RightsFile {
    /// Reads the file that `[sharing]` names as `rights_file`: columns `key`, `right`, `rate_…`.
    pub fn read(sharing: &Section<'_>, source: Source<'_>) -> Self {
        let Some((file, at)) = sharing.text("rights_file") else { return Self::default() };
        let text = match source.table_text(file, &at) {
            Ok(text) => text,
            Err(problem) => {
                sharing.sheet.tell(problem);
                return Self::default();
            }
        };
        let mut problems = Vec::new();
        let table = SmallTable::parse(source.shown(file), &text, &mut problems);
        table.tell_unknown(&["key", "right"], &[("rate", FLOW_M3S)], &mut problems);
        let mut rights: Vec<ListedRight> = Vec::new();
        for row in 0..table.rows() {
            let Some((key, at)) = table.text(row, "key") else {
                problems.push(Problem::error(table.row_at(row), "problem-cell-empty").with("key", "key"));
                continue;
            };
            if rights.iter().any(|right| right.key == key) {
                problems.push(Problem::error(at.clone(), "problem-same-key").with("key", key));
            }
            let right = table.text(row, "right").and_then(|(text, at)| {
                let right = priority_from_text(text);
                if right.is_none() {
                    problems.push(Problem::error(at, "problem-right-date").with("key", "right"));
                }
                right
            });
            let rate = table.number(row, "rate", FLOW_M3S, FLOW, &mut problems);
            rights.push(ListedRight { key: key.to_owned(), at, right, rate });
        }
        problems.into_iter().for_each(|problem| sharing.sheet.tell(problem));
        Self(rights)
    }

    /// The row of this gate.
    pub fn of(&self, key: &str) -> Option<ListedRight> {
        self.0.iter().find(|right| right.key == key).cloned()
    }

    /// Tells of rows that belong to no gate.
    pub fn tell_strangers(&self, known: &[String], root: &Section<'_>) {
        for right in self.0.iter().filter(|right| !known.contains(&right.key)) {
            let problem = Problem::error(right.at.clone(), "problem-gate-unknown").with("value", right.key.clone());
            root.sheet.tell(problem.with_nearest(&right.key, known));
        }
    }
}
