//! The voice: short forms fit, cautions fit the screen, nobody is blamed, and Spanish says usted.

use deshielo::words::{EMBEDDED, KNOWN_TAGS, Words};

use super::locales::messages;

/// Letters that a short form may take on a screen 320 pixels wide.
const SHORT_FORM: usize = 14;
/// Letters that a caution may take on the screen.
const CAUTION: usize = 90;
/// Letters that one line of a screen may take.
const LINE: usize = 60;

/// The lines of a file that people see, without comments, names and arguments.
fn seen_lines(text: &str) -> impl Iterator<Item = &str> {
    text.lines().filter(|line| !line.starts_with('#')).filter_map(|line| match line.split_once(" = ") {
        Some((_, seen)) => Some(seen),
        None => line.strip_prefix("    "),
    })
}

fn words_of(line: &str) -> impl Iterator<Item = String> {
    line.split(|letter: char| !letter.is_alphabetic()).filter(|word| !word.is_empty()).map(str::to_lowercase)
}

fn assert_avoids(language: &str, banned: &[&str]) {
    for file in EMBEDDED.iter().filter(|file| file.folder.starts_with(language)) {
        for line in seen_lines(file.text) {
            for word in words_of(line) {
                assert!(!banned.contains(&word.as_str()), "{}/{} says “{word}”: {line}", file.folder, file.name);
            }
        }
    }
}

#[test]
fn short_forms_fit() {
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        for id in messages("en").iter().filter(|(_, shape)| shape.contains_key("short")).map(|(id, _)| id) {
            let short = words.say(&format!("{id}.short"), &[]);
            assert!(short.chars().count() <= SHORT_FORM, "{tag} {id}: {short}");
        }
    }
}

#[test]
fn cautions_and_set_phrases_fit_the_screen() {
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        let cautions: Vec<_> = messages("en").into_keys().filter(|id| id.starts_with("caution-")).collect();
        assert_eq!(cautions.len(), 11);
        for id in cautions {
            let caution = words.say(&id, &[]);
            assert!(caution.chars().count() <= CAUTION, "{tag} {id}: {caution}");
        }
        for id in ["days-same", "change-none", "change-unclear", "model-calm", "model-outside", "shortage-shared"] {
            assert!(words.say(id, &[]).chars().count() <= LINE, "{tag} {id}");
        }
    }
}

#[test]
fn sentences_in_plain_words_stay_short() {
    let mut too_long = Vec::new();
    for (folder, most) in [("en", 18), ("es", 20)] {
        let (words, _) = Words::new(folder);
        for (id, shape) in messages(folder) {
            for part in shape.keys().filter(|part| ["plain", "stands"].contains(&part.as_str())) {
                let text = words.say(&format!("{id}.{part}"), &[]);
                let sentences = text.split(['.', ':', ';', '?']);
                too_long.extend(
                    sentences
                        .filter(|text| text.split_whitespace().count() > most)
                        .map(|text| format!("{folder} {id}: {text}")),
                );
            }
        }
    }
    assert_eq!(too_long, [""; 0]);
}

#[test]
fn spanish_says_usted() {
    assert_avoids(
        "es",
        &[
            "tú", "tu", "tus", "ti", "contigo", "vos", "vosotros", "vuestro", "eres", "tienes", "puedes", "quieres",
            "gira", "elige", "mira", "compara", "haz", "pon", "escribe", "escoge", "usa tu", "usuario", "usuarios",
        ],
    );
}

#[test]
fn nobody_is_blamed_when_water_is_short() {
    assert_avoids(
        "en",
        &["steal", "waste", "hog", "greedy", "loser", "victim", "crisis", "users", "folks", "stakeholders"],
    );
    assert_avoids("es", &["robar", "desperdiciar", "acaparar", "víctima", "crisis", "reclamo", "barbecho", "fusión"]);
}

#[test]
fn gasto_is_a_flow_in_mexico_only() {
    for file in EMBEDDED.iter().filter(|file| file.folder.starts_with("es") && file.folder != "es-MX") {
        assert!(!seen_lines(file.text).any(|line| words_of(line).any(|word| word == "gasto")), "{}", file.folder);
    }
}

#[test]
fn the_lake_has_the_name_of_its_region() {
    let fills = |tag| Words::new(tag).0.say("sign-fill-date.plain", &[]);
    assert!(fills("es-US").contains("la presa está llena"));
    assert!(fills("es-MX").contains("la presa está llena"));
    for tag in ["es-CL", "es-AR", "es-ES"] {
        assert!(fills(tag).contains("el embalse está lleno"), "{tag}");
        let (words, _) = Words::new(tag);
        for id in messages("es").keys() {
            for part in ["", ".short", ".plain", ".stands", ".title", ".print"] {
                let id = format!("{id}{part}");
                if words.has(&id) {
                    let said = words.say(&id, &[]);
                    // In Spain the wall is the presa.
                    let wall = tag == "es-ES"
                        && (id.starts_with("term-dam")
                            || said.contains("a la presa,")
                            || said.contains("en la presa."));
                    let mixed =
                        words_of(&said).any(|word| ["presa", "presas", "cortina", "vertedor"].contains(&word.as_str()));
                    assert!(wall || !mixed, "{tag} {id}: {said}");
                }
            }
        }
    }
}

#[test]
fn regional_words_follow_the_table() {
    let table = [
        ("term-reservoir", ["Presa", "Presa", "Embalse", "Embalse"]),
        ("term-dam", ["Cortina", "Cortina", "Muro", "Presa"]),
        ("term-spillway", ["Vertedor", "Vertedor", "Vertedero", "Aliviadero"]),
        ("term-head-gate", ["Compuerta", "Compuerta", "Bocatoma", "Toma"]),
        ("term-turn", ["Turno", "Tanda", "Turno", "Turno"]),
        ("term-flow", ["Caudal", "Gasto", "Caudal", "Caudal"]),
        ("term-flood", ["Crecida", "Crecida", "Crecida", "Avenida"]),
        ("term-forecast", ["Pronóstico", "Pronóstico", "Pronóstico", "Predicción"]),
        ("term-reliability", ["Confiabilidad", "Confiabilidad", "Seguridad", "Garantía"]),
        ("term-average", ["Promedio", "Promedio", "Promedio", "Media"]),
        ("term-potato", ["Papa", "Papa", "Papa", "Patata"]),
        ("term-dry-beans", ["Frijol", "Frijol", "Poroto", "Judía"]),
        ("term-sugar-beet", ["Betabel", "Betabel", "Remolacha", "Remolacha"]),
        ("term-chile", ["Chile", "Chile", "Ají", "Pimiento"]),
        ("term-vineyard", ["Viñedo", "Viñedo", "Viña", "Viñedo"]),
        ("term-pasture", ["Potrero", "Potrero", "Pradera", "Prado"]),
        ("term-dial", ["Perilla", "Perilla", "Perilla", "Mando"]),
    ];
    for (column, tag) in ["es-US", "es-MX", "es-CL", "es-ES"].into_iter().enumerate() {
        let (words, _) = Words::new(tag);
        for (id, expected) in table {
            assert_eq!(words.say(&format!("{id}.short"), &[]), expected[column], "{tag} {id}");
        }
    }
}
