//! The rasterised letters that the program carries, read in place.
//!
//! `atlas/README.md` describes the file and how to make it anew. It is checked while the program is compiled, so that
//! nothing has to be checked when a letter is drawn.

use super::Weight;

static FILE: &[u8] = include_bytes!("atlas/letters.bin");

const SIZE_COUNT: usize = 13;
const HEADER: usize = 16;
const CHARACTERS: usize = word(6);
const KERNING: [usize; 2] = [word(8), word(10)];
const SIZES_AT: usize = HEADER;
const PHASES_AT: usize = SIZES_AT + SIZE_COUNT;
const CODES_AT: usize = PHASES_AT + SIZE_COUNT;
const ADVANCES_AT: usize = CODES_AT + 2 * CHARACTERS;
const KERNING_AT: usize = ADVANCES_AT + 4 * CHARACTERS;
const GLYPHS_AT: usize = KERNING_AT + 4 * (KERNING[0] + KERNING[1]);
const DATA_AT: usize = GLYPHS_AT + word(12) + (word(14) << 16);
const GLYPH_BYTES: usize = 8;
/// Units to the em in advances and kerning.
const EM: i32 = 2000;
/// The first printable ASCII character; those up to the tilde come first in the file, in order.
const FIRST: u32 = 0x20;
const LAST_ASCII: u32 = 0x7E;
/// The place of a capital with a level top, the H.
pub(super) const CAPITAL: usize = ('H' as u32 - FIRST) as usize;

/// Sizes in pixels to the em, smallest first.
pub(super) const SIZES_PX: [u8; SIZE_COUNT] = {
    assert!(FILE[0] == b'L' && FILE[1] == b'T' && FILE[2] == b'R' && FILE[3] == b'1', "not an atlas of letters");
    assert!(FILE[4] as usize == SIZE_COUNT, "another number of sizes");
    assert!(DATA_AT < FILE.len(), "the atlas is cut short");
    let mut sizes = [0; SIZE_COUNT];
    let mut i = 0;
    while i < SIZE_COUNT {
        sizes[i] = FILE[SIZES_AT + i];
        i += 1;
    }
    sizes
};

/// For each size, how many glyph records of one character come before it in one weight; the total last.
const PHASES_BEFORE: [usize; SIZE_COUNT + 1] = {
    let mut before = [0; SIZE_COUNT + 1];
    let mut i = 0;
    while i < SIZE_COUNT {
        before[i + 1] = before[i] + FILE[PHASES_AT + i] as usize;
        i += 1;
    }
    before
};

const fn word(at: usize) -> usize {
    FILE[at] as usize | (FILE[at + 1] as usize) << 8
}

/// The place of a character in the file, or `None` where the face has no picture of it.
pub(super) fn find(character: char) -> Option<usize> {
    let code = u32::from(character);
    if (FIRST..=LAST_ASCII).contains(&code) {
        return Some((code - FIRST) as usize);
    }
    let (mut low, mut high) = (0, CHARACTERS);
    while low < high {
        let middle = (low + high) / 2;
        let here = word(CODES_AT + 2 * middle) as u32;
        if here == code {
            return Some(middle);
        }
        if here < code { low = middle + 1 } else { high = middle }
    }
    None
}

/// How far the pen moves on after a character, in 1/64 pixel.
pub(super) fn advance(weight: Weight, px: u8, place: usize) -> i32 {
    scaled(word(ADVANCES_AT + 2 * (weight as usize * CHARACTERS + place)) as i32, px)
}

/// How far two characters draw together (less than 0) or apart, in 1/64 pixel.
pub(super) fn kerning(weight: Weight, px: u8, left: usize, right: usize) -> i32 {
    let start = KERNING_AT + if weight == Weight::Bold { 4 * KERNING[0] } else { 0 };
    let wanted = (left as u8, right as u8);
    let (mut low, mut high) = (0, KERNING[weight as usize]);
    while low < high {
        let middle = (low + high) / 2;
        let at = start + 4 * middle;
        let here = (FILE[at], FILE[at + 1]);
        if here == wanted {
            return scaled(i32::from(i16::from_le_bytes([FILE[at + 2], FILE[at + 3]])), px);
        }
        if here < wanted { low = middle + 1 } else { high = middle }
    }
    0
}

