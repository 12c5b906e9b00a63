//! The names that members of a bundle may have; no other name is ever made into a path.

use super::Fault;

/// Which part of a bundle a member belongs to.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Part {
    /// The folder of a place.
    Place,
    /// A lesson.
    Lesson,
    /// Words.
    Locale,
    /// The board file.
    Board,
}

/// A name that stays inside the folder that it is put into, on every system.
#[derive(Clone, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub struct MemberName {
    text: String,
}

/// Longest name, bytes.
const MOST_NAME_BYTES: usize = 200;
/// Folders below `place/` and the name itself.
const MOST_STEPS: usize = 4;
/// Names that are devices on some systems, whatever follows their first full stop.
const DEVICES: [&str; 6] = ["con", "prn", "aux", "nul", "conin$", "conout$"];
const NUMBERED_DEVICES: [&str; 2] = ["com", "lpt"];

impl MemberName {
    /// Checks a name.
    ///
    /// # Errors
    /// [`Fault::Name`] where it is none that a bundle has.
    pub fn new(text: &str) -> Result<Self, Fault> {
        let fault = || Fault::Name(text.to_owned());
        let steps: Vec<&str> = text.split('/').collect();
        if text.len() > MOST_NAME_BYTES || steps.len() > MOST_STEPS || !steps.iter().all(|step| is_plain(step)) {
            return Err(fault());
        }
        part_of(&steps).map(|_| Self { text: text.to_owned() }).ok_or_else(fault)
    }

    /// The name, with `/` between folders.
    pub fn as_str(&self) -> &str {
        &self.text
    }

    /// Which part it belongs to.
    pub fn part(&self) -> Part {
        let steps: Vec<&str> = self.text.split('/').collect();
        part_of(&steps).unwrap_or(Part::Place)
    }

    /// The same for every name that some system takes for this one.
    pub(super) fn folded(&self) -> String {
        self.text.to_lowercase()
    }
}

fn part_of(steps: &[&str]) -> Option<Part> {
    match steps {
        ["board.toml"] => Some(Part::Board),
        ["place", _, ..] => Some(Part::Place),
        ["lessons", file] => file.ends_with(".toml").then_some(Part::Lesson),
        ["locales", _, file] => file.ends_with(".ftl").then_some(Part::Locale),
        _ => None,
    }
}

/// Whether one step of a name is letters, digits and a few signs, and means the same everywhere.
fn is_plain(step: &str) -> bool {
    let allowed = |c: char| c.is_alphanumeric() || "-_. ".contains(c);
    let stem = step.split('.').next().unwrap_or_default().trim_end().to_lowercase();
    let is_numbered = |device: &&str| {
        let rest = stem.strip_prefix(*device);
        rest.is_some_and(|rest| rest.chars().count() == 1 && rest.chars().all(char::is_numeric))
    };
    let is_device = DEVICES.contains(&stem.as_str()) || NUMBERED_DEVICES.iter().any(is_numbered);
    !step.is_empty()
        && step.chars().all(allowed)
        && !step.starts_with(['.', ' ', '-'])
        && !step.ends_with(['.', ' '])
        && !is_device
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_belongs_into_a_bundle_has_a_name() {
        for (name, part) in [
            ("board.toml", Part::Board),
            ("place/place.toml", Part::Place),
            ("place/records/año 1.csv", Part::Place),
            ("lessons/snow.toml", Part::Lesson),
            ("locales/es-CL/terms.ftl", Part::Locale),
        ] {
            assert_eq!(MemberName::new(name).unwrap().part(), part, "{name}");
        }
    }

    #[test]
    fn names_that_lead_elsewhere_are_none() {
        let long = format!("place/{}", "a".repeat(MOST_NAME_BYTES));
        for name in [
            "",
            "/",
            "place",
            "place/",
            "/place/a.csv",
            "place//a.csv",
            "place/../a.csv",
            "../place/a.csv",
            "place/./a.csv",
            "place/.hidden",
            "place/a.csv.",
            "place/a.csv ",
            "place\\..\\a.csv",
            "C:/place/a.csv",
            "place/a:stream",
            "place/a\0.csv",
            "place/a\n.csv",
            "place/-rf",
            "place/NUL.csv",
            "place/com1",
            "place/lpt9.txt",
            "place/1/2/3/4.csv",
            "lessons/deep/a.toml",
            "lessons/a.sh",
            "locales/a.ftl",
            "SUMS",
            "etc/passwd",
            &long,
        ] {
            assert_eq!(MemberName::new(name), Err(Fault::Name(name.to_owned())), "{name:?}");
        }
    }
}
