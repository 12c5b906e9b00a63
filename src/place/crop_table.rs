//! Crops that a place may name instead of describing: traits, dates and the source of each number.
//!
//! Coefficients are those of FAO-56 (Allen, Pereira, Raes & Smith 1998, FAO Irrigation and Drainage Paper 56) table 12
//! (single), stage lengths its table 11, root depths and depletion shares its table 22; yield response factors those of
//! FAO-33 (Doorenbos & Kassam 1979, FAO Irrigation and Drainage Paper 33), whole season. Table 12 is for a sub-humid
//! climate with 2 m/s of wind; [`CropTraits::in_climate`] moves it. Where table 12 or 11 prints a range, the middle is
//! taken. Of table 22's two depths the smaller is the trait, as its footnote advises for irrigation.
//!
//! Most numbers were written from memory, and each row says which; tests hold the others to a transcription. Once, by hand,
//! the coefficients of 57 rows and table 22's vegetables were also laid beside public transcriptions and agreed; stage
//! lengths and yield factors were not. A place that has local numbers should give them.

use crate::water::crop::CropTraits;

/// Which numbers of a row were recalled without a look at the printed table.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct FromMemory {
    /// The three coefficients and the height.
    pub coefficients: bool,
    /// The four stage lengths.
    pub stage_days: bool,
    /// The root depths and the depletion share.
    pub roots: bool,
    /// The yield response factor, where there is one.
    pub yield_response: bool,
}

/// One crop of the built-in table.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Crop {
    /// Stable English key; the name that people see is the message `crop-` and this key.
    pub key: &'static str,
    /// What the water needs to know.
    pub traits: CropTraits,
    /// Height of the full-grown crop, m (FAO-56 table 12).
    pub height_m: f64,
    /// Smallest and largest of the full-grown roots' depth, m (FAO-56 table 22).
    pub root_depth_range_m: [f64; 2],
    /// Month and day on which the season begins in the northern hemisphere: sowing, or growth in spring for perennials.
    /// Common practice in mountain valleys, no source.
    pub northern_start: (u8, u8),
    /// Where the stage lengths come from: the climate of the row of table 11, or what was done where it has none.
    pub season_source: &'static str,
    /// What is harvested, or which printed row was taken. For preparers; screens do not show it.
    pub harvest: &'static str,
    /// Which numbers were recalled.
    pub from_memory: FromMemory,
}

impl Crop {
    /// Month and day on which the season begins; the southern hemisphere is six months later.
    pub fn season_start(&self, southern: bool) -> (u8, u8) {
        let (month, day) = self.northern_start;
        if southern { ((month + 5) % 12 + 1, day) } else { (month, day) }
    }

    /// Where every number of the row comes from, in one English line for files and developers.
    pub fn source(&self) -> String {
        if self.traits.season_days() == 0 {
            return self.season_source.to_owned();
        }
        let memory = |recalled: bool| if recalled { " (from memory)" } else { "" };
        let mut line = format!(
            "FAO-56 (Allen et al. 1998): coefficients table 12{}; stage lengths {}{}; roots table 22{}",
            memory(self.from_memory.coefficients),
            self.season_source,
            memory(self.from_memory.stage_days),
            memory(self.from_memory.roots),
        );
        if self.traits.yield_response.is_some() {
            line.push_str("; yield response FAO-33 (Doorenbos & Kassam 1979)");
            line.push_str(memory(self.from_memory.yield_response));
        }
        line
    }

    const fn new(key: &'static str, coefficients: [f64; 3], height_m: f64) -> Self {
        let [coefficient_initial, coefficient_mid, coefficient_end] = coefficients;
        Self {
            key,
            traits: CropTraits {
                coefficient_initial,
                coefficient_mid,
                coefficient_end,
                stage_days: [0; 4],
                root_depth_m: 0.0,
                depletion_share: 0.0,
                yield_response: None,
            },
            height_m,
            root_depth_range_m: [0.0; 2],
            northern_start: (1, 1),
            season_source: "",
            harvest: "",
            from_memory: FromMemory { coefficients: true, stage_days: true, roots: true, yield_response: true },
        }
    }

    const fn season(mut self, northern_start: (u8, u8), stage_days: [u16; 4], source: &'static str) -> Self {
        self.northern_start = northern_start;
        self.traits.stage_days = stage_days;
        self.season_source = source;
        self
    }

