//! The nearest known name to one that was mistyped.

/// Longer input is not a slip of the finger, and comparing it would cost time for nothing.
const LONGEST_COMPARED: usize = 64;

/// The known name that is the fewest slips (insert, drop, change, swap) away from `typed`, or `None` where nothing is
/// near: more than a third of the letters wrong. Ties go to the name that comes first. Capital letters and hyphens in
/// place of underscores are no slips.
pub fn nearest<'a>(typed: &str, known: impl IntoIterator<Item = &'a str>) -> Option<&'a str> {
    let length = typed.chars().count();
    if length == 0 || length > LONGEST_COMPARED {
        return None;
    }
    let typed = typed.to_lowercase().replace(['-', ' '], "_");
    let allowed = (length / 3).max(1);
    let mut best: Option<(usize, &str)> = None;
    for name in known {
        let slips = strsim::damerau_levenshtein(&typed, name);
        if slips <= allowed && best.is_none_or(|(fewest, _)| slips < fewest) {
            best = Some((slips, name));
        }
    }
    best.map(|(_, name)| name)
}

#[cfg(test)]
mod tests {
    use super::nearest;

    const DIALS: [&str; 4] = ["warming", "winter_precipitation", "summer_precipitation", "diversion"];

    #[test]
    fn slips_are_forgiven() {
        assert_eq!(nearest("warmign", DIALS), Some("warming"));
        assert_eq!(nearest("Winter-Precipitation", DIALS), Some("winter_precipitation"));
        assert_eq!(nearest("divrsion", DIALS), Some("diversion"));
    }

    #[test]
    fn far_names_get_no_advice() {
        assert_eq!(nearest("elevation", DIALS), None);
        assert_eq!(nearest("", DIALS), None);
        assert_eq!(nearest(&"w".repeat(10_000), DIALS), None);
    }
}
