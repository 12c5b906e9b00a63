//! Which language to speak: reading a tag such as `es-CL` and settling on one that there are words for.

use unic_langid::LanguageIdentifier;

use super::say::Words;

/// The tags that ship with the program, the default of each language first.
pub const KNOWN_TAGS: [&str; 7] = ["en-US", "en-GB", "es-US", "es-MX", "es-CL", "es-AR", "es-ES"];

/// Regions that say *embalse* for the lake; they share the whole sentences of one folder.
const EMBALSE_REGIONS: [&str; 3] = ["CL", "AR", "ES"];
/// The folder of those sentences.
const EMBALSE_FOLDER: &str = "es-embalse";

/// The language and region that were settled on.
#[derive(Clone, Debug, PartialEq, Eq)]
pub(super) struct Choice {
    /// The tag whose words are used, such as `es-US`.
    pub tag: String,
    /// The region that decides on units: the one asked for even where its words are missing.
    pub region: Option<String>,
    /// Folders to read, the general one first; later ones replace single messages.
    pub folders: Vec<String>,
    /// What could not be met, if anything.
    pub fallback: Option<Fallback>,
}

/// What was asked for and not available, for the caller to say as a warning.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Fallback {
    /// The tag as it was asked for.
    pub asked: String,
    /// The tag that is used in its place.
    pub used: String,
    /// Why.
    pub kind: FallbackKind,
}

/// Why another tag is used than the one asked for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum FallbackKind {
    /// The language is there, but not for that region.
    UnknownRegion,
    /// There are no words in that language.
    UnknownLanguage,
    /// The text is not a language tag.
    NotATag,
}

impl Fallback {
    /// The warning in words.
    pub fn say(&self, words: &Words) -> String {
        let id = match self.kind {
            FallbackKind::UnknownRegion => "language-region-unknown",
            FallbackKind::UnknownLanguage => "language-unknown",
            FallbackKind::NotATag => "language-not-a-tag",
        };
        words.say(id, &[("asked", self.asked.as_str().into()), ("used", self.used.as_str().into())])
    }
}

/// Settles on a language.
///
/// `asked` is `en`, `es`, or a full tag (`es-CL`, also the `es_CL.UTF-8` of a system setting). A bare language takes
/// `place_region` where there are words for it, else its default region. `folders` are the folders that exist.
pub(super) fn choose(asked: &str, place_region: Option<&str>, folders: &[&str]) -> Choice {
    let bare = asked.split(['.', '@']).next().unwrap_or_default();
    let Ok(tag) = bare.parse::<LanguageIdentifier>() else {
        return fall_back_to_english(asked, FallbackKind::NotATag, folders);
    };
    let language = tag.language.as_str();
    if language != "en" && !folders.contains(&language) {
        return fall_back_to_english(asked, FallbackKind::UnknownLanguage, folders);
    }
    match tag.region {
        Some(region) => in_region(asked, language, region.as_str(), folders),
        None => {
            let from_place = place_region.map(str::to_ascii_uppercase);
            let region = from_place.or_else(|| default_region(language).map(str::to_owned));
            match region {
                // The region of the place was not asked for by this person, so its lack is no news to them.
                Some(region) => Choice { fallback: None, ..in_region(asked, language, &region, folders) },
                None => Choice {
                    tag: language.to_owned(),
                    region: None,
                    folders: vec![language.to_owned()],
                    fallback: None,
                },
            }
        }
    }
}

fn in_region(asked: &str, language: &str, region: &str, folders: &[&str]) -> Choice {
    let full = format!("{language}-{region}");
    let known = KNOWN_TAGS.contains(&full.as_str()) || folders.contains(&full.as_str());
    let region_chosen = Some(region.to_owned());
    if known {
        return Choice { folders: chain(language, region, folders), tag: full, region: region_chosen, fallback: None };
    }
    let default = default_region(language);
    let used = default.map_or_else(|| language.to_owned(), |region| format!("{language}-{region}"));
    let fallback = Fallback { asked: asked.to_owned(), used: used.clone(), kind: FallbackKind::UnknownRegion };
    Choice {
        folders: chain(language, default.unwrap_or_default(), folders),
        tag: used,
        region: region_chosen,
        fallback: Some(fallback),
    }
}

