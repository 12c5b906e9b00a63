//! What a fit leaves behind: the content of `fit.toml`, read, checked and written as text.
//!
//! Writing the file, whole or not at all, is the command's matter; so is what is said about a fit that is stale.

use serde::{Deserialize, Serialize};

use super::ensemble::Spread;
use super::objective::Objective;
use super::parameters::{Parameter, ParameterUnit, PrecipitationCorrection, apply};
use super::split::{Half, Scores, SplitTest};
use super::{Fit, Settings};
use crate::water::valley::Valley;

/// How far a value may lie beyond a bound because of rounding, as a share of the larger bound.
const ROUNDING: f64 = 1e-9;

/// A fit, as it stands in its file.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct FitFile {
    /// Version of the program that fitted.
    pub program_version: String,
    /// Checksum of the records that were fitted to.
    pub record_checksum: String,
    /// Checksum of what the fit takes from the place and leaves as it is, see [`place_checksum`].
    pub place_checksum: String,
    /// What was made large.
    pub objective: Objective,
    /// Which correction of precipitation was fitted.
    pub correction: PrecipitationCorrection,
    /// Seed of the search.
    pub seed: u64,
    /// Independent starts.
    pub starts: usize,
    /// Runs of each.
    pub runs_per_start: usize,
    /// Whole water years at the record's start that were run but not scored.
    pub warm_up_years: usize,
    /// Whether the search was stopped before its end.
    pub stopped: bool,
    /// Water years that were fitted to.
    pub water_years: Vec<i32>,
    /// Scores of the fitted set on them.
    pub scores: Scores,
    /// The fitted set.
    pub parameters: Vec<FittedParameter>,
    /// Fitted on one half, judged on the other; empty where there were too few years.
    #[serde(default)]
    pub tests: Vec<SplitTest>,
    /// How the ensemble was chosen.
    pub spread: Spread,
    /// The ensemble, the fitted set first.
    pub sets: Vec<FittedSet>,
}

/// One number of the fitted set.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct FittedParameter {
    /// Its key.
    pub key: String,
    /// Its value, in its unit.
    pub value: f64,
    /// What it is measured in.
    pub unit: ParameterUnit,
    /// Lowest value that the search could give it.
    pub least: f64,
    /// Highest.
    pub most: f64,
}

/// One set of the ensemble.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct FittedSet {
    /// Its score on all years.
    pub score: f64,
    /// Its values, in the order of the parameters.
    pub values: Vec<f64>,
}

/// What is wrong with the text of a fit.
#[derive(Clone, Debug, PartialEq)]
pub enum FitFileError {
    /// Not the expected text; the reader's own words, in English, and the bytes that they are about.
    Unreadable {
        /// What the reader says.
        message: String,
        /// Which bytes.
        span: Option<std::ops::Range<usize>>,
    },
    /// No such parameter, or named twice.
    WrongParameter {
        /// Its key.
        key: String,
    },
    /// A value outside its bounds, or not a number.
    OutOfBounds {
        /// The parameter's key.
        key: String,
        /// Which set, from 0; `None` for the fitted one.
        set: Option<usize>,
        /// The value.
        value: f64,
    },
    /// A set with more or fewer values than there are parameters.
    WrongCount {
        /// Which set, from 0.
        set: usize,
        /// Values found.
        found: usize,
        /// Values needed.
        needed: usize,
    },
}

impl FitFile {
    /// The content for a fit of `valley` to records with the checksum `record_checksum`.
    pub fn new(fit: &Fit, settings: &Settings, valley: &Valley, record_checksum: impl Into<String>) -> Self {
        let named = |(parameter, value): (&Parameter, &f64)| FittedParameter {
            key: parameter.key().to_owned(),
            value: *value,
            unit: parameter.unit(),
            least: parameter.bounds().least,
            most: parameter.bounds().most,
        };
        Self {
            program_version: env!("CARGO_PKG_VERSION").to_owned(),
            record_checksum: record_checksum.into(),
            place_checksum: place_checksum(valley),
            objective: settings.objective,
            correction: settings.correction,
            seed: settings.seed,
            starts: settings.starts,
            runs_per_start: settings.runs_per_start,
            warm_up_years: settings.warm_up_years,
            stopped: fit.stopped,
            water_years: fit.water_years.clone(),
            scores: fit.scores,
            parameters: fit.parameters.iter().zip(&fit.sets[0].values).map(named).collect(),
            tests: fit.tests.clone(),
            spread: fit.spread,
            sets: fit.sets.clone(),
        }
    }

