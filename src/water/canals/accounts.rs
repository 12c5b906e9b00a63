//! Credits to and debits from the accounts of stored water.
//!
//! Source: common practice, no source.

use super::bounds::positive;

/// The shares of the reservoir and what each may hold; the pool is the share that no gate owns.
#[derive(Clone, Debug)]
pub(super) struct Shares {
    /// Each gate's share, 0 to 1; none under one-pool rules.
    pub(super) share: heapless::Vec<f64, { super::MOST_GATES }>,
    /// The most that each account may hold, m³; infinite where the share is zero, as it is never credited.
    pub(super) capacity_m3: heapless::Vec<f64, { super::MOST_GATES }>,
    /// The pool's share.
    pub(super) pool_share: f64,
    /// The most that the pool may hold, m³.
    pub(super) pool_capacity_m3: f64,
    /// One over the sum of all shares, the pool's included.
    pub(super) per_share: f64,
}

/// Sum of accounts and pool, m³.
#[inline(always)]
pub(super) fn content_m3(account_m3: &[f64], pool_m3: f64) -> f64 {
    let mut sum = 0.0;
    for held in account_m3 {
        sum += held;
    }
    sum + pool_m3
}

/// Takes an amount out of all accounts in proportion to what they hold; all of it when the amount reaches the content.
#[inline(always)]
pub(super) fn debit(account_m3: &mut [f64], pool_m3: &mut f64, content_m3: f64, amount_m3: f64) {
    if amount_m3 <= 0.0 {
        return;
    }
    if amount_m3 >= content_m3 {
        account_m3.fill(0.0);
        *pool_m3 = 0.0;
        return;
    }
    let ratio = amount_m3 / content_m3;
    for held in account_m3.iter_mut() {
        *held -= *held * ratio;
    }
    *pool_m3 -= *pool_m3 * ratio;
}

/// Credits an amount by shares: every account that is not full rises by one level times its share, and what a full
/// account cannot hold goes to the others. What rounding leaves goes to the pool.
#[inline(always)]
pub(super) fn fill(account_m3: &mut [f64], pool_m3: &mut f64, shares: &Shares, amount_m3: f64) {
    if amount_m3 <= 0.0 {
        return;
    }
    // Most days no account fills up, and one pass does it.
    let level = amount_m3 * shares.per_share;
    let mut fits = level * shares.pool_share < shares.pool_capacity_m3 - *pool_m3 || shares.pool_share == 0.0;
    for ((held, share), capacity) in account_m3.iter().zip(&shares.share).zip(&shares.capacity_m3) {
        fits &= level * share < capacity - held;
    }
    if fits {
        for (held, share) in account_m3.iter_mut().zip(&shares.share) {
            *held += level * share;
        }
        *pool_m3 += level * shares.pool_share;
    } else {
        fill_in_passes(account_m3, pool_m3, shares, amount_m3);
    }
}

/// The general credit: in each pass the accounts that would overflow are filled and drop out.
fn fill_in_passes(account_m3: &mut [f64], pool_m3: &mut f64, shares: &Shares, amount_m3: f64) {
    let mut left = amount_m3;
    let mut open: u32 = 0;
    for (i, ((held, share), capacity)) in account_m3.iter().zip(&shares.share).zip(&shares.capacity_m3).enumerate() {
        if *share > 0.0 && held < capacity {
            open |= 1 << i;
        }
    }
    let mut pool_open = shares.pool_share > 0.0 && *pool_m3 < shares.pool_capacity_m3;
    while left > 0.0 && (open != 0 || pool_open) {
        let mut weight = if pool_open { shares.pool_share } else { 0.0 };
        for (i, share) in shares.share.iter().enumerate() {
            if open & (1 << i) != 0 {
                weight += share;
            }
        }
        let level = left / weight;
        let mut overflowed = false;
        for (i, held) in account_m3.iter_mut().enumerate() {
            if open & (1 << i) != 0 && level * shares.share[i] >= shares.capacity_m3[i] - *held {
                left -= shares.capacity_m3[i] - *held;
                *held = shares.capacity_m3[i];
                open &= !(1 << i);
                overflowed = true;
            }
        }
        if pool_open && level * shares.pool_share >= shares.pool_capacity_m3 - *pool_m3 {
            left -= shares.pool_capacity_m3 - *pool_m3;
            *pool_m3 = shares.pool_capacity_m3;
            pool_open = false;
            overflowed = true;
        }
        if !overflowed {
            for (i, held) in account_m3.iter_mut().enumerate() {
                if open & (1 << i) != 0 {
                    *held += level * shares.share[i];
                }
            }
            if pool_open {
                *pool_m3 += level * shares.pool_share;
            }
            return;
        }
    }
    *pool_m3 += positive(left);
}
