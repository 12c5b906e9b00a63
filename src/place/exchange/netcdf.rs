//! The bytes of NetCDF classic: dimensions, attributes, variables and their values.
//!
//! The grammar is that of OGC 10-092r3: versions 1 (classic), 2 (64-bit offset) and 5 (64-bit data). Every count is held
//! against the bytes that are there before anything is set aside for it.

/// How an HDF5 file begins, and with it the younger NetCDF-4.
pub(super) const HDF5_START: &[u8] = b"\x89HDF\r\n\x1a\n";

const TAG_DIMENSION: u64 = 10;
const TAG_VARIABLE: u64 = 11;
const TAG_ATTRIBUTE: u64 = 12;
/// Most dimensions of one variable; a daily series has one to three.
const MOST_RANK: usize = 16;

/// What cannot be read, and at which byte.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Fault {
    /// Message that says it.
    pub message: &'static str,
    /// Byte of the file, from 0.
    pub byte: usize,
}

/// Type of a value.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Kind {
    I8,
    Text,
    I16,
    I32,
    F32,
    F64,
    U8,
    U16,
    U32,
    I64,
    U64,
}

impl Kind {
    fn of(code: u64) -> Option<Self> {
        use Kind::*;
        let kinds = [I8, Text, I16, I32, F32, F64, U8, U16, U32, I64, U64];
        usize::try_from(code).ok()?.checked_sub(1).and_then(|index| kinds.get(index)).copied()
    }

    fn size(self) -> usize {
        match self {
            Kind::I8 | Kind::U8 | Kind::Text => 1,
            Kind::I16 | Kind::U16 => 2,
            Kind::I32 | Kind::U32 | Kind::F32 => 4,
            Kind::F64 | Kind::I64 | Kind::U64 => 8,
        }
    }

    /// The value that fills what was never written (the library's defaults, from memory).
    pub fn usual_fill(self) -> Option<f64> {
        match self {
            Kind::I8 => Some(-127.0),
            Kind::I16 => Some(-32_767.0),
            Kind::I32 => Some(-2_147_483_647.0),
            Kind::F32 => Some(f64::from(9.969_21e36_f32)),
            Kind::F64 => Some(9.969_209_968_386_869e36),
            Kind::U16 => Some(65_535.0),
            Kind::U32 => Some(4_294_967_295.0),
            Kind::I64 => Some(-9_223_372_036_854_775_806.0),
            Kind::U64 => Some(18_446_744_073_709_551_614.0),
            Kind::U8 | Kind::Text => None,
        }
    }
}

/// An attribute's value.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Attribute {
    Text(String),
    Numbers(Vec<f64>),
}

/// Attributes in the order of the file.
#[derive(Clone, Debug, Default)]
pub(super) struct Attributes(Vec<(String, Attribute)>);

impl Attributes {
    /// The text of an attribute; empty where it has none.
    pub fn text(&self, name: &str) -> &str {
        match self.0.iter().find(|(known, _)| known == name) {
            Some((_, Attribute::Text(text))) => text.trim_matches(['\0', ' ']),
            _ => "",
        }
    }

    /// The first number of an attribute.
    pub fn number(&self, name: &str) -> Option<f64> {
        match &self.0.iter().find(|(known, _)| known == name)?.1 {
            Attribute::Numbers(numbers) => numbers.first().copied(),
            Attribute::Text(_) => None,
        }
    }
}

/// A dimension.
#[derive(Clone, Debug)]
pub(super) struct Dimension {
    pub name: String,
    pub length: usize,
    grows: bool,
}

/// A variable.
#[derive(Clone, Debug)]
pub(super) struct Variable {
    pub name: String,
    /// Indices of its dimensions, the slowest first.
    pub dimensions: Vec<usize>,
    pub attributes: Attributes,
    pub kind: Kind,
    begin: usize,
}

/// A file whose header was read.
#[derive(Debug)]
pub(super) struct NetCdf<'b> {
    bytes: &'b [u8],
    pub dimensions: Vec<Dimension>,
    pub variables: Vec<Variable>,
    record_bytes: usize,
}

struct Cursor<'b> {
    bytes: &'b [u8],
    at: usize,
    wide_counts: bool,
    wide_offsets: bool,
}

const CUT: &str = "problem-netcdf-cut";
const HEADER: &str = "problem-netcdf-header";

impl<'b> Cursor<'b> {
    fn fault<T>(&self, message: &'static str) -> Result<T, Fault> {
        Err(Fault { message, byte: self.at })
    }

