//! Parity of languages, the table of embedded files, and locales read from a directory.

use std::collections::{BTreeMap, BTreeSet};
use std::fs;
use std::path::Path;

use deshielo::words::{
    EMBEDDED, FallbackKind, KNOWN_TAGS, LocaleProblemKind, Locales, Shape, Value, Words, nearest, shapes,
};

/// The keys of the contract.
const DIALS: [&str; 10] = [
    "warming",
    "winter_precipitation",
    "summer_precipitation",
    "diversion",
    "canal_lining",
    "crop_mix",
    "river_minimum",
    "reservoir_size",
    "starting_storage",
    "town_growth",
];
const SIGNS: [&str; 23] = [
    "precipitation_mm",
    "snow_share",
    "survey_swe_mm",
    "peak_swe_mm",
    "peak_swe_date",
    "melt_out_date",
    "half_volume_date",
    "centre_of_volume_day",
    "spring_volume_hm3",
    "peak_flow_m3s",
    "peak_flow_date",
    "low_flow_7day_m3s",
    "fill_date",
    "carryover_hm3",
    "spill_hm3",
    "flood_release_hm3",
    "crop_evaporation_hm3",
    "yield_share",
    "river_minimum_days_met",
    "supply_ratio",
    "reliability",
    "resilience",
    "vulnerability_hm3",
];
const CANAL_SIGNS: [&str; 11] = [
    "name",
    "right_year",
    "supply_ratio",
    "days_full",
    "days_cut",
    "days_short",
    "first_short_date",
    "last_full_date",
    "last_water_date",
    "stored_draw_hm3",
    "account_end_hm3",
];

fn folder() -> &'static Path {
    Path::new(concat!(env!("CARGO_MANIFEST_DIR"), "/locales"))
}

/// Every message of a folder with its shape.
pub fn messages(folder: &str) -> BTreeMap<String, Shape> {
    let files = EMBEDDED.iter().filter(|file| file.folder == folder);
    files.flat_map(|file| shapes(file.text).0).collect()
}

#[test]
fn every_file_in_the_folder_is_embedded() {
    let mut on_disk = BTreeSet::new();
    for entry in fs::read_dir(folder()).unwrap() {
        let entry = entry.unwrap();
        if entry.file_type().unwrap().is_dir() {
            for file in fs::read_dir(entry.path()).unwrap() {
                let name = file.unwrap().file_name().into_string().unwrap();
                on_disk.insert((entry.file_name().into_string().unwrap(), name));
            }
        }
    }
    let embedded: BTreeSet<_> = EMBEDDED.iter().map(|file| (file.folder.to_owned(), file.name.to_owned())).collect();
    assert_eq!(embedded, on_disk);
    assert_eq!(embedded.len(), EMBEDDED.len(), "a file is listed twice");
}

#[test]
fn every_line_is_a_message() {
    for file in EMBEDDED {
        let (found, errors) = shapes(file.text);
        assert!(errors.is_empty(), "{}/{}: {errors:?}", file.folder, file.name);
        assert!(!found.is_empty(), "{}/{} is empty", file.folder, file.name);
    }
}

#[test]
fn all_languages_have_the_same_messages_attributes_and_arguments() {
    let locales = Locales::embedded();
    for folder in locales.folders() {
        assert_eq!(locales.check(folder), [], "{folder}");
    }
    assert_eq!(
        messages("en").keys().collect::<Vec<_>>(),
        messages("es").keys().collect::<Vec<_>>(),
        "English has a message that Spanish lacks, or the other way round"
    );
}

/// The source text of each message of a file.
fn message_texts(text: &str) -> BTreeMap<&str, String> {
    let mut texts: BTreeMap<&str, String> = BTreeMap::new();
    let mut current = "";
    for line in text.lines().filter(|line| !line.starts_with('#') && !line.is_empty()) {
        if let Some((id, _)) = line.split_once(" =").filter(|_| !line.starts_with([' ', '}'])) {
            current = id;
        }
        let text = texts.entry(current).or_default();
        text.push_str(line);
        text.push('\n');
    }
    texts
}

#[test]
fn a_region_says_nothing_that_its_language_says_already() {
    for file in EMBEDDED.iter().filter(|file| file.folder.contains('-')) {
        let language = &file.folder[..2];
        let whole = EMBEDDED.iter().find(|other| other.folder == language && other.name == file.name);
        let whole = whole.unwrap_or_else(|| panic!("{}/{} overrides nothing", file.folder, file.name));
        let general = message_texts(whole.text);
        for (id, text) in message_texts(file.text) {
            assert_ne!(general.get(id), Some(&text), "{}/{} repeats {id}", file.folder, file.name);
        }
    }
}

