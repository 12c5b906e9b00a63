//! Every check of `reference/et.toml` (FAO-56 examples and tables, Oudin 2005, Stull 2011), each at its tolerance.
#![cfg(feature = "std")]

use deshielo::water::evaporation::air::*;
use deshielo::water::evaporation::radiation::*;
use deshielo::water::evaporation::sun::*;
use deshielo::water::evaporation::{
    EvaporationDay, LATENT_HEAT_OF_VAPORISATION_MJ_KG, Method, PenmanMonteithInputs, PenmanMonteithTraits,
    hargreaves_samani_mm, oudin_mm, penman_monteith_mm, reference_evaporation_mm,
};
use toml::{Table, Value};

/// The inputs of one check, by name.
struct Inputs<'a>(&'a Table);

impl Inputs<'_> {
    fn number(&self, name: &str) -> f64 {
        number(self.0.get(name).unwrap_or_else(|| panic!("no input {name}")))
    }

    fn day(&self) -> u16 {
        self.number("doy") as u16
    }

    fn latitude(&self) -> f64 {
        radians(self.number("lat_deg"))
    }

    fn extraterrestrial(&self) -> f64 {
        extraterrestrial_radiation_mj_m2(self.latitude(), self.day())
    }

    fn declination(&self) -> f64 {
        declination_rad(self.day())
    }

    fn daylight(&self) -> f64 {
        daylight_h(sunset_hour_angle_rad(self.latitude(), self.declination()))
    }

    fn psychrometric(&self) -> f64 {
        psychrometric_constant_kpa_c(pressure_kpa(self.number("z_m")))
    }

    fn solar(&self) -> f64 {
        solar_from_sunshine_mj_m2(self.number("n_h"), self.daylight(), self.extraterrestrial())
    }

    fn clear_sky(&self) -> f64 {
        clear_sky_mj_m2(self.number("z_m"), self.extraterrestrial())
    }

    fn vapour_pressure(&self) -> f64 {
        if self.0.contains_key("ea") {
            return self.number("ea");
        }
        vapour_pressure_from_humidity_extremes_kpa(
            self.number("tmin"),
            self.number("tmax"),
            self.number("rhmin"),
            self.number("rhmax"),
        )
    }

    fn net_longwave(&self) -> f64 {
        let sun = relative_sun(self.solar(), self.clear_sky());
        net_longwave_mj_m2(self.number("tmin"), self.number("tmax"), self.vapour_pressure(), sun)
    }

    fn net_radiation(&self) -> f64 {
        net_shortwave_mj_m2(self.solar()) - self.net_longwave()
    }

    fn wind_2m(&self) -> f64 {
        if self.0.contains_key("u2") {
            return self.number("u2");
        }
        wind_at_2m_ms(self.number("u10_kmh") / 3.6, 10.0)
    }

    fn middle(&self) -> f64 {
        (self.number("tmin") + self.number("tmax")) / 2.0
    }

    /// The last part of a worked example: one of its intermediate or final results.
    fn example(&self, part: &str) -> Option<f64> {
        Some(match part {
            "ra" => self.extraterrestrial(),
            "daylight" => self.daylight(),
            "rs" => self.solar(),
            "rso" => self.clear_sky(),
            "rns" => net_shortwave_mj_m2(self.solar()),
            "rnl" => self.net_longwave(),
            "rn" => self.net_radiation(),
            "u2" => self.wind_2m(),
            "p" => pressure_kpa(self.number("z_m")),
            "gamma" => self.psychrometric(),
            "slope" => saturation_slope_kpa_c(self.middle()),
            "es" => mean_saturation_vapour_pressure_kpa(self.number("tmin"), self.number("tmax")),
            "ea" => self.vapour_pressure(),
            "et0" => penman_monteith_mm(&PenmanMonteithInputs {
                tmin_c: self.number("tmin"),
                tmax_c: self.number("tmax"),
                vapour_pressure_kpa: self.vapour_pressure(),
                wind_2m_ms: self.wind_2m(),
                net_radiation_mj_m2: self.net_radiation(),
                soil_heat_mj_m2: if self.0.contains_key("t_prev") {
                    soil_heat_since_last_month_mj_m2(self.number("t_prev"), self.number("t_month"))
                } else {
                    0.0
                },
                psychrometric_kpa_c: self.psychrometric(),
            }),
            _ => return None,
        })
    }
}

fn number(value: &Value) -> f64 {
    value.as_float().or_else(|| value.as_integer().map(|whole| whole as f64)).expect("a number")
}

fn numbers(value: &Value) -> Vec<f64> {
    value.as_array().map_or_else(|| vec![number(value)], |items| items.iter().map(number).collect())
}

