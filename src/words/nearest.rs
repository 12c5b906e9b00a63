//! The nearest known name to one that was mistyped.

/// Longer input is not a slip of the finger, and comparing it would cost time for nothing.
const LONGEST_COMPARED: usize = 64;

/// Letters that a part of a name must have to mean the whole.
const SHORTEST_PART: usize = 3;

/// The known name that is the fewest slips (insert, drop, change, swap) away from `typed`, or `None` where nothing is
/// near: more than a third of the letters wrong. A name of which `typed` is a part (`slow` of `slow_days`) is near, the
/// shortest one most; so is one of which it is too much (`quick_days_long`). Ties go to the name that comes first.
/// Capital letters and hyphens in place of underscores are no slips.
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
        let is_part = |part: &str, whole: &str| part.chars().count() >= SHORTEST_PART && whole.contains(part);
        let near = slips <= allowed || is_part(&typed, name) || is_part(name, &typed);
        if near && best.is_none_or(|(fewest, _)| slips < fewest) {
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
    fn a_part_means_the_whole() {
        assert_eq!(nearest("slow", ["quick_days", "slow_days", "slow"]), Some("slow"));
        assert_eq!(nearest("slow", ["quick_days", "slow_days_long", "slow_days"]), Some("slow_days"));
        assert_eq!(nearest("slow_days_of_water", ["quick_days", "slow_days"]), Some("slow_days"));
        assert_eq!(nearest("ab", ["abacus"]), None);
    }

    #[test]
    fn far_names_get_no_advice() {
        assert_eq!(nearest("elevation", DIALS), None);
        assert_eq!(nearest("", DIALS), None);
        assert_eq!(nearest(&"w".repeat(10_000), DIALS), None);
    }
}
