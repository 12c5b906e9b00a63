//! Reference evaporation.
#![allow(missing_docs)]
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PenmanMonteithTraits {
    pub elevation_m: f64,
    pub krs: f64,
}
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Method {
    PenmanMonteith(PenmanMonteithTraits),
    HargreavesSamani,
    Oudin,
    Given,
}
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct EvaporationDay {
    pub tmin_c: f64,
    pub tmax_c: f64,
    pub tmean_c: f64,
    pub vapour_pressure_kpa: f64,
    pub wind_2m_ms: f64,
    pub solar_mj_m2: f64,
    pub given_mm: f64,
}
