//! A writer of NetCDF classic files with 64-bit offsets (CDF-2).
//!
//! The layout follows the NetCDF classic and 64-bit offset format specification (Unidata): a header of dimensions,
//! attributes and variables, each list with its tag and count, then the values of the variables one after the other, all
//! big-endian and padded to four bytes. No dimension is unlimited.

/// Values of a variable or an attribute.
#[derive(Clone, Debug, PartialEq)]
pub enum Values {
    /// Text, in UTF-8.
    Text(Vec<u8>),
    /// 32-bit whole numbers.
    Whole(Vec<i32>),
    /// 64-bit floating point.
    Double(Vec<f64>),
}

/// A named value of the file or of a variable.
#[derive(Clone, Debug, PartialEq)]
pub struct Attribute {
    /// Its name.
    pub name: String,
    /// Its value.
    pub values: Values,
}

impl Attribute {
    /// A text.
    pub fn text(name: &str, text: &str) -> Self {
        Self { name: name.to_owned(), values: Values::Text(text.as_bytes().to_vec()) }
    }

    /// A number.
    pub fn double(name: &str, value: f64) -> Self {
        Self { name: name.to_owned(), values: Values::Double(vec![value]) }
    }
}

/// A variable over some of the file's dimensions, the last of which runs fastest.
#[derive(Clone, Debug, PartialEq)]
pub struct Variable {
    /// Its name.
    pub name: String,
    /// Indexes of its dimensions.
    pub dimensions: Vec<usize>,
    /// What is told of it.
    pub attributes: Vec<Attribute>,
    /// Its values, as many as its dimensions say.
    pub values: Values,
}

/// A file.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct File {
    /// Names and lengths.
    pub dimensions: Vec<(String, usize)>,
    /// What is told of the file.
    pub attributes: Vec<Attribute>,
    /// What it holds.
    pub variables: Vec<Variable>,
}

/// Why there is no file.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum NetCdfFault {
    /// The variable of this name has not as many values as its dimensions say, or names one that is not there.
    Shape(String),
    /// A length is beyond what the format holds.
    TooLarge,
}

const DIMENSION: u32 = 0x0A;
const VARIABLE: u32 = 0x0B;
const ATTRIBUTE: u32 = 0x0C;

impl Values {
    fn type_code(&self) -> u32 {
        match self {
            Self::Text(_) => 2,
            Self::Whole(_) => 4,
            Self::Double(_) => 6,
        }
    }

    fn count(&self) -> usize {
        match self {
            Self::Text(text) => text.len(),
            Self::Whole(values) => values.len(),
            Self::Double(values) => values.len(),
        }
    }

    fn bytes(&self) -> usize {
        let each = match self {
            Self::Text(_) => 1,
            Self::Whole(_) => 4,
            Self::Double(_) => 8,
        };
        (self.count() * each).next_multiple_of(4)
    }

    fn write(&self, out: &mut Vec<u8>) {
        match self {
            Self::Text(text) => out.extend_from_slice(text),
            Self::Whole(values) => values.iter().for_each(|value| out.extend_from_slice(&value.to_be_bytes())),
            Self::Double(values) => values.iter().for_each(|value| out.extend_from_slice(&value.to_be_bytes())),
        }
        pad(out);
    }
}

impl File {
    /// The file's bytes.
    ///
    /// # Errors
    /// A [`NetCdfFault`].
    pub fn bytes(&self) -> Result<Vec<u8>, NetCdfFault> {
        for variable in &self.variables {
            let lengths =
                variable.dimensions.iter().map(|index| self.dimensions.get(*index).map(|(_, length)| *length));
            let wanted = lengths.into_iter().try_fold(1_usize, |product, length| product.checked_mul(length?));
            if wanted != Some(variable.values.count()) {
                return Err(NetCdfFault::Shape(variable.name.clone()));
            }
        }
        // Where the values begin is known only when the header has been written once.
        let header = self.header(0)?.len() as u64;
        let mut out = self.header(header)?;
        for variable in &self.variables {
            variable.values.write(&mut out);
        }
        Ok(out)
    }

