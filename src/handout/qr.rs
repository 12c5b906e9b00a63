//! The result as a square code that any telephone camera reads as plain text: no address, no network.

use qrcodegen::{QrCode, QrCodeEcc};

use super::model::{Ink, Piece};
use super::pen::{area, corners};

/// Why there is no code.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum QrFault {
    /// The text is longer than a code holds; this many bytes.
    TooLong(usize),
}

/// The code as squares within a box of that size at (0, 0). The paper around it must stay empty for 4 modules
/// (ISO/IEC 18004).
///
/// # Errors
/// A [`QrFault`].
pub(super) fn code(text: &str, size: f64) -> Result<Piece, QrFault> {
    // The lowest correction that keeps the modules large: paper is clean, cameras are not all sharp.
    let code = QrCode::encode_text(text, QrCodeEcc::Low).map_err(|_| QrFault::TooLong(text.len()))?;
    // Whole tenths of a point, so that all modules are of one size.
    let module = libm::floor(size / f64::from(code.size()) * 10.0) / 10.0;
    let right = size - module * f64::from(code.size());
    let mut runs = Vec::new();
    for y in 0..code.size() {
        let mut x = 0;
        while x < code.size() {
            let from = x;
            while code.get_module(x, y) {
                x += 1;
            }
            if x > from {
                let (top, wide) = (f64::from(y) * module, f64::from(x - from) * module);
                // A hair's overlap, so that no viewer shows seams between the rows.
                runs.push(corners(right + f64::from(from) * module, top, wide, module + 0.01));
            }
            x += 1;
        }
    }
    Ok(area(runs, Ink::Black))
}