/// Whether a value is that close to its target; one that is not a number never is.
fn within(value: f64, target: f64, tolerance: f64) -> bool {
    (value - target).abs() <= tolerance
}

/// FAO-56 examples 10 to 12 are one story: 22°54′ south, 15 May, 220 h of sunshine in the month.
fn example_10_solar() -> f64 {
    let latitude = radians(-22.9);
    let daylight = daylight_h(sunset_hour_angle_rad(latitude, declination_rad(135)));
    solar_from_sunshine_mj_m2(220.0 / 31.0, daylight, extraterrestrial_radiation_mj_m2(latitude, 135))
}

fn example_11_net_longwave(solar: f64, clear_sky: f64) -> f64 {
    net_longwave_mj_m2(19.1, 25.1, 2.1, relative_sun(solar, clear_sky))
}

/// What the crate makes of one check, or nothing if the check is not known here.
fn compute(id: &str, inputs: &Inputs<'_>) -> Option<Vec<f64>> {
    if let Some(part) = id.strip_prefix("ex17_").or_else(|| id.strip_prefix("ex18_")) {
        return inputs.example(part).map(|value| vec![value]);
    }
    if id.starts_with("tab2_6_ra_") {
        let latitude = inputs.latitude();
        let days = numbers(&inputs.0["doy"]);
        return Some(days.iter().map(|&day| extraterrestrial_radiation_mj_m2(latitude, day as u16)).collect());
    }
    let one = match id {
        "ex2_gamma_1800m" => inputs.psychrometric(),
        "ex3_mean_es" => mean_saturation_vapour_pressure_kpa(inputs.number("tmin"), inputs.number("tmax")),
        "ex3_es_of_mean" => saturation_vapour_pressure_kpa(inputs.number("t_c")),
        "ex4_psychrometer" => {
            assert_eq!(inputs.number("a_psy"), VENTILATED_PSYCHROMETER_PER_C);
            vapour_pressure_from_psychrometer_kpa(
                inputs.number("tdry"),
                inputs.number("twet"),
                pressure_kpa(inputs.number("z_m")),
                VENTILATED_PSYCHROMETER_PER_C,
            )
        }
        "ex5_ea_from_rh" => inputs.vapour_pressure(),
        "ex6_vpd" => {
            mean_saturation_vapour_pressure_kpa(inputs.number("tmin"), inputs.number("tmax")) - inputs.vapour_pressure()
        }
        "ex7_lat_bangkok" | "ex7_lat_rio" => {
            let degrees = inputs.number("deg") + inputs.number("minute") / 60.0;
            radians(if inputs.0["south"].as_bool() == Some(true) { -degrees } else { degrees })
        }
        "ex8_dr" => inverse_relative_distance(inputs.day()),
        "ex8_declination_rad" => inputs.declination(),
        "ex8_sunset_hour_angle_rad" => sunset_hour_angle_rad(inputs.latitude(), inputs.declination()),
        "ex8_ra_mm" => MM_PER_MJ_M2 * inputs.extraterrestrial(),
        "ex8_ra" | "ex10_ra" | "ex15_ra" => inputs.extraterrestrial(),
        "ex9_daylight" | "ex10_n" => inputs.daylight(),
        "ex10_rs" => example_10_solar(),
        "ex11_rnl" => example_11_net_longwave(inputs.number("rs"), inputs.number("rso")),
        "ex12_rn" => {
            assert_eq!(inputs.number("albedo"), GRASS_ALBEDO);
            // Example 11 takes 0.75 of the extraterrestrial radiation (eq. 36), which is the clear sky at sea level.
            let clear_sky = clear_sky_mj_m2(0.0, extraterrestrial_radiation_mj_m2(radians(-22.9), 135));
            net_shortwave_mj_m2(example_10_solar()) - example_11_net_longwave(example_10_solar(), clear_sky)
        }
        "ex13_g_month" => soil_heat_of_month_mj_m2(inputs.number("t_prev"), inputs.number("t_next")),
        "ex14_wind" => wind_at_2m_ms(inputs.number("u"), inputs.number("z_m")),
        "ex15_rs" => {
            // Example 15 and example 20 are the same place and month.
            let radiation = extraterrestrial_radiation_mj_m2(radians(45.0 + 43.0 / 60.0), 196);
            let range_c = inputs.number("tmax") - inputs.number("tmin");
            let clear_sky = clear_sky_mj_m2(200.0, radiation);
            assert_eq!(inputs.number("krs"), INTERIOR_SOLAR_RANGE_COEFFICIENT);
            solar_from_temperature_range_mj_m2(range_c, INTERIOR_SOLAR_RANGE_COEFFICIENT, radiation, clear_sky)
        }
        "ex20_hargreaves" => {
            let range_c = inputs.number("tmax") - inputs.number("tmin");
            hargreaves_samani_mm(inputs.middle(), range_c, inputs.extraterrestrial())
        }
        "ex20_pm_missing" => {
            let traits = PenmanMonteithTraits::new(inputs.number("z_m"), INTERIOR_SOLAR_RANGE_COEFFICIENT);
            let day = EvaporationDay::from_extremes(inputs.number("tmin"), inputs.number("tmax"));
            let sky = SkyTable::at_latitude(inputs.number("lat_deg"))?;
            reference_evaporation_mm(&Method::PenmanMonteith(traits), &sky, inputs.day(), &day, 0.0)
        }
        "lapse_icao" => STANDARD_LAPSE_C_PER_M * 1000.0,
        "stefan_boltzmann_day" => STEFAN_BOLTZMANN_MJ_K4_M2,
        _ if id.starts_with("ex2_pressure_") || id.starts_with("tab2_1_pressure_") || id.starts_with("pressure_") => {
            pressure_kpa(inputs.number("z_m"))
        }
        _ if id.starts_with("e0_") => saturation_vapour_pressure_kpa(inputs.number("t_c")),
        _ if id.starts_with("slope_") => saturation_slope_kpa_c(inputs.number("t_c")),
        _ if id.starts_with("ra_polar_") => inputs.extraterrestrial(),
        _ if id.starts_with("oudin_") => oudin_mm(inputs.number("t_c"), inputs.extraterrestrial()),
        _ if id.starts_with("tdew_") => dew_point_c(inputs.number("ea")),
        _ if id.starts_with("wet_bulb_stull_") => wet_bulb_c(inputs.number("t_c"), inputs.number("rh")),
        _ if id.starts_with("clausius_") => {
            let temperature_c = inputs.number("t_c");
            saturation_slope_kpa_c(temperature_c) / saturation_vapour_pressure_kpa(temperature_c) * 100.0
        }
        _ => return None,
    };
    Some(vec![one])
}

