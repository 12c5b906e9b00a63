//! Powers inside the day loop: the recharge curve of the soil, without branches and with the same bits on every target.
//!
//! A power that is a whole number of halves (2.5, 3, …) goes by multiplication and one square root; any other by our
//! own base-2 logarithm and exponential, whose relative error against `libm::pow` stays below 1e-12 (tested).

use super::lanes::Lanes;

/// A power curve `x ↦ x^p` for 0 ≤ x, with p > 0, chosen once for a run.
pub trait PowerCurve<const L: usize>: Copy {
    /// `x` to the power, lane by lane; 0 for 0.
    fn of(self, x: Lanes<L>) -> Lanes<L>;

    /// `amount` times `x` to the power, lane by lane.
    #[inline(always)]
    fn times(self, amount: Lanes<L>, x: Lanes<L>) -> Lanes<L> {
        amount * self.of(x)
    }
}

/// A curve for `L` lanes that can be had for a pair of them.
pub trait CurveByPairs<const L: usize>: Copy {
    /// The curve of a pair.
    type Pair: PowerCurve<2>;

    /// The curve of the lanes `2 pair` and `2 pair + 1`.
    fn pair(self, pair: usize) -> Self::Pair;
}

/// The power `HALVES / 2`.
#[derive(Clone, Copy, Debug)]
pub struct Halves<const HALVES: u32>;

impl<const HALVES: u32, const L: usize> PowerCurve<L> for Halves<HALVES> {
    #[inline(always)]
    fn of(self, x: Lanes<L>) -> Lanes<L> {
        let mut result = if HALVES % 2 == 1 { x.square_root() } else { Lanes::splat(1.0) };
        let mut square = x;
        let mut left = HALVES / 2;
        while left > 0 {
            if left % 2 == 1 {
                result = result * square;
            }
            square = square * square;
            left /= 2;
        }
        result
    }
}

impl<const HALVES: u32, const L: usize> CurveByPairs<L> for Halves<HALVES> {
    type Pair = Self;

    #[inline(always)]
    fn pair(self, _: usize) -> Self {
        self
    }
}

/// Bits of a count of halves: up to 15 halves, the power 7.5.
const HALF_BITS: usize = 4;

/// Powers that are whole numbers of halves, one a lane: the same multiplications as [`Halves`], with a factor of exactly 1
/// where a lane's power has no such bit, so that a lane has the same bits as a run alone.
#[derive(Clone, Copy, Debug)]
pub struct HalvesByLane<const L: usize> {
    /// For each bit of the count of halves, all ones in the lanes that have it.
    masks: [[u64; L]; HALF_BITS],
}

impl<const L: usize> HalvesByLane<L> {
    /// The curve of `powers`, if each is ½, 1, 1½, … up to 7½.
    pub fn of_powers(powers: Lanes<L>) -> Option<Self> {
        let mut masks = [[0; L]; HALF_BITS];
        for (lane, power) in powers.0.into_iter().enumerate() {
            let halves = power * 2.0;
            // Saturating: what is no number of halves does not come back from the whole number.
            let count = halves as u64;
            if count == 0 || count >= 1 << HALF_BITS || count as f64 != halves {
                return None;
            }
            for (bit, mask) in masks.iter_mut().enumerate() {
                mask[lane] = if count >> bit & 1 == 1 { u64::MAX } else { 0 };
            }
        }
        Some(Self { masks })
    }
}

impl<const L: usize> PowerCurve<L> for HalvesByLane<L> {
    #[inline(always)]
    fn of(self, x: Lanes<L>) -> Lanes<L> {
        let or_one = |factor: Lanes<L>, mask: &[u64; L]| {
            let mut chosen = factor;
            for (chosen, mask) in chosen.0.iter_mut().zip(mask) {
                *chosen = f64::from_bits(chosen.to_bits() & mask | ONE_BITS & !mask);
            }
            chosen
        };
        let [half, one, two, four] = &self.masks;
        let square = x * x;
        let low = or_one(x.square_root(), half) * or_one(x, one);
        low * or_one(square, two) * or_one(square * square, four)
    }
}

