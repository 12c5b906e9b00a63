//! The flow-duration curve: which flow is exceeded for which share of the time, and the bias of its two ends.
//!
//! Plotting positions are Weibull's, rank over count and one (Vogel & Fennessey 1994, *Journal of Water Resources Planning
//! and Management* 120(4), 485–504). The ends are the segments of Yilmaz, Gupta & Wagener (2008), *Water Resources
//! Research* 44, W09417 (from memory): the highest 2 % and the lowest 30 % of days; for both the error of the volume is
//! told here, which people can picture, and not that of logarithms.

/// Share of days that are the highest flows.
pub const HIGH_FLOW_SHARE: f64 = 0.02;
/// Share of days that are the lowest flows.
pub const LOW_FLOW_SHARE: f64 = 0.3;

/// Sorts flows from high to low and returns those that are numbers.
pub fn sort_flows(flows_m3s: &mut [f64]) -> &[f64] {
    // Missing values go to the end, whatever their sign bit.
    flows_m3s.sort_unstable_by(|a, b| a.is_nan().cmp(&b.is_nan()).then(b.total_cmp(a)));
    let known = flows_m3s.iter().take_while(|flow| !flow.is_nan()).count();
    &flows_m3s[..known]
}

/// The flow that is exceeded for a `share` of the time, 0 to 1, by straight lines between plotting positions; beyond the
/// first and last it is theirs. `sorted` is from high to low. `None` for an empty series.
pub fn exceeded_m3s(sorted: &[f64], share: f64) -> Option<f64> {
    let (first, last) = (*sorted.first()?, *sorted.last()?);
    let rank = share * (sorted.len() as f64 + 1.0);
    if rank <= 1.0 {
        return Some(first);
    }
    let below = rank as usize;
    let (Some(high), Some(low)) = (sorted.get(below - 1), sorted.get(below)) else { return Some(last) };
    Some(high + (low - high) * (rank - below as f64))
}

fn segment_bias(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    let volume: f64 = observed.iter().sum();
    (volume != 0.0).then(|| 100.0 * (volume - modelled.iter().sum::<f64>()) / volume)
}

/// Percent bias of the highest 2 % of days, each series by its own order; positive where the model gives too little.
/// Both series are sorted from high to low and of the same days. `None` where there is no flow.
pub fn high_flow_bias(modelled_sorted: &[f64], observed_sorted: &[f64]) -> Option<f64> {
    let days = modelled_sorted.len().min(observed_sorted.len());
    let high = libm::ceil(HIGH_FLOW_SHARE * days as f64) as usize;
    segment_bias(&modelled_sorted[..high], &observed_sorted[..high])
}

/// Percent bias of the lowest 30 % of days, likewise.
pub fn low_flow_bias(modelled_sorted: &[f64], observed_sorted: &[f64]) -> Option<f64> {
    let days = modelled_sorted.len().min(observed_sorted.len());
    let low = libm::ceil(LOW_FLOW_SHARE * days as f64) as usize;
    segment_bias(&modelled_sorted[days - low..days], &observed_sorted[days - low..days])
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn plotting_positions_and_ends() {
        let mut flows = [f64::NAN, 3.0, 1.0, -f64::NAN, 4.0, 2.0];
        let sorted = sort_flows(&mut flows);
        assert_eq!(sorted, [4.0, 3.0, 2.0, 1.0]);
        // Rank 1 of 4 stands at 1/5, rank 4 at 4/5; half-way lies between the second and the third.
        assert_eq!(exceeded_m3s(sorted, 0.2), Some(4.0));
        assert_eq!(exceeded_m3s(sorted, 0.5), Some(2.5));
        assert_eq!(exceeded_m3s(sorted, 0.8), Some(1.0));
        assert_eq!((exceeded_m3s(sorted, 0.0), exceeded_m3s(sorted, 1.0)), (Some(4.0), Some(1.0)));
        assert_eq!(exceeded_m3s(&[], 0.5), None);
    }

    #[test]
    fn the_two_ends_are_judged_apart() {
        let observed: [f64; 100] = core::array::from_fn(|day| 100.0 - day as f64);
        let mut modelled = observed;
        modelled[..2].iter_mut().for_each(|flow| *flow *= 1.5);
        modelled[70..].iter_mut().for_each(|flow| *flow *= 0.8);
        assert!((high_flow_bias(&modelled, &observed).unwrap() + 50.0).abs() < 1e-9);
        assert!((low_flow_bias(&modelled, &observed).unwrap() - 20.0).abs() < 1e-9);
    }
}