    /// Reads the text of a fit and checks every value.
    ///
    /// # Errors
    /// See [`FitFileError`].
    pub fn read(text: &str) -> Result<Self, FitFileError> {
        let file: FitFile = toml::from_str(text)
            .map_err(|error| FitFileError::Unreadable { message: error.message().to_owned(), span: error.span() })?;
        let parameters = file.known_parameters()?;
        let fitted: Vec<f64> = file.parameters.iter().map(|parameter| parameter.value).collect();
        check_values(&parameters, &fitted, None)?;
        for (set, one) in file.sets.iter().enumerate() {
            if one.values.len() != parameters.len() {
                return Err(FitFileError::WrongCount { set, found: one.values.len(), needed: parameters.len() });
            }
            check_values(&parameters, &one.values, Some(set))?;
        }
        for (set, half) in file.tests.iter().flat_map(|test| &test.halves).enumerate() {
            if half.values.len() != parameters.len() {
                return Err(FitFileError::WrongCount { set, found: half.values.len(), needed: parameters.len() });
            }
            check_values(&parameters, &half.values, Some(set))?;
        }
        Ok(file)
    }

    /// The text of the fit. Reading it again gives the same fit to the last bit.
    ///
    /// # Errors
    /// What the writer says, in English; no fit of [`super::fit`] has led to it.
    pub fn write(&self) -> Result<String, String> {
        toml::to_string(self).map_err(|error| error.to_string())
    }

    /// Whether the records are no longer those that were fitted to.
    pub fn is_stale(&self, record_checksum: &str) -> bool {
        self.record_checksum != record_checksum
    }

    /// Whether the land of the place is no longer what it was when it was fitted; `valley` is the place before the fit.
    pub fn is_of_another_land(&self, valley: &Valley) -> bool {
        self.place_checksum != place_checksum(valley)
    }

    /// `valley` with the fitted set.
    ///
    /// # Errors
    /// [`FitFileError::WrongParameter`] for a file that was not read by [`FitFile::read`].
    pub fn apply(&self, valley: &Valley) -> Result<Valley, FitFileError> {
        let values: Vec<f64> = self.parameters.iter().map(|parameter| parameter.value).collect();
        Ok(apply(valley, &self.known_parameters()?, &values))
    }

    /// `valley` with every set of the ensemble, the fitted one first.
    ///
    /// # Errors
    /// Likewise.
    pub fn apply_sets(&self, valley: &Valley) -> Result<Vec<Valley>, FitFileError> {
        let parameters = self.known_parameters()?;
        Ok(self.sets.iter().map(|set| apply(valley, &parameters, &set.values)).collect())
    }

    /// `valley` with the set that was fitted on a half of a test.
    ///
    /// # Errors
    /// Likewise.
    pub fn apply_half(&self, valley: &Valley, half: &Half) -> Result<Valley, FitFileError> {
        Ok(apply(valley, &self.known_parameters()?, &half.values))
    }

    fn known_parameters(&self) -> Result<Vec<Parameter>, FitFileError> {
        let mut known = Vec::new();
        for FittedParameter { key, .. } in &self.parameters {
            match Parameter::from_key(key) {
                Some(parameter) if !known.contains(&parameter) => known.push(parameter),
                _ => return Err(FitFileError::WrongParameter { key: key.clone() }),
            }
        }
        Ok(known)
    }
}

/// A fingerprint of what a fit takes from a place and leaves as it is: latitude, start of the water year, the station's
/// height and the bands. FNV-1a with 64 bits over the numbers' bits.
pub fn place_checksum(valley: &Valley) -> String {
    let own = [valley.latitude_deg, f64::from(valley.water_year_start_month), valley.station_elevation_m];
    let bands = valley
        .bands
        .iter()
        .flat_map(|band| [band.area_km2, band.elevation_m, band.melt_exposure, band.evaporation_factor]);
    let bytes = own.into_iter().chain(bands).flat_map(|number| number.to_bits().to_le_bytes());
    let sum =
        bytes.fold(0xcbf2_9ce4_8422_2325_u64, |sum, byte| (sum ^ u64::from(byte)).wrapping_mul(0x0000_0100_0000_01b3));
    format!("{sum:016x}")
}

fn check_values(parameters: &[Parameter], values: &[f64], set: Option<usize>) -> Result<(), FitFileError> {
    for (parameter, &value) in parameters.iter().zip(values) {
        let bounds = parameter.bounds();
        let slack = ROUNDING * bounds.most.abs().max(bounds.least.abs());
        if !(bounds.least - slack <= value && value <= bounds.most + slack) {
            return Err(FitFileError::OutOfBounds { key: parameter.key().to_owned(), set, value });
        }
    }
    Ok(())
}
