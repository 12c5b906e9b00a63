//! The square code, read back from the picture by a decoder that shares nothing with what wrote it.

use super::command::{Desk, said_in};

/// Every code on a grey picture.
fn decoded(picture: &[u8]) -> Vec<String> {
    let mut reader = png::Decoder::new(std::io::Cursor::new(picture)).read_info().unwrap();
    let mut pixels = vec![0; reader.output_buffer_size().unwrap()];
    let info = reader.next_frame(&mut pixels).unwrap();
    let (wide, high) = (info.width as usize, info.height as usize);
    // The upper right of the first page, where the code stands.
    let (left, rows) = (wide / 2, high / 5);
    let grey = |x: usize, y: usize| pixels[(y * wide + left + x) * 3];
    let mut image = rqrr::PreparedImage::prepare_from_greyscale(wide - left, rows, grey);
    image.detect_grids().iter().map(|grid| grid.decode().unwrap().1).collect()
}

#[test]
fn a_camera_reads_what_the_page_says() {
    let desk = Desk::new();
    for lang in ["en", "es"] {
        let options = format!("handout demo --set warming=3 --years dry --lang {lang}");
        let picture = desk.write(&format!("{options} --out page.png"), "page.png");
        let codes = decoded(&picture);
        let [text] = codes.as_slice() else { panic!("{lang}: {} codes", codes.len()) };
        let said = said_in(&desk.write_text(&format!("{options} --out page.svg"), "page.svg"));
        assert!(text.lines().count() >= 5, "{text}");
        assert!(text.starts_with("Tresnubes: 1988"), "{text}");
        for line in text.lines().skip(1).filter(|line| !line.contains("caution")) {
            let line = line.split_whitespace().collect::<Vec<_>>().join(" ");
            let (_, is_said) = (line.len(), said.contains(&line));
            // The caution is said in full in the code and by its parts on the page.
            let is_caution = line.contains("model, not a forecast") || line.contains("modelo, no un pronóstico");
            assert!(is_said || is_caution, "{lang}: “{line}” is not on the page: {said}");
        }
        assert!(!text.contains("://"), "{text}");
    }
}
