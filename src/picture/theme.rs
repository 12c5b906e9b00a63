//! Colours by what they mean; views name a role, never a colour.
//!
//! Water is blue and lack is orange in every theme, and both come in a fill, a pale ground and an ink that can be read
//! on paper. The tests at the foot hold every pair that a view may put together to its contrast, and every pair of data
//! colours to its distance, for normal eyes and for the three colour-vision deficiencies.

use embedded_graphics::pixelcolor::Rgb565;

use super::colour::rgb;
use super::paint::{Hatch, Paint, Pattern, mix};

/// One set of colours.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Theme {
    /// The ground of the frame.
    pub paper: Rgb565,
    /// The ground of a card or panel on the paper.
    pub card: Rgb565,
    /// The air above the valley.
    pub sky: Rgb565,
    /// Text and the line *as it was*.
    pub ink: Rgb565,
    /// Text that matters less: units, notes, months.
    pub quiet: Rgb565,
    /// Axes and the edges of empty vessels.
    pub rule: Rgb565,
    /// Hairlines that part areas and grid lines; never the only sign of anything.
    pub faint: Rgb565,
    /// Water itself: fills, bars, thick lines.
    pub water: Rgb565,
    /// The area under a line of water.
    pub water_pale: Rgb565,
    /// Text and thin lines that speak of water.
    pub water_ink: Rgb565,
    /// Text on `water`.
    pub on_water: Rgb565,
    /// What is lacking: fills, hatching, the day's cursor.
    pub lack: Rgb565,
    /// The area of a lack.
    pub lack_pale: Rgb565,
    /// Text that speaks of a lack.
    pub lack_ink: Rgb565,
    /// Text on `lack`.
    pub on_lack: Rgb565,
    /// Snow on the ground.
    pub snow: Rgb565,
    /// The edge of snow against what is as bright.
    pub snow_edge: Rgb565,
    /// Ground in front.
    pub rock: Rgb565,
    /// Every second band of ground.
    pub rock_far: Rgb565,
    /// Text on either rock.
    pub on_rock: Rgb565,
    /// Fields that got their water.
    pub crop: Rgb565,
    /// Fields that did not.
    pub crop_dry: Rgb565,
    /// Text that speaks of fields.
    pub crop_ink: Rgb565,
    /// Roofs and whatever else belongs to the town.
    pub town: Rgb565,
    /// The ground of the dial that is being turned.
    pub chosen: Rgb565,
    /// Text on `chosen`.
    pub on_chosen: Rgb565,
}

impl Theme {
    /// Dark ink on warm paper, for rooms.
    pub const LIGHT: Self = Self {
        paper: rgb(0xF7, 0xF3, 0xE8),
        card: rgb(0xFF, 0xFF, 0xFF),
        sky: rgb(0xE2, 0xEB, 0xF0),
        ink: rgb(0x1A, 0x22, 0x2E),
        quiet: rgb(0x5A, 0x63, 0x6C),
        rule: rgb(0x80, 0x82, 0x80),
        faint: rgb(0xD6, 0xD2, 0xC4),
        water: rgb(0x1F, 0x74, 0xB8),
        water_pale: rgb(0xB9, 0xD5, 0xEA),
        water_ink: rgb(0x10, 0x58, 0x94),
        on_water: rgb(0xFF, 0xFF, 0xFF),
        lack: rgb(0xD9, 0x6A, 0x14),
        lack_pale: rgb(0xF6, 0xD9, 0xB8),
        lack_ink: rgb(0xA3, 0x42, 0x00),
        on_lack: rgb(0x1A, 0x14, 0x10),
        snow: rgb(0xFF, 0xFF, 0xFF),
        snow_edge: rgb(0x93, 0xA6, 0xB4),
        rock: rgb(0x5C, 0x52, 0x4A),
        rock_far: rgb(0x70, 0x66, 0x5D),
        on_rock: rgb(0xFF, 0xFF, 0xFF),
        crop: rgb(0x84, 0xB4, 0x70),
        crop_dry: rgb(0xEC, 0xD2, 0x70),
        crop_ink: rgb(0x3F, 0x66, 0x1C),
        town: rgb(0x8C, 0x4A, 0x5E),
        chosen: rgb(0x1A, 0x22, 0x2E),
        on_chosen: rgb(0xFF, 0xFF, 0xFF),
    };

