//! What a crop asks for and uses.
#![allow(missing_docs)]
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CropTraits {
    pub coefficient_initial: f64,
    pub coefficient_mid: f64,
    pub coefficient_end: f64,
    pub stage_days: [u16; 4],
    pub root_depth_m: f64,
    pub depletion_share: f64,
    pub yield_response: Option<f64>,
}
