//! The Esri ASCII grid: a header of a few named numbers, then heights row by row from the north-west.

use std::path::Path;

use super::coordinates::{Coordinates, Geometry};
use super::{CellSource, TerrainFiles, at_line, prj, whole};
use crate::place::problem::Problem;

/// Most rows and most columns of a grid.
pub(super) const MOST_SIDE: usize = 100_000;

/// A grid whose header was read.
pub(super) struct AsciiCells<'f> {
    file: &'f Path,
    tokens: Tokens<'f>,
    columns: usize,
    rows: usize,
    no_data: Option<f64>,
}

/// Words of a text, each with its line and column.
#[derive(Clone)]
struct Tokens<'t> {
    bytes: &'t [u8],
    at: usize,
    line: usize,
    line_start: usize,
}

struct Token<'t> {
    text: &'t [u8],
    line: usize,
    column: usize,
}

impl<'t> Tokens<'t> {
    fn next(&mut self) -> Option<Token<'t>> {
        while let Some(byte) = self.bytes.get(self.at) {
            if !byte.is_ascii_whitespace() {
                break;
            }
            self.at += 1;
            if *byte == b'\n' {
                self.line += 1;
                self.line_start = self.at;
            }
        }
        let rest = self.bytes.get(self.at..).filter(|rest| !rest.is_empty())?;
        let length = rest.iter().position(u8::is_ascii_whitespace).unwrap_or(rest.len());
        let column = self.at - self.line_start + 1;
        self.at += length;
        Some(Token { text: &rest[..length], line: self.line, column })
    }
}

fn number(text: &[u8]) -> Option<f64> {
    let text = std::str::from_utf8(text).ok().filter(|text| text.len() <= 40)?;
    let starts = text.starts_with(|letter: char| letter.is_ascii_digit() || matches!(letter, '-' | '+' | '.'));
    text.parse().ok().filter(|number: &f64| starts && number.is_finite())
}

fn shown(text: &[u8]) -> String {
    let short = &text[..text.len().min(40)];
    String::from_utf8_lossy(short).chars().map(|letter| if letter.is_control() { '\u{FFFD}' } else { letter }).collect()
}

/// Reads the header.
pub(super) fn open<'f>(files: &TerrainFiles<'f>) -> Result<(Geometry, AsciiCells<'f>), Box<Problem>> {
    let file = files.grid_file;
    let bytes = files.grid.strip_prefix(b"\xEF\xBB\xBF").unwrap_or(files.grid);
    let mut tokens = Tokens { bytes, at: 0, line: 1, line_start: 0 };
    let mut header = Header::default();
    loop {
        let before = tokens.clone();
        let Some(key) = tokens.next() else { break };
        // Words make the head; what begins like a number is a height, good or not.
        if !key.text[0].is_ascii_alphabetic() || key.text.eq_ignore_ascii_case(b"nan") {
            tokens = before;
            break;
        }
        let name = String::from_utf8_lossy(key.text).to_lowercase();
        let value = tokens.next();
        let Some(place) = header.place(&name) else {
            let at = at_line(file, key.line, key.column, key.text.len().min(40));
            return Err(Box::new(Problem::error(at, "problem-grid-header").with("text", shown(key.text))));
        };
        let Some(value) = value else { break };
        let Some(read) = number(value.text) else {
            let at = at_line(file, value.line, value.column, value.text.len().min(40));
            return Err(Box::new(Problem::error(at, "problem-grid-number").with("text", shown(value.text))));
        };
        *place = Some(read);
    }
    let (columns, rows) = (header.side(header.columns), header.side(header.rows));
    let step_x = header.cell.or(header.cell_x);
    let step_y = header.cell.or(header.cell_y);
    let corner =
        |corner: Option<f64>, center: Option<f64>, step: Option<f64>| corner.or_else(|| Some(center? - step? / 2.0));
    let west = corner(header.x_corner, header.x_center, step_x);
    let south = corner(header.y_corner, header.y_center, step_y);
    let lacking = [
        ("ncols", columns.is_none()),
        ("nrows", rows.is_none()),
        ("cellsize", step_x.is_none() || step_y.is_none()),
        ("xllcorner", west.is_none()),
        ("yllcorner", south.is_none()),
    ];
    if let Some((name, _)) = lacking.iter().find(|(_, lacks)| *lacks) {
        return Err(Box::new(Problem::error(whole(file), "problem-grid-lacks").with("key", *name)));
    }
    let (columns, rows) = (columns.unwrap_or(0), rows.unwrap_or(0));
    let (step_x, step_y) = (step_x.unwrap_or(f64::NAN), step_y.unwrap_or(f64::NAN));
    // A value and the blank behind it take two bytes at least.
    let found = bytes.len().saturating_sub(tokens.at).div_ceil(2);
    if columns.saturating_mul(rows) > found {
        let problem = Problem::error(whole(file), "problem-grid-few").with("wanted", columns.saturating_mul(rows));
        return Err(Box::new(problem));
    }
    let said = files.prj.and_then(prj::coordinates_of);
    let coordinates = match (said, files.grid_coordinates) {
        (Some(said), None) => said,
        (None, Some(told)) => told,
        (Some(said), Some(told)) if said == told => said,
        (Some(said), Some(told)) => {
            let problem = Problem::error(whole(file), "problem-terrain-told-otherwise");
            return Err(Box::new(problem.with("found", said.name()).with("told", told.name())));
        }
        (None, None) => {
            let message = if files.prj.is_some() { "problem-terrain-prj" } else { "problem-terrain-no-prj" };
            return Err(Box::new(Problem::error(whole(file), message)));
        }
    };
    let geometry = Geometry {
        columns,
        rows,
        west: west.unwrap_or(f64::NAN),
        north: south.unwrap_or(f64::NAN) + step_y * rows as f64,
        step_x,
        step_y,
        coordinates,
    };
    if !geometry.is_sound() || coordinates == Coordinates::Unnamed {
        return Err(Box::new(Problem::error(whole(file), "problem-terrain-place")));
    }
    Ok((geometry, AsciiCells { file, tokens, columns, rows, no_data: header.no_data }))
}

