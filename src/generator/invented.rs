//! Two invented stations: no such valley exists, and no record stands behind their numbers.

use super::recipe::{Depths, Humidity, Radiation, Recipe, Temperatures, Wetness, Wind, YearIndex};
use super::residuals::ResidualCorrelations;
use super::season::SeasonalCurve;

/// The demo valley Tresnubes: a station at 2300 m and 39.5° N with a winter maximum of precipitation, a small bump of
/// late-summer thunderstorms, about 500 mm a year, a January mean near −6 °C and a July mean near 17 °C. Invented.
pub fn tresnubes() -> Recipe {
    Recipe {
        about: "Invented: Tresnubes, a mountain valley that does not exist.".into(),
        water_year_start_month: 10,
        depth_step_mm: 0.1,
        temperature_step_c: 0.1,
        round_as_station: true,
        wetness: Wetness {
            dry_to_wet: [0.26, 0.26, 0.26, 0.22, 0.17, 0.09, 0.14, 0.16, 0.12, 0.14, 0.21, 0.25],
            wet_to_wet: [0.53, 0.53, 0.52, 0.48, 0.42, 0.30, 0.32, 0.34, 0.36, 0.42, 0.49, 0.53],
        },
        depths: Depths {
            light_share: [0.55, 0.55, 0.55, 0.57, 0.60, 0.62, 0.62, 0.60, 0.60, 0.57, 0.55, 0.55],
            light_mean_mm: [2.5, 2.5, 2.6, 2.5, 2.1, 1.9, 1.9, 2.0, 2.1, 2.5, 2.5, 2.5],
            heavy_mean_mm: [9.7, 9.7, 9.9, 9.0, 7.8, 7.1, 7.3, 8.0, 8.5, 9.4, 9.7, 9.7],
        },
        temperature: Temperatures {
            tmax_dry_c: SeasonalCurve::yearly(13.2, 12.3, 204.0),
            tmax_wet_c: SeasonalCurve::yearly(9.8, 11.6, 206.0),
            tmin_dry_c: SeasonalCurve::yearly(-1.9, 11.2, 206.0),
            tmin_wet_c: SeasonalCurve::yearly(-1.2, 10.4, 208.0),
            tmax_dry_spread_c: SeasonalCurve::yearly(4.2, 0.9, 30.0),
            tmax_wet_spread_c: SeasonalCurve::yearly(4.1, 0.6, 60.0),
            tmin_dry_spread_c: SeasonalCurve::yearly(3.7, 1.2, 15.0),
            tmin_wet_spread_c: SeasonalCurve::yearly(3.4, 1.2, 15.0),
        },
        residuals: ResidualCorrelations::RICHARDSON_WRIGHT_1984,
        years: YearIndex {
            lag_one: 0.5,
            wetness_shift: 0.11,
            depth_shift: 0.07,
            wet_year_cooling_c: 0.2,
            temperature_spread_c: 0.5,
        },
        radiation: Some(Radiation {
            latitude_degrees: 39.5,
            elevation_m: 2300.0,
            dry_clear_log_odds: SeasonalCurve::yearly(1.9, 0.3, 190.0),
            wet_clear_log_odds: SeasonalCurve::yearly(0.4, 0.3, 190.0),
            dry_spread_log_odds: 0.9,
            wet_spread_log_odds: 0.9,
        }),
        humidity: Some(Humidity { dry_dewpoint_below_tmin_c: 3.0, wet_dewpoint_below_tmin_c: 0.5 }),
        wind: Some(Wind { mean_2m_ms: [1.7, 1.9, 2.3, 2.6, 2.5, 2.3, 2.0, 1.9, 1.9, 1.9, 1.8, 1.7], shape: 2.2 }),
    }
}

/// A southern valley: a station at 1600 m and 33° S with winter precipitation of about 350 mm a year and summers that
/// are almost without any. Invented.
pub fn valle_del_sur() -> Recipe {
    Recipe {
        about: "Invented: a southern mountain valley that does not exist.".into(),
        water_year_start_month: 4,
        depth_step_mm: 0.1,
        temperature_step_c: 0.1,
        round_as_station: true,
        wetness: Wetness {
            dry_to_wet: [0.008, 0.008, 0.02, 0.05, 0.11, 0.15, 0.15, 0.12, 0.08, 0.05, 0.02, 0.01],
            wet_to_wet: [0.15, 0.15, 0.25, 0.38, 0.46, 0.50, 0.50, 0.47, 0.42, 0.35, 0.25, 0.18],
        },
        depths: Depths {
            light_share: [0.60, 0.60, 0.60, 0.52, 0.48, 0.46, 0.46, 0.48, 0.52, 0.56, 0.60, 0.60],
            light_mean_mm: [1.7, 1.7, 2.3, 3.2, 3.7, 3.9, 3.9, 3.7, 3.2, 2.8, 2.3, 1.7],
            heavy_mean_mm: [5.8, 5.8, 8.1, 12.7, 16.2, 17.3, 17.3, 16.2, 13.3, 10.4, 8.1, 6.4],
        },
        temperature: Temperatures {
            tmax_dry_c: SeasonalCurve::yearly(19.8, 6.6, 22.0),
            tmax_wet_c: SeasonalCurve::yearly(14.4, 6.4, 22.0),
            tmin_dry_c: SeasonalCurve::yearly(6.4, 5.4, 24.0),
            tmin_wet_c: SeasonalCurve::yearly(4.2, 4.8, 24.0),
            tmax_dry_spread_c: SeasonalCurve::yearly(3.9, 0.7, 200.0),
            tmax_wet_spread_c: SeasonalCurve::yearly(3.6, 0.4, 200.0),
            tmin_dry_spread_c: SeasonalCurve::yearly(2.6, 0.3, 200.0),
            tmin_wet_spread_c: SeasonalCurve::yearly(2.4, 0.2, 200.0),
        },
        residuals: ResidualCorrelations::RICHARDSON_WRIGHT_1984,
        years: YearIndex {
            lag_one: 0.35,
            wetness_shift: 0.12,
            depth_shift: 0.09,
            wet_year_cooling_c: 0.2,
            temperature_spread_c: 0.4,
        },
        radiation: Some(Radiation {
            latitude_degrees: -33.0,
            elevation_m: 1600.0,
            dry_clear_log_odds: SeasonalCurve::yearly(2.2, 0.5, 10.0),
            wet_clear_log_odds: SeasonalCurve::yearly(0.2, 0.3, 10.0),
            dry_spread_log_odds: 0.9,
            wet_spread_log_odds: 0.9,
        }),
        humidity: Some(Humidity { dry_dewpoint_below_tmin_c: 4.0, wet_dewpoint_below_tmin_c: 0.5 }),
        wind: Some(Wind { mean_2m_ms: [2.4, 2.3, 2.1, 1.8, 1.6, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.5], shape: 2.2 }),
    }
}