    const fn roots(mut self, range_m: [f64; 2], depletion_share: f64) -> Self {
        self.root_depth_range_m = range_m;
        self.traits.root_depth_m = range_m[0];
        self.traits.depletion_share = depletion_share;
        self
    }

    const fn responds(mut self, yield_response: f64) -> Self {
        self.traits.yield_response = Some(yield_response);
        self
    }

    const fn gives(mut self, harvest: &'static str) -> Self {
        self.harvest = harvest;
        self
    }

    /// Which parts agree with a transcription of the printed tables and so are not from memory alone.
    const fn seen(mut self, coefficients: bool, stage_days: bool, roots: bool) -> Self {
        self.from_memory.coefficients = !coefficients;
        self.from_memory.stage_days = !stage_days;
        self.from_memory.roots = !roots;
        self
    }
}

/// The built-in crop with a key, if there is one.
pub fn built_in_crop(key: &str) -> Option<&'static Crop> {
    CROPS.iter().find(|crop| crop.key == key)
}

/// A short name, so that the table keeps to two lines a crop.
const fn c(key: &'static str, coefficients: [f64; 3], height_m: f64) -> Crop {
    Crop::new(key, coefficients, height_m)
}

const FROST_TO_FROST: &str = "chosen here for 200 days between hard frosts (table 11 leaves them variable)";
const SEMI_ARID: &str = "table 11, semi-arid";
const MEDITERRANEAN: &str = "table 11, mediterranean";
const EUROPE: &str = "table 11, Europe";
const DESERT: &str = "table 11, desert";
const CONTINENTAL: &str = "table 11, continental";
const ARID: &str = "table 11, arid";
const HIGH_LATITUDES: &str = "table 11, high latitudes";
const LATITUDE_35_TO_45: &str = "table 11, 35 to 45 degrees of latitude";

