//! What the sets of a fit's ensemble say of a change: its range, set by set against its own run at rest.

use rayon::prelude::*;

use super::node::Node;
use super::runs::years_of_set;
use crate::commands::failure::Failure;
use crate::commands::tell::layout::wrapped;
use crate::fit::ensemble::range;
use crate::place::Place;
use crate::signs::{Sign, SignKind, YearReport, spread};
use crate::water::dials::Dials;
use crate::water::valley::Valley;
use crate::words::{Value, Words};

/// Fewest sets whose range says anything.
const FEWEST_SETS: usize = 2;

/// The ranges of the mean changes of the years shown.
#[derive(Clone, Debug)]
pub(in crate::commands) struct Ranges {
    sets: usize,
    signs: Vec<SignRange>,
}

/// Of one sign.
#[derive(Clone, Copy, Debug)]
struct SignRange {
    sign: Sign,
    /// Lower and upper mean change, in the sign's unit.
    change: (f64, f64),
    /// The same of the mean with the changes.
    with: (f64, f64),
    /// The same of the change of the mean, %, where the mean is not zero.
    percent: Option<(f64, f64)>,
}

/// Of one set: mean as it was, mean with the changes, mean of the yearly changes.
type Means = [f64; 3];

impl Ranges {
    /// Runs every set as it was and with `dials`; `shown` are the years by their number. `None` for too few sets.
    pub fn of(
        place: &Place,
        sets: &[Valley],
        dials: &Dials,
        shown: &[usize],
        words: &Words,
    ) -> Result<Option<Self>, Failure> {
        if sets.len() < FEWEST_SETS {
            return Ok(None);
        }
        let runs: Result<Vec<[Vec<YearReport>; 2]>, Failure> =
            sets.par_iter().map(|valley| years_of_set(place, valley, dials, words)).collect();
        let runs = runs?;
        let of_sign = |sign: Sign| {
            let means: Option<Vec<Means>> = runs.iter().map(|run| means(run, sign, shown)).collect();
            let means = means?;
            let of = |value: &dyn Fn(&Means) -> f64| range(means.iter().map(value).collect());
            let percent = |mean: &Means| 100.0 * (mean[1] - mean[0]) / mean[0];
            let all_finite = means.iter().all(|mean| percent(mean).is_finite());
            Some(SignRange {
                sign,
                change: of(&|mean| mean[2])?,
                with: of(&|mean| mean[1])?,
                percent: if all_finite { of(&percent) } else { None },
            })
        };
        Ok(Some(Self { sets: sets.len(), signs: Sign::ALL.into_iter().filter_map(of_sign).collect() }))
    }

    /// The ranges of these signs, a line each.
    pub fn say(&self, signs: &[Sign], words: &Words) -> String {
        let mut text = wrapped(&words.say("tell-ranges", &[("n", self.sets.into())]), "");
        for sign in signs {
            let Some(found) = self.signs.iter().find(|found| found.sign == *sign) else { continue };
            let name = words.say(&Words::key_id("sign", sign.key()), &[]);
            let line = [("name", name.into()), ("range", found.say(words).into())];
            text.push_str(&wrapped(&words.say("tell-range-line", &line), "  "));
        }
        text
    }

    /// As JSON, in the units of the signs; dates in days, negative is sooner.
    pub fn node(&self) -> Node {
        let ends = |(low, high): (f64, f64)| Node::table([("low", low.into()), ("high", high.into())]);
        let one = |found: &SignRange| {
            let node = Node::table([
                ("change", ends(found.change)),
                ("with_changes", ends(found.with)),
                ("change_percent", found.percent.map(ends).into()),
            ]);
            (found.sign.key(), node)
        };
        Node::table([("sets", self.sets.into()), ("signs", Node::table(self.signs.iter().map(one)))])
    }
}

impl SignRange {
    fn say(&self, words: &Words) -> String {
        let (low, high) = self.change;
        if low <= 0.0 && 0.0 <= high {
            return words.say("change-unclear", &[]);
        }
        let [low, high] = [low, high].map(libm::round);
        match (self.sign.kind(), self.percent) {
            (SignKind::Date, _) => words.days_range(low as i32, high as i32),
            (SignKind::Days, _) => {
                let (least, most) = (low.abs().min(high.abs()), low.abs().max(high.abs()));
                let id = if high <= 0.0 { "tell-range-days-fewer" } else { "tell-range-days-more" };
                words.say(id, &[("a", Value::Number(least, 0)), ("b", Value::Number(most, 0))])
            }
            (SignKind::Share, _) | (_, None) => {
                let end = |value: f64| match self.sign.kind() {
                    SignKind::Share => words.percent(100.0 * value, 0).into(),
                    _ => words.significant(value, 3).into(),
                };
                words.say("tell-range-ends", &[("low", end(self.with.0)), ("high", end(self.with.1))])
            }
            (_, Some((low, high))) => words.percent_range(low, high),
        }
    }
}

/// `None` where no year shown has the sign in both runs.
fn means([was, with]: &[Vec<YearReport>; 2], sign: Sign, shown: &[usize]) -> Option<Means> {
    let of = |run: &[YearReport], year: usize| sign.of(&run.get(year)?.signs);
    let mean = |values: &mut dyn Iterator<Item = f64>| spread(values).map(|spread| spread.mean);
    Some([
        mean(&mut shown.iter().filter_map(|year| of(was, *year)))?,
        mean(&mut shown.iter().filter_map(|year| of(with, *year)))?,
        mean(&mut shown.iter().filter_map(|year| Some(of(with, *year)? - of(was, *year)?)))?,
    ])
}
