//! Yield: what the water that a crop went without costs at harvest.

/// Harvest as a share of the full one, from the yield response factor and the season's actual and full crop evaporation (mm).
///
/// Doorenbos & Kassam (1979), *Yield response to water*, FAO Irrigation and Drainage Paper 33: 1 − Ya/Ym = Ky (1 − ETa/ETm).
/// They fitted it to shortages of up to about half; a line that falls below nothing is taken as no harvest. Nothing is
/// returned unless the full evaporation is above zero.
pub fn yield_share(yield_response: f64, actual_mm: f64, full_mm: f64) -> Option<f64> {
    if full_mm <= 0.0 || full_mm.is_nan() {
        return None;
    }
    let share = 1.0 - yield_response * (1.0 - actual_mm / full_mm);
    Some(if share < 0.0 { 0.0 } else { share })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn shortage_costs_by_the_response_factor() {
        assert_eq!(yield_share(1.25, 500.0, 500.0), Some(1.0));
        // Four fifths of the water, factor 1.25: three quarters of the harvest.
        assert!((yield_share(1.25, 400.0, 500.0).unwrap() - 0.75).abs() < 1e-12);
        assert_eq!(yield_share(1.25, 0.0, 500.0), Some(0.0));
        assert_eq!(yield_share(1.25, 0.0, 0.0), None);
        assert_eq!(yield_share(1.25, 0.0, f64::NAN), None);
    }
}
