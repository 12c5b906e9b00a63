//! Small tables beside `place.toml`: the reservoir's survey, the list of rights.
//!
//! One line a row, the first line the names, cells parted by `,` `;` or tab. Names carry units as keys do. A line that
//! starts with `#` is a remark. With `;` or tab between the cells a decimal comma is understood.

use std::path::PathBuf;

use super::problem::{Location, Problem};
use super::section::{Limits, Number};
use super::unit_suffix::{UnitSuffix, Units};

/// A cell and where it starts.
#[derive(Clone, Debug)]
struct Cell {
    text: String,
    column: usize,
}

/// A table as text.
#[derive(Debug)]
pub(super) struct SmallTable {
    file: PathBuf,
    decimal_comma: bool,
    header: Vec<Cell>,
    header_line: usize,
    rows: Vec<(usize, Vec<Cell>)>,
}

impl SmallTable {
    /// Cuts `text` into cells; tells of rows of another length than the header.
    pub fn parse(file: PathBuf, text: &str, problems: &mut Vec<Problem>) -> Self {
        let lines = text.lines().enumerate().filter(|(_, line)| !line.trim().is_empty() && !line.starts_with('#'));
        let mut lines = lines.map(|(index, line)| (index + 1, line)).peekable();
        let first = lines.peek().map_or("", |(_, line)| line);
        let delimiter = ['\t', ';'].into_iter().find(|mark| first.contains(*mark)).unwrap_or(',');
        let (header_line, header) = lines.next().map_or((0, Vec::new()), |(line, text)| (line, cells(text, delimiter)));
        let mut table = Self { file, decimal_comma: delimiter != ',', header, header_line, rows: Vec::new() };
        for (line, text) in lines {
            let row = cells(text, delimiter);
            if row.len() != table.header.len() {
                problems.push(
                    Problem::error(table.at(line, 1), "problem-row-length")
                        .with("found", row.len())
                        .with("wanted", table.header.len()),
                );
            }
            table.rows.push((line, row));
        }
        table
    }

    fn at(&self, line: usize, column: usize) -> Location {
        Location { file: self.file.clone(), line, column, length: 0 }
    }

    /// Where the header stands.
    pub fn header_at(&self) -> Location {
        self.at(self.header_line, if self.header_line == 0 { 0 } else { 1 })
    }

    /// How many rows there are.
    pub fn rows(&self) -> usize {
        self.rows.len()
    }

    /// Tells of every name in the header that is none of these.
    pub fn tell_unknown(&self, plain: &[&str], measured: &[(&str, Units)], problems: &mut Vec<Problem>) {
        let mut known: Vec<String> = plain.iter().map(|name| (*name).to_owned()).collect();
        for (base, units) in measured {
            known.extend(units.iter().map(|unit| format!("{base}{}", unit.suffix)));
        }
        for cell in self.header.iter().filter(|cell| !known.contains(&cell.text)) {
            problems.push(
                Problem::error(self.at(self.header_line, cell.column), "problem-column-unknown")
                    .with("key", cell.text.clone())
                    .with_nearest(&cell.text, &known),
            );
        }
    }

    /// Text of a cell and its place; `None` where the column is absent or the cell empty.
    pub fn text(&self, row: usize, name: &str) -> Option<(&str, Location)> {
        let column = self.header.iter().position(|cell| cell.text == name)?;
        let (line, cells) = self.rows.get(row)?;
        let cell = cells.get(column).filter(|cell| !cell.text.is_empty())?;
        Some((&cell.text, self.at(*line, cell.column)))
    }

    /// Where a row starts.
    pub fn row_at(&self, row: usize) -> Location {
        self.rows.get(row).map_or_else(|| self.header_at(), |(line, _)| self.at(*line, 1))
    }

    /// A cell as a number in whichever unit the header names.
    pub fn number(
        &self,
        row: usize,
        base: &str,
        units: Units,
        limits: Limits,
        problems: &mut Vec<Problem>,
    ) -> Option<Number> {
        let (name, unit) = self.measured(base, units)?;
        let (text, at) = self.text(row, &name)?;
        let text = if self.decimal_comma { text.replace(',', ".") } else { text.to_owned() };
        let wrong = || Number { value: f64::NAN, at: at.clone(), stated: true };
        let Some(written) = text.parse().ok().filter(|number: &f64| number.is_finite()) else {
            problems.push(Problem::error(at.clone(), "problem-cell-not-number").with("key", name).with("value", text));
            return Some(wrong());
        };
        let value = unit.to_si(written);
        if !(limits.0..=limits.1).contains(&value) {
            problems.push(
                Problem::error(at.clone(), "problem-number-range")
                    .with("key", name)
                    .with("value", written)
                    .with("least", unit.si_as_written(limits.0))
                    .with("most", unit.si_as_written(limits.1)),
            );
            return Some(wrong());
        }
        Some(Number { value, at, stated: true })
    }

    /// A whole column of numbers; tells where it or a cell of it is missing.
    pub fn numbers(
        &self,
        base: &'static str,
        units: Units,
        limits: Limits,
        problems: &mut Vec<Problem>,
    ) -> Option<Vec<Number>> {
        let Some((name, _)) = self.measured(base, units) else {
            let wanted = format!("{base}{}", units[0].suffix);
            problems.push(Problem::error(self.header_at(), "problem-column-missing").with("key", wanted));
            return None;
        };
        let mut column = Vec::new();
        for row in 0..self.rows() {
            let number = self.number(row, base, units, limits, problems);
            if number.is_none() {
                problems.push(Problem::error(self.row_at(row), "problem-cell-empty").with("key", name.clone()));
            }
            column.extend(number);
        }
        Some(column)
    }

    fn measured(&self, base: &str, units: Units) -> Option<(String, UnitSuffix)> {
        units
            .iter()
            .map(|unit| (format!("{base}{}", unit.suffix), *unit))
            .find(|(name, _)| self.header.iter().any(|cell| cell.text == *name))
    }
}

fn cells(line: &str, delimiter: char) -> Vec<Cell> {
    let mut column = 1;
    line.split(delimiter)
        .map(|part| {
            let blanks = part.chars().take_while(|letter| letter.is_whitespace()).count();
            let cell = Cell { text: part.trim().trim_matches('"').trim().to_owned(), column: column + blanks };
            column += part.chars().count() + 1;
            cell
        })
        .collect()
}

#[cfg(test)]
mod tests {
    use super::super::unit_suffix::FLOW_M3S;
    use super::*;

    #[test]
    fn cells_know_their_line_and_column() {
        let mut problems = Vec::new();
        let text = "# rights\ncanal; rate_cfs\n\nnorte; 12,5\nñandú; x\nsur\n";
        let table = SmallTable::parse("rights.csv".into(), text, &mut problems);
        let rate = table.number(0, "rate", FLOW_M3S, Limits(0.0, 10.0), &mut problems).unwrap();
        approx::assert_relative_eq!(rate.value, 12.5 * 0.028_316_846_592, max_relative = 1e-14);
        assert!(table.number(1, "rate", FLOW_M3S, Limits(0.0, 10.0), &mut problems).unwrap().value.is_nan());
        let told: Vec<_> = problems.iter().map(|told| (told.message, told.at.line, told.at.column)).collect();
        assert_eq!(told, [("problem-row-length", 6, 1), ("problem-cell-not-number", 5, 8)]);
    }
}