#[test]
fn every_message_can_be_said_in_every_tag() {
    let numbers = [0.0, 1.0, 2.0, 1.5, -3.0, 1_234_567.0, f64::NAN];
    for tag in KNOWN_TAGS {
        let (words, fallback) = Words::new(tag);
        assert_eq!(fallback, None, "{tag}");
        for (id, shape) in messages("en") {
            for (part, arguments) in shape {
                let id = if part.is_empty() { id.clone() } else { format!("{id}.{part}") };
                for number in numbers {
                    let numeric: Vec<_> =
                        arguments.iter().map(|name| (name.as_str(), Value::Number(number, 1))).collect();
                    let text: Vec<_> = arguments.iter().map(|name| (name.as_str(), Value::from("x"))).collect();
                    for args in [numeric, text] {
                        let said = words.say(&id, &args);
                        assert!(!said.is_empty() && !said.contains(['{', '}']), "{tag} {id}: {said:?}");
                        assert!(!said.contains(['\u{2068}', '\u{2069}']), "{tag} {id}: isolation marks");
                    }
                    if arguments.is_empty() {
                        break;
                    }
                }
            }
        }
        assert_eq!(words.take_errors(), [], "{tag}");
    }
}

#[test]
fn every_key_of_the_contract_has_its_words() {
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        let has = |topic: &str, key: &str, parts: &[&str]| {
            let id = Words::key_id(topic, key);
            assert!(words.has(&id), "{tag} lacks {id}");
            for part in parts {
                assert!(words.has(&format!("{id}.{part}")), "{tag} lacks {id}.{part}");
            }
        };
        DIALS.iter().for_each(|key| has("dial", key, &["short", "unit", "stands"]));
        SIGNS.iter().for_each(|key| has("sign", key, &["short", "plain"]));
        CANAL_SIGNS.iter().for_each(|key| has("sign-canal", key, &["short", "plain"]));
    }
}

#[test]
fn the_glossary_and_its_sources_go_together() {
    let table = fs::read_to_string(folder().join("glossary.tsv")).unwrap();
    let mut sourced = BTreeSet::new();
    for line in table.lines().skip(1) {
        let cells: Vec<_> = line.split('\t').collect();
        assert_eq!(cells.len(), 4, "{line}");
        assert!(!cells[3].trim().is_empty(), "{} names no source", cells[0]);
        assert!(sourced.insert(cells[0].to_owned()), "{} is there twice", cells[0]);
    }
    let file = EMBEDDED.iter().find(|file| file.folder == "en" && file.name == "terms.ftl").unwrap();
    let terms: BTreeSet<_> = shapes(file.text).0.into_iter().map(|(id, _)| id).collect();
    assert_eq!(sourced, terms);
    assert!(terms.len() >= 151);
}

/// The Rust sources under a folder.
fn sources(folder: &Path) -> Vec<String> {
    let mut texts = Vec::new();
    for entry in fs::read_dir(folder).unwrap() {
        let path = entry.unwrap().path();
        if path.is_dir() {
            texts.extend(sources(&path));
        } else if path.extension().is_some_and(|extension| extension == "rs") {
            texts.push(fs::read_to_string(path).unwrap());
        }
    }
    texts
}

#[test]
fn every_message_that_the_program_names_is_there() {
    let (words, _) = Words::new("en");
    let mut asked = BTreeSet::new();
    for source in sources(Path::new(concat!(env!("CARGO_MANIFEST_DIR"), "/src"))) {
        for call in source.split(".say(").skip(1) {
            if let Some(id) = call.trim_start().strip_prefix('"').and_then(|rest| rest.split('"').next()) {
                asked.insert(id.to_owned());
            }
        }
    }
    assert!(asked.len() > 20, "the calls were not found");
    let missing: Vec<_> = asked.iter().filter(|id| !words.has(id)).collect();
    assert_eq!(missing, [""; 0]);
}

#[test]
fn what_cannot_be_said_is_noted_and_never_shown_as_a_key() {
    let (words, _) = Words::new("es");
    assert_eq!(words.say("no-such-message", &[]), "");
    assert_eq!(words.say("days-sooner", &[]), "", "an argument is missing");
    let errors = words.take_errors();
    assert_eq!(errors.iter().map(|error| error.tag.as_str()).collect::<Vec<_>>(), ["es-US", "en-US", "es-US", "en-US"]);
    for _ in 0..1000 {
        words.say("no-such-message", &[]);
    }
    assert!(words.take_errors().len() <= 64, "the list of errors grows without end");
}

#[test]
fn a_language_that_is_not_there_is_told_in_words() {
    for (asked, kind) in [
        ("fr-CA", FallbackKind::UnknownLanguage),
        ("es-PE", FallbackKind::UnknownRegion),
        ("!!", FallbackKind::NotATag),
    ] {
        let (words, fallback) = Words::new(asked);
        let fallback = fallback.unwrap();
        assert_eq!(fallback.kind, kind);
        assert!(fallback.say(&words).contains(asked), "{}", fallback.say(&words));
        assert_eq!(words.take_errors(), []);
    }
}

