//! The first line of every kept file, by which a whole file is told from a damaged one.

/// The format that this program writes.
pub const FORMAT: u32 = 1;

/// More bytes than this are no kept file.
pub const MOST_BYTES: usize = 512 * 1024;

const MARK: &str = "deshielo-keep";

/// Why a file cannot be used.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Damage {
    /// It does not begin as a kept file does.
    NoSeal,
    /// It is longer than any kept file.
    TooLong,
    /// A newer program wrote it, in this format.
    Newer(u32),
    /// Its length or its sum is not the one of its first line.
    Torn,
    /// It is whole, but its content is none that this program writes.
    Content,
}

/// A body with its first line.
pub fn seal(serial: u64, body: &str) -> Vec<u8> {
    let sum = sum_of(serial, body.as_bytes());
    format!("{MARK} {FORMAT} {serial} {} {sum:08x}\n{body}", body.len()).into_bytes()
}

/// The serial and the body of a whole file.
///
/// # Errors
/// Its [`Damage`].
pub fn unseal(bytes: &[u8]) -> Result<(u64, &str), Damage> {
    if bytes.len() > MOST_BYTES {
        return Err(Damage::TooLong);
    }
    let end = bytes.iter().position(|byte| *byte == b'\n').ok_or(Damage::NoSeal)?;
    let line = std::str::from_utf8(&bytes[..end]).map_err(|_| Damage::NoSeal)?;
    let parts: Vec<&str> = line.split(' ').collect();
    let [MARK, format, serial, length, sum] = parts[..] else { return Err(Damage::NoSeal) };
    let format: u32 = format.parse().map_err(|_| Damage::NoSeal)?;
    if format > FORMAT {
        return Err(Damage::Newer(format));
    }
    let serial: u64 = serial.parse().map_err(|_| Damage::NoSeal)?;
    let length: usize = length.parse().map_err(|_| Damage::NoSeal)?;
    let sum = u32::from_str_radix(sum, 16).map_err(|_| Damage::NoSeal)?;
    let body = &bytes[end + 1..];
    if body.len() != length || sum_of(serial, body) != sum {
        return Err(Damage::Torn);
    }
    // Whatever was sealed was text.
    std::str::from_utf8(body).map(|body| (serial, body)).map_err(|_| Damage::Torn)
}

/// CRC-32 over the serial and the body, so that a serial cannot change alone.
fn sum_of(serial: u64, body: &[u8]) -> u32 {
    let mut sum = crc32fast::Hasher::new();
    sum.update(&serial.to_le_bytes());
    sum.update(body);
    sum.finalize()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_was_sealed_opens_and_no_changed_byte_goes_unseen() {
        let sealed = seal(17, "{\"año\":3}\n");
        assert_eq!(unseal(&sealed), Ok((17, "{\"año\":3}\n")));
        for at in 0..sealed.len() {
            for bit in 0..8 {
                let mut damaged = sealed.clone();
                damaged[at] ^= 1 << bit;
                // The case of a hexadecimal digit says nothing.
                if let Ok(read) = unseal(&damaged) {
                    assert_eq!(read, (17, "{\"año\":3}\n"), "byte {at}, bit {bit}");
                }
            }
            assert!(unseal(&sealed[..at]).is_err(), "cut at {at}");
        }
        let mut longer = sealed.clone();
        longer.push(0);
        assert_eq!(unseal(&longer), Err(Damage::Torn));
        assert_eq!(unseal(&vec![b'a'; MOST_BYTES + 1]), Err(Damage::TooLong));
        assert_eq!(unseal(b"deshielo-keep 2 1 0 00000000\n"), Err(Damage::Newer(2)));
    }
}
