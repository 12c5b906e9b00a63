//! What goes in comes out, and the same content is the same bytes.

use std::fs;

use deshielo::bundle::{Contents, Fault, MOST_MEMBER_BYTES, unpack};

use crate::support::{Desk, PLACE, contents, names};

#[test]
fn what_goes_in_comes_out() {
    let desk = Desk::new();
    let packed = contents("one").pack().unwrap();
    let file = desk.put("valley.zip", &packed);
    let members = unpack(&file, &desk.path("deep/valley")).unwrap();
    assert_eq!(members.len(), contents("one").members().len());
    for (name, bytes) in contents("one").members() {
        assert_eq!(fs::read(desk.path("deep/valley").join(name.as_str())).unwrap(), bytes, "{}", name.as_str());
    }
    assert_eq!(names(&desk.path("deep")), ["valley"], "nothing is left beside it");
    // An empty folder is as good as none.
    fs::create_dir(desk.path("empty")).unwrap();
    unpack(&file, &desk.path("empty")).unwrap();
    assert!(desk.path("empty").join(PLACE).is_file());
}

#[test]
fn the_same_content_is_the_same_bytes() {
    let mut other_way = Contents::new();
    let all = contents("one");
    let members: Vec<_> = all.members().collect();
    for (name, bytes) in members.iter().rev() {
        other_way.add(name.as_str(), bytes.to_vec()).unwrap();
    }
    let packed = other_way.pack().unwrap();
    assert_eq!(packed, contents("one").pack().unwrap());
    assert_ne!(packed, contents("two").pack().unwrap());
    assert!(packed.len() < 2500, "{} bytes", packed.len());
}

#[test]
fn a_folder_goes_in_without_what_is_hidden() {
    let desk = Desk::new();
    fs::create_dir_all(desk.path("valley/records/.git")).unwrap();
    desk.put("valley/place.toml", b"# here");
    desk.put("valley/.notes", b"mine");
    desk.put("valley/records/river.csv", b"date");
    let mut contents = Contents::new();
    contents.add_folder("place", &desk.path("valley"), "").unwrap();
    let found: Vec<&str> = contents.members().map(|(name, _)| name.as_str()).collect();
    assert_eq!(found, [PLACE, "place/records/river.csv"]);
    let mut words = Contents::new();
    fs::create_dir_all(desk.path("words/qu")).unwrap();
    desk.put("words/README.md", b"");
    desk.put("words/qu/terms.ftl", b"");
    words.add_folder("locales", &desk.path("words"), ".ftl").unwrap();
    assert_eq!(words.members().map(|(name, _)| name.as_str()).collect::<Vec<_>>(), ["locales/qu/terms.ftl"]);
    assert_eq!(words.pack(), Err(Fault::NoPlace));
}

#[cfg(unix)]
#[test]
fn a_folder_with_a_link_is_not_packed() {
    let desk = Desk::new();
    fs::create_dir(desk.path("valley")).unwrap();
    desk.put("valley/place.toml", b"");
    std::os::unix::fs::symlink("/etc/passwd", desk.path("valley/weather.csv")).unwrap();
    let refused = Contents::new().add_folder("place", &desk.path("valley"), "");
    assert_eq!(refused, Err(Fault::NotAFile("place/weather.csv".to_owned())));
}

#[test]
fn too_much_is_refused_before_it_is_packed() {
    let mut contents = Contents::new();
    let large = vec![0; MOST_MEMBER_BYTES as usize];
    let mut larger = large.clone();
    larger.push(0);
    assert_eq!(contents.add("place/a.csv", larger), Err(Fault::TooLarge("place/a.csv".to_owned())));
    for name in ["place/a.csv", "place/b.csv", "place/c.csv"] {
        contents.add(name, large.clone()).unwrap();
    }
    assert_eq!(contents.add("place/d.csv", vec![0]), Err(Fault::TooLarge("SUMS".to_owned())));
}