#[derive(Default)]
struct Header {
    columns: Option<f64>,
    rows: Option<f64>,
    x_corner: Option<f64>,
    y_corner: Option<f64>,
    x_center: Option<f64>,
    y_center: Option<f64>,
    cell: Option<f64>,
    cell_x: Option<f64>,
    cell_y: Option<f64>,
    no_data: Option<f64>,
}

impl Header {
    fn place(&mut self, name: &str) -> Option<&mut Option<f64>> {
        Some(match name {
            "ncols" => &mut self.columns,
            "nrows" => &mut self.rows,
            "xllcorner" => &mut self.x_corner,
            "yllcorner" => &mut self.y_corner,
            "xllcenter" => &mut self.x_center,
            "yllcenter" => &mut self.y_center,
            "cellsize" => &mut self.cell,
            "dx" => &mut self.cell_x,
            "dy" => &mut self.cell_y,
            "nodata_value" | "nodata" => &mut self.no_data,
            _ => return None,
        })
    }

    fn side(&self, written: Option<f64>) -> Option<usize> {
        written.filter(|side| *side >= 1.0 && *side <= MOST_SIDE as f64 && side % 1.0 == 0.0).map(|side| side as usize)
    }
}

impl CellSource for AsciiCells<'_> {
    fn each_cell(&mut self, visit: &mut dyn FnMut(usize, usize, f64)) -> Result<(), Problem> {
        for row in 0..self.rows {
            for column in 0..self.columns {
                let Some(token) = self.tokens.next() else {
                    let problem = Problem::error(at_line(self.file, self.tokens.line, 0, 0), "problem-grid-few");
                    return Err(problem.with("wanted", self.columns * self.rows));
                };
                let Some(height) = number(token.text) else {
                    if token.text.eq_ignore_ascii_case(b"nan") {
                        continue;
                    }
                    let at = at_line(self.file, token.line, token.column, token.text.len().min(40));
                    return Err(Problem::error(at, "problem-grid-number").with("text", shown(token.text)));
                };
                if self.no_data != Some(height) {
                    visit(row, column, height);
                }
            }
        }
        match self.tokens.next() {
            None => Ok(()),
            Some(token) => {
                let problem = Problem::error(at_line(self.file, token.line, token.column, 1), "problem-grid-many");
                Err(problem.with("wanted", self.columns * self.rows))
            }
        }
    }
}
