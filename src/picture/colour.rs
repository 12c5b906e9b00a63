//! How well colours can be told apart: contrast for reading, and difference for eyes that see colour otherwise.

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

/// Ways in which people see fewer colours.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Deficiency {
    /// No long-wave (red) cones.
    Protanopia,
    /// No middle-wave (green) cones.
    Deuteranopia,
    /// No short-wave (blue) cones.
    Tritanopia,
}

impl Deficiency {
    /// All three.
    pub const ALL: [Self; 3] = [Self::Protanopia, Self::Deuteranopia, Self::Tritanopia];

    /// What linear red, green and blue look like to such an eye: Machado, Oliveira and Fernandes (2009), "A
    /// physiologically-based model for simulation of color vision deficiency", IEEE Transactions on Visualization and
    /// Computer Graphics 15(6), the authors' table of matrices at severity 1.0.
    const fn matrix(self) -> [[f64; 3]; 3] {
        match self {
            Self::Protanopia => {
                [[0.152286, 1.052583, -0.204868], [0.114503, 0.786281, 0.099216], [-0.003882, -0.048116, 1.051998]]
            }
            Self::Deuteranopia => {
                [[0.367322, 0.860646, -0.227968], [0.280085, 0.672501, 0.047413], [-0.011820, 0.042940, 0.968881]]
            }
            Self::Tritanopia => {
                [[1.255528, -0.076749, -0.178779], [-0.078411, 0.930809, 0.147602], [0.004733, 0.691367, 0.303900]]
            }
        }
    }
}

/// A colour of 8 bits a channel as the frame keeps it.
pub const fn rgb(red: u8, green: u8, blue: u8) -> Rgb565 {
    Rgb565::new(round_to(red, 31), round_to(green, 63), round_to(blue, 31))
}

const fn round_to(value: u8, most: u32) -> u8 {
    ((value as u32 * most + 127) / 255) as u8
}

/// Red, green and blue in linear light, 0 to 1 (IEC 61966-2-1, the sRGB curve).
fn linear(colour: Rgb565) -> [f64; 3] {
    let channel = |value: u8, most: f64| {
        let share = f64::from(value) / most;
        if share <= 0.04045 { share / 12.92 } else { libm::pow((share + 0.055) / 1.055, 2.4) }
    };
    [channel(colour.r(), 31.0), channel(colour.g(), 63.0), channel(colour.b(), 31.0)]
}

/// Relative luminance, 0 to 1 (WCAG 2.2, definition "relative luminance").
pub fn luminance(colour: Rgb565) -> f64 {
    let [red, green, blue] = linear(colour);
    0.2126 * red + 0.7152 * green + 0.0722 * blue
}

/// Contrast of two colours, 1 to 21, the same either way round (WCAG 2.2, definition "contrast ratio").
pub fn contrast(one: Rgb565, other: Rgb565) -> f64 {
    let (a, b) = (luminance(one), luminance(other));
    (a.max(b) + 0.05) / (a.min(b) + 0.05)
}

/// Distance of two colours in CIELAB (CIE 1976, white D65); about 2.3 can just be seen by a normal eye. With a
/// deficiency given, the distance that is left to that eye.
pub fn difference(one: Rgb565, other: Rgb565, seen_with: Option<Deficiency>) -> f64 {
    let (a, b) = (lab(seen(linear(one), seen_with)), lab(seen(linear(other), seen_with)));
    let square = |i: usize| (a[i] - b[i]) * (a[i] - b[i]);
    libm::sqrt(square(0) + square(1) + square(2))
}

fn seen(light: [f64; 3], with: Option<Deficiency>) -> [f64; 3] {
    let Some(deficiency) = with else { return light };
    deficiency.matrix().map(|row| (row[0] * light[0] + row[1] * light[1] + row[2] * light[2]).clamp(0.0, 1.0))
}

/// L*, a* and b* of linear light (CIE 15: 2004; sRGB primaries and white from IEC 61966-2-1).
fn lab([red, green, blue]: [f64; 3]) -> [f64; 3] {
    let x = (0.4124 * red + 0.3576 * green + 0.1805 * blue) / 0.9505;
    let y = 0.2126 * red + 0.7152 * green + 0.0722 * blue;
    let z = (0.0193 * red + 0.1192 * green + 0.9505 * blue) / 1.089;
    let bent = |t: f64| if t > 216.0 / 24_389.0 { libm::cbrt(t) } else { (24_389.0 / 27.0 * t + 16.0) / 116.0 };
    let (x, y, z) = (bent(x), bent(y), bent(z));
    [116.0 * y - 16.0, 500.0 * (x - y), 200.0 * (y - z)]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn contrast_runs_from_1_to_21() {
        // WCAG 2.2: black on white is 21:1, a colour on itself 1:1.
        assert!((contrast(Rgb565::BLACK, Rgb565::WHITE) - 21.0).abs() < 1e-12);
        assert!((contrast(Rgb565::RED, Rgb565::RED) - 1.0).abs() < 1e-12);
        // Luminance of pure red is its coefficient, so (1 + 0.05) / (0.2126 + 0.05).
        assert!((contrast(Rgb565::RED, Rgb565::WHITE) - 1.05 / 0.2626).abs() < 1e-9);
    }

    #[test]
    fn white_is_white_to_every_eye() {
        for deficiency in Deficiency::ALL {
            for row in deficiency.matrix() {
                assert!((row.iter().sum::<f64>() - 1.0).abs() < 2e-6);
            }
            assert!((difference(Rgb565::BLACK, Rgb565::WHITE, Some(deficiency)) - 100.0).abs() < 0.1);
        }
    }

    #[test]
    fn red_and_green_come_close_without_middle_wave_cones() {
        let (brick, olive) = (rgb(170, 80, 40), rgb(110, 110, 30));
        let normal = difference(brick, olive, None);
        assert!(difference(brick, olive, Some(Deficiency::Deuteranopia)) < normal / 2.0);
        assert!(difference(brick, olive, Some(Deficiency::Tritanopia)) > normal / 2.0);
    }

    #[test]
    fn lab_of_the_red_primary() {
        // L* 53.24, a* 80.09, b* 67.20 for sRGB red under D65: from memory, agrees with the definition above.
        let [l, a, b] = lab([1.0, 0.0, 0.0]);
        assert!((l - 53.24).abs() < 0.05 && (a - 80.09).abs() < 0.1 && (b - 67.20).abs() < 0.1, "{l} {a} {b}");
    }
}
