//! How far apart the guesses of the groups were, and how far from the result.

/// The guesses of a step, taken together, in the reading's unit.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct GuessSpread {
    /// Lowest guess.
    pub least: f64,
    /// Middle guess: half of the groups said this or less. Of an even number, the mean of the two in the middle.
    pub middle: f64,
    /// Highest guess.
    pub most: f64,
    /// How many there are.
    pub guesses: usize,
    /// How far the middle guess lay above the result; `None` without a result.
    pub off_by: Option<f64>,
    /// Whether the result lies between the lowest and the highest guess.
    pub holds_result: bool,
}

/// Takes guesses together; `None` without any.
pub fn guess_spread(guesses: impl IntoIterator<Item = f64>, result: Option<f64>) -> Option<GuessSpread> {
    let mut sorted: Vec<f64> = guesses.into_iter().collect();
    sorted.sort_by(f64::total_cmp);
    let (&least, &most) = (sorted.first()?, sorted.last()?);
    let half = sorted.len() / 2;
    let middle = if sorted.len() % 2 == 1 { sorted[half] } else { 0.5 * (sorted[half - 1] + sorted[half]) };
    Some(GuessSpread {
        least,
        middle,
        most,
        guesses: sorted.len(),
        off_by: result.map(|result| middle - result),
        holds_result: result.is_some_and(|result| least <= result && result <= most),
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn guesses_are_taken_together() {
        let spread = guess_spread([10.0, -5.0, 0.0], Some(-20.0)).unwrap();
        assert_eq!((spread.least, spread.middle, spread.most, spread.guesses), (-5.0, 0.0, 10.0, 3));
        assert_eq!((spread.off_by, spread.holds_result), (Some(20.0), false));
        let even = guess_spread([4.0, 1.0], Some(2.0)).unwrap();
        assert!(even.middle == 2.5 && even.holds_result);
        assert_eq!(guess_spread([3.0], None).unwrap().off_by, None);
        assert_eq!(guess_spread([], Some(1.0)), None);
    }
}
