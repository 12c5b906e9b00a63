//! The page of a result: one or two pages, small, the same every time, and nothing over anything else.

use deshielo::handout::{Document, Paper, ResultPage, ResultVoice, SignTable, write_pdf};
use deshielo::picture::views::Scene;
use deshielo::picture::views::scene::{DialSetting, YearKind};
use deshielo::place::demo::{demo_files, piedranieve_files};
use deshielo::place::{Place, Source as Files, read};
use deshielo::session::answer::{Asked, Source};
use deshielo::session::scene::{Moment, PlaceTold, Stage};
use deshielo::session::{Answers, Third, YearChoice, YearList};
use deshielo::water::dials::{Dial, Dials};
use deshielo::words::{System, Words};

use super::command::{Desk, pages_of, said_in};

const MOST_BYTES_A_PAGE: usize = 60_000;
const TURNED: &str = "--set warming=3 --set winter_precipitation=-10";

/// A page put together by hand, as a running session would.
fn laid_out(place: &Place, dials: Dials, tags: &[&str], paper: Paper, third: Third) -> Document {
    let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
    let mut answers = Answers::new(&source).unwrap();
    let years = YearList::of(&answers.rest().run.years).unwrap();
    let year = years.index(YearChoice::Of(third)).unwrap();
    assert!(answers.ask(Asked { dials, beside: None, year }));
    answers.finish(&source).unwrap();
    let words: Vec<Words> = tags.iter().map(|tag| Words::new(tag).0).collect();
    let settings: Vec<DialSetting> =
        place.dials.open().map(|(dial, range)| DialSetting { dial, value: dials.get(dial), range }).collect();
    let names: Vec<Vec<&str>> =
        tags.iter().map(|tag| place.gates.iter().map(|gate| gate.name.get(tag)).collect()).collect();
    let stages: Vec<Stage<'_>> = tags
        .iter()
        .zip(&names)
        .map(|(tag, names)| {
            let told = PlaceTold { name: place.name.get(tag), invented: true, fitted: false, gate_names: names };
            Stage::new(told, &source, &answers)
        })
        .collect();
    let props: Vec<_> = stages.iter().map(Stage::props).collect();
    let voices = words.iter().zip(stages.iter().zip(&props)).map(|(words, (stage, props))| {
        let moment = Moment {
            dials: &settings,
            chosen: None,
            kind: YearKind::Dry,
            day: 0,
            playing: false,
            stale: false,
            units: System::Metric,
            second: None,
            doubt: None,
        };
        let scene: Scene<'_> = stage.scene(props, moment);
        let row = |name: &str| vec![name.to_owned(), "9.1".into(), "5.2".into(), "3.9 less".into()];
        let table = SignTable {
            heads: ["Water year", "As it was", "With your changes", "Change"].map(str::to_owned).to_vec(),
            rows: (0..11).map(|_| row("Share of the water asked for that arrived, hm³")).collect(),
        };
        ResultVoice { words, scene, dials: vec![("Warming".into(), "+3 °C".into())], table }
    });
    ResultPage { paper, voices: voices.collect() }.lay_out().unwrap().unwrap()
}

#[test]
fn no_letters_stand_over_others_or_off_the_paper() {
    let turned = Dials::REST.with(Dial::Warming, 3.0).with(Dial::WinterPrecipitation, -20.0);
    for files in [demo_files(), piedranieve_files()] {
        let place = read(Files::Embedded(files)).place.unwrap();
        for dials in [Dials::REST, turned] {
            for tags in [&["en-US"][..], &["es-US"], &["es-CL", "en-GB"], &["en-US", "es-US"]] {
                for (paper, third) in [(Paper::A4, Third::Wet), (Paper::Letter, Third::Dry)] {
                    let document = laid_out(&place, dials, tags, paper, third);
                    assert_eq!(document.collisions(), Vec::<String>::new(), "{tags:?} {paper:?}");
                    assert!(document.page_count() <= 2, "{tags:?} {paper:?}: {}", document.page_count());
                }
            }
        }
    }
}

