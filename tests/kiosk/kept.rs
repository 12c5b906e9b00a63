//! What is kept as a whole: damaged files, full and read-only cards, and files from elsewhere.

use std::fs;
use std::io::ErrorKind;

use deshielo::keep::{Damage, Folder, Keep, Kept, Note, PinHash, Settings, Tally, Trouble};
use deshielo::session::kiosk::{Count, Wishes};
use deshielo::session::{Offer, Shade, State, View};

use super::disk::Disk;

fn settings(place: &str) -> Settings {
    let pin = PinHash::with_salt("4711", [3; 16]).unwrap();
    let wishes = Wishes { light_percent: 70, ..Wishes::default() };
    Settings { place: place.to_owned(), wishes, pin: Some(pin), wrong_pins: 2, whereabouts: None, left_alone: false }
}

#[test]
fn everything_comes_back_from_a_folder_and_nobody_else_can_read_it() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("state/deshielo");
    let mut keep = Keep::new(Folder::new(path.clone()));
    assert_eq!((keep.settings(), keep.guesses(), keep.tally()), Default::default());
    let mut tally = Tally::default();
    tally.add(&Count::View(View::Canals), Some(20_788));
    let kept = settings("demo");
    assert_eq!((keep.keep_settings(&kept), keep.keep_tally(&tally), keep.keep_guesses(None)), (None, None, None));
    assert_eq!(keep.take_notes(), []);
    let mut again = Keep::new(Folder::new(path.clone()));
    assert_eq!((again.settings(), again.guesses(), again.tally()), (kept, None, tally));
    assert_eq!(again.take_notes(), []);
    let names = fs::read_dir(&path).unwrap().map(|entry| entry.unwrap().file_name().into_string().unwrap());
    let mut names: Vec<String> = names.collect();
    names.sort();
    assert_eq!(names, ["guesses", "settings", "tally"]);
    #[cfg(unix)]
    {
        use std::os::unix::fs::PermissionsExt;
        let mode = fs::metadata(path.join("settings")).unwrap().permissions().mode();
        assert_eq!(mode & 0o077, 0, "{mode:o}");
    }
}

#[test]
fn a_damaged_file_is_set_aside_and_said() {
    type Harm = fn(&[u8]) -> Vec<u8>;
    let harm: [(&str, Harm, Damage); 5] = [
        ("emptied", |_| Vec::new(), Damage::NoSeal),
        ("cut in half", |bytes| bytes[..bytes.len() / 2].to_vec(), Damage::Torn),
        (
            "one bit",
            |bytes| bytes.iter().enumerate().map(|(at, byte)| if at == 60 { byte ^ 4 } else { *byte }).collect(),
            Damage::Torn,
        ),
        ("noise", |bytes| (0..bytes.len()).map(|at| (at * 37 % 251) as u8).collect(), Damage::NoSeal),
        ("far too long", |bytes| bytes.iter().copied().cycle().take(2_000_000).collect(), Damage::TooLong),
    ];
    for (what, harm, damage) in harm {
        for saves in [1, 2] {
            let folder = tempfile::tempdir().unwrap();
            let mut keep = Keep::new(Folder::new(folder.path().to_owned()));
            (0..saves).for_each(|save| assert_eq!(keep.keep_settings(&settings(&format!("place {save}"))), None));
            let file = folder.path().join("settings");
            let bytes = harm(&fs::read(&file).unwrap());
            fs::write(&file, &bytes).unwrap();
            let mut keep = Keep::new(Folder::new(folder.path().to_owned()));
            let (found, afresh) = (keep.settings(), saves == 1);
            assert_eq!(found, if afresh { Settings::default() } else { settings("place 0") }, "{what}");
            assert_eq!(keep.take_notes(), [Note::Damaged { kept: Kept::Settings, damage, afresh }], "{what}");
            assert_eq!(fs::read(folder.path().join("settings.damaged")).unwrap(), bytes, "{what}");
            // It goes on, and the next start finds nothing wrong.
            assert_eq!(keep.keep_settings(&settings("new")), None);
            let mut keep = Keep::new(Folder::new(folder.path().to_owned()));
            assert_eq!((keep.settings(), keep.take_notes()), (settings("new"), vec![]), "{what}");
        }
    }
}