    fn take(&mut self, count: usize) -> Result<&'b [u8], Fault> {
        let taken = self.at.checked_add(count).and_then(|end| self.bytes.get(self.at..end));
        let Some(taken) = taken else { return self.fault(CUT) };
        self.at += count;
        Ok(taken)
    }

    fn unsigned(&mut self, wide: bool) -> Result<u64, Fault> {
        let bytes = self.take(if wide { 8 } else { 4 })?;
        Ok(bytes.iter().fold(0, |number, byte| (number << 8) | u64::from(*byte)))
    }

    /// A count of things that take `least` bytes each, at least.
    fn count(&mut self, least: usize) -> Result<usize, Fault> {
        let count = self.unsigned(self.wide_counts)?;
        let room = self.bytes.len().saturating_sub(self.at) / least.max(1);
        match usize::try_from(count) {
            Ok(count) if count <= room => Ok(count),
            _ => self.fault(CUT),
        }
    }

    fn name(&mut self) -> Result<String, Fault> {
        let length = self.count(1)?;
        let bytes = self.take(length)?;
        self.pad(length)?;
        Ok(String::from_utf8_lossy(bytes).into_owned())
    }

    fn pad(&mut self, length: usize) -> Result<(), Fault> {
        self.take(length.wrapping_neg() % 4).map(|_| ())
    }

    /// How many entries a list has: a tag and a count, both zero for none.
    fn list(&mut self, tag: u64) -> Result<usize, Fault> {
        let found = self.unsigned(false)?;
        let count = self.count(if tag == TAG_VARIABLE { 24 } else { 8 })?;
        if found != tag && !(found == 0 && count == 0) { self.fault(HEADER) } else { Ok(count) }
    }

    fn kind(&mut self) -> Result<Kind, Fault> {
        let code = self.unsigned(false)?;
        Kind::of(code).map_or_else(|| self.fault(HEADER), Ok)
    }

    fn attributes(&mut self) -> Result<Attributes, Fault> {
        let mut attributes = Vec::new();
        for _ in 0..self.list(TAG_ATTRIBUTE)? {
            let name = self.name()?;
            let kind = self.kind()?;
            let count = self.count(kind.size())?;
            let bytes = self.take(count * kind.size())?;
            self.pad(count * kind.size())?;
            let value = if kind == Kind::Text {
                Attribute::Text(String::from_utf8_lossy(bytes).into_owned())
            } else {
                Attribute::Numbers(bytes.chunks_exact(kind.size()).map(|part| number(part, kind)).collect())
            };
            attributes.push((name, value));
        }
        Ok(Attributes(attributes))
    }
}

/// One big-endian value.
fn number(part: &[u8], kind: Kind) -> f64 {
    let mut wide = [0u8; 8];
    let start = 8 - part.len().min(8);
    wide[start..].copy_from_slice(&part[..8 - start]);
    let bits = u64::from_be_bytes(wide);
    // The narrow kinds are cut out of the wide number on purpose.
    match kind {
        Kind::I8 => f64::from(bits as u8 as i8),
        Kind::I16 => f64::from(bits as u16 as i16),
        Kind::I32 => f64::from(bits as u32 as i32),
        Kind::F32 => f64::from(f32::from_bits(bits as u32)),
        Kind::F64 => f64::from_bits(bits),
        Kind::I64 => bits as i64 as f64,
        Kind::U8 | Kind::Text | Kind::U16 | Kind::U32 | Kind::U64 => bits as f64,
    }
}

impl<'b> NetCdf<'b> {
    /// Reads the header.
    pub fn open(bytes: &'b [u8]) -> Result<Self, Fault> {
        if bytes.starts_with(HDF5_START) {
            return Err(Fault { message: "problem-netcdf-hdf5", byte: 0 });
        }
        let version = bytes.get(3).copied();
        let (wide_counts, wide_offsets) = match version {
            Some(1) => (false, false),
            Some(2) => (false, true),
            Some(5) => (true, true),
            _ => return Err(Fault { message: HEADER, byte: 3 }),
        };
        let mut cursor = Cursor { bytes, at: 4, wide_counts, wide_offsets };
        let records = cursor.unsigned(wide_counts)?;
        let streaming = if wide_counts { u64::MAX } else { u64::from(u32::MAX) };
        let mut dimensions = Vec::new();
        for _ in 0..cursor.list(TAG_DIMENSION)? {
            let name = cursor.name()?;
            let length = cursor.unsigned(wide_counts)?;
            let length = usize::try_from(length).map_or_else(|_| cursor.fault(HEADER), Ok)?;
            dimensions.push(Dimension { name, length, grows: length == 0 });
        }
        // What is said of the whole file is passed over: each series says for itself what it is.
        cursor.attributes()?;
        let mut variables = Vec::new();
        for _ in 0..cursor.list(TAG_VARIABLE)? {
            variables.push(variable(&mut cursor, dimensions.len())?);
        }
        let mut file = Self { bytes, dimensions, variables, record_bytes: 0 };
        file.settle_records(if records == streaming { None } else { Some(records) })?;
        Ok(file)
    }