#[test]
fn a_running_session_can_write_the_page_too() {
    let place = read(Files::Embedded(demo_files())).place.unwrap();
    let document = laid_out(&place, Dials::REST, &["en-US"], Paper::A4, Third::Middling);
    let mut bytes = Vec::new();
    write_pdf(&document, &mut bytes).unwrap();
    assert_eq!(pages_of(&bytes), document.page_count());
    assert!(bytes.starts_with(b"%PDF-1.7"));
}

#[test]
fn a_page_is_small_tagged_and_the_same_every_time() {
    let desk = Desk::new();
    for lang in ["en", "es", "both"] {
        for paper in ["a4", "letter"] {
            let line = format!("handout demo {TURNED} --years dry --lang {lang} --paper {paper} --out page.pdf");
            let pdf = desk.write(&line, "page.pdf");
            let pages = pages_of(&pdf);
            assert!(pages <= 2, "{lang} {paper}: {pages} pages");
            assert!(pdf.len() < MOST_BYTES_A_PAGE * pages, "{lang} {paper}: {} bytes", pdf.len());
            let text = String::from_utf8_lossy(&pdf);
            for part in ["/StructTreeRoot", "/Marked true", "/Lang (", "/DisplayDocTitle true", "pdfuaid"] {
                assert!(text.contains(part), "{lang} {paper}: no {part}");
            }
            assert_eq!(pdf, desk.write(&line, "page.pdf"), "{lang} {paper}");
        }
    }
}

#[test]
fn the_page_says_what_tell_says() {
    let desk = Desk::new();
    let (_, told, _) = desk.run("tell demo --set warming=3 --years 1988..1988 --lang en");
    let svg = desk.write_text("handout demo --set warming=3 --years 1988..1988 --lang en --out page.svg", "page.svg");
    let said = said_in(&svg);
    let rows = told.lines().skip_while(|line| !line.starts_with("Water year 1988")).skip(1);
    let rows: Vec<&str> = rows.take_while(|line| !line.is_empty()).collect();
    assert!(rows.len() > 8, "{told}");
    for row in rows {
        let row = row.split_whitespace().collect::<Vec<_>>().join(" ");
        assert!(said.contains(&row), "“{row}” is not on the page: {said}");
    }
    for part in ["Tresnubes", "Cautions", "Canals kill", "Where the water went", "This is a model, not a forecast."] {
        assert!(said.contains(part), "{part}: {said}");
    }
}

#[test]
fn both_languages_stand_on_one_page() {
    let desk = Desk::new();
    let said = said_in(&desk.write_text("handout demo --set warming=2 --lang both --out page.svg", "page.svg"));
    for part in ["What changed", "Qué cambió", "All the years", "Todos los años", "Cautions", "Precauciones"] {
        assert!(said.contains(part), "{part}: {said}");
    }
}

#[test]
fn a_mistake_is_told_and_nothing_is_written() {
    let desk = Desk::new();
    for (line, code, part) in [
        ("handout demo --lang en --out page.doc", 2, "must end in .pdf, .svg or .png"),
        ("handout demo --lang en --paper a3", 2, "a4"),
        ("handout demo --lang en --sheet key", 2, "--lesson"),
        ("handout demo --lang en --lesson earlier_water --set warming=2", 2, "--set"),
        ("handout demo --lang en --lesson earlier_watter", 1, "earlier_water"),
        ("handout nowhere --lang en", 1, "nowhere"),
        ("handout demo --lang en --set warming=9", 2, "goes from 0 to 6"),
        ("handout demo --lang en --years 1900..1901", 2, "1900"),
        ("data demo --lang en --out a.csv", 2, "--form netcdf"),
        ("data demo --lang en --form netcdf --into a", 2, "--form csv"),
    ] {
        let (got, _, err) = desk.run(line);
        assert_eq!(got, code, "{line}: {err}");
        assert!(err.contains(part), "{line}: {err}");
    }
    assert_eq!(std::fs::read_dir(desk.path(".")).unwrap().count(), 0);
}
