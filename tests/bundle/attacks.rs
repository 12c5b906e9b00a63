//! Everything that a crafted stick could hold; each is refused and leaves nothing behind.

use std::fs;
use std::io::Write;

use deshielo::bundle::{Fault, MOST_FILE_BYTES, MOST_MEMBERS, unpack};

use crate::support::{Desk, PLACE, archive, archive_with, contents, sums};

const GOOD: (&str, &[u8]) = (PLACE, b"# a place\n");

/// Opens what must be refused, and holds that nothing was written anywhere.
#[track_caller]
fn refused(bytes: &[u8]) -> Fault {
    let desk = Desk::new();
    let file = desk.put("stick.zip", bytes);
    let fault = unpack(&file, &desk.path("into")).expect_err("it was opened");
    assert_eq!(desk.names(), ["stick.zip"], "{fault:?}");
    fault
}

#[test]
fn the_crafted_archives_differ_from_a_good_one_only_by_the_attack() {
    let desk = Desk::new();
    let file = desk.put("stick.zip", &archive(&sums(&[GOOD]), &[GOOD]));
    assert_eq!(unpack(&file, &desk.path("into")).unwrap().len(), 1);
}

#[test]
fn path_tricks() {
    for name in ["../evil", "/etc/evil", "place/../../evil", "place\\..\\evil", "place/nul", "evil.sh", "place/.evil"] {
        let bad: (&str, &[u8]) = (name, b"evil");
        // In both lists, in the archive alone, and in the list of sums alone.
        assert_eq!(refused(&archive(&sums(&[GOOD, bad]), &[GOOD, bad])), Fault::Name(name.to_owned()));
        assert_eq!(refused(&archive(&sums(&[GOOD]), &[GOOD, bad])), Fault::Name(name.to_owned()));
        assert_eq!(refused(&archive(&sums(&[GOOD, bad]), &[GOOD])), Fault::Name(name.to_owned()));
    }
}

#[test]
fn links_folders_and_devices() {
    let link: (&str, &[u8]) = ("place/weather.csv", b"/etc/passwd");
    let with_link = archive_with(&sums(&[GOOD, link]), |zip, options| {
        zip.start_file(GOOD.0, options).unwrap();
        zip.write_all(GOOD.1).unwrap();
        zip.add_symlink(link.0, "/etc/passwd", options).unwrap();
    });
    assert_eq!(refused(&with_link), Fault::NotAFile(link.0.to_owned()));
    let with_folder = archive_with(&sums(&[GOOD]), |zip, options| {
        zip.start_file(GOOD.0, options).unwrap();
        zip.write_all(GOOD.1).unwrap();
        zip.add_directory("place/records", options).unwrap();
    });
    assert!(matches!(refused(&with_folder), Fault::Name(_) | Fault::NotAFile(_)));
    // The mode of a block device, in the upper half of the external attributes of the last member.
    let mut device = archive(&sums(&[GOOD]), &[GOOD]);
    let at = device.windows(4).rposition(|four| four == b"PK\x01\x02").unwrap();
    device[at + 40..at + 42].copy_from_slice(&0o060_644_u16.to_le_bytes());
    assert_eq!(refused(&device), Fault::NotAFile(PLACE.to_owned()));
}

#[test]
fn wrong_sums_and_wrong_lists() {
    let other: (&str, &[u8]) = (PLACE, b"# a plaza\n");
    let more: (&str, &[u8]) = ("place/more.csv", b"more");
    assert_eq!(refused(&archive(&sums(&[GOOD]), &[other])), Fault::Sum(PLACE.to_owned()), "the same length");
    assert_eq!(refused(&archive(&sums(&[GOOD]), &[GOOD, more])), Fault::Unlisted(more.0.to_owned()));
    assert_eq!(refused(&archive(&sums(&[GOOD, more]), &[GOOD])), Fault::Missing(more.0.to_owned()));
    assert_eq!(refused(&archive(&sums(&[more]), &[more])), Fault::NoPlace);
    let newer = sums(&[GOOD]).replace("bundle 1", "bundle 2");
    assert_eq!(refused(&archive(&newer, &[GOOD])), Fault::Newer(2));
    assert_eq!(refused(&archive("anything", &[GOOD])), Fault::NotABundle);
    let twice: [(&str, &[u8]); 2] = [("place/A.csv", b"1"), ("place/a.csv", b"1")];
    let all = [GOOD, twice[0], twice[1]];
    assert_eq!(refused(&archive(&sums(&all), &all)), Fault::Twice("place/a.csv".to_owned()));
}