#[test]
fn words_are_shared_between_threads() {
    fn shared<T: Send + Sync>(value: T) -> T {
        value
    }
    let words = shared(Words::new("es").0);
    let said: Vec<String> = std::thread::scope(|scope| {
        let threads: Vec<_> = (0..4).map(|_| scope.spawn(|| words.days_change(-18))).collect();
        threads.into_iter().map(|thread| thread.join().unwrap()).collect()
    });
    assert_eq!(said, ["18 días antes"; 4]);
}

#[test]
fn a_third_language_comes_from_a_directory_with_its_faults_as_data() {
    let directory = tempfile::tempdir().unwrap();
    let write = |name: &str, text: &str| {
        let path = directory.path().join(name);
        fs::create_dir_all(path.parent().unwrap()).unwrap();
        fs::write(path, text).unwrap();
    };
    write(
        "fr/patterns.ftl",
        "days-later = { $n } jours plus tard\n\ndays-sooner = { $m } jours plus tôt\n\nbroken line\n",
    );
    write("fr/more.ftl", "days-later = { $n } jours après\nnobody-asks = rien\n");
    write("es-PE/terms.ftl", "term-potato = papa\n    .short = Papa\n    .plain = Cultivo de raíz.\n");
    write("not a tag/terms.ftl", "term-potato = x\n");
    let mut locales = Locales::embedded();
    let problems = locales.add_directory(directory.path());
    let kinds: Vec<_> = problems.iter().map(|problem| (problem.folder.as_str(), &problem.kind)).collect();

    assert!(kinds.contains(&("not a tag", &LocaleProblemKind::NotATag)));
    assert!(kinds.contains(&("fr", &LocaleProblemKind::Syntax { line: 5 })));
    assert!(kinds.contains(&("fr", &LocaleProblemKind::Twice { id: "days-later".into() })));
    assert!(kinds.contains(&("fr", &LocaleProblemKind::Unknown { id: "nobody-asks".into() })));
    assert!(kinds.contains(&("fr", &LocaleProblemKind::Missing { id: "days-same".into() })));
    let swapped =
        LocaleProblemKind::Arguments { id: "days-sooner".into(), expected: vec!["n".into()], found: vec!["m".into()] };
    assert!(kinds.contains(&("fr", &swapped)));
    assert!(!kinds.iter().any(|(folder, _)| *folder == "es-PE"), "a whole override is no fault");

    let (english, _) = locales.words("en", None);
    assert!(problems.iter().all(|problem| problem.say(&english).contains(problem.folder.as_str())));
    assert_eq!(english.take_errors(), []);

    let (french, fallback) = locales.words("fr", None);
    assert_eq!(fallback, None);
    assert_eq!(french.say("days-later", &[("n", 2.into())]), "2 jours plus tard");
    assert_eq!(french.say("change-none", &[]), "No change.", "a missing message is said in English");
    let (peruvian, fallback) = locales.words("es-PE", None);
    assert_eq!(fallback, None);
    assert_eq!(peruvian.say("term-potato.plain", &[]), "Cultivo de raíz.");
    assert_eq!(peruvian.say("term-reservoir", &[]), "presa");
}

#[test]
fn a_directory_that_is_not_there_is_one_fault() {
    let mut locales = Locales::embedded();
    let problems = locales.add_directory(Path::new("/no/such/folder"));
    assert!(matches!(problems.as_slice(), [problem] if matches!(problem.kind, LocaleProblemKind::Unreadable(_))));
}

#[test]
fn hostile_files_are_refused_and_the_rest_still_works() {
    let directory = tempfile::tempdir().unwrap();
    fs::create_dir(directory.path().join("fr")).unwrap();
    fs::write(directory.path().join("fr/deep.ftl"), format!("a = {}", "{ ".repeat(100_000))).unwrap();
    fs::write(directory.path().join("fr/large.ftl"), "#".repeat(2 << 20)).unwrap();
    fs::write(directory.path().join("fr/bytes.ftl"), [0xFF, 0xFE, 0x00]).unwrap();
    fs::write(directory.path().join("fr/cycle.ftl"), "days-same = { change-none }\nchange-none = { days-same }\n")
        .unwrap();
    let mut locales = Locales::embedded();
    let problems = locales.add_directory(directory.path());
    let of =
        |file: &str| problems.iter().find(|problem| problem.file.as_deref() == Some(file)).map(|found| &found.kind);
    assert!(matches!(of("deep.ftl"), Some(LocaleProblemKind::Syntax { line: 1 })));
    assert!(matches!(of("large.ftl"), Some(LocaleProblemKind::TooLarge)));
    assert!(matches!(of("bytes.ftl"), Some(LocaleProblemKind::Unreadable(_))));
    let (words, _) = locales.words("fr", None);
    assert_eq!(words.say("days-same", &[]), "Same day as before.");
}

#[test]
fn a_mistyped_dial_finds_its_neighbor() {
    assert_eq!(nearest("resevoir_size", DIALS), Some("reservoir_size"));
    assert_eq!(nearest("canal-linning", DIALS), Some("canal_lining"));
    assert_eq!(nearest("xyzzy", DIALS), None);
}