    fn header(&self, first_value: u64) -> Result<Vec<u8>, NetCdfFault> {
        let mut out = b"CDF\x02".to_vec();
        word(&mut out, 0);
        list(&mut out, DIMENSION, self.dimensions.len())?;
        for (name, length) in &self.dimensions {
            text(&mut out, name)?;
            word(&mut out, size(*length)?);
        }
        attributes(&mut out, &self.attributes)?;
        list(&mut out, VARIABLE, self.variables.len())?;
        let mut begin = first_value;
        for variable in &self.variables {
            text(&mut out, &variable.name)?;
            word(&mut out, size(variable.dimensions.len())?);
            for index in &variable.dimensions {
                word(&mut out, size(*index)?);
            }
            attributes(&mut out, &variable.attributes)?;
            word(&mut out, variable.values.type_code());
            let bytes = variable.values.bytes();
            word(&mut out, size(bytes)?);
            out.extend_from_slice(&begin.to_be_bytes());
            begin += bytes as u64;
        }
        Ok(out)
    }
}

fn attributes(out: &mut Vec<u8>, attributes: &[Attribute]) -> Result<(), NetCdfFault> {
    list(out, ATTRIBUTE, attributes.len())?;
    for attribute in attributes {
        text(out, &attribute.name)?;
        word(out, attribute.values.type_code());
        word(out, size(attribute.values.count())?);
        attribute.values.write(out);
    }
    Ok(())
}

/// The tag and the count of a list; an empty one is two zeros.
fn list(out: &mut Vec<u8>, tag: u32, count: usize) -> Result<(), NetCdfFault> {
    word(out, if count == 0 { 0 } else { tag });
    word(out, size(count)?);
    Ok(())
}

fn text(out: &mut Vec<u8>, name: &str) -> Result<(), NetCdfFault> {
    word(out, size(name.len())?);
    out.extend_from_slice(name.as_bytes());
    pad(out);
    Ok(())
}

fn word(out: &mut Vec<u8>, value: u32) {
    out.extend_from_slice(&value.to_be_bytes());
}

fn pad(out: &mut Vec<u8>) {
    while !out.len().is_multiple_of(4) {
        out.push(0);
    }
}

/// Lengths are signed in the format.
fn size(length: usize) -> Result<u32, NetCdfFault> {
    i32::try_from(length).map(|length| length as u32).map_err(|_| NetCdfFault::TooLarge)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_header_is_that_of_the_specification() {
        let file = File {
            dimensions: vec![("time".to_owned(), 2)],
            attributes: vec![],
            variables: vec![Variable {
                name: "flow".to_owned(),
                dimensions: vec![0],
                attributes: vec![Attribute::text("units", "m3 s-1")],
                values: Values::Double(vec![1.5, -2.0]),
            }],
        };
        let bytes = file.bytes().unwrap();
        let mut wanted = b"CDF\x02\0\0\0\0\0\0\0\x0A\0\0\0\x01\0\0\0\x04time\0\0\0\x02".to_vec();
        wanted.extend_from_slice(b"\0\0\0\0\0\0\0\0\0\0\0\x0B\0\0\0\x01\0\0\0\x04flow\0\0\0\x01\0\0\0\0");
        wanted.extend_from_slice(b"\0\0\0\x0C\0\0\0\x01\0\0\0\x05units\0\0\0\0\0\0\x02\0\0\0\x06m3 s-1\0\0");
        wanted.extend_from_slice(b"\0\0\0\x06\0\0\0\x10");
        let begin = wanted.len() as u64 + 8;
        wanted.extend_from_slice(&begin.to_be_bytes());
        wanted.extend_from_slice(&1.5_f64.to_be_bytes());
        wanted.extend_from_slice(&(-2.0_f64).to_be_bytes());
        assert_eq!(bytes, wanted);
    }

    #[test]
    fn a_variable_of_another_shape_is_refused() {
        let variable = |dimensions: Vec<usize>| Variable {
            name: "x".to_owned(),
            dimensions,
            attributes: vec![],
            values: Values::Whole(vec![1, 2, 3]),
        };
        let file = |dimensions| File {
            dimensions: vec![("a".to_owned(), 2)],
            attributes: vec![],
            variables: vec![variable(dimensions)],
        };
        assert_eq!(file(vec![0]).bytes(), Err(NetCdfFault::Shape("x".to_owned())));
        assert_eq!(file(vec![7]).bytes(), Err(NetCdfFault::Shape("x".to_owned())));
    }
}
