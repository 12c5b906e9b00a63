//! Credits to and debits from the accounts of stored water.
//!
//! Source: common practice, no source.

use super::MOST_GATES;
use super::bounds::{least, positive};
use super::width::sum;

/// The shares of the reservoir and what each may hold; the pool is the share that no gate owns.
#[derive(Clone, Debug)]
pub(super) struct Shares {
    /// Each gate's share, 0 to 1.
    pub(super) share: [f64; MOST_GATES],
    /// The most that each account may hold, m³; infinite where the share is zero, as it is never credited.
    pub(super) capacity_m3: [f64; MOST_GATES],
    /// The pool's share.
    pub(super) pool_share: f64,
    /// The most that the pool may hold, m³; infinite where its share is zero.
    pub(super) pool_capacity_m3: f64,
    /// One over the sum of all shares, the pool's included.
    pub(super) per_share: f64,
}

/// The stored water of one day: accounts and pool.
pub(super) struct Stored<'a> {
    pub(super) account_m3: &'a mut [f64; MOST_GATES],
    pub(super) pool_m3: &'a mut f64,
    pub(super) shares: &'a Shares,
}

impl Stored<'_> {
    /// Sum of accounts and pool, m³.
    #[inline(always)]
    pub(super) fn content_m3<const WIDTH: usize>(&self) -> f64 {
        sum::<WIDTH>(self.account_m3) + *self.pool_m3
    }

    /// Takes an amount out of all accounts in proportion to what they hold; all of it when it reaches the content.
    #[inline(always)]
    pub(super) fn debit<const WIDTH: usize>(&mut self, content_m3: f64, amount_m3: f64) {
        if amount_m3 <= 0.0 {
            return;
        }
        let emptied = amount_m3 >= content_m3;
        let ratio = if emptied { 1.0 } else { amount_m3 / content_m3 };
        for held in &mut self.account_m3[..WIDTH] {
            *held -= *held * ratio;
        }
        *self.pool_m3 -= *self.pool_m3 * ratio;
    }

    /// Credits an amount by shares: every account that is not full rises by one level times its share, and what a full
    /// account cannot hold goes to the others. What rounding leaves goes to the pool.
    #[inline(always)]
    pub(super) fn fill<const WIDTH: usize>(&mut self, amount_m3: f64) {
        if amount_m3 <= 0.0 {
            return;
        }
        // Most days no account fills up, and one pass does it.
        let shares = self.shares;
        let level = amount_m3 * shares.per_share;
        let (share, capacity, held) = (&shares.share, &shares.capacity_m3, &mut *self.account_m3);
        let mut room = [f64::INFINITY; 2];
        for i in 0..WIDTH {
            room[i % 2] = least(room[i % 2], capacity[i] - held[i] - level * share[i]);
        }
        let pool_room = shares.pool_capacity_m3 - *self.pool_m3 - level * shares.pool_share;
        if least(least(room[0], room[1]), pool_room) > 0.0 {
            for i in 0..WIDTH {
                held[i] += level * share[i];
            }
            *self.pool_m3 += level * shares.pool_share;
        } else if !self.fill_open::<WIDTH>(amount_m3) {
            self.fill_in_passes::<WIDTH>(amount_m3);
        }
    }

    /// The first pass of the general credit, where nothing overflows in it; else changes nothing and says so. While one
    /// account stays full for weeks this is the way of every day, so that it goes without a branch for a gate.
    #[inline(always)]
    fn fill_open<const WIDTH: usize>(&mut self, amount_m3: f64) -> bool {
        let shares = self.shares;
        // Shares of the accounts that are not full, zero for the others.
        let mut open_share = [0.0; WIDTH];
        let pool_open = shares.pool_share > 0.0 && *self.pool_m3 < shares.pool_capacity_m3;
        let pool_share = if pool_open { shares.pool_share } else { 0.0 };
        let mut weight = pool_share;
        for (i, open) in open_share.iter_mut().enumerate() {
            let is_open = self.account_m3[i] < shares.capacity_m3[i];
            *open = if is_open { shares.share[i] } else { 0.0 };
            weight += *open;
        }
        if weight <= 0.0 {
            return false;
        }
        let level = amount_m3 / weight;
        let mut overflows = pool_open & (level * pool_share >= shares.pool_capacity_m3 - *self.pool_m3);
        for (i, open) in open_share.iter().enumerate() {
            let room = shares.capacity_m3[i] - self.account_m3[i];
            overflows |= (*open > 0.0) & (level * open >= room);
        }
        if overflows {
            return false;
        }
        for (i, open) in open_share.iter().enumerate() {
            self.account_m3[i] += level * open;
        }
        *self.pool_m3 += level * pool_share;
        true
    }

    /// The general credit: in each pass the accounts that would overflow are filled and drop out.
    fn fill_in_passes<const WIDTH: usize>(&mut self, amount_m3: f64) {
        let shares = self.shares;
        let mut open: u32 = 0;
        for i in 0..WIDTH {
            let is_open = (shares.share[i] > 0.0) & (self.account_m3[i] < shares.capacity_m3[i]);
            open |= u32::from(is_open) << i;
        }
        let mut pool_open = shares.pool_share > 0.0 && *self.pool_m3 < shares.pool_capacity_m3;
        let mut left = amount_m3;
        while left > 0.0 && (open != 0 || pool_open) {
            let mut weight = if pool_open { shares.pool_share } else { 0.0 };
            for i in Gates(open) {
                weight += shares.share[i];
            }
            let level = left / weight;
            let mut overflowed = false;
            for i in Gates(open) {
                let room = shares.capacity_m3[i] - self.account_m3[i];
                if level * shares.share[i] >= room {
                    left -= room;
                    self.account_m3[i] = shares.capacity_m3[i];
                    open &= !(1 << i);
                    overflowed = true;
                }
            }
            let room = shares.pool_capacity_m3 - *self.pool_m3;
            if pool_open && level * shares.pool_share >= room {
                left -= room;
                *self.pool_m3 = shares.pool_capacity_m3;
                pool_open = false;
                overflowed = true;
            }
            if !overflowed {
                for i in Gates(open) {
                    self.account_m3[i] += level * shares.share[i];
                }
                if pool_open {
                    *self.pool_m3 += level * shares.pool_share;
                }
                return;
            }
        }
        *self.pool_m3 += positive(left);
    }
}

