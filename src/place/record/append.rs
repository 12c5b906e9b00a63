//! New days at the end of a record: only days that follow on, in the record's own form, and nothing that was there changed.

use std::path::Path;

use chrono::{Days, NaiveDate};

use super::cells::{plain_name, texts_of};
use super::plan::{DateOrder, DatePlan, Encoding, GapFill, GapRule, RecordPlan};
use super::rows::is_idle;
use super::text::lines_of;
use super::{ReadRecord, read_record};
use crate::place::problem::{Location, Problem};

/// Decimals of a value that had to be converted.
const DECIMALS: usize = 4;
/// Values that differ by less are the same reading, written in two units.
const SAME: f64 = 1.0e-3;

/// A record with new days behind the old ones.
#[derive(Clone, Debug, PartialEq)]
pub struct Appended {
    /// The whole file.
    pub bytes: Vec<u8>,
    /// How many days are new.
    pub days: usize,
    /// How many days of the new file were there already, with the same values.
    pub same_days: usize,
    /// The first new day.
    pub first: NaiveDate,
    /// The last day of the record now.
    pub last: NaiveDate,
}

/// Puts the days of `new` behind those of `old`, which `plan` reads.
///
/// `new_plan` reads the new file; where it is the same plan for another file, cells are copied as they are written, and
/// else values are converted. `new_record` is what it read, every gap open. Problems: days that do not follow on or are
/// different from those that are there, and whatever the checks of a record say of the whole.
pub fn append(
    plan: &RecordPlan,
    old: &[u8],
    new_plan: &RecordPlan,
    new: &[u8],
    new_record: &ReadRecord,
) -> Result<Appended, Vec<Problem>> {
    let mut problems = Vec::new();
    let Some(old_record) = read_record(&with_open_gaps(plan), old, &mut problems) else { return Err(problems) };
    let follows = old_record.last_date() + Days::new(1);
    check_joint(&old_record, new_record, &new_plan.file, follows)?;
    let sheet = Sheet::of(new_plan, new, new_record);
    check_same(plan, &old_record, new_record, &sheet, &new_plan.file)?;
    let overlap = days_between(new_record.first_date, follows);
    let form = Form::of(plan, old);
    let copies = sheet.has_lines()
        && plan
            .columns
            .iter()
            .zip(&new_plan.columns)
            .all(|(a, b)| plain_name(&a.name) == plain_name(&b.name) && a.unit == b.unit)
        && plan.decimal_comma == new_plan.decimal_comma
        && plan.missing == new_plan.missing;
    let mut bytes = old.to_vec();
    if !bytes.ends_with(b"\n") && !bytes.ends_with(b"\r") {
        bytes.extend_from_slice(form.line_end.as_bytes());
    }
    let mut sources = Vec::new();
    for day in overlap..new_record.days {
        let date = new_record.first_date + Days::new(day as u64);
        let cells = form.cells(plan, new_record, day, date, copies.then_some(&sheet));
        let line = cells.join(&form.delimiter.to_string()) + form.line_end;
        match plan.encoding {
            Encoding::Utf8 => bytes.extend_from_slice(line.as_bytes()),
            Encoding::Latin1 => bytes.extend(line.chars().map(|letter| u8::try_from(letter).unwrap_or(b'?'))),
        }
        sources.push(sheet.line(day));
    }
    let old_lines = lines_of(&String::from_utf8_lossy(old)).len();
    if read_record(plan, &bytes, &mut problems).is_none() {
        for problem in &mut problems {
            // What is wrong with a new day is shown where it comes from.
            if let Some(source) = problem.at.line.checked_sub(old_lines + 1).and_then(|index| sources.get(index)) {
                problem.at = Location { file: new_plan.file.clone(), line: *source, column: 0, length: 0 };
            }
        }
        return Err(problems);
    }
    Ok(Appended { bytes, days: sources.len(), same_days: overlap, first: follows, last: new_record.last_date() })
}

/// The plan with all gaps left open, so that only what is written counts.
pub fn with_open_gaps(plan: &RecordPlan) -> RecordPlan {
    let mut open = plan.clone();
    for column in &mut open.columns {
        column.gaps = GapRule { how: GapFill::Keep, longest_days: 0 };
    }
    open
}

fn days_between(from: NaiveDate, to: NaiveDate) -> usize {
    usize::try_from((to - from).num_days()).unwrap_or(0)
}

fn check_joint(old: &ReadRecord, new: &ReadRecord, file: &Path, follows: NaiveDate) -> Result<(), Vec<Problem>> {
    let tell = |message| Problem::error(Location::whole_file(file), message);
    let problem = if new.last_date() < follows {
        tell("problem-add-nothing").with("date", old.last_date())
    } else if new.first_date > follows {
        tell("problem-add-hole").with("first", follows).with("last", new.first_date - Days::new(1))
    } else if new.first_date < old.first_date {
        tell("problem-add-before").with("date", old.first_date)
    } else {
        return Ok(());
    };
    Err(vec![problem])
}