#[test]
fn a_file_of_a_newer_program_is_not_lost() {
    let folder = tempfile::tempdir().unwrap();
    let newer = b"deshielo-keep 99 1 2 00000000\n{}";
    fs::write(folder.path().join("tally"), newer).unwrap();
    let mut keep = Keep::new(Folder::new(folder.path().to_owned()));
    assert_eq!(keep.tally(), Tally::default());
    assert_eq!(keep.take_notes(), [Note::Damaged { kept: Kept::Tally, damage: Damage::Newer(99), afresh: true }]);
    assert_eq!(fs::read(folder.path().join("tally.damaged")).unwrap(), newer);
}

#[test]
fn a_full_or_read_only_card_is_said_once_and_changes_nothing() {
    for kind in [ErrorKind::StorageFull, ErrorKind::ReadOnlyFilesystem, ErrorKind::PermissionDenied] {
        let mut keep = Keep::new(Disk::default());
        assert_eq!(keep.keep_settings(&settings("old")), None);
        let kept = keep.layer().leavings().pop_first().unwrap();
        let mut full = Disk::with(&kept);
        full.always = Some(kind);
        let mut keep = Keep::new(full);
        assert_eq!(keep.settings(), settings("old"));
        let trouble = Trouble { kept: Kept::Settings, reason: kind };
        assert_eq!(keep.keep_settings(&settings("new")), Some(Note::CannotKeep(trouble)));
        for _ in 0..1000 {
            assert_eq!(keep.keep_settings(&settings("new")), None, "said once");
        }
        assert_eq!(keep.troubles().collect::<Vec<_>>(), [trouble]);
        assert_eq!(keep.layer().leavings().into_iter().collect::<Vec<_>>(), std::slice::from_ref(&kept));
        // There is room again.
        let mut keep = Keep::new(Disk::with(&kept));
        assert_eq!(keep.settings(), settings("old"));
        assert_eq!(keep.keep_settings(&settings("new")), None);
    }
    let folder = tempfile::tempdir().unwrap();
    fs::write(folder.path().join("taken"), "").unwrap();
    let mut keep = Keep::new(Folder::new(folder.path().join("taken")));
    assert_eq!(keep.settings(), Settings::default());
    assert!(matches!(keep.keep_settings(&settings("new")), Some(Note::CannotKeep(_))));
}

fn offer() -> Offer {
    Offer::new(super::everything()).unwrap()
}

#[test]
fn the_instrument_goes_back_to_where_it_was_through_a_file() {
    let offer = offer();
    let mut next = super::valleys::numbers(5);
    let mut state = State::new(&offer);
    for _ in 0..3000 {
        state.step(super::random_event(&mut next), &offer);
        let was = state.whereabouts(&offer);
        let text = serde_json::to_string(&was).unwrap();
        let mut back = State::new(&offer);
        back.return_to(&serde_json::from_str(&text).unwrap(), &offer);
        assert_eq!(back.check(&offer), Ok(()));
        assert_eq!(back.whereabouts(&offer), was);
    }
}

#[test]
fn where_it_was_elsewhere_does_no_harm() {
    let rich = offer();
    let mut next = super::valleys::numbers(6);
    let mut state = State::new(&rich);
    for seed in 0..400 {
        for _ in 0..9 {
            state.step(super::random_event(&mut next), &rich);
        }
        let mut input = super::everything();
        input.dials.truncate((seed % 11) as usize);
        input.views.truncate(1 + (seed % 8) as usize);
        input.voices.truncate(1 + (seed % 3) as usize);
        input.settings.clear();
        input.years = super::years(1 + (seed % 30) as usize, || 1.0);
        let poor = Offer::new(input).unwrap();
        let mut back = State::new(&poor);
        back.return_to(&state.whereabouts(&rich), &poor);
        assert_eq!(back.check(&poor), Ok(()), "{seed}");
        assert!(Shade::ALL.contains(&back.shown().shade));
    }
}
