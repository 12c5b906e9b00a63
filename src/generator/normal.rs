//! The normal distribution and its inverse, to full double precision.
//!
//! The inverse is algorithm AS 241, routine PPND16 (Wichura 1988, "The percentage points of the normal distribution",
//! Applied Statistics 37(3):477–484), accurate to about one part in 10^16.

/// Probability that a standard normal deviate is below `deviate`.
pub(super) fn normal_probability(deviate: f64) -> f64 {
    0.5 * libm::erfc(-deviate * core::f64::consts::FRAC_1_SQRT_2)
}

/// Density of the standard normal distribution at `deviate`.
pub(super) fn normal_density(deviate: f64) -> f64 {
    // 1/sqrt(2 pi).
    0.398_942_280_401_432_7 * libm::exp(-0.5 * deviate * deviate)
}

/// The standard normal deviate below which the given probability lies.
///
/// `probability` is to lie strictly between 0 and 1; the ends give minus and plus infinity, anything outside gives
/// not-a-number.
pub(super) fn normal_from_probability(probability: f64) -> f64 {
    let from_middle = probability - 0.5;
    if from_middle.abs() <= 0.425 {
        let r = 0.180_625 - from_middle * from_middle;
        return from_middle * ratio(r, &MIDDLE_ABOVE, &MIDDLE_BELOW);
    }
    let tail = if from_middle < 0.0 { probability } else { 1.0 - probability };
    if tail < 0.0 || tail.is_nan() {
        return f64::NAN;
    }
    if tail == 0.0 {
        return if from_middle < 0.0 { f64::NEG_INFINITY } else { f64::INFINITY };
    }
    let r = (-libm::log(tail)).sqrt();
    let size = if r <= 5.0 { ratio(r - 1.6, &NEAR_ABOVE, &NEAR_BELOW) } else { ratio(r - 5.0, &FAR_ABOVE, &FAR_BELOW) };
    if from_middle < 0.0 { -size } else { size }
}

/// Two polynomials of degree seven, lowest power first, one over the other.
fn ratio(at: f64, above: &[f64; 8], below: &[f64; 8]) -> f64 {
    let polynomial = |coefficients: &[f64; 8]| coefficients.iter().rev().fold(0.0, |sum, c| sum * at + c);
    polynomial(above) / polynomial(below)
}

/// Coefficients above the line, within 0.425 of the middle (AS 241).
const MIDDLE_ABOVE: [f64; 8] = [
    3.3871328727963665,
    133.14166789178438,
    1971.5909503065513,
    13731.69376550946,
    45921.95393154987,
    67265.7709270087,
    33430.57558358813,
    2509.0809287301227,
];
/// Coefficients below the line, within 0.425 of the middle (AS 241).
const MIDDLE_BELOW: [f64; 8] = [
    1.0,
    42.31333070160091,
    687.1870074920579,
    5394.196021424751,
    21213.794301586597,
    39307.89580009271,
    28729.085735721943,
    5226.495278852854,
];
/// Coefficients above the line, in the tails, down to exp(-25) (AS 241).
const NEAR_ABOVE: [f64; 8] = [
    1.4234371107496835,
    4.630337846156546,
    5.769497221460691,
    3.6478483247632045,
    1.2704582524523684,
    0.2417807251774506,
    0.022723844989269184,
    0.0007745450142783414,
];
/// Coefficients below the line, in the tails, down to exp(-25) (AS 241).
const NEAR_BELOW: [f64; 8] = [
    1.0,
    2.053191626637759,
    1.6763848301838038,
    0.6897673349851,
    0.14810397642748008,
    0.015198666563616457,
    0.0005475938084995345,
    1.0507500716444169e-09,
];
/// Coefficients above the line, further out (AS 241).
const FAR_ABOVE: [f64; 8] = [
    6.657904643501103,
    5.463784911164114,
    1.7848265399172913,
    0.29656057182850487,
    0.026532189526576124,
    0.0012426609473880784,
    2.7115555687434876e-05,
    2.0103343992922881e-07,
];
/// Coefficients below the line, further out (AS 241).
const FAR_BELOW: [f64; 8] = [
    1.0,
    0.599832206555888,
    0.1369298809227358,
    0.014875361290850615,
    0.0007868691311456133,
    1.8463183175100548e-05,
    1.421511758316446e-07,
    2.0442631033899397e-15,
];

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn published_check_values() {
        // Wichura (1988): the paper's three check values; from memory.
        for (probability, deviate) in
            [(0.25, -0.674_489_750_196_081_7), (0.001, -3.090_232_306_167_813_5), (1e-20, -9.262_340_089_798_408)]
        {
            assert!((normal_from_probability(probability) / deviate - 1.0).abs() < 1e-15, "{probability}");
        }
    }

    #[test]
    fn there_and_back() {
        for step in 1..400 {
            let probability = f64::from(step) / 400.0;
            let back = normal_probability(normal_from_probability(probability));
            assert!((back / probability - 1.0).abs() < 1e-14, "{probability} {back}");
        }
        assert_eq!(normal_from_probability(0.0), f64::NEG_INFINITY);
        assert_eq!(normal_from_probability(1.0), f64::INFINITY);
        assert!(normal_from_probability(-0.1).is_nan());
        assert!(normal_from_probability(1.1).is_nan());
        assert!(normal_from_probability(f64::NAN).is_nan());
        assert_eq!(normal_from_probability(0.5), 0.0);
    }
}
