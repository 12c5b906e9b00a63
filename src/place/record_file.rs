//! The file behind one record of a place: how the place says it is to be read, and its days.

use super::exchange::{DATE_COLUMN, ExchangeFile, read_exchange, recognise};
use super::problem::{Location, Problem};
use super::record::{
    ColumnPlan, DateOrder, DatePlan, Encoding, ReadRecord, RecordPlan, checksum_of, plain_name, read_record,
};
use super::records::NamedRecord;
use super::section::{Limits, Section, unknown_choice};
use super::source::Source;
use super::tree::{Kind, Table, Value};
use super::unit_suffix::PLAIN;

/// A record file with the way to read it.
pub(super) struct PlannedFile {
    /// Name of the file in the place.
    pub file: String,
    /// Where the place names it.
    pub at: Location,
    /// How it is to be read.
    pub plan: RecordPlan,
    /// What is in it.
    pub bytes: Vec<u8>,
}

/// What a table such as `[gauge]` says of its record file, and the bytes of that; tells what is wrong.
pub(super) fn planned(section: &Section<'_>, source: Source<'_>, columns: Vec<ColumnPlan>) -> Option<PlannedFile> {
    let encodings = [("utf-8", Encoding::Utf8), ("latin-1", Encoding::Latin1)];
    let encoding = section.choice("encoding", &encodings).map_or(Encoding::Utf8, |(encoding, _)| encoding);
    let delimiters = [(",", ','), (";", ';'), ("tab", '\t'), ("|", '|')];
    let delimiter = section.choice("delimiter", &delimiters).map(|(delimiter, _)| delimiter);
    let decimal_comma = section.flag_or("decimal_comma", false);
    let skip_lines = section.number_or("skip_lines", PLAIN, Limits(0.0, 1000.0), 0.0).value as usize;
    let missing = missing(section);
    let named = section.need_text("file").map(|(file, at)| {
        let bytes = source.record(file, &at).map_err(|problem| section.sheet.tell(problem)).ok();
        (file, at, bytes)
    });
    let exchange = named.as_ref().is_some_and(|(_, _, bytes)| bytes.as_deref().and_then(recognise).is_some());
    // Files of exchange say themselves where their days are.
    let own_date = || DatePlan::Column { name: DATE_COLUMN.into(), order: DateOrder::YearMonthDay };
    let stated = if exchange && section.get("date").is_none() { None } else { date(section) };
    let date = if exchange { Some(own_date()) } else { stated };
    let (file, at, bytes) = named?;
    let bytes = bytes?;
    // Without columns nothing in the file can be judged; that they are lacking was told.
    if columns.is_empty() {
        return None;
    }
    let plan = RecordPlan {
        encoding,
        delimiter,
        decimal_comma,
        skip_lines,
        missing,
        ..RecordPlan::new(source.shown(file), date?, columns)
    };
    Some(PlannedFile { file: file.to_owned(), at, plan, bytes })
}

/// Reads the record that a table such as `[gauge]` names.
pub(super) fn read(section: &Section<'_>, source: Source<'_>, columns: Vec<ColumnPlan>) -> Option<NamedRecord> {
    let PlannedFile { file, at, plan, bytes } = planned(section, source, columns)?;
    let mut problems = Vec::new();
    let record = read_any(&plan, &bytes, &mut problems);
    problems.into_iter().for_each(|problem| section.sheet.tell(problem));
    Some(NamedRecord { file, record: record?, at })
}

/// Reads a record by its plan, whichever format its bytes are in.
pub(super) fn read_any(plan: &RecordPlan, bytes: &[u8], problems: &mut Vec<Problem>) -> Option<ReadRecord> {
    if recognise(bytes).is_none() {
        return read_record(plan, bytes, problems);
    }
    let before = problems.len();
    let file = read_exchange(&plan.file, bytes, problems)?;
    tell_units(plan, &file, problems);
    if problems.len() > before {
        return None;
    }
    let table = file.table();
    let of_table = RecordPlan {
        encoding: Encoding::Utf8,
        delimiter: Some(','),
        decimal_comma: false,
        comment: None,
        skip_lines: 0,
        missing: Vec::new(),
        ..plan.clone()
    };
    let record = read_record(&of_table, table.text.as_bytes(), problems);
    // Problems are shown in the file itself, where only lines have their like.
    for problem in problems[before..].iter_mut().filter(|problem| problem.at.file == plan.file) {
        let line = problem.at.line.checked_sub(1).and_then(|index| table.source_lines.get(index));
        problem.at = Location { line: line.copied().unwrap_or(0), column: 0, length: 0, ..problem.at.clone() };
    }
    record.map(|record| ReadRecord { checksum: checksum_of(bytes), ..record })
}

/// The file knows its units: the place may not say others.
fn tell_units(plan: &RecordPlan, file: &ExchangeFile, problems: &mut Vec<Problem>) {
    for column in &plan.columns {
        let series = file.series.iter().find(|series| plain_name(&series.name) == plain_name(&column.name));
        let Some(unit) = series.and_then(|series| series.unit).filter(|unit| *unit != column.unit) else { continue };
        let at = column.declared_at.clone().unwrap_or_else(|| Location::whole_file(plan.file.clone()));
        problems.push(
            Problem::error(at, "problem-exchange-unit")
                .with("column", column.name.clone())
                .with("unit", column.unit.key())
                .with("found", unit.key()),
        );
    }
}

/// Marks that stand for a missing value: texts, or numbers as they are written in the file.
fn missing(section: &Section<'_>) -> Vec<String> {
    let mut marks = Vec::new();
    for value in section.list("missing").unwrap_or_default() {
        match &value.kind {
            Kind::Text(text) => marks.push(text.clone()),
            Kind::Number(number) => marks.push(number.to_string()),
            _ => {
                section.sheet.tell(Problem::error(section.value_at(value), "problem-not-text").with("key", "missing"));
            }
        }
    }
    marks
}

/// Where the date of a row is: one column and the order in it, or two or three columns.
fn date(section: &Section<'_>) -> Option<DatePlan> {
    let value = section.get("date");
    let order = date_order(section);
    let Some(value) = value else {
        section.tell_missing("date");
        return None;
    };
    match &value.kind {
        Kind::Text(name) => Some(DatePlan::Column { name: name.clone(), order: order? }),
        Kind::Table(table) => date_parts(section, value, table),
        _ => {
            section.sheet.tell(Problem::error(section.value_at(value), "problem-not-text").with("key", "date"));
            None
        }
    }
}

fn date_parts(section: &Section<'_>, value: &Value, table: &Table) -> Option<DatePlan> {
    let parts = section.as_section(value, format!("{}.date", section.name));
    let (year, _) = parts.need_text("year")?;
    if table.get("day_of_year").is_some() {
        let (day_of_year, _) = parts.text("day_of_year")?;
        return Some(DatePlan::YearAndDay { year: year.to_owned(), day_of_year: day_of_year.to_owned() });
    }
    let (month, day) = (parts.need_text("month"), parts.need_text("day"));
    Some(DatePlan::Parts { year: year.to_owned(), month: month?.0.to_owned(), day: day?.0.to_owned() })
}

fn date_order(section: &Section<'_>) -> Option<DateOrder> {
    let Some((word, at)) = section.text("date_format") else {
        return section.peek("date_format").is_none().then_some(DateOrder::YearMonthDay);
    };
    let order = DateOrder::from_key(word);
    if order.is_none() {
        let keys = DateOrder::ALL.into_iter().map(DateOrder::key);
        section.sheet.tell(unknown_choice(at, "date_format", word, keys));
    }
    order
}
