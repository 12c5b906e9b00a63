//! Every point of the search's cube is a valley that keeps what a valley promises, and a fit survives its file.

use std::sync::atomic::AtomicBool;

use super::valleys;
use deshielo::fit::parameters::{Scale, values_of};
use deshielo::fit::{
    FitFile, FitFileError, Measures, Parameter, PrecipitationCorrection, Record, Settings, Watch, apply, fit,
};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::channel::Reach;
use deshielo::water::dials::Dials;
use deshielo::water::valley::{MOST_HYDROGRAPH_DAYS, ReachTraits, Valley};
use proptest::prelude::*;

const CORRECTIONS: [PrecipitationCorrection; 4] = [
    PrecipitationCorrection::SnowCatch,
    PrecipitationCorrection::Gradient,
    PrecipitationCorrection::Factor,
    PrecipitationCorrection::RainAndSnow,
];

fn with_reach() -> Valley {
    let mut valley = valleys::bare_basin(2);
    valley.channel.reach = Some(ReachTraits { travel_days: 1.0, inflow_weight: 0.2 });
    valley
}

fn assert_keeps_its_promises(valley: &Valley) {
    assert!(valley.rain_snow.all_rain_above_c > valley.rain_snow.all_snow_below_c);
    assert!(valley.snow.full_cover_mm > 0.0 && valley.soil.capacity_mm > 0.0);
    assert!(valley.soil.dry_share > 0.0 && valley.soil.dry_share <= 1.0);
    assert!(valley.ground.quick_days > 0.0 && valley.ground.slow_days > valley.ground.quick_days);
    let base_days = valley.channel.unit_hydrograph_base_days;
    assert!(base_days > 0.0 && base_days <= MOST_HYDROGRAPH_DAYS as f64);
    assert!(valley.climb.snow_catch_factor > 0.0 && valley.climb.precipitation_factor > 0.0);
    assert!(valley.soil.recharge_power > 0.0 && (2.0 * valley.soil.recharge_power) % 1.0 == 0.0);
    if let Some(reach) = &valley.channel.reach {
        assert!((0.0..=0.5).contains(&reach.inflow_weight));
        assert!(Reach::from(reach).is_stable(), "{reach:?}");
    }
}

proptest! {
    #[test]
    fn any_point_is_a_sound_valley(
        at in prop::collection::vec(prop_oneof![Just(0.0), Just(1.0), 0.0..=1.0_f64], 20),
        correction in prop::sample::select(&CORRECTIONS[..]),
    ) {
        for valley in [with_reach(), valleys::bare_basin(2)] {
            let parameters = Parameter::fitted(&valley, correction);
            let values: Vec<f64> = parameters.iter().zip(&at).map(|(parameter, at)| parameter.value_at(*at)).collect();
            let set = apply(&valley, &parameters, &values);
            assert_keeps_its_promises(&set);
            for ((parameter, want), got) in parameters.iter().zip(&values).zip(values_of(&set, &parameters)) {
                // Largest stable weights of 0 leave a share of it undefined.
                let undefined = *parameter == Parameter::ReachWeight && got.is_nan();
                prop_assert!(undefined || (got - want).abs() <= 1e-9 * want.abs().max(1.0), "{}", parameter.key());
            }
        }
    }
}

#[test]
fn only_corrections_of_precipitation_that_do_not_undo_each_other_are_fitted() {
    let corrections = [Parameter::SnowCatch, Parameter::PrecipitationGradient, Parameter::PrecipitationFactor];
    for (correction, kept) in CORRECTIONS.into_iter().zip(corrections) {
        let fitted = Parameter::fitted(&with_reach(), correction);
        assert_eq!(fitted.len(), 19);
        let found: Vec<_> = fitted.into_iter().filter(|parameter| corrections.contains(parameter)).collect();
        assert_eq!(found, [kept]);
    }
    let both = Parameter::fitted(&with_reach(), PrecipitationCorrection::RainAndSnow);
    assert!(!both.contains(&Parameter::PrecipitationGradient) && both.len() == 20);
    assert_eq!(Parameter::fitted(&valleys::bare_basin(2), PrecipitationCorrection::Factor).len(), 17);
    // Where every band lies at the station's height, nothing cools on the way.
    let mut flat = valleys::bare_basin(2);
    flat.station_elevation_m = 1000.0;
    flat.bands.iter_mut().for_each(|band| band.elevation_m = 1020.0);
    assert!(!Parameter::fitted(&flat, PrecipitationCorrection::Factor).contains(&Parameter::MeanLapse));
}