impl<const L: usize> CurveByPairs<L> for HalvesByLane<L> {
    type Pair = HalvesByLane<2>;

    #[inline(always)]
    fn pair(self, pair: usize) -> HalvesByLane<2> {
        HalvesByLane { masks: self.masks.map(|mask| mask.as_chunks::<2>().0[pair]) }
    }
}

/// Any power above 0, one a lane.
#[derive(Clone, Copy, Debug)]
pub struct AnyPower<const L: usize>(pub Lanes<L>);

impl<const L: usize> PowerCurve<L> for AnyPower<L> {
    #[inline(always)]
    fn of(self, x: Lanes<L>) -> Lanes<L> {
        x.zip(self.0, power)
    }

    /// On most days no water enters the soil, and the power of nothing need not be known. The result is the same.
    #[inline(always)]
    fn times(self, amount: Lanes<L>, x: Lanes<L>) -> Lanes<L> {
        if amount.0.iter().all(|amount| *amount == 0.0) { Lanes::splat(0.0) } else { amount * self.of(x) }
    }
}

impl<const L: usize> CurveByPairs<L> for AnyPower<L> {
    type Pair = AnyPower<2>;

    #[inline(always)]
    fn pair(self, pair: usize) -> AnyPower<2> {
        AnyPower(self.0.pair(pair))
    }
}

/// Exponent bits of 1.0.
const ONE_BITS: u64 = 1023 << 52;
/// Bits of √½: mantissas are brought between √½ and √2.
const ROOT_HALF_BITS: u64 = 0x3FE6_A09E_667F_3BCD;
/// 2⁵²: or-ing a small whole number into its mantissa converts it without an instruction that SSE2 lacks.
const TWO_52: f64 = 4_503_599_627_370_496.0;
/// 1.5 · 2⁵²: adding it rounds to the nearest whole number.
const ROUNDER: f64 = 6_755_399_441_055_744.0;
/// Below this exponent the result is taken as the smallest that the sum of bits can hold.
const LEAST_EXPONENT: f64 = -1000.0;

/// log₂ m = s · Σ c_k s^2k with s = (m−1)/(m+1), |s| ≤ 0.1716: the polynomial of least greatest error on that range
/// (exchange method in 60 digits); the error of log₂ m is below 1.4e-14.
const LOG2: [f64; 6] = [
    2.885_390_081_777_849_6,
    0.961_796_694_113_958_4,
    0.577_077_942_199_678_7,
    0.412_209_267_899_965_85,
    0.319_905_101_092_145_53,
    0.282_908_168_079_430_03,
];

/// 2^f = Σ c_k f^k for |f| ≤ ½, likewise, of least greatest relative error: 2.2e-16.
const EXP2: [f64; 11] = [
    1.0,
    0.693_147_180_559_949_8,
    0.240_226_506_959_087_68,
    0.055_504_108_664_458_83,
    0.009_618_129_108_034_597,
    0.001_333_355_822_856_176_6,
    0.000_154_035_299_611_270_76,
    1.525_265_811_640_985_4e-5,
    1.321_566_283_595_923_9e-6,
    1.020_853_792_965_740_4e-7,
    7.037_278_846_726_901e-9,
];