/// Every built-in crop: hay and pasture, grains, legumes, roots, vegetables, oil and fibre, vines and trees, fallow.
#[rustfmt::skip]
pub const CROPS: &[Crop] = &[
    c("alfalfa_hay", [0.40, 0.95, 0.90], 0.7).season((4, 15), [10, 30, 130, 30], FROST_TO_FROST).roots([1.0, 2.0], 0.55)
        .responds(1.1).seen(true, false, true).gives("several cuttings; the coefficient is averaged over them"),
    c("clover_hay", [0.40, 0.90, 0.85], 0.6).season((4, 15), [10, 30, 130, 30], FROST_TO_FROST).roots([0.6, 0.9], 0.50)
        .gives("several cuttings, averaged; row berseem clover"),
    c("grass_hay", [0.95, 1.05, 1.00], 0.3).season((4, 15), [10, 20, 140, 30], FROST_TO_FROST).roots([0.6, 1.0], 0.60)
        .gives("several cuttings, averaged; row ryegrass hay"),
    c("sudan_grass_hay", [0.50, 0.90, 0.85], 1.2).season((5, 20), [25, 25, 55, 15], "chosen here: table 11's first cutting and one more").roots([1.0, 1.5], 0.55)
        .gives("two cuttings, averaged"),
    c("pasture_rotated", [0.40, 0.90, 0.85], 0.22).season((4, 15), [10, 20, 140, 30], FROST_TO_FROST).roots([0.5, 1.5], 0.60)
        .seen(true, false, true).gives("grazed in turns"),
    c("pasture_extensive", [0.30, 0.75, 0.75], 0.10).season((4, 15), [10, 20, 140, 30], FROST_TO_FROST).roots([0.5, 1.5], 0.60)
        .seen(true, false, false).gives("grazed freely"),
    c("turf", [0.90, 0.95, 0.95], 0.10).season((4, 15), [10, 20, 140, 30], FROST_TO_FROST).roots([0.5, 1.0], 0.40)
        .gives("mown lawn of cool-season grass"),

    c("barley", [0.30, 1.15, 0.25], 1.0).season((4, 10), [20, 25, 60, 30], LATITUDE_35_TO_45).roots([1.0, 1.5], 0.55)
        .seen(false, true, false).gives("dry grain; table 11 has barley, oats and wheat in one row"),
    c("oats", [0.30, 1.15, 0.25], 1.0).season((4, 10), [20, 25, 60, 30], LATITUDE_35_TO_45).roots([1.0, 1.5], 0.55)
        .seen(false, true, false).gives("dry grain; table 11 has barley, oats and wheat in one row"),
    c("wheat_spring", [0.30, 1.15, 0.25], 1.0).season((4, 10), [20, 25, 60, 30], LATITUDE_35_TO_45).roots([1.0, 1.5], 0.55)
        .responds(1.15).seen(true, true, true).gives("dry grain, by machine"),
    c("wheat_winter", [0.40, 1.15, 0.25], 1.0).season((10, 5), [160, 75, 75, 25], SEMI_ARID).roots([1.5, 1.8], 0.55)
        .responds(1.05).seen(true, true, true).gives("dry grain; soil that freezes in winter"),
    c("maize_grain", [0.30, 1.20, 0.35], 2.0).season((5, 1), [30, 40, 50, 50], SEMI_ARID).roots([1.0, 1.7], 0.55)
        .responds(1.25).seen(true, true, true).gives("grain dried in the field"),
    c("maize_silage", [0.30, 1.20, 0.60], 2.0).season((5, 5), [30, 40, 50, 30], MEDITERRANEAN).roots([1.0, 1.7], 0.55)
        .responds(1.25).seen(true, true, true).gives("whole plant, cut moist; rows of maize for grain"),
    c("maize_sweet", [0.30, 1.15, 1.05], 1.5).season((6, 1), [20, 25, 25, 10], MEDITERRANEAN).roots([0.8, 1.2], 0.50)
        .responds(1.25).seen(true, false, false).gives("fresh ears"),
    c("millet", [0.30, 1.00, 0.30], 1.5).season((5, 15), [20, 30, 55, 35], CONTINENTAL).roots([1.0, 2.0], 0.55)
        .gives("dry grain"),
    c("sorghum_grain", [0.30, 1.05, 0.55], 1.5).season((5, 15), [20, 35, 40, 30], MEDITERRANEAN).roots([1.0, 2.0], 0.55)
        .responds(0.9).gives("dry grain"),

    c("beans_dry", [0.40, 1.15, 0.35], 0.4).season((6, 1), [25, 25, 30, 20], SEMI_ARID).roots([0.6, 0.9], 0.45)
        .responds(1.15).seen(true, true, true).gives("dry beans"),
    c("beans_green", [0.50, 1.05, 0.90], 0.4).season((5, 25), [20, 30, 30, 10], MEDITERRANEAN).roots([0.5, 0.7], 0.45)
        .responds(1.15).gives("fresh pods"),
    c("faba_bean_fresh", [0.50, 1.15, 1.10], 0.8).season((4, 20), [15, 25, 35, 15], EUROPE).roots([0.5, 0.7], 0.45)
        .gives("fresh pods"),
    c("faba_bean_dry", [0.50, 1.15, 0.30], 0.8).season((4, 10), [20, 30, 35, 15], MEDITERRANEAN).roots([0.5, 0.7], 0.45)
        .gives("dry beans"),
    c("chickpea", [0.40, 1.00, 0.35], 0.4).season((4, 15), [20, 30, 60, 40], "as lentil (table 11 has no row)").roots([0.6, 1.0], 0.50)
        .gives("dry seed"),
    c("lentil", [0.40, 1.10, 0.30], 0.5).season((4, 15), [20, 30, 60, 40], EUROPE).roots([0.6, 0.8], 0.50)
        .gives("dry seed"),
    c("peas_fresh", [0.50, 1.15, 1.10], 0.5).season((4, 25), [15, 25, 35, 15], EUROPE).roots([0.6, 1.0], 0.35)
        .responds(1.15).gives("fresh pods"),
    c("peas_dry", [0.40, 1.15, 0.30], 0.5).season((4, 15), [35, 25, 30, 20], SEMI_ARID).roots([0.6, 1.0], 0.40)
        .responds(1.15).gives("dry seed; first coefficient of the legume group"),
    c("soybean", [0.40, 1.15, 0.50], 0.75).season((5, 15), [20, 35, 60, 25], CONTINENTAL).roots([0.6, 1.3], 0.50)
        .responds(0.85).gives("dry seed"),

    c("potato", [0.50, 1.15, 0.75], 0.6).season((5, 1), [45, 30, 70, 20], SEMI_ARID).roots([0.4, 0.6], 0.35)
        .responds(1.1).seen(true, true, true).gives("tubers; vines alive until harvest (about 0.40 at the end where they are killed)"),
    c("sugar_beet", [0.35, 1.20, 0.70], 0.5).season((4, 15), [50, 40, 50, 40], SEMI_ARID).roots([0.7, 1.2], 0.55)
        .responds(1.0).seen(true, true, true).gives("roots for sugar"),
    c("table_beet", [0.50, 1.05, 0.95], 0.4).season((4, 20), [25, 30, 25, 10], MEDITERRANEAN).roots([0.6, 1.0], 0.50)
        .gives("roots for eating"),
    c("carrot", [0.70, 1.05, 0.95], 0.3).season((4, 20), [30, 40, 60, 20], MEDITERRANEAN).roots([0.5, 1.0], 0.35)
        .gives("roots"),
    c("onion_dry", [0.70, 1.05, 0.75], 0.4).season((4, 15), [15, 25, 70, 40], MEDITERRANEAN).roots([0.3, 0.6], 0.30)
        .responds(1.1).seen(true, true, true).gives("dry bulbs"),
    c("garlic", [0.70, 1.00, 0.70], 0.3).season((10, 15), [20, 35, 110, 45], "as dry onion, arid (table 11 has no row)").roots([0.3, 0.5], 0.30)
        .gives("bulbs planted in autumn"),

    c("lettuce", [0.70, 1.00, 0.95], 0.3).season((5, 1), [20, 30, 15, 10], MEDITERRANEAN).roots([0.3, 0.5], 0.30)
        .gives("heads"),
    c("spinach", [0.70, 1.00, 0.95], 0.3).season((4, 20), [20, 20, 20, 5], MEDITERRANEAN).roots([0.3, 0.5], 0.20)
        .gives("leaves"),
    c("broccoli", [0.70, 1.05, 0.95], 0.3).season((5, 10), [35, 45, 40, 15], DESERT).roots([0.4, 0.6], 0.45)
        .gives("heads"),
    c("cabbage", [0.70, 1.05, 0.95], 0.4).season((5, 1), [40, 60, 50, 15], DESERT).roots([0.5, 0.8], 0.45)
        .responds(0.95).gives("heads"),
    c("cauliflower", [0.70, 1.05, 0.95], 0.4).season((5, 10), [35, 50, 40, 15], DESERT).roots([0.4, 0.7], 0.45)
        .gives("heads"),
    c("celery", [0.70, 1.05, 1.00], 0.6).season((5, 10), [25, 40, 45, 15], MEDITERRANEAN).roots([0.3, 0.5], 0.20)
        .gives("stalks"),
    c("tomato", [0.60, 1.15, 0.80], 0.6).season((5, 15), [30, 40, 45, 30], MEDITERRANEAN).roots([0.7, 1.5], 0.40)
        .responds(1.05).gives("fruit"),
    c("sweet_pepper", [0.60, 1.05, 0.90], 0.7).season((5, 20), [30, 35, 40, 20], MEDITERRANEAN).roots([0.5, 1.0], 0.30)
        .responds(1.1).gives("fresh fruit"),
    c("chile", [0.60, 1.05, 0.90], 0.7).season((5, 15), [30, 35, 40, 20], MEDITERRANEAN).roots([0.5, 1.0], 0.30)
        .responds(1.1).gives("green fruit; rows of sweet pepper"),
    c("eggplant", [0.60, 1.05, 0.90], 0.8).season((5, 20), [30, 45, 40, 25], MEDITERRANEAN).roots([0.7, 1.2], 0.45)
        .gives("fruit"),
    c("cucumber", [0.60, 1.00, 0.75], 0.3).season((6, 1), [20, 30, 40, 15], ARID).roots([0.7, 1.2], 0.50)
        .gives("fresh fruit"),
    c("zucchini", [0.50, 0.95, 0.75], 0.3).season((6, 1), [20, 30, 25, 15], MEDITERRANEAN).roots([0.6, 1.0], 0.50)
        .gives("fruit"),
    c("winter_squash", [0.50, 1.00, 0.80], 0.4).season((6, 1), [25, 35, 35, 25], EUROPE).roots([1.0, 1.5], 0.35)
        .gives("fruit"),
    c("melon", [0.50, 1.05, 0.75], 0.4).season((5, 20), [25, 35, 40, 20], MEDITERRANEAN).roots([0.8, 1.5], 0.40)
        .gives("fruit; row sweet melons"),
    c("watermelon", [0.40, 1.00, 0.75], 0.4).season((5, 20), [20, 30, 30, 30], MEDITERRANEAN).roots([0.8, 1.5], 0.40)
        .responds(1.1).gives("fruit"),
    c("asparagus", [0.50, 0.95, 0.30], 0.5).season((4, 1), [50, 30, 100, 50], "table 11, warm winter").roots([1.2, 1.8], 0.45)
        .gives("spears in spring, then ferns; perennial"),

    c("sunflower", [0.35, 1.10, 0.35], 2.0).season((5, 10), [25, 35, 45, 25], MEDITERRANEAN).roots([0.8, 1.5], 0.45)
        .responds(0.95).gives("dry seed"),
    c("safflower", [0.35, 1.10, 0.25], 0.8).season((4, 15), [25, 35, 55, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.60)
        .responds(0.8).gives("dry seed"),
    c("flax", [0.35, 1.10, 0.25], 1.2).season((4, 15), [25, 35, 50, 40], EUROPE).roots([1.0, 1.5], 0.50)
        .gives("seed or fibre"),
    c("hops", [0.30, 1.05, 0.85], 5.0).season((4, 15), [25, 40, 80, 10], SEMI_ARID).roots([1.0, 1.2], 0.50)
        .gives("cones; perennial"),

    c("grape_table", [0.30, 0.85, 0.45], 2.0).season((5, 1), [20, 50, 90, 20], HIGH_LATITUDES).roots([1.0, 2.0], 0.35)
        .responds(0.85).gives("table grapes or raisins; perennial"),
    c("grape_wine", [0.30, 0.70, 0.45], 1.75).season((4, 15), [30, 60, 40, 80], "table 11, middle latitudes").roots([1.0, 2.0], 0.45)
        .responds(0.85).gives("wine grapes; perennial"),
    c("apple_bare", [0.45, 0.95, 0.70], 4.0).season((4, 1), [20, 70, 90, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.50)
        .seen(true, false, true).gives("apples, also pears and cherries; killing frost, no ground cover"),
    c("apple_cover", [0.50, 1.20, 0.95], 4.0).season((4, 1), [20, 70, 90, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.50)
        .seen(true, false, true).gives("apples; killing frost, active ground cover"),
    c("pear_cover", [0.50, 1.20, 0.95], 4.0).season((4, 1), [20, 70, 90, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.50)
        .seen(true, false, true).gives("pears; one row with apples: killing frost, active ground cover"),
    c("cherry_cover", [0.50, 1.20, 0.95], 4.0).season((4, 1), [20, 70, 90, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.50)
        .seen(true, false, true).gives("cherries; one row with apples: killing frost, active ground cover"),
    c("stone_fruit_bare", [0.45, 0.90, 0.65], 3.0).season((4, 1), [20, 70, 90, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.50)
        .gives("peaches, apricots, plums; killing frost, no ground cover"),
    c("stone_fruit_cover", [0.50, 1.15, 0.90], 3.0).season((4, 1), [20, 70, 90, 30], HIGH_LATITUDES).roots([1.0, 2.0], 0.50)
        .gives("peaches, apricots, plums; killing frost, active ground cover"),
    c("almond", [0.40, 0.90, 0.65], 5.0).season((3, 1), [20, 70, 120, 60], "table 11, deciduous orchard, low latitudes").roots([1.0, 2.0], 0.40)
        .gives("nuts; no ground cover"),
    c("walnut", [0.50, 1.10, 0.65], 4.5).season((4, 10), [20, 10, 130, 30], SEMI_ARID).roots([1.7, 2.4], 0.50)
        .gives("nuts"),
    c("pistachio", [0.40, 1.10, 0.45], 4.0).season((4, 1), [20, 60, 30, 40], MEDITERRANEAN).roots([1.0, 1.5], 0.40)
        .gives("nuts; no ground cover"),
    c("olive", [0.65, 0.70, 0.70], 4.0).season((3, 1), [30, 90, 60, 90], MEDITERRANEAN).roots([1.2, 1.7], 0.65)
        .gives("fruit; crowns over 40 to 60 % of the ground"),

    c("fallow", [0.0, 0.0, 0.0], 0.0).season((1, 1), [0, 0, 0, 0], "no source: land at rest has no season here and asks for no water").roots([0.5, 0.5], 0.50)
        .gives("nothing; the root depth only keeps the store of a field that changes crops"),
];
