//! Soil textures and the water they hold.

/// Ranges of the water that a soil of one texture holds, as shares of its volume.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SoilTexture {
    /// Stable key.
    pub key: &'static str,
    /// Lowest and highest field capacity.
    pub field_capacity_share: [f64; 2],
    /// Lowest and highest wilting point.
    pub wilting_point_share: [f64; 2],
    /// Lowest and highest available water (field capacity less wilting point).
    pub available_share: [f64; 2],
}

impl SoilTexture {
    /// The middle of the published range of available water, as a share of volume.
    pub fn typical_available_share(&self) -> f64 {
        (self.available_share[0] + self.available_share[1]) / 2.0
    }
}

const fn texture(key: &'static str, capacity: [f64; 2], wilting: [f64; 2], available: [f64; 2]) -> SoilTexture {
    SoilTexture { key, field_capacity_share: capacity, wilting_point_share: wilting, available_share: available }
}

/// Typical water of nine soil textures, from coarse to fine (FAO-56 table 19, Allen et al. 1998; from memory).
pub const SOIL_TEXTURES: [SoilTexture; 9] = [
    texture("sand", [0.07, 0.17], [0.02, 0.07], [0.05, 0.11]),
    texture("loamy_sand", [0.11, 0.19], [0.03, 0.10], [0.06, 0.12]),
    texture("sandy_loam", [0.18, 0.28], [0.06, 0.16], [0.11, 0.15]),
    texture("loam", [0.20, 0.30], [0.07, 0.17], [0.13, 0.18]),
    texture("silt_loam", [0.22, 0.36], [0.09, 0.21], [0.13, 0.19]),
    texture("silt", [0.28, 0.36], [0.12, 0.22], [0.16, 0.20]),
    texture("silty_clay_loam", [0.30, 0.37], [0.17, 0.24], [0.13, 0.18]),
    texture("silty_clay", [0.30, 0.42], [0.17, 0.29], [0.13, 0.19]),
    texture("clay", [0.32, 0.40], [0.20, 0.24], [0.12, 0.20]),
];

/// The texture with a key, if there is one.
pub fn soil_texture(key: &str) -> Option<&'static SoilTexture> {
    SOIL_TEXTURES.iter().find(|texture| texture.key == key)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn ranges_are_ordered_and_agree() {
        for soil in &SOIL_TEXTURES {
            for [low, high] in [soil.field_capacity_share, soil.wilting_point_share, soil.available_share] {
                assert!(0.0 < low && low < high && high < 0.5, "{}", soil.key);
            }
            let typical = soil.typical_available_share();
            let widest = soil.field_capacity_share[1] - soil.wilting_point_share[0];
            let narrowest = soil.field_capacity_share[0] - soil.wilting_point_share[1];
            assert!(narrowest < typical && typical < widest, "{}", soil.key);
            assert_eq!(soil_texture(soil.key), Some(soil));
        }
        assert_eq!(soil_texture("gravel"), None);
    }
}