    /// Light ink on a dark ground, for dim rooms and night.
    pub const DARK: Self = Self {
        paper: rgb(0x12, 0x18, 0x20),
        card: rgb(0x1E, 0x27, 0x32),
        sky: rgb(0x1B, 0x2A, 0x38),
        ink: rgb(0xF0, 0xEE, 0xE6),
        quiet: rgb(0xA6, 0xAE, 0xB6),
        rule: rgb(0x7A, 0x84, 0x8E),
        faint: rgb(0x33, 0x3E, 0x4A),
        water: rgb(0x2F, 0x86, 0xCE),
        water_pale: rgb(0x1C, 0x44, 0x68),
        water_ink: rgb(0x7C, 0xBE, 0xF4),
        on_water: rgb(0x06, 0x0A, 0x10),
        lack: rgb(0xF0, 0x8C, 0x32),
        lack_pale: rgb(0x5A, 0x36, 0x18),
        lack_ink: rgb(0xFF, 0xA8, 0x5C),
        on_lack: rgb(0x12, 0x0C, 0x06),
        snow: rgb(0xF4, 0xF8, 0xFC),
        snow_edge: rgb(0x8E, 0xA2, 0xB2),
        rock: rgb(0x54, 0x4C, 0x46),
        rock_far: rgb(0x64, 0x5A, 0x52),
        on_rock: rgb(0xFF, 0xFF, 0xFF),
        crop: rgb(0x78, 0xC4, 0x8C),
        crop_dry: rgb(0xF0, 0xD8, 0x80),
        crop_ink: rgb(0xB4, 0xD8, 0x80),
        town: rgb(0xB0, 0x6E, 0x84),
        chosen: rgb(0xF0, 0xEE, 0xE6),
        on_chosen: rgb(0x12, 0x18, 0x20),
    };

    /// As much contrast as can be had, for a screen in the sun or a faint projector.
    pub const SUNLIGHT: Self = Self {
        paper: rgb(0xFF, 0xFF, 0xFF),
        card: rgb(0xFF, 0xFF, 0xFF),
        sky: rgb(0xFF, 0xFF, 0xFF),
        ink: rgb(0x00, 0x00, 0x00),
        quiet: rgb(0x30, 0x34, 0x38),
        rule: rgb(0x48, 0x4C, 0x50),
        faint: rgb(0xB0, 0xB0, 0xB0),
        water: rgb(0x00, 0x52, 0x9C),
        water_pale: rgb(0xC4, 0xE2, 0xFA),
        water_ink: rgb(0x00, 0x3E, 0x7A),
        on_water: rgb(0xFF, 0xFF, 0xFF),
        lack: rgb(0xE0, 0x60, 0x00),
        lack_pale: rgb(0xFF, 0xE2, 0xC4),
        lack_ink: rgb(0x86, 0x2E, 0x00),
        on_lack: rgb(0x00, 0x00, 0x00),
        snow: rgb(0xFF, 0xFF, 0xFF),
        snow_edge: rgb(0x30, 0x40, 0x50),
        rock: rgb(0x3A, 0x32, 0x2C),
        rock_far: rgb(0x54, 0x4A, 0x42),
        on_rock: rgb(0xFF, 0xFF, 0xFF),
        crop: rgb(0x6C, 0xC0, 0x80),
        crop_dry: rgb(0xFC, 0xE0, 0x80),
        crop_ink: rgb(0x24, 0x4C, 0x00),
        town: rgb(0x80, 0x20, 0x48),
        chosen: rgb(0x00, 0x00, 0x00),
        on_chosen: rgb(0xFF, 0xFF, 0xFF),
    };

    /// The three sets.
    pub const ALL: [Self; 3] = [Self::LIGHT, Self::DARK, Self::SUNLIGHT];

    /// Stripes that stand for a lack beside its colour.
    pub const fn lack_hatch(&self) -> Paint {
        Paint::Hatch(Hatch { pattern: Pattern::Rising, period_px: 5, width_px: 1.6, colour: self.lack })
    }

    /// Dots that stand for snow on a ground as bright as snow.
    pub const fn snow_hatch(&self) -> Paint {
        Paint::Hatch(Hatch { pattern: Pattern::Dots, period_px: 4, width_px: 1.6, colour: self.snow_edge })
    }

    /// Fine falling stripes that stand for a range in which the model's answer lies.
    pub const fn range_hatch(&self) -> Paint {
        Paint::Hatch(Hatch { pattern: Pattern::Falling, period_px: 4, width_px: 0.8, colour: self.rule })
    }

    /// A colour between lack (0) and plenty (1), for fields of shares: ever more water, ever further in lightness from
    /// where it began. What lies beyond counts as 0 or 1.
    pub fn ramp(&self, share: f64) -> Rgb565 {
        // The cast takes what is no number as nothing.
        mix(self.lack_pale, self.water, (share.clamp(0.0, 1.0) * 255.0 + 0.5) as u8)
    }