#[test]
fn bombs() {
    // A thousand to one, told truly: too large before a byte is unpacked.
    let zeroes = vec![0_u8; 17 << 20];
    let bomb: (&str, &[u8]) = ("place/weather.csv", &zeroes);
    let honest = archive(&sums(&[GOOD, bomb]), &[GOOD, bomb]);
    assert!(honest.len() < 100_000);
    assert_eq!(refused(&honest), Fault::TooLarge(bomb.0.to_owned()));
    // Told small in the list and in both headers of the archive: no more than that is ever unpacked.
    let small = sums(&[GOOD, (bomb.0, &zeroes[..10])]);
    assert_eq!(refused(&archive(&small, &[GOOD, bomb])), Fault::Sum(bomb.0.to_owned()));
    let mut lying = archive(&small, &[GOOD, bomb]);
    let real = (zeroes.len() as u32).to_le_bytes();
    let places: Vec<usize> = (0..lying.len() - 4).filter(|at| lying[*at..*at + 4] == real).collect();
    assert!(places.len() >= 2);
    places.iter().for_each(|at| lying[*at..*at + 4].copy_from_slice(&10_u32.to_le_bytes()));
    assert!(matches!(refused(&lying), Fault::Sum(_) | Fault::NotABundle));
    // A list of sums that never ends.
    let endless = "x".repeat(4 << 20);
    assert_eq!(refused(&archive(&endless, &[GOOD])), Fault::TooLarge("SUMS".to_owned()));
    // Too many members, and a file that is too long.
    let names: Vec<String> = (0..=MOST_MEMBERS).map(|n| format!("place/{n}.csv")).collect();
    let many: Vec<(&str, &[u8])> = names.iter().map(|name| (name.as_str(), b"1".as_slice())).collect();
    assert_eq!(refused(&archive(&sums(&many), &many)), Fault::TooMany);
    let desk = Desk::new();
    let long = desk.path("long.zip");
    fs::File::create(&long).unwrap().set_len(MOST_FILE_BYTES + 1).unwrap();
    assert!(matches!(unpack(&long, &desk.path("into")), Err(Fault::TooLarge(_))));
}

#[test]
fn archives_that_are_two_things_at_once() {
    let good = archive(&sums(&[GOOD]), &[GOOD]);
    // Something before it, something after it, a remark at its end.
    assert_eq!(refused(&[b"#!/bin/sh\n".as_slice(), &good].concat()), Fault::NotABundle);
    assert_eq!(refused(&[good.as_slice(), b"more"].concat()), Fault::NotABundle);
    let mut remark = good.clone();
    let end = remark.len() - 22;
    remark[end + 20] = 4;
    assert_eq!(refused(&[remark.as_slice(), b"more"].concat()), Fault::NotABundle);
    // The header beside the member names another one than the directory.
    let mut two_names = good.clone();
    let at = two_names.windows(PLACE.len()).position(|part| part == PLACE.as_bytes()).unwrap();
    two_names[at..at + 5].copy_from_slice(b"plaza");
    assert!(matches!(refused(&two_names), Fault::NotABundle | Fault::Sum(_)));
    // A second archive in the remark of nothing: two directories.
    let second = archive(&sums(&[(PLACE, b"# evil\n")]), &[(PLACE, b"# evil\n")]);
    assert_eq!(refused(&[second, good].concat()), Fault::NotABundle);
    assert_eq!(refused(b""), Fault::NotABundle);
    assert_eq!(refused(&[0; 4096]), Fault::NotABundle);
}

/// Whatever byte a bad card changes and wherever a copy was cut short: the bundle as it was made, or nothing.
#[test]
fn damage_anywhere() {
    let good = contents("one").pack().unwrap();
    let desk = Desk::new();
    let (mut opened, mut seed) = (0, 1_u32);
    for at in (0..good.len()).step_by(23) {
        let mut damaged = good.clone();
        seed = seed.wrapping_mul(1_664_525).wrapping_add(1_013_904_223);
        damaged[at] ^= (seed >> 24) as u8 | 1;
        let into = desk.path("into");
        let file = desk.put("stick.zip", &damaged);
        if unpack(&file, &into).is_ok() {
            opened += 1;
            for (name, bytes) in contents("one").members() {
                assert_eq!(fs::read(into.join(name.as_str())).unwrap(), bytes, "byte {at}");
            }
            fs::remove_dir_all(&into).unwrap();
        }
        assert_eq!(desk.names(), ["stick.zip"], "byte {at}");
    }
    // Only dates and versions in the headers do not matter.
    assert!(opened < good.len() / 23 / 4, "{opened} of {}", good.len() / 23);
    for length in (0..good.len()).step_by(17) {
        refused(&good[..length]);
    }
}

#[test]
fn what_is_there_already_stays() {
    let desk = Desk::new();
    let file = desk.put("stick.zip", &contents("one").pack().unwrap());
    fs::create_dir(desk.path("mine")).unwrap();
    desk.put("mine/place.toml", b"mine");
    assert_eq!(unpack(&file, &desk.path("mine")), Err(Fault::Occupied(desk.path("mine"))));
    assert_eq!(unpack(&file, &file), Err(Fault::Occupied(file.clone())));
    assert_eq!(fs::read(desk.path("mine/place.toml")).unwrap(), b"mine");
    assert_eq!(desk.names(), ["mine", "stick.zip"]);
}

#[cfg(unix)]
#[test]
fn a_link_in_place_of_the_folder_is_not_followed() {
    let desk = Desk::new();
    let file = desk.put("stick.zip", &contents("one").pack().unwrap());
    fs::create_dir(desk.path("elsewhere")).unwrap();
    std::os::unix::fs::symlink(desk.path("elsewhere"), desk.path("into")).unwrap();
    assert_eq!(unpack(&file, &desk.path("into")), Err(Fault::Occupied(desk.path("into"))));
    assert!(fs::read_dir(desk.path("elsewhere")).unwrap().next().is_none());
}
