//! A few numbers that go through the same arithmetic side by side: elevation bands of one run, or many runs of a band.
//!
//! Plain arrays, no intrinsics: the compiler turns the loops into vector instructions where the target has them, and
//! every lane gets the same bits as it would alone.

use core::ops::{Add, Div, Mul, Sub};

/// `L` numbers side by side.
#[derive(Clone, Copy, Debug, PartialEq)]
#[repr(align(16))]
pub struct Lanes<const L: usize>(pub [f64; L]);

/// The smaller of two numbers that are not NaN; one instruction, unlike `f64::min`, which must look for NaN.
#[inline(always)]
pub fn least(a: f64, b: f64) -> f64 {
    if a < b { a } else { b }
}

/// The larger of two numbers that are not NaN.
#[inline(always)]
pub fn most(a: f64, b: f64) -> f64 {
    if a > b { a } else { b }
}

/// Square root, correctly rounded on every target.
#[inline(always)]
pub fn square_root(x: f64) -> f64 {
    #[cfg(feature = "std")]
    {
        x.sqrt()
    }
    #[cfg(not(feature = "std"))]
    {
        libm::sqrt(x)
    }
}

/// A number, or a few side by side: what a chain of stores is written for once.
pub trait Number: Copy + Add<Output = Self> + Sub<Output = Self> + Mul<Output = Self> + Div<Output = Self> {
    /// The same number in every lane.
    fn splat(x: f64) -> Self;
    /// The smaller, lane by lane.
    fn least(self, other: Self) -> Self;
    /// The larger, lane by lane; `other` where this is not a number.
    fn most(self, other: Self) -> Self;
    /// Zero where negative or not a number.
    #[inline(always)]
    fn positive(self) -> Self {
        self.most(Self::splat(0.0))
    }
}

impl Number for f64 {
    #[inline(always)]
    fn splat(x: f64) -> Self {
        x
    }
    #[inline(always)]
    fn least(self, other: Self) -> Self {
        least(self, other)
    }
    #[inline(always)]
    fn most(self, other: Self) -> Self {
        most(self, other)
    }
}

impl<const L: usize> Number for Lanes<L> {
    #[inline(always)]
    fn splat(x: f64) -> Self {
        Lanes([x; L])
    }
    #[inline(always)]
    fn least(self, other: Self) -> Self {
        self.zip(other, least)
    }
    #[inline(always)]
    fn most(self, other: Self) -> Self {
        self.zip(other, most)
    }
}

impl<const L: usize> Lanes<L> {
    /// How many pairs of lanes there are. Long chains of arithmetic go pair by pair: that is what a register holds where
    /// there is no more than the baseline of the common processors, and more lanes at a time would only spill.
    pub const PAIRS: usize = {
        assert!(L.is_multiple_of(2), "lanes come in pairs");
        L / 2
    };

    /// A pair of neighbouring lanes; `pair` is below [`Lanes::PAIRS`].
    #[inline(always)]
    pub fn pair(&self, pair: usize) -> Lanes<2> {
        Lanes(self.0.as_chunks::<2>().0[pair])
    }

    /// Puts a pair of lanes back.
    #[inline(always)]
    pub fn set_pair(&mut self, pair: usize, lanes: Lanes<2>) {
        self.0.as_chunks_mut::<2>().0[pair] = lanes.0;
    }

    /// The same number in every lane.
    #[inline(always)]
    pub const fn splat(x: f64) -> Self {
        Lanes([x; L])
    }

    /// `f` of every lane.
    #[inline(always)]
    pub fn map(self, f: impl Fn(f64) -> f64) -> Self {
        let mut out = self;
        for lane in &mut out.0 {
            *lane = f(*lane);
        }
        out
    }

    /// `f` of the lanes of both.
    #[inline(always)]
    pub fn zip(self, other: Self, f: impl Fn(f64, f64) -> f64) -> Self {
        let mut out = self;
        for (lane, other) in out.0.iter_mut().zip(other.0) {
            *lane = f(*lane, other);
        }
        out
    }

    /// Square root, lane by lane.
    #[inline(always)]
    pub fn square_root(self) -> Self {
        self.map(square_root)
    }
}

impl<const L: usize> Default for Lanes<L> {
    fn default() -> Self {
        Self::splat(0.0)
    }
}

impl<const L: usize> Add for Lanes<L> {
    type Output = Self;
    #[inline(always)]
    fn add(self, other: Self) -> Self {
        self.zip(other, |a, b| a + b)
    }
}

impl<const L: usize> Sub for Lanes<L> {
    type Output = Self;
    #[inline(always)]
    fn sub(self, other: Self) -> Self {
        self.zip(other, |a, b| a - b)
    }
}

impl<const L: usize> Mul for Lanes<L> {
    type Output = Self;
    #[inline(always)]
    fn mul(self, other: Self) -> Self {
        self.zip(other, |a, b| a * b)
    }
}

impl<const L: usize> Div for Lanes<L> {
    type Output = Self;
    #[inline(always)]
    fn div(self, other: Self) -> Self {
        self.zip(other, |a, b| a / b)
    }
}