    /// Every pair of text and ground that views may use, by name.
    pub const fn text_pairs(&self) -> [(&'static str, Rgb565, Rgb565); 25] {
        [
            ("ink on paper", self.ink, self.paper),
            ("ink on card", self.ink, self.card),
            ("ink on sky", self.ink, self.sky),
            ("ink on water_pale", self.ink, self.water_pale),
            ("ink on lack_pale", self.ink, self.lack_pale),
            ("quiet on paper", self.quiet, self.paper),
            ("quiet on card", self.quiet, self.card),
            ("quiet on sky", self.quiet, self.sky),
            ("water_ink on paper", self.water_ink, self.paper),
            ("water_ink on card", self.water_ink, self.card),
            ("water_ink on sky", self.water_ink, self.sky),
            ("lack_ink on paper", self.lack_ink, self.paper),
            ("lack_ink on card", self.lack_ink, self.card),
            ("lack_ink on sky", self.lack_ink, self.sky),
            ("crop_ink on paper", self.crop_ink, self.paper),
            ("crop_ink on card", self.crop_ink, self.card),
            ("crop_ink on sky", self.crop_ink, self.sky),
            ("water_ink on water_pale", self.water_ink, self.water_pale),
            ("lack_ink on lack_pale", self.lack_ink, self.lack_pale),
            ("on_water on water", self.on_water, self.water),
            ("on_lack on lack", self.on_lack, self.lack),
            ("on_rock on rock", self.on_rock, self.rock),
            ("on_rock on rock_far", self.on_rock, self.rock_far),
            ("on_chosen on chosen", self.on_chosen, self.chosen),
            ("paper on ink", self.paper, self.ink),
        ]
    }

    /// Pairs of data colours that stand side by side and mean different things, by name.
    pub const fn data_pairs(&self) -> [(&'static str, Rgb565, Rgb565); 14] {
        [
            ("water and lack", self.water, self.lack),
            ("water and crop", self.water, self.crop),
            ("water and crop_dry", self.water, self.crop_dry),
            ("water and rock", self.water, self.rock),
            ("water and paper", self.water, self.paper),
            ("water and sky", self.water, self.sky),
            ("water_pale and lack_pale", self.water_pale, self.lack_pale),
            ("lack and paper", self.lack, self.paper),
            ("lack and crop", self.lack, self.crop),
            ("lack and rock", self.lack, self.rock),
            ("crop and crop_dry", self.crop, self.crop_dry),
            ("crop and rock", self.crop, self.rock),
            ("snow and rock", self.snow, self.rock),
            ("town and crop", self.town, self.crop),
        ]
    }
}

#[cfg(test)]
mod tests {
    use super::super::colour::{Deficiency, contrast, difference, luminance};
    use super::*;

    const NAMES: [&str; 3] = ["light", "dark", "sunlight"];

    #[test]
    fn all_text_can_be_read() {
        // WCAG 2.2, success criteria 1.4.3 (4.5:1) and, in the sun, 1.4.6 (7:1).
        for (name, theme) in NAMES.into_iter().zip(Theme::ALL) {
            let least = if name == "sunlight" { 7.0 } else { 4.5 };
            for (pair, text, ground) in theme.text_pairs() {
                let found = contrast(text, ground);
                // Text on a fill is large and bold there; 4.5 holds for it in the sun as well.
                let least = if pair.starts_with("on_") { 4.5 } else { least };
                assert!(found >= least, "{name}: {pair} has {found:.2}");
            }
        }
    }

    #[test]
    fn lines_and_fills_stand_out_from_their_ground() {
        // WCAG 2.2, success criterion 1.4.11: 3:1 for what is needed to understand a graphic.
        for (name, theme) in NAMES.into_iter().zip(Theme::ALL) {
            for (what, one) in [("water", theme.water), ("lack", theme.lack), ("rule", theme.rule)] {
                let found = contrast(one, theme.paper);
                assert!(found >= 3.0, "{name}: {what} on paper has {found:.2}");
            }
        }
    }

    #[test]
    fn the_ramp_goes_one_way_and_its_fifths_can_be_told_apart() {
        for (name, theme) in NAMES.into_iter().zip(Theme::ALL) {
            let light: [f64; 6] = core::array::from_fn(|i| luminance(theme.ramp(i as f64 / 5.0)));
            assert!(light.is_sorted() || light.iter().rev().is_sorted(), "{name}: {light:?}");
            for eye in [None].into_iter().chain(Deficiency::ALL.map(Some)) {
                for fifth in 0..5 {
                    let (one, next) = (theme.ramp(f64::from(fifth) / 5.0), theme.ramp(f64::from(fifth + 1) / 5.0));
                    let found = difference(one, next, eye);
                    assert!(found >= 5.0, "{name}: fifth {fifth} differs from the next by {found:.1} for {eye:?}");
                }
            }
        }
    }

    #[test]
    fn data_colours_differ_for_every_eye() {
        // 20 in CIELAB is nearly ten times what can just be seen; every colour is doubled by shape or pattern besides.
        for (name, theme) in NAMES.into_iter().zip(Theme::ALL) {
            for (pair, one, other) in theme.data_pairs() {
                for eye in [None].into_iter().chain(Deficiency::ALL.map(Some)) {
                    let found = difference(one, other, eye);
                    assert!(found >= 20.0, "{name}: {pair} differ by {found:.1} for {eye:?}");
                }
            }
        }
    }
}