/// Days that both files have must agree.
fn check_same(
    plan: &RecordPlan,
    old: &ReadRecord,
    new: &ReadRecord,
    sheet: &Sheet,
    file: &Path,
) -> Result<(), Vec<Problem>> {
    let shift = days_between(old.first_date, new.first_date);
    for day in 0..old.days.saturating_sub(shift).min(new.days) {
        for (index, column) in plan.columns.iter().enumerate() {
            let (Some(before), Some(after)) = (old.columns.get(index), new.columns.get(index)) else { continue };
            let (before, after) = (before.values[shift + day], after.values[day]);
            let same = (before.is_nan() && after.is_nan()) || (before - after).abs() <= SAME * before.abs().max(1.0);
            if !same {
                let at = Location { file: file.to_path_buf(), line: sheet.line(day), column: 0, length: 0 };
                let written = |value: f64| {
                    if value.is_nan() { "–".to_owned() } else { number(column.unit.from_si(value), false) }
                };
                let problem = Problem::error(at, "problem-add-differs")
                    .with("date", new.first_date + Days::new(day as u64))
                    .with("column", column.name.clone())
                    .with("before", written(before))
                    .with("after", written(after));
                return Err(vec![problem]);
            }
        }
    }
    Ok(())
}

/// The rows of the new file as they are written.
struct Sheet {
    names: Vec<String>,
    /// Line and cells of each day, in the order of the days; empty for a file without lines.
    rows: Vec<(usize, Vec<String>)>,
}

impl Sheet {
    fn of(plan: &RecordPlan, bytes: &[u8], record: &ReadRecord) -> Self {
        let nothing = Sheet { names: Vec::new(), rows: Vec::new() };
        if crate::place::exchange::recognise(bytes).is_some() {
            return nothing;
        }
        let Some(delimiter) = plan.delimiter else { return nothing };
        let text = text_of(plan, bytes);
        let mut lines = lines_of(&text).into_iter().enumerate().skip(plan.skip_lines);
        let Some((_, header)) = lines.find(|(_, line)| !is_idle(line, plan.comment, None)) else { return nothing };
        let names = texts_of(header, delimiter).iter().map(|name| plain_name(name)).collect();
        let rows: Vec<(usize, Vec<String>)> = lines
            .filter(|(_, line)| !is_idle(line, plan.comment, Some(delimiter)))
            .map(|(index, line)| (index + 1, texts_of(line, delimiter)))
            .collect();
        // The record has a row a day, in order: that is how it was read.
        if rows.len() == record.days { Sheet { names, rows } } else { nothing }
    }

    fn has_lines(&self) -> bool {
        !self.rows.is_empty()
    }

    fn line(&self, day: usize) -> usize {
        self.rows.get(day).map_or(0, |(line, _)| *line)
    }

    fn cell(&self, day: usize, name: &str) -> Option<&str> {
        let index = self.names.iter().position(|known| known == name)?;
        self.rows.get(day)?.1.get(index).map(String::as_str)
    }
}

fn text_of(plan: &RecordPlan, bytes: &[u8]) -> String {
    let bytes = bytes.strip_prefix(b"\xEF\xBB\xBF").unwrap_or(bytes);
    match plan.encoding {
        Encoding::Utf8 => String::from_utf8_lossy(bytes).into_owned(),
        Encoding::Latin1 => bytes.iter().map(|byte| char::from(*byte)).collect(),
    }
}

/// How rows of the old file are written.
struct Form {
    names: Vec<String>,
    delimiter: char,
    line_end: &'static str,
}

impl Form {
    fn of(plan: &RecordPlan, bytes: &[u8]) -> Self {
        let text = text_of(plan, bytes);
        let line_end = match (text.contains("\r\n"), text.contains('\n')) {
            (true, _) => "\r\n",
            (false, true) => "\n",
            (false, false) => "\r",
        };
        let lines = lines_of(&text);
        let header = lines.iter().skip(plan.skip_lines).find(|line| !is_idle(line, plan.comment, None));
        let header = header.copied().unwrap_or_default();
        let wanted = super::header::wanted_names(plan);
        let delimiter = plan.delimiter.or_else(|| super::recognise_delimiter(header, &wanted)).unwrap_or(',');
        let names = texts_of(header, delimiter).iter().map(|name| plain_name(name)).collect();
        Self { names, delimiter, line_end }
    }

