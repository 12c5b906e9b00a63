//! Oudin: potential evaporation for river models, from the mean temperature and the latitude alone.

/// Latent heat of vaporisation in MJ/kg, the fixed value of FAO-56 (Allen et al. 1998, chapter 1; at 20 °C).
pub const LATENT_HEAT_OF_VAPORISATION_MJ_KG: f64 = 2.45;

/// Potential evaporation in mm a day from the day's mean temperature (°C) and extraterrestrial radiation (MJ/m²).
///
/// Oudin et al. (2005), *Journal of Hydrology* 303, 290–306, eq. 3: nothing at or below −5 °C.
pub fn oudin_mm(mean_c: f64, extraterrestrial_mj_m2: f64) -> f64 {
    if mean_c <= -5.0 {
        return 0.0;
    }
    extraterrestrial_mj_m2 / LATENT_HEAT_OF_VAPORISATION_MJ_KG * (mean_c + 5.0) / 100.0
}
