//! What the trust page shows of a place, kept for as long as it is shown.

use crate::commands::fitted::PlaceFit;
use crate::commands::judged::{Judged, use_shown};
use crate::fit::{Parting, Transfer};
use crate::picture::views::facts::{RiverSkill, Skill, TestShown, TestedYears, UseShown, Verdict};
use crate::place::Place;

/// The lists that a page borrows.
#[derive(Debug)]
pub(in crate::commands) struct OwnSkill {
    fitted_years: (i32, i32),
    fitted: Option<f64>,
    percent_bias: Option<f64>,
    tests: Vec<TestShown>,
    uses: Vec<UseShown>,
    river: Option<OwnRiver>,
}

#[derive(Debug)]
struct OwnRiver {
    unseen: bool,
    season: Vec<(u8, f64, f64)>,
    duration: Vec<(f64, f64, f64)>,
    errors: Vec<f64>,
    error_ends: (f64, f64),
    humps: usize,
    years: Vec<(i32, f64, f64)>,
}

impl OwnSkill {
    /// Judges the place; `None` where it has neither a gauge nor a fit, or cannot be run.
    pub fn of(place: &Place, fit: Option<&PlaceFit>) -> Option<Self> {
        if place.gauge.is_none() && fit.is_none() {
            return None;
        }
        let judged = Judged::of(place, fit).ok()?;
        let years = fit.map_or(&[] as &[i32], |fit| &fit.file.water_years);
        let river = judged.best_evidence().map(|flow| OwnRiver {
            unseen: judged.unseen.is_some(),
            season: flow.season.iter().map(|month| (month.month, month.observed_m3s, month.modelled_m3s)).collect(),
            duration: flow.duration.iter().map(|point| (point.share, point.observed_m3s, point.modelled_m3s)).collect(),
            errors: flow.errors.as_ref().map(|shape| shape.density.to_vec()).unwrap_or_default(),
            error_ends: flow.errors.as_ref().map_or((-1.0, 1.0), |shape| (shape.from, shape.to)),
            humps: flow.errors.as_ref().map_or(0, |shape| shape.humps.len()),
            years: flow.years.iter().map(|year| (year.water_year, year.observed_hm3, year.modelled_hm3)).collect(),
        });
        let tests = judged.tests.iter().flat_map(|test| {
            let years = match test.parting {
                Parting::EarlierLater => [TestedYears::Earlier, TestedYears::Later],
                Parting::ColderWarmer => [TestedYears::Colder, TestedYears::Warmer],
            };
            test.halves.iter().zip(years).map(|(half, years)| TestShown {
                years,
                count: half.water_years.len(),
                judged: half.judged.kling_gupta,
                guess: half.guess_kling_gupta,
                verdict: match half.transfer() {
                    Transfer::Holds => Verdict::Holds,
                    Transfer::Weakens => Verdict::Weakens,
                    Transfer::Fails => Verdict::Fails,
                },
            })
        });
        let scores = fit.map(|fit| fit.file.scores).unwrap_or_default();
        Some(Self {
            fitted_years: (years.first().copied().unwrap_or(0), years.last().copied().unwrap_or(0)),
            fitted: scores.kling_gupta,
            percent_bias: scores.percent_bias,
            tests: tests.collect(),
            uses: judged.rulings.iter().map(use_shown).collect(),
            river,
        })
    }

    /// As a page borrows it.
    pub fn shown(&self) -> Skill<'_> {
        Skill {
            fitted_years: self.fitted_years,
            fitted: self.fitted,
            percent_bias: self.percent_bias,
            tests: &self.tests,
            uses: &self.uses,
            river: self.river.as_ref().map(|river| RiverSkill {
                unseen: river.unseen,
                season: &river.season,
                duration: &river.duration,
                errors: &river.errors,
                error_ends: river.error_ends,
                humps: river.humps,
                years: &river.years,
            }),
        }
    }
}
