//! Text that a place carries in its own languages.

use super::problem::Problem;
use super::section::Section;
use super::tree::{Kind, Value};

/// Text by language tag: always in `en` and `es`, and in any region's own words besides.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Text {
    by_tag: Vec<(String, String)>,
}

impl Text {
    /// The same words in every language; for places that are put together in code.
    pub fn same(words: &str) -> Self {
        Self { by_tag: vec![("en".into(), words.into()), ("es".into(), words.into())] }
    }

    /// The words for a full tag such as `es-CL`: the region's own, else the language's, else English.
    pub fn get(&self, tag: &str) -> &str {
        let language = tag.split('-').next().unwrap_or(tag);
        [tag, language, "en"]
            .iter()
            .find_map(|wanted| self.by_tag.iter().find(|(tag, _)| tag.eq_ignore_ascii_case(wanted)))
            .map_or("", |(_, words)| words)
    }

    /// Every tag with its words, in the order of the file.
    pub fn all(&self) -> impl Iterator<Item = (&str, &str)> {
        self.by_tag.iter().map(|(tag, words)| (tag.as_str(), words.as_str()))
    }
}

/// Reads `key = { en = "...", es = "..." }`, which the file must give in both languages.
pub(crate) fn need_names(section: &Section<'_>, key: &'static str) -> Text {
    match section.get(key) {
        Some(value) => names(section, key, value),
        None => {
            section.tell_missing(key);
            Text::default()
        }
    }
}

/// Reads text in both languages that the file may leave out.
pub(super) fn optional_names(section: &Section<'_>, key: &'static str) -> Option<Text> {
    section.get(key).map(|value| names(section, key, value))
}

fn names(section: &Section<'_>, key: &'static str, value: &Value) -> Text {
    let tell = |problem: Problem| section.sheet.tell(problem.with("key", key));
    let Kind::Table(table) = &value.kind else {
        tell(Problem::error(section.value_at(value), "problem-name-one-language"));
        return Text::default();
    };
    let mut text = Text::default();
    for entry in &table.entries {
        if !is_language_tag(&entry.key) {
            tell(Problem::error(section.key_at(entry), "problem-language-tag").with("value", entry.key.clone()));
        } else if let Some((words, _)) = section.as_text(&entry.key, &entry.value) {
            text.by_tag.push((entry.key.clone(), words.trim().to_owned()));
        }
    }
    for language in ["en", "es"] {
        if table.get(language).is_none() {
            tell(Problem::error(section.value_at(value), "problem-name-language").with("language", language));
        }
    }
    text
}

/// Whether a tag is a language, alone or with a region: `es`, `es-CL`.
pub(super) fn is_language_tag(tag: &str) -> bool {
    let mut parts = tag.split('-');
    let language =
        parts.next().is_some_and(|part| matches!(part.len(), 2 | 3) && part.bytes().all(|b| b.is_ascii_lowercase()));
    let region = parts.next().is_none_or(is_region);
    language && region && parts.next().is_none()
}

/// Whether a tag names a region as well: `es-CL`.
pub(super) fn is_region_tag(tag: &str) -> bool {
    is_language_tag(tag) && tag.contains('-')
}

fn is_region(part: &str) -> bool {
    (part.len() == 2 && part.bytes().all(|byte| byte.is_ascii_uppercase()))
        || (part.len() == 3 && part.bytes().all(|byte| byte.is_ascii_digit()))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_region_has_its_own_words_or_those_of_its_language() {
        let text = Text {
            by_tag: [("en", "reservoir"), ("es", "presa"), ("es-CL", "embalse")]
                .map(|(tag, words)| (tag.to_owned(), words.to_owned()))
                .to_vec(),
        };
        assert_eq!(text.get("es-CL"), "embalse");
        assert_eq!(text.get("es-MX"), "presa");
        assert_eq!(text.get("qu"), "reservoir");
    }

    #[test]
    fn language_tags() {
        assert!(is_language_tag("es") && is_language_tag("es-419") && is_region_tag("en-US"));
        assert!(!is_language_tag("español") && !is_language_tag("es-cl") && !is_region_tag("es"));
    }
}