fn fall_back_to_english(asked: &str, kind: FallbackKind, folders: &[&str]) -> Choice {
    let fallback = Fallback { asked: asked.to_owned(), used: "en-US".to_owned(), kind };
    Choice { fallback: Some(fallback), ..in_region("en-US", "en", "US", folders) }
}

fn default_region(language: &str) -> Option<&'static str> {
    match language {
        "en" | "es" => Some("US"),
        _ => None,
    }
}

fn chain(language: &str, region: &str, folders: &[&str]) -> Vec<String> {
    let mut chain = vec![language.to_owned()];
    if language == "es" && EMBALSE_REGIONS.contains(&region) {
        chain.push(EMBALSE_FOLDER.to_owned());
    }
    let regional = format!("{language}-{region}");
    if folders.contains(&regional.as_str()) {
        chain.push(regional);
    }
    chain
}

#[cfg(test)]
mod tests {
    use super::*;

    const FOLDERS: [&str; 5] = ["en", "es", "es-embalse", "es-CL", "fr"];

    fn tag_of(asked: &str, place_region: Option<&str>) -> (String, Option<FallbackKind>) {
        let choice = choose(asked, place_region, &FOLDERS);
        (choice.tag, choice.fallback.map(|fallback| fallback.kind))
    }

    #[test]
    fn full_tags_are_taken_as_they_are() {
        for tag in KNOWN_TAGS {
            assert_eq!(tag_of(tag, None), (tag.to_owned(), None));
        }
        assert_eq!(tag_of("es_cl.UTF-8", None), ("es-CL".to_owned(), None));
    }

    #[test]
    fn a_bare_language_takes_the_region_of_the_place() {
        assert_eq!(tag_of("es", None), ("es-US".to_owned(), None));
        assert_eq!(tag_of("es", Some("CL")), ("es-CL".to_owned(), None));
        assert_eq!(tag_of("en", Some("GB")), ("en-GB".to_owned(), None));
        assert_eq!(tag_of("en", Some("CL")), ("en-US".to_owned(), None));
        assert_eq!(tag_of("fr", None), ("fr".to_owned(), None));
    }

    #[test]
    fn what_is_missing_is_told() {
        assert_eq!(tag_of("es-PE", None), ("es-US".to_owned(), Some(FallbackKind::UnknownRegion)));
        assert_eq!(tag_of("fr-CA", None), ("fr".to_owned(), Some(FallbackKind::UnknownRegion)));
        assert_eq!(tag_of("de", None), ("en-US".to_owned(), Some(FallbackKind::UnknownLanguage)));
        assert_eq!(tag_of("¿qué?", None), ("en-US".to_owned(), Some(FallbackKind::NotATag)));
        assert_eq!(tag_of("", None), ("en-US".to_owned(), Some(FallbackKind::NotATag)));
    }

    #[test]
    fn the_region_decides_on_units_even_without_its_own_words() {
        assert_eq!(choose("es-PE", None, &FOLDERS).region.as_deref(), Some("PE"));
        assert_eq!(choose("en", Some("CL"), &FOLDERS).region.as_deref(), Some("CL"));
    }

    #[test]
    fn regions_with_embalse_share_a_folder() {
        assert_eq!(choose("es-CL", None, &FOLDERS).folders, ["es", "es-embalse", "es-CL"]);
        assert_eq!(choose("es-AR", None, &FOLDERS).folders, ["es", "es-embalse"]);
        assert_eq!(choose("es-MX", None, &FOLDERS).folders, ["es"]);
    }
}