    /// One row: the date, the columns of the plan, and whatever else the new file has under a name of the old.
    fn cells(
        &self,
        plan: &RecordPlan,
        record: &ReadRecord,
        day: usize,
        date: NaiveDate,
        sheet: Option<&Sheet>,
    ) -> Vec<String> {
        let cell = |name: &String| {
            if let Some(part) = date_cell(&plan.date, name, date) {
                return part;
            }
            if let Some(copied) = sheet.and_then(|sheet| sheet.cell(day, name)) {
                return copied.to_owned();
            }
            let column = plan.columns.iter().position(|column| plain_name(&column.name) == *name);
            let value = column.and_then(|index| {
                let value = record.columns.get(index)?.values.get(day).copied()?;
                (!value.is_nan()).then(|| number(plan.columns[index].unit.from_si(value), plan.decimal_comma))
            });
            value.unwrap_or_default()
        };
        self.names.iter().map(|name| self.quoted(cell(name))).collect()
    }

    fn quoted(&self, cell: String) -> String {
        let plain = !cell.contains(self.delimiter) && !cell.contains(['"', '#', '\n', '\r']);
        if plain { cell } else { format!("\"{}\"", cell.replace('"', "\"\"").replace(['\n', '\r'], " ")) }
    }
}

fn date_cell(plan: &DatePlan, name: &str, date: NaiveDate) -> Option<String> {
    let is = |column: &String| plain_name(column) == name;
    let (text, found) = match plan {
        DatePlan::Column { name: column, order } => {
            let form = match order {
                DateOrder::YearMonthDay => "%Y-%m-%d",
                DateOrder::DayMonthYear => "%d/%m/%Y",
                DateOrder::MonthDayYear => "%m/%d/%Y",
            };
            (form, is(column))
        }
        DatePlan::Parts { year, month, day } => {
            let part = [(year, "%Y"), (month, "%-m"), (day, "%-d")].into_iter().find(|(column, _)| is(column));
            (part.map_or("", |(_, form)| form), part.is_some())
        }
        DatePlan::YearAndDay { year, day_of_year } => {
            let part = [(year, "%Y"), (day_of_year, "%-j")].into_iter().find(|(column, _)| is(column));
            (part.map_or("", |(_, form)| form), part.is_some())
        }
    };
    found.then(|| date.format(text).to_string())
}

/// A value with as many decimals as it needs, four at most.
fn number(value: f64, decimal_comma: bool) -> String {
    let written = format!("{value:.DECIMALS$}");
    let trimmed = written.trim_end_matches('0').trim_end_matches('.');
    let plain = if trimmed == "-0" { "0" } else { trimmed };
    if decimal_comma { plain.replace('.', ",") } else { plain.to_owned() }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::place::record::{ColumnPlan, Measure, MeasureUnit};

    fn plan(file: &str, order: DateOrder) -> RecordPlan {
        let date = DatePlan::Column { name: "fecha".into(), order };
        let columns = vec![ColumnPlan::new("caudal", Measure::Flow, MeasureUnit::M3PerS)];
        RecordPlan { delimiter: Some(';'), decimal_comma: true, ..RecordPlan::new(file, date, columns) }
    }

    fn added(old: &str, new: &str) -> Result<String, Vec<(&'static str, usize)>> {
        let (old_plan, new_plan) = (plan("old.csv", DateOrder::DayMonthYear), plan("new.csv", DateOrder::DayMonthYear));
        let record =
            read_record(&with_open_gaps(&new_plan), new.as_bytes(), &mut Vec::new()).expect("the new file reads");
        append(&old_plan, old.as_bytes(), &new_plan, new.as_bytes(), &record)
            .map(|appended| String::from_utf8(appended.bytes).unwrap())
            .map_err(|problems| problems.iter().map(|problem| (problem.message, problem.at.line)).collect())
    }

    const OLD: &str = "# río\r\nfecha;nota;caudal\r\n30/12/2003;;1,5\r\n31/12/2003;x;1,25";

    #[test]
    fn days_that_follow_on_are_added_in_the_form_of_the_file() {
        let new = "fecha;caudal;nota\n31/12/2003;1,25;\n01/01/2004;2,750;hielo\n02/01/2004;;\n";
        let whole = added(OLD, new).unwrap();
        assert_eq!(whole, format!("{OLD}\r\n01/01/2004;hielo;2,750\r\n02/01/2004;;\r\n"));
    }

    #[test]
    fn what_does_not_follow_on_is_refused() {
        let row = |text: &str| added(OLD, &format!("fecha;caudal;nota\n{text}\n")).unwrap_err();
        assert_eq!(row("02/01/2004;1;"), [("problem-add-hole", 0)]);
        assert_eq!(row("31/12/2003;1,25;"), [("problem-add-nothing", 0)]);
        assert_eq!(row("31/12/2003;9,25;\n01/01/2004;2;"), [("problem-add-differs", 2)]);
        assert_eq!(row("29/12/2003;9;\n30/12/2003;1,5;\n31/12/2003;1,25;\n01/01/2004;1;"), [("problem-add-before", 0)]);
        assert_eq!(row("01/01/2004;-2;"), [("problem-record-flow-negative", 2)]);
    }
}
