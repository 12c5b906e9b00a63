//! Plain words for a score: the bands of Moriasi et al. (2007), *Transactions of the ASABE* 50(3), 885–900, table 4, for
//! monthly streamflow. Recalled from memory.

/// How good a score is said to be.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Rating {
    /// Nothing to build on.
    Unsatisfactory,
    /// Good enough to work with.
    Satisfactory,
    /// Good.
    Good,
    /// Very good.
    VeryGood,
}

fn rate(is_very_good: bool, is_good: bool, is_satisfactory: bool) -> Rating {
    if is_very_good {
        Rating::VeryGood
    } else if is_good {
        Rating::Good
    } else if is_satisfactory {
        Rating::Satisfactory
    } else {
        Rating::Unsatisfactory
    }
}

/// The band of a Nash–Sutcliffe efficiency of monthly means: above 0.75, 0.65, 0.50.
pub fn rate_nash_sutcliffe(efficiency: f64) -> Rating {
    rate(efficiency > 0.75, efficiency > 0.65, efficiency > 0.50)
}

/// The band of a percent bias of streamflow: within 10, 15, 25 % either way.
pub fn rate_percent_bias(percent: f64) -> Rating {
    rate(percent.abs() < 10.0, percent.abs() < 15.0, percent.abs() < 25.0)
}

/// The band of an RSR of monthly means: up to 0.50, 0.60, 0.70.
pub fn rate_rsr(ratio: f64) -> Rating {
    rate(ratio <= 0.50, ratio <= 0.60, ratio <= 0.70)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_edges_of_the_bands() {
        use Rating::{Good, Satisfactory, Unsatisfactory, VeryGood};
        for (efficiency, rating) in [(0.76, VeryGood), (0.75, Good), (0.65, Satisfactory), (0.5, Unsatisfactory)] {
            assert_eq!(rate_nash_sutcliffe(efficiency), rating);
        }
        for (percent, rating) in [(-9.9, VeryGood), (10.0, Good), (-15.0, Satisfactory), (25.0, Unsatisfactory)] {
            assert_eq!(rate_percent_bias(percent), rating);
        }
        for (ratio, rating) in [(0.5, VeryGood), (0.6, Good), (0.7, Satisfactory), (0.71, Unsatisfactory)] {
            assert_eq!(rate_rsr(ratio), rating);
        }
        assert_eq!(rate_nash_sutcliffe(f64::NAN), Unsatisfactory);
        assert!(VeryGood > Good && Satisfactory > Unsatisfactory);
    }
}
