//! The list of sums: what is in a bundle, how long it is and what its SHA-256 is.

use std::collections::BTreeMap;

use sha2::{Digest, Sha256};

use super::{FORMAT, Fault, MOST_BYTES, MOST_MEMBER_BYTES, MOST_MEMBERS, MemberName, SUMS};

const MARK: &str = "deshielo-bundle";
/// Longest list, bytes.
pub(super) const MOST_LIST_BYTES: u64 = 256 * 1024;

/// What the list says of one member.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Entry {
    /// Its length in bytes.
    pub length: u64,
    /// Its SHA-256.
    pub sum: [u8; 32],
}

/// Every member by its name.
pub(super) type Entries = BTreeMap<MemberName, Entry>;

/// The SHA-256 of bytes.
pub(super) fn sum_of(bytes: &[u8]) -> [u8; 32] {
    Sha256::digest(bytes).into()
}

/// The list as text.
pub(super) fn write(entries: &Entries) -> String {
    let mut text = format!("{MARK} {FORMAT}\n");
    for (name, entry) in entries {
        let sum: String = entry.sum.iter().map(|byte| format!("{byte:02x}")).collect();
        text.push_str(&format!("{sum} {} {}\n", entry.length, name.as_str()));
    }
    text
}

/// Reads a list and holds it against every bound, so that nothing larger is ever begun.
///
/// # Errors
/// What is wrong with it.
pub(super) fn read(text: &str) -> Result<Entries, Fault> {
    let mut lines = text.split('\n');
    let format = lines.next().and_then(|line| line.strip_prefix(MARK)?.strip_prefix(' ')).ok_or(Fault::NotABundle)?;
    match format.parse() {
        Ok(FORMAT) => {}
        Ok(newer) if newer > FORMAT => return Err(Fault::Newer(newer)),
        _ => return Err(Fault::NotABundle),
    }
    let (mut entries, mut all_bytes) = (Entries::new(), 0_u64);
    let mut folded = BTreeMap::new();
    // Whoever cut the list short left no end of line.
    if lines.next_back() != Some("") {
        return Err(Fault::NotABundle);
    }
    for line in lines {
        let (name, entry) = read_line(line)?;
        if folded.insert(name.folded(), ()).is_some() {
            return Err(Fault::Twice(name.as_str().to_owned()));
        }
        all_bytes = all_bytes.saturating_add(entry.length);
        if entry.length > MOST_MEMBER_BYTES {
            return Err(Fault::TooLarge(name.as_str().to_owned()));
        }
        if all_bytes > MOST_BYTES {
            return Err(Fault::TooLarge(SUMS.to_owned()));
        }
        entries.insert(name, entry);
        if entries.len() > MOST_MEMBERS {
            return Err(Fault::TooMany);
        }
    }
    Ok(entries)
}

fn read_line(line: &str) -> Result<(MemberName, Entry), Fault> {
    let mut parts = line.splitn(3, ' ');
    let (Some(sum), Some(length), Some(name)) = (parts.next(), parts.next(), parts.next()) else {
        return Err(Fault::NotABundle);
    };
    let name = MemberName::new(name)?;
    let sum = read_sum(sum).ok_or(Fault::NotABundle)?;
    let length = length.parse().map_err(|_| Fault::NotABundle)?;
    Ok((name, Entry { length, sum }))
}

fn read_sum(text: &str) -> Option<[u8; 32]> {
    let mut sum = [0; 32];
    if text.len() != 64 || !text.bytes().all(|byte| byte.is_ascii_hexdigit()) {
        return None;
    }
    for (byte, at) in sum.iter_mut().zip((0..64).step_by(2)) {
        *byte = u8::from_str_radix(text.get(at..at + 2)?, 16).ok()?;
    }
    Some(sum)
}

#[cfg(test)]
mod tests {
    use super::*;

    const ZEROES: &str = "0000000000000000000000000000000000000000000000000000000000000000";

    fn list(lines: &[&str]) -> Result<Entries, Fault> {
        read(&format!("deshielo-bundle 1\n{}", lines.iter().map(|line| format!("{line}\n")).collect::<String>()))
    }

    #[test]
    fn what_is_written_is_read() {
        // SHA-256 of "abc": FIPS 180-4, the example of the standard, from memory.
        let abc = "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";
        let name = MemberName::new("place/place.toml").unwrap();
        let entries = Entries::from([(name, Entry { length: 3, sum: sum_of(b"abc") })]);
        let text = write(&entries);
        assert_eq!(text, format!("deshielo-bundle 1\n{abc} 3 place/place.toml\n"));
        assert_eq!(read(&text), Ok(entries));
    }

    #[test]
    fn a_list_that_is_not_ours_is_refused() {
        assert_eq!(read(""), Err(Fault::NotABundle));
        assert_eq!(read("deshielo-bundle one\n"), Err(Fault::NotABundle));
        assert_eq!(read("deshielo-bundle 0\n"), Err(Fault::NotABundle));
        assert_eq!(read("deshielo-bundle 2\nanything"), Err(Fault::Newer(2)));
        assert_eq!(read("deshielo-bundle 1"), Err(Fault::NotABundle));
        assert_eq!(read(&format!("deshielo-bundle 1\n{ZEROES} 3 place/a")), Err(Fault::NotABundle));
        assert_eq!(list(&["x 3 place/a"]), Err(Fault::NotABundle));
        assert_eq!(list(&[&format!("{ZEROES} -3 place/a")]), Err(Fault::NotABundle));
        assert_eq!(list(&[&format!("{ZEROES} 3 ../a")]), Err(Fault::Name("../a".to_owned())));
    }

    #[test]
    fn bounds_hold_before_a_byte_is_read() {
        let large = MOST_MEMBER_BYTES;
        assert_eq!(list(&[&format!("{ZEROES} {} place/a", large + 1)]), Err(Fault::TooLarge("place/a".to_owned())));
        let four: Vec<String> = (0..4).map(|n| format!("{ZEROES} {large} place/{n}")).collect();
        let four: Vec<&str> = four.iter().map(String::as_str).collect();
        assert_eq!(list(&four), Err(Fault::TooLarge(SUMS.to_owned())));
        let many: Vec<String> = (0..=MOST_MEMBERS).map(|n| format!("{ZEROES} 1 place/{n}")).collect();
        assert_eq!(list(&many.iter().map(String::as_str).collect::<Vec<_>>()), Err(Fault::TooMany));
        let twice = [format!("{ZEROES} 1 place/Nieve.csv"), format!("{ZEROES} 1 place/nieve.csv")];
        assert_eq!(list(&[&twice[0], &twice[1]]), Err(Fault::Twice("place/nieve.csv".to_owned())));
    }
}
