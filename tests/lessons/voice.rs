//! The words of the lessons: short sentences, usted, nobody blamed, and the lake by the name of its region.

use deshielo::lesson::Lesson;
use deshielo::lesson::lessons;
use deshielo::place::Text;

use super::shipped;

/// Most words of a sentence, by language.
const MOST_WORDS: [(&str, usize); 2] = [("en", 18), ("es", 20)];
const REGIONS_WITH_EMBALSE: [&str; 3] = ["es-CL", "es-AR", "es-ES"];

fn texts(lesson: &Lesson) -> Vec<(String, Text)> {
    let mut texts = vec![("name".to_owned(), lesson.name.clone()), ("text".to_owned(), lesson.text.clone())];
    for step in &lesson.steps {
        let of = |part: &str| format!("{} {part}", step.key);
        texts.push((of("prompt"), step.prompt.clone()));
        texts.extend(step.reveal.clone().map(|text| (of("reveal"), text)));
        texts.extend(step.talk.clone().map(|text| (of("talk"), text)));
    }
    texts
}

fn every_text() -> Vec<(String, Text)> {
    let all = lessons().iter().flat_map(|(name, _)| {
        texts(&shipped(name)).into_iter().map(move |(part, text)| (format!("{name} {part}"), text))
    });
    all.collect()
}

fn words_of(text: &str) -> Vec<String> {
    let split = text.split(|letter: char| !letter.is_alphabetic());
    split.filter(|word| !word.is_empty()).map(str::to_lowercase).collect()
}

#[test]
fn sentences_stay_short() {
    let mut long = Vec::new();
    for (part, text) in every_text() {
        for (language, most) in MOST_WORDS {
            let sentences = text.get(language).split(['.', ':', ';', '?', '!', '…']);
            let too_long = sentences.filter(|sentence| sentence.split_whitespace().count() > most);
            long.extend(too_long.map(|sentence| format!("{part} ({language}): {sentence}")));
        }
    }
    assert_eq!(long, [""; 0], "{}", long.join("\n"));
}

#[test]
fn spanish_says_usted_and_nobody_is_blamed() {
    const NOT_IN_SPANISH: [&str; 24] = [
        "tú",
        "tu",
        "tus",
        "ti",
        "vos",
        "vosotros",
        "eres",
        "tienes",
        "puedes",
        "quieres",
        "gira",
        "elige",
        "mira",
        "compara",
        "haz",
        "pon",
        "usuario",
        "usuarios",
        "robar",
        "desperdiciar",
        "acaparar",
        "víctima",
        "crisis",
        "reclamo",
    ];
    const NOT_IN_ENGLISH: [&str; 9] =
        ["steal", "waste", "hog", "greedy", "loser", "victim", "crisis", "users", "stakeholders"];
    for (part, text) in every_text() {
        for (tag, said) in text.all() {
            let banned: &[&str] = if tag.starts_with("es") { &NOT_IN_SPANISH } else { &NOT_IN_ENGLISH };
            for word in words_of(said) {
                assert!(!banned.contains(&word.as_str()), "{part} ({tag}) says “{word}”: {said}");
            }
        }
    }
}

#[test]
fn the_lake_has_the_name_of_its_region() {
    for (part, text) in every_text() {
        let names_lake = words_of(text.get("es")).iter().any(|word| word == "presa");
        for tag in REGIONS_WITH_EMBALSE {
            let said = words_of(text.get(tag));
            assert!(!said.iter().any(|word| word == "presa"), "{part} ({tag})");
            assert_eq!(said.iter().any(|word| word == "embalse"), names_lake, "{part} ({tag})");
            let after = |word: &str| said.windows(2).any(|pair| pair[0] == word && pair[1] == "embalse");
            assert!(!after("la") && !after("una") && !after("esta") && !after("otra"), "{part} ({tag})");
        }
        assert!(!words_of(text.get("en")).contains(&"presa".to_owned()), "{part}");
    }
}

#[test]
fn questions_open_and_close_in_spanish() {
    for (part, text) in every_text() {
        let said = text.get("es");
        assert_eq!(said.matches('¿').count(), said.matches('?').count(), "{part}: {said}");
        assert_ne!(said, text.get("en"), "{part} is translated");
    }
}