fn scaled(units: i32, px: u8) -> i32 {
    (units * i32::from(px) * 64 + EM / 2).div_euclid(EM)
}

/// The picture of one character.
#[derive(Clone, Copy)]
pub(super) struct Glyph {
    /// Columns from the pen to the left edge of the picture.
    pub(super) left: i32,
    /// Rows from the baseline up to the top edge of the picture.
    pub(super) top: i32,
    pub(super) width: usize,
    pub(super) height: usize,
    packed: Packed,
}

#[derive(Clone, Copy)]
enum Packed {
    /// Two pixels to a byte, the left one in the upper half.
    Pairs(&'static [u8]),
    /// Length less one in the upper half, coverage in the lower.
    Runs(&'static [u8]),
}

/// The picture of the character at `place` for a pen `pen` 1/64 pixel from the frame's edge, and the whole pixel that
/// its `left` counts from.
pub(super) fn glyph(weight: Weight, size: usize, place: usize, pen: i32) -> (Glyph, i32) {
    let phases = i32::from(FILE[PHASES_AT + size]);
    let step = 64 / phases;
    let place_of_pen = (pen + step / 2).div_euclid(step);
    let (column, phase) = (place_of_pen.div_euclid(phases), place_of_pen.rem_euclid(phases) as usize);
    let before = (weight as usize * PHASES_BEFORE[SIZE_COUNT] + PHASES_BEFORE[size]) * CHARACTERS;
    let at = GLYPHS_AT + GLYPH_BYTES * (before + place * phases as usize + phase);
    let packed = u32::from_le_bytes([FILE[at], FILE[at + 1], FILE[at + 2], FILE[at + 3]]) as usize;
    let bytes = &FILE[DATA_AT + (packed >> 1)..];
    let glyph = Glyph {
        left: i32::from(FILE[at + 4] as i8),
        top: i32::from(FILE[at + 5] as i8),
        width: usize::from(FILE[at + 6]),
        height: usize::from(FILE[at + 7]),
        packed: if packed & 1 == 1 { Packed::Runs(bytes) } else { Packed::Pairs(bytes) },
    };
    (glyph, column)
}

impl Glyph {
    /// Hands on the rows from the top as coverage of 0 to 255.
    pub(super) fn rows(&self, mut row: impl FnMut(usize, &[u8])) {
        let mut cells = [0; u8::MAX as usize];
        let mut next = self.values();
        for y in 0..self.height {
            for cell in &mut cells[..self.width] {
                *cell = next() * 17;
            }
            row(y, &cells[..self.width]);
        }
    }

    fn values(&self) -> impl FnMut() -> u8 + use<> {
        let packed = self.packed;
        let (mut at, mut left) = (0, 0);
        move || match packed {
            Packed::Pairs(bytes) => {
                let byte = bytes[at / 2];
                at += 1;
                if at % 2 == 1 { byte >> 4 } else { byte & 15 }
            }
            Packed::Runs(bytes) => {
                if left == 0 {
                    left = (bytes[at] >> 4) + 1;
                    at += 1;
                }
                left -= 1;
                bytes[at - 1] & 15
            }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_picture_in_the_file_can_be_unpacked() {
        let mut inked = 0;
        for weight in [Weight::Regular, Weight::Bold] {
            for size in 0..SIZE_COUNT {
                for place in 0..CHARACTERS {
                    for pen in [0, 16, 32, 48] {
                        let (glyph, _) = glyph(weight, size, place, pen);
                        glyph.rows(|_, row| inked += usize::from(row.contains(&255)));
                    }
                }
            }
        }
        assert!(inked > 10_000);
    }

    #[test]
    fn the_codes_are_in_order() {
        assert!((1..CHARACTERS).all(|i| word(CODES_AT + 2 * i) > word(CODES_AT + 2 * (i - 1))));
        assert_eq!(find('~'), Some(94));
        assert!(find('ñ').is_some() && find('漢').is_none());
    }

    #[test]
    fn figures_are_all_of_one_width() {
        for weight in [Weight::Regular, Weight::Bold] {
            let width = |figure: char| advance(weight, 48, find(figure).unwrap());
            assert!(('0'..='9').all(|figure| width(figure) == width('0')));
        }
    }
}