/// The gates of a set, one bit each, in downstream order.
struct Gates(u32);

impl Iterator for Gates {
    type Item = usize;

    fn next(&mut self) -> Option<usize> {
        if self.0 == 0 {
            return None;
        }
        let gate = self.0.trailing_zeros() as usize;
        self.0 &= self.0 - 1;
        Some(gate)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// What each of three accounts and the pool hold after a credit to a lake of 100 m³.
    fn filled(mut held: [f64; 3], mut pool: f64, share: [f64; 3], amount: f64) -> [f64; 4] {
        let owned: f64 = share.iter().sum();
        let mut shares = Shares {
            share: [0.0; 24],
            capacity_m3: [f64::INFINITY; 24],
            pool_share: 1.0 - owned,
            pool_capacity_m3: 100.0 * (1.0 - owned),
            per_share: 1.0,
        };
        let mut account = [0.0; 24];
        account[..3].copy_from_slice(&held);
        shares.share[..3].copy_from_slice(&share);
        for i in (0..3).filter(|&i| share[i] > 0.0) {
            shares.capacity_m3[i] = 100.0 * share[i];
        }
        Stored { account_m3: &mut account, pool_m3: &mut pool, shares: &shares }.fill::<4>(amount);
        held.copy_from_slice(&account[..3]);
        [held[0], held[1], held[2], pool]
    }

    #[test]
    fn a_full_account_passes_its_part_on() {
        // Spaces 6.8, 21 and 18.2: the first pass offers 18, 10.8 and 7.2, the second shares the other 29.2 as 3 to 2.
        let got = filled([43.2, 9.0, 0.0], 1.8, [0.5, 0.3, 0.0], 36.0);
        for (got, expected) in got.into_iter().zip([50.0, 26.52, 0.0, 13.48]) {
            assert!((got - expected).abs() < 1e-12, "{got} {expected}");
        }
    }

    #[test]
    fn a_credit_beyond_all_room_goes_to_the_pool() {
        assert_eq!(filled([50.0, 30.0, 0.0], 20.0, [0.5, 0.3, 0.0], 7.0), [50.0, 30.0, 0.0, 27.0]);
    }
}
