//! All years together: means and ranges, and how reliable the supply was.

/// Mean and range of a sign over the years that have it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Spread {
    /// Mean.
    pub mean: f64,
    /// Lowest.
    pub least: f64,
    /// Highest.
    pub most: f64,
    /// Years that have the sign.
    pub years: usize,
}

/// Mean and range of `values`; `None` where there is none.
pub fn spread(values: impl IntoIterator<Item = f64>) -> Option<Spread> {
    let mut out: Option<Spread> = None;
    let mut sum = 0.0;
    for value in values {
        sum += value;
        let so_far = out.get_or_insert(Spread { mean: value, least: value, most: value, years: 0 });
        so_far.least = so_far.least.min(value);
        so_far.most = so_far.most.max(value);
        so_far.years += 1;
    }
    out.map(|spread| Spread { mean: sum / spread.years as f64, ..spread })
}

/// Reliability, resilience and vulnerability (Hashimoto, Stedinger & Loucks 1982, *Water Resources Research* 18(1),
/// 14–20) of a series of years.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Performance {
    /// Share of years that were enough.
    pub reliability: f64,
    /// Share of failures followed by a year that was enough, among failures that have a following year; 1 where there
    /// is none to judge by and nothing failed, `None` where only the last year failed.
    pub resilience: Option<f64>,
    /// Mean over runs of failed years of the largest shortage in the run, hm³; 0 without failure.
    pub vulnerability_hm3: f64,
    /// Years judged.
    pub years: usize,
}

/// Judges years of `(demand_hm3, delivered_hm3)`, in order; years without demand are left out. A year is enough when it
/// got at least `enough_share` of its demand. `None` without any year to judge.
pub fn performance(years: impl IntoIterator<Item = (f64, f64)>, enough_share: f64) -> Option<Performance> {
    let (mut count, mut enough, mut failures_followed, mut recoveries) = (0_usize, 0_usize, 0_usize, 0_usize);
    let (mut runs, mut worst_of_runs_hm3) = (0_usize, 0.0);
    let mut run_worst_hm3: Option<f64> = None;
    for (demand_hm3, delivered_hm3) in years {
        if demand_hm3 <= 0.0 {
            continue;
        }
        count += 1;
        let is_enough = delivered_hm3 >= enough_share * demand_hm3;
        if run_worst_hm3.is_some() {
            failures_followed += 1;
            recoveries += usize::from(is_enough);
        }
        if is_enough {
            enough += 1;
            if let Some(worst_hm3) = run_worst_hm3.take() {
                runs += 1;
                worst_of_runs_hm3 += worst_hm3;
            }
        } else {
            let short_hm3 = demand_hm3 - delivered_hm3;
            run_worst_hm3 = Some(run_worst_hm3.map_or(short_hm3, |worst| worst.max(short_hm3)));
        }
    }
    if let Some(worst_hm3) = run_worst_hm3 {
        runs += 1;
        worst_of_runs_hm3 += worst_hm3;
    }
    if count == 0 {
        return None;
    }
    let resilience = if failures_followed > 0 {
        Some(recoveries as f64 / failures_followed as f64)
    } else if runs == 0 {
        Some(1.0)
    } else {
        None
    };
    Some(Performance {
        reliability: enough as f64 / count as f64,
        resilience,
        vulnerability_hm3: if runs > 0 { worst_of_runs_hm3 / runs as f64 } else { 0.0 },
        years: count,
    })
}
