//! Which columns are the date, and in which order day and month stand in it.

use chrono::NaiveDate;

use super::DateReason;
use super::layout::Layout;
use crate::place::measure_words::{DatePart, date_part, speaks_of_date};
use crate::place::record::dates::parse_date;
use crate::place::record::plan::{DateOrder, DatePlan};

/// The date of the file; `None` where no column has one.
pub(super) fn find(layout: &Layout, rows: &[Vec<String>]) -> Option<(DatePlan, DateReason)> {
    let mut best: Option<(Merit, usize)> = None;
    for (index, name) in layout.names.iter().enumerate() {
        let merits: Vec<(DateOrder, Merit)> =
            DateOrder::ALL.into_iter().map(|order| (order, Merit::of(rows, index, order, name))).collect();
        for (_, merit) in merits {
            if merit.dates > 0 && best.as_ref().is_none_or(|(so_far, _)| merit.is_better(so_far)) {
                best = Some((merit, index));
            }
        }
    }
    match best {
        Some((merit, index)) if merit.dates * 2 > rows.len() => {
            let reason = reason(rows, index, merit);
            Some((DatePlan::Column { name: layout.names[index].clone(), order: merit.order }, reason))
        }
        _ => parts(layout),
    }
}

/// How well a column reads as dates in an order.
#[derive(Clone, Copy, Debug, PartialEq)]
struct Merit {
    order: DateOrder,
    dates: usize,
    steps: usize,
    is_named: bool,
}

impl Merit {
    fn of(rows: &[Vec<String>], index: usize, order: DateOrder, name: &str) -> Self {
        let mut last: Option<NaiveDate> = None;
        let (mut dates, mut steps) = (0, 0);
        for row in rows {
            let date = row.get(index).and_then(|cell| parse_date(cell, order).ok());
            dates += usize::from(date.is_some());
            steps += usize::from(date.is_some() && last.and_then(|last| last.succ_opt()) == date);
            last = date.or(last);
        }
        Self { order, dates, steps, is_named: speaks_of_date(name) }
    }

    fn is_better(&self, other: &Merit) -> bool {
        (self.dates, self.steps, self.is_named) > (other.dates, other.steps, other.is_named)
    }
}

fn reason(rows: &[Vec<String>], index: usize, best: Merit) -> DateReason {
    let others: Vec<Merit> = DateOrder::ALL
        .into_iter()
        .filter(|order| *order != best.order)
        .map(|order| Merit::of(rows, index, order, ""))
        .filter(|other| other.dates == best.dates)
        .collect();
    if others.is_empty() {
        DateReason::Only
    } else if others.iter().all(|other| other.steps < best.steps) {
        DateReason::Daily
    } else {
        DateReason::Usual
    }
}

fn parts(layout: &Layout) -> Option<(DatePlan, DateReason)> {
    let named = |wanted: DatePart| layout.names.iter().find(|name| date_part(name) == Some(wanted)).cloned();
    let year = named(DatePart::Year)?;
    let plan = match (named(DatePart::Month), named(DatePart::Day), named(DatePart::DayOfYear)) {
        (Some(month), Some(day), _) => DatePlan::Parts { year, month, day },
        (_, _, Some(day_of_year)) => DatePlan::YearAndDay { year, day_of_year },
        _ => return None,
    };
    Some((plan, DateReason::Parts))
}
