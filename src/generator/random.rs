//! Seeded random numbers that are the same on every board.
//!
//! The engine is xoshiro256++ (Blackman and Vigna 2021, "Scrambled linear pseudorandom number generators", ACM
//! Transactions on Mathematical Software 47(4), article 36); its 256 bits of state are filled from one number by
//! SplitMix64 (Steele, Lea and Flood 2014, OOPSLA), as its authors recommend. Whole-number arithmetic only, so no target
//! can differ. Every kind of draw has its own stream, and every day takes the same number of draws from each, so that a
//! longer record begins with the shorter one and a change in one kind of draw leaves the others alone.

use super::normal::normal_from_probability;

/// SplitMix64: turns a counter into well-mixed 64-bit numbers; used only to seed.
#[derive(Debug, Clone)]
struct SplitMix64(u64);

impl SplitMix64 {
    fn next(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e37_79b9_7f4a_7c15);
        let mut mixed = self.0;
        mixed = (mixed ^ (mixed >> 30)).wrapping_mul(0xbf58_476d_1ce4_e5b9);
        mixed = (mixed ^ (mixed >> 27)).wrapping_mul(0x94d0_49bb_1331_11eb);
        mixed ^ (mixed >> 31)
    }
}

/// What a stream is for; each has its own numbers under one seed.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum Purpose {
    YearIndex = 1,
    Wetness = 2,
    Depth = 3,
    Residuals = 4,
    Wind = 5,
    /// Fitting: the seed of each start.
    Starts = 6,
    /// Fitting: the steps of one start.
    Search = 7,
}

/// One stream of seeded random numbers (xoshiro256++).
#[derive(Debug, Clone)]
pub(crate) struct Stream {
    state: [u64; 4],
}

impl Stream {
    /// The stream for one purpose under a seed.
    pub(crate) fn new(seed: u64, purpose: Purpose) -> Self {
        // Mixing the seed before the purpose is added keeps neighbouring seeds from sharing a stream.
        let mixed = SplitMix64(seed).next();
        let mut filler = SplitMix64(mixed ^ SplitMix64(purpose as u64).next());
        Self { state: [filler.next(), filler.next(), filler.next(), filler.next()] }
    }

    /// The next 64 random bits.
    pub(crate) fn bits(&mut self) -> u64 {
        let [s0, s1, s2, s3] = self.state;
        let result = s0.wrapping_add(s3).rotate_left(23).wrapping_add(s0);
        let shifted = s1 << 17;
        let s2 = s2 ^ s0;
        let s3 = s3 ^ s1;
        self.state = [s0 ^ s3, s1 ^ s2, s2 ^ shifted, s3.rotate_left(45)];
        result
    }

    /// A number evenly spread over the open interval from 0 to 1; neither end ever occurs.
    pub(crate) fn uniform(&mut self) -> f64 {
        // 52 bits and a half: one bit fewer than a double holds, so that the half is exact and 1 cannot be reached.
        ((self.bits() >> 12) as f64 + 0.5) * (1.0 / 4_503_599_627_370_496.0)
    }

    /// A standard normal deviate, by inverting the distribution: one uniform number each, none rejected.
    pub(crate) fn normal(&mut self) -> f64 {
        normal_from_probability(self.uniform())
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn splitmix_first_outputs() {
        // Reference implementation by Vigna (2015), seed 1234567, as widely reprinted; from memory.
        let mut filler = SplitMix64(1_234_567);
        let first: Vec<u64> = (0..5).map(|_| filler.next()).collect();
        assert_eq!(
            first,
            [6457827717110365317, 3203168211198807973, 9817491932198370423, 4593380528125082431, 16408922859458223821]
        );
    }

    #[test]
    fn xoshiro_first_outputs() {
        // Reference implementation by Blackman and Vigna (2019), state 1, 2, 3, 4, as widely reprinted; from memory.
        let mut stream = Stream { state: [1, 2, 3, 4] };
        let first: Vec<u64> = (0..10).map(|_| stream.bits()).collect();
        assert_eq!(
            first,
            [
                41943041,
                58720359,
                3588806011781223,
                3591011842654386,
                9228616714210784205,
                9973669472204895162,
                14011001112246962877,
                12406186145184390807,
                15849039046786891736,
                10450023813501588000
            ]
        );
    }

    #[test]
    fn streams_of_one_seed_are_unrelated() {
        // Correlation of n independent pairs has standard error 1/sqrt(n): four of those is the limit.
        let purposes = [Purpose::YearIndex, Purpose::Wetness, Purpose::Depth, Purpose::Residuals, Purpose::Wind];
        let count = 20_000;
        for (at, &one) in purposes.iter().enumerate() {
            for &other in &purposes[at + 1..] {
                let (mut a, mut b) = (Stream::new(7, one), Stream::new(7, other));
                let sum: f64 = (0..count).map(|_| a.normal() * b.normal()).sum();
                let correlation = sum / f64::from(count);
                assert!(correlation.abs() < 4.0 / f64::from(count).sqrt(), "{one:?} {other:?} {correlation}");
            }
        }
    }

    #[test]
    fn uniform_numbers_stay_inside_and_are_even() {
        let mut stream = Stream::new(1, Purpose::Wetness);
        let count = 100_000;
        let mut sum = 0.0;
        for _ in 0..count {
            let value = stream.uniform();
            assert!(value > 0.0 && value < 1.0);
            sum += value;
        }
        // Standard error of the mean of n uniform numbers: 1/sqrt(12 n).
        assert!((sum / f64::from(count) - 0.5).abs() < 4.0 / (12.0 * f64::from(count)).sqrt());
        let largest = Stream { state: [0, 0, 0, 0] }.uniform();
        assert!(largest > 0.0);
        assert!(((u64::MAX >> 12) as f64 + 0.5) * (1.0 / 4_503_599_627_370_496.0) < 1.0);
    }
}