#[test]
fn months_keep_what_parts_them() {
    let mut valley = valleys::bare_basin(2);
    valley.climb.lapse_c_per_km = std::array::from_fn(|month| -5.0 - 0.2 * month as f64);
    let set = apply(&valley, &[Parameter::MeanLapse], &[-7.0]);
    let [was, now] = [&valley, &set].map(|valley| valley.climb.lapse_c_per_km);
    assert!((now.iter().sum::<f64>() / 12.0 + 7.0).abs() < 1e-12);
    assert!(((now[11] - now[0]) - (was[11] - was[0])).abs() < 1e-12);
}

#[test]
fn coordinates_and_values_go_both_ways() {
    for parameter in Parameter::ALL {
        let bounds = parameter.bounds();
        assert!(bounds.least < bounds.most && parameter.value_at(0.0) == bounds.least, "{}", parameter.key());
        assert_eq!(Parameter::from_key(parameter.key()), Some(parameter));
        for step in 0..=20 {
            let at = f64::from(step) / 20.0;
            let value = parameter.value_at(at);
            if bounds.scale == Scale::Halves {
                assert_eq!(parameter.value_at(parameter.coordinate_of(value)), value);
            } else {
                assert!((parameter.coordinate_of(value) - at).abs() < 1e-12, "{}", parameter.key());
            }
        }
    }
    assert_eq!(Parameter::from_key("beta"), None);
}

fn fit_file() -> FitFile {
    let valley = with_reach();
    let (calendar, weather) = valleys::record(&valley, 6, 2);
    let mut days = vec![BasinDay::default(); calendar.len()];
    let basin = Basin::new(&valley, &Dials::REST);
    basin.run(&mut basin.start(), &calendar, &weather, &mut days);
    let flow_m3s: Vec<f64> = days.iter().map(|day| day.inflow_m3 / 86_400.0).collect();
    let record =
        Record { calendar: &calendar, weather: &weather, measures: Measures::Natural, flow_m3s: &flow_m3s, snow: None };
    let settings = Settings { starts: 2, runs_per_start: 30, ..Settings::default() };
    let stop = AtomicBool::new(false);
    let found = fit(&valley, &record, &settings, &Watch { stop: &stop, progress: &|_| {} }).unwrap();
    let file = FitFile::new(&found, &settings, &valley, "checksum of the records");
    let fitted = file.apply(&valley).unwrap();
    assert_eq!(fitted, apply(&valley, &found.parameters, &found.sets[0].values));
    file
}

#[test]
fn a_fit_survives_its_file_to_the_last_bit() {
    let file = fit_file();
    let text = file.write().unwrap();
    let again = FitFile::read(&text).unwrap();
    assert_eq!(again, file);
    assert_eq!(again.tests.len(), 2);
    assert!(text.contains("key = \"melt_factor_mm_c_day\"") && text.contains("unit = \"mm/°C/day\""), "{text}");
    assert_eq!(again.program_version, env!("CARGO_PKG_VERSION"));
    assert!(!again.is_stale("checksum of the records") && again.is_stale("another"));
    let valley = with_reach();
    assert!(!again.is_of_another_land(&valley));
    let mut larger = valley.clone();
    larger.bands[1].area_km2 += 1.0;
    assert!(again.is_of_another_land(&larger));
    let mut other_snow = valley.clone();
    other_snow.snow.melt_factor_mm_c_day += 1.0;
    assert!(!again.is_of_another_land(&other_snow), "what the fit replaces does not count");
    let sets = again.apply_sets(&valley).unwrap();
    assert!(sets.len() >= 20);
    assert_eq!(sets[0], again.apply(&valley).unwrap());
    sets.iter().for_each(assert_keeps_its_promises);
}

#[test]
fn a_broken_file_is_refused_with_its_reason() {
    let file = fit_file();
    let broken = |change: &dyn Fn(&mut FitFile)| {
        let mut file = file.clone();
        change(&mut file);
        FitFile::read(&file.write().unwrap()).unwrap_err()
    };
    let key = "all_snow_below_c".to_owned();
    assert_eq!(
        broken(&|file| file.parameters[0].value = 9.0),
        FitFileError::OutOfBounds { key: key.clone(), set: None, value: 9.0 }
    );
    assert!(matches!(
        broken(&|file| file.sets[3].values[0] = f64::NAN),
        FitFileError::OutOfBounds { set: Some(3), value, .. } if value.is_nan()
    ));
    assert_eq!(
        broken(&|file| file.parameters[1].key = "beta".to_owned()),
        FitFileError::WrongParameter { key: "beta".to_owned() }
    );
    assert_eq!(broken(&|file| file.parameters[1].key = key.clone()), FitFileError::WrongParameter { key: key.clone() });
    assert_eq!(
        broken(&|file| file.sets[1].values.truncate(3)),
        FitFileError::WrongCount { set: 1, found: 3, needed: 19 }
    );
    assert!(matches!(FitFile::read("seed = ["), Err(FitFileError::Unreadable { span: Some(_), .. })));
    assert!(matches!(FitFile::read(""), Err(FitFileError::Unreadable { .. })));
}
