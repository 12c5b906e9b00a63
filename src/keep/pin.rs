//! The PIN of the staff menu, kept as a salted hash.
//!
//! PBKDF2 with HMAC-SHA-256 (RFC 8018, section 5.2), 16 bytes of salt from the system. A PIN of a few digits is found in
//! a short time by whoever has the card in hand, whatever the hash: it keeps visitors out of the menu, and the number of
//! tries is limited for that ([`crate::session::kiosk`]).

use pbkdf2::pbkdf2_hmac;
use serde::{Deserialize, Serialize};
use sha2::Sha256;

/// Fewest digits of a PIN.
pub const LEAST_PIN_DIGITS: usize = 4;
/// Most digits of a PIN.
pub const MOST_PIN_DIGITS: usize = 8;

/// Rounds of the hash: as many as an ARM1176 has time for while a person waits.
const ROUNDS: u32 = 20_000;
/// More rounds than this in a file are no setting but damage, and would stop the picture.
const MOST_ROUNDS: u32 = 200_000;

/// What is wrong with a PIN.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PinFault {
    /// It has too few or too many digits, or something else in it.
    Digits,
    /// The system gives no random numbers.
    NoSalt,
}

/// A PIN that can be checked and not read.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct PinHash {
    rounds: u32,
    salt: [u8; 16],
    hash: [u8; 32],
}

impl PinHash {
    /// Hashes a PIN with a salt of its own.
    ///
    /// # Errors
    /// [`PinFault`].
    pub fn new(pin: &str) -> Result<Self, PinFault> {
        let mut salt = [0; 16];
        getrandom::fill(&mut salt).map_err(|_| PinFault::NoSalt)?;
        Self::with_salt(pin, salt)
    }

    /// Hashes a PIN with a given salt.
    ///
    /// # Errors
    /// [`PinFault::Digits`].
    pub fn with_salt(pin: &str, salt: [u8; 16]) -> Result<Self, PinFault> {
        let digits = pin.bytes().all(|byte| byte.is_ascii_digit());
        if !digits || !(LEAST_PIN_DIGITS..=MOST_PIN_DIGITS).contains(&pin.len()) {
            return Err(PinFault::Digits);
        }
        Ok(Self { rounds: ROUNDS, salt, hash: hash(pin, &salt, ROUNDS) })
    }

    /// Whether this is the PIN.
    pub fn is(&self, pin: &str) -> bool {
        if self.rounds == 0 || self.rounds > MOST_ROUNDS {
            return false;
        }
        let got = hash(pin, &self.salt, self.rounds);
        // Every byte is looked at, so that the time tells nothing.
        got.iter().zip(&self.hash).fold(0, |differ, (a, b)| differ | (a ^ b)) == 0
    }
}

fn hash(pin: &str, salt: &[u8], rounds: u32) -> [u8; 32] {
    let mut hash = [0; 32];
    pbkdf2_hmac::<Sha256>(pin.as_bytes(), salt, rounds, &mut hash);
    hash
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_published_vector_holds() {
        // RFC 7914, section 11: PBKDF2-HMAC-SHA-256, P = "passwd", S = "salt", c = 1, from memory.
        let mut got = [0; 64];
        pbkdf2_hmac::<Sha256>(b"passwd", b"salt", 1, &mut got);
        assert_eq!(got[..8], [0x55, 0xac, 0x04, 0x6e, 0x56, 0xe3, 0x08, 0x9f]);
    }

    #[test]
    fn only_the_pin_opens() {
        let kept = PinHash::with_salt("04711", [7; 16]).unwrap();
        assert!(kept.is("04711"));
        for other in ["", "4711", "04712", "047110", "00000"] {
            assert!(!kept.is(other), "{other}");
        }
        assert_ne!(kept, PinHash::with_salt("04711", [8; 16]).unwrap());
        assert!(!serde_json::to_string(&kept).unwrap().contains("4711"));
        for wrong in ["", "123", "123456789", "12a4", "１２３４"] {
            assert_eq!(PinHash::with_salt(wrong, [0; 16]), Err(PinFault::Digits), "{wrong}");
        }
    }

    #[test]
    fn damaged_rounds_neither_open_nor_stop_the_picture() {
        let kept = PinHash::with_salt("4711", [7; 16]).unwrap();
        for rounds in [0, u32::MAX] {
            assert!(!PinHash { rounds, ..kept.clone() }.is("4711"));
        }
    }
}
