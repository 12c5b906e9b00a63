//! A reader of NetCDF classic files, written from the format's specification for these tests alone.

use std::collections::BTreeMap;

/// A variable as it was read.
#[derive(Debug, Default)]
pub struct Variable {
    pub dimensions: Vec<usize>,
    pub attributes: BTreeMap<String, String>,
    pub doubles: Vec<f64>,
    pub text: Vec<u8>,
}

/// A file as it was read.
#[derive(Debug, Default)]
pub struct File {
    pub dimensions: Vec<(String, usize)>,
    pub attributes: BTreeMap<String, String>,
    pub variables: BTreeMap<String, Variable>,
}

struct Reader<'b> {
    bytes: &'b [u8],
    at: usize,
}

impl Reader<'_> {
    fn word(&mut self) -> usize {
        let word = u32::from_be_bytes(self.bytes[self.at..self.at + 4].try_into().unwrap());
        self.at += 4;
        word as usize
    }

    fn long(&mut self) -> usize {
        let high = self.word();
        (high << 32) | self.word()
    }

    fn raw(&mut self, length: usize) -> Vec<u8> {
        let raw = self.bytes[self.at..self.at + length].to_vec();
        self.at += length.next_multiple_of(4);
        raw
    }

    fn name(&mut self) -> String {
        let length = self.word();
        String::from_utf8(self.raw(length)).unwrap()
    }

    fn list(&mut self, tag: usize) -> usize {
        let got = self.word();
        let count = self.word();
        assert!(got == tag || (got == 0 && count == 0));
        count
    }

    fn attributes(&mut self) -> BTreeMap<String, String> {
        (0..self.list(0x0C))
            .map(|_| {
                let name = self.name();
                let kind = self.word();
                let count = self.word();
                let value = match kind {
                    2 => String::from_utf8(self.raw(count)).unwrap(),
                    6 => format!("{:e}", f64::from_be_bytes(self.raw(8 * count).try_into().unwrap())),
                    other => panic!("type {other}"),
                };
                (name, value)
            })
            .collect()
    }
}

/// Reads a whole file.
pub fn read(bytes: &[u8]) -> File {
    assert_eq!(&bytes[..4], b"CDF\x02");
    let mut reader = Reader { bytes, at: 4 };
    assert_eq!(reader.word(), 0, "no records");
    let dimensions: Vec<(String, usize)> = (0..reader.list(0x0A)).map(|_| (reader.name(), reader.word())).collect();
    let attributes = reader.attributes();
    let mut variables = BTreeMap::new();
    for _ in 0..reader.list(0x0B) {
        let name = reader.name();
        let ranks = reader.word();
        let mut variable = Variable { dimensions: (0..ranks).map(|_| reader.word()).collect(), ..Variable::default() };
        variable.attributes = reader.attributes();
        let kind = reader.word();
        let size = reader.word();
        let begin = reader.long();
        let count: usize = variable.dimensions.iter().map(|index| dimensions[*index].1).product();
        match kind {
            2 => variable.text = bytes[begin..begin + count].to_vec(),
            4 => assert_eq!(size, 4 * count),
            6 => {
                assert_eq!(size, 8 * count);
                let values = bytes[begin..begin + size].chunks_exact(8);
                variable.doubles = values.map(|value| f64::from_be_bytes(value.try_into().unwrap())).collect();
            }
            other => panic!("type {other}"),
        }
        variables.insert(name, variable);
    }
    File { dimensions, attributes, variables }
}