/// `x` to the `power`, for x ≥ 0 and power > 0 with x^power ≤ 1e300; 0 for x below 1e−300.
#[inline(always)]
pub fn power(x: f64, power: f64) -> f64 {
    let bits = x.to_bits();
    let exponent_bits = bits.wrapping_add(ONE_BITS - ROOT_HALF_BITS) >> 52;
    let mantissa = f64::from_bits(bits.wrapping_sub(exponent_bits << 52).wrapping_add(ONE_BITS));
    let exponent = f64::from_bits(exponent_bits | TWO_52.to_bits()) - (TWO_52 + 1023.0);
    let s = (mantissa - 1.0) / (mantissa + 1.0);
    let s2 = s * s;
    let s4 = s2 * s2;
    // Even and odd powers apart halve the wait for each multiplication.
    let even = LOG2[0] + s4 * (LOG2[2] + s4 * LOG2[4]);
    let odd = LOG2[1] + s4 * (LOG2[3] + s4 * LOG2[5]);
    let log2 = exponent + s * (even + s2 * odd);

    let scaled = power * log2;
    let scaled = if scaled > LEAST_EXPONENT { scaled } else { LEAST_EXPONENT };
    let rounded = scaled + ROUNDER;
    let f = scaled - (rounded - ROUNDER);
    let f2 = f * f;
    let even = EXP2[0] + f2 * (EXP2[2] + f2 * (EXP2[4] + f2 * (EXP2[6] + f2 * (EXP2[8] + f2 * EXP2[10]))));
    let odd = EXP2[1] + f2 * (EXP2[3] + f2 * (EXP2[5] + f2 * (EXP2[7] + f2 * EXP2[9])));
    let two_to_f = even + f * odd;
    let result = f64::from_bits(two_to_f.to_bits().wrapping_add(rounded.to_bits() << 52));
    if x > 1e-300 { result } else { 0.0 }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn relative_error(x: f64, p: f64) -> f64 {
        let truth = libm::pow(x, p);
        (power(x, p) - truth).abs() / truth
    }

    #[test]
    fn any_power_is_within_1e_12_of_libm() {
        let mut worst: f64 = 0.0;
        for i in 1..=20_000 {
            let x = f64::from(i) / 16_000.0;
            for p in [0.3, 0.9, 1.0, 1.7, 2.2, 2.5, 3.6, 4.9, 6.0, 8.3, 12.0] {
                worst = worst.max(relative_error(x, p));
            }
        }
        for i in 0..400 {
            let x = libm::exp2(-f64::from(i) / 4.0);
            worst = worst.max(relative_error(x, 3.6));
        }
        assert!(worst < 1e-12, "worst relative error {worst:e}");
    }

    #[test]
    fn the_ends_are_exact() {
        assert_eq!(power(0.0, 2.2), 0.0);
        assert_eq!(power(1.0, 2.2), 1.0);
        assert!(power(1e-200, 6.0) < 1e-290);
    }

    #[test]
    fn halves_agree_with_any_power() {
        for i in 0..=1000 {
            let x = Lanes([f64::from(i) / 1000.0; 2]);
            for (halves, p) in [(Halves::<5>.of(x), 2.5), (Halves::<2>.of(x), 1.0), (Halves::<7>.of(x), 3.5)] {
                let any = AnyPower(Lanes::splat(p)).of(x);
                assert!((halves.0[0] - any.0[0]).abs() <= 1e-12 * any.0[0]);
            }
            assert_eq!(Halves::<3>.of(x).0[1], x.0[0].sqrt() * x.0[0]);
        }
    }

    #[test]
    fn halves_by_lane_have_the_bits_of_halves_alone() {
        let curve = HalvesByLane::of_powers(Lanes([0.5, 1.0, 2.5, 3.5, 4.0, 5.5, 6.0, 7.5])).unwrap();
        for i in 0..=1000 {
            let x = Lanes([f64::from(i) / 1000.0; 8]);
            let alone = [
                Halves::<1>.of(x).0[0],
                Halves::<2>.of(x).0[0],
                Halves::<5>.of(x).0[0],
                Halves::<7>.of(x).0[0],
                Halves::<8>.of(x).0[0],
                Halves::<11>.of(x).0[0],
                Halves::<12>.of(x).0[0],
                Halves::<15>.of(x).0[0],
            ];
            assert_eq!(curve.of(x).0, alone);
        }
        for wrong in [0.0, 0.25, 2.6, 8.0, -1.0, f64::NAN, f64::INFINITY] {
            assert!(HalvesByLane::of_powers(Lanes([1.0, wrong])).is_none(), "{wrong}");
        }
    }
}