#[test]
fn every_published_value_is_met() {
    let file: Table = include_str!("reference/et.toml").parse().expect("a table");
    let checks = file["check"].as_array().expect("checks");
    let mut faults = Vec::new();
    for check in checks {
        let id = check["id"].as_str().expect("an id");
        let Some(ours) = compute(id, &Inputs(check["inputs"].as_table().expect("inputs"))) else {
            faults.push(format!("{id}: no test knows this check"));
            continue;
        };
        let expected = numbers(&check["expected"]);
        let rel_tol = number(&check["rel_tol"]);
        assert_eq!(ours.len(), expected.len(), "{id}");
        for (value, target) in ours.iter().zip(&expected) {
            let tolerance = if *target == 0.0 { 1e-9 } else { rel_tol * target.abs() };
            if !within(*value, *target, tolerance) {
                faults.push(format!("{id}: {value} is not {target} ± {tolerance}"));
            }
        }
        if let (Some(printed), Some(hold)) = (check.get("printed"), check.get("hold_printed_to")) {
            for (value, target) in ours.iter().zip(numbers(printed)) {
                // The last digit's half unit is itself a decimal fraction, hence the hair.
                if !within(*value, target, number(hold) * 1.000_000_1) {
                    faults.push(format!("{id}: {value} is not the printed {target}"));
                }
            }
        }
    }
    assert_eq!(checks.len(), 126, "the copy of the checks has changed");
    assert!(faults.is_empty(), "{faults:#?}");
}

#[test]
fn latent_heat_and_its_rounded_inverse_agree() {
    // FAO-56 eq. 20 rounds 1/2.45 = 0.40816 to 0.408.
    assert!((MM_PER_MJ_M2 * LATENT_HEAT_OF_VAPORISATION_MJ_KG - 1.0).abs() < 5e-4);
}

#[test]
fn humidity_rules_agree_where_they_must() {
    // Equal humidity all day makes the rule of the extremes (eq. 17) that of the mean (eq. 19).
    let extremes = vapour_pressure_from_humidity_extremes_kpa(8.0, 24.0, 60.0, 60.0);
    let mean = vapour_pressure_from_mean_humidity_kpa(8.0, 24.0, 60.0);
    assert!((extremes - mean).abs() < 1e-12);
    // A dew point turned into vapour pressure and back is itself, to the four digits of annex 3's constants.
    assert!((dew_point_c(vapour_pressure_from_dew_point_kpa(9.5)) - 9.5).abs() < 0.01);
}