    /// How long a record is, and how many there are.
    fn settle_records(&mut self, records: Option<u64>) -> Result<(), Fault> {
        let impossible = Fault { message: HEADER, byte: 4 };
        let growing: Vec<&Variable> = self.variables.iter().filter(|variable| self.grows(variable)).collect();
        let mut record_bytes: usize = 0;
        for variable in &growing {
            let one = self.values_in(variable, 1).and_then(|values| values.checked_mul(variable.kind.size()));
            let one = one.ok_or(impossible)?;
            // A single variable of small values is not padded from record to record.
            let padded = if growing.len() == 1 { Some(one) } else { one.checked_next_multiple_of(4) };
            record_bytes = padded.and_then(|padded| record_bytes.checked_add(padded)).ok_or(impossible)?;
        }
        let begin = growing.iter().map(|variable| variable.begin).min().unwrap_or(self.bytes.len());
        let room = self.bytes.len().saturating_sub(begin);
        let there = room.checked_div(record_bytes).unwrap_or(0);
        let length = match records {
            None => there,
            Some(records) => usize::try_from(records).map_err(|_| impossible)?,
        };
        self.record_bytes = record_bytes;
        for dimension in self.dimensions.iter_mut().filter(|dimension| dimension.grows) {
            dimension.length = length;
        }
        Ok(())
    }

    fn grows(&self, variable: &Variable) -> bool {
        variable.dimensions.first().is_some_and(|index| self.dimensions[*index].grows)
    }

    /// Values of a variable with its first dimension, if that grows, taken as `records` long.
    fn values_in(&self, variable: &Variable, records: usize) -> Option<usize> {
        let lengths = variable.dimensions.iter().map(|index| &self.dimensions[*index]);
        lengths.enumerate().try_fold(1usize, |product, (place, dimension)| {
            let length = if dimension.grows && place == 0 { records } else { dimension.length };
            product.checked_mul(length)
        })
    }

    /// The variable of this name.
    pub fn variable(&self, name: &str) -> Option<&Variable> {
        self.variables.iter().find(|variable| variable.name == name)
    }

    /// How many values a variable has; `None` where that is more than the file has bytes.
    pub fn size(&self, variable: &Variable) -> Option<usize> {
        let grown = variable.dimensions.first().map_or(0, |index| self.dimensions[*index].length);
        self.values_in(variable, grown).filter(|size| *size <= self.bytes.len())
    }

    /// All values of a variable, as numbers, in the order of the file.
    pub fn values(&self, variable: &Variable) -> Result<Vec<f64>, Fault> {
        let cut = |byte: usize| Fault { message: CUT, byte };
        let width = variable.kind.size();
        let size = self.size(variable).ok_or(cut(variable.begin))?;
        let (runs, per_run, step) = if self.grows(variable) {
            let per_run = self.values_in(variable, 1).ok_or(cut(variable.begin))?;
            (size.checked_div(per_run).unwrap_or(0), per_run, self.record_bytes)
        } else {
            (1, size, 0)
        };
        let mut values = Vec::new();
        for run in 0..runs {
            let start = run.checked_mul(step).and_then(|past| variable.begin.checked_add(past));
            let start = start.ok_or(cut(variable.begin))?;
            let end = per_run.checked_mul(width).and_then(|bytes| start.checked_add(bytes)).ok_or(cut(start))?;
            let bytes = self.bytes.get(start..end).ok_or(cut(start))?;
            values.extend(bytes.chunks_exact(width).map(|part| number(part, variable.kind)));
        }
        Ok(values)
    }
}

fn variable(cursor: &mut Cursor, known_dimensions: usize) -> Result<Variable, Fault> {
    let name = cursor.name()?;
    let rank = cursor.count(4)?;
    if rank > MOST_RANK {
        return cursor.fault(HEADER);
    }
    let mut dimensions = Vec::new();
    for _ in 0..rank {
        let index = cursor.unsigned(cursor.wide_counts)?;
        match usize::try_from(index) {
            Ok(index) if index < known_dimensions => dimensions.push(index),
            _ => return cursor.fault(HEADER),
        }
    }
    let attributes = cursor.attributes()?;
    let kind = cursor.kind()?;
    // The size that is written here wraps for large variables; it follows from the dimensions anyway.
    cursor.unsigned(cursor.wide_counts)?;
    let begin = cursor.unsigned(cursor.wide_offsets)?;
    let begin = usize::try_from(begin).map_or_else(|_| cursor.fault(HEADER), Ok)?;
    Ok(Variable { name, dimensions, attributes, kind, begin })
}
