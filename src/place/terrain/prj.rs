//! The text beside a grid that names its coordinates (`.prj`: well-known text, OGC 01-009).

use super::coordinates::Coordinates;

/// Longest text that is looked through, bytes.
const MOST_BYTES: usize = 100_000;

/// Datums within metres of WGS 84, as they are written in such texts, with the first code of their UTM zones north and
/// south of the equator.
const DATUMS: [(&str, Option<u32>, Option<u32>); 4] = [
    ("WGS1984", Some(32_600), Some(32_700)),
    ("NORTHAMERICAN1983", Some(26_900), None),
    ("ETRS1989", Some(25_800), None),
    ("SIRGAS2000", None, Some(31_960)),
];

/// What the text says; `None` where it says nothing that is known to be in degrees or in metres.
pub(super) fn coordinates_of(text: &[u8]) -> Option<Coordinates> {
    let text = String::from_utf8_lossy(&text[..text.len().min(MOST_BYTES)]).to_uppercase();
    let plain: String = text.chars().filter(|letter| !matches!(letter, '_' | ' ' | '\n' | '\r' | '\t')).collect();
    let datum = DATUMS.iter().find(|(name, ..)| {
        plain.contains(&format!("\"D{name}\""))
            || plain.contains(&format!("DATUM[\"{name}\""))
            || plain.contains(&format!("\"{name}DATUM\""))
    });
    if plain.starts_with("GEOGCS[") {
        return datum.is_some_and(|_| plain.contains("\"DEGREE\"")).then_some(Coordinates::Degrees);
    }
    if !plain.starts_with("PROJCS[") {
        return None;
    }
    // The last authority is that of the whole; the ones before name its parts.
    let code = plain.rfind("AUTHORITY[\"EPSG\",\"").filter(|at| plain[*at..].ends_with("\"]]"));
    if let Some(at) = code {
        let digits: String = plain[at + 18..].chars().take_while(char::is_ascii_digit).collect();
        return Coordinates::from_epsg(digits.parse().ok()?);
    }
    let in_metres = plain.contains("UNIT[\"METER\",1") || plain.contains("UNIT[\"METRE\",1");
    let (_, north, south) = datum?;
    let name = plain.split('"').nth(1)?;
    let zone = name.split("UTMZONE").nth(1)?;
    let (number, side) = zone.split_at(zone.find(|letter: char| !letter.is_ascii_digit())?);
    let number: u32 = number.parse().ok().filter(|number| (1..=60).contains(number))?;
    let first = match side {
        "N" => *north,
        "S" => *south,
        _ => None,
    };
    Coordinates::from_epsg(first? + number).filter(|_| in_metres)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn texts_of_two_writers_are_understood() {
        let esri =
            b"PROJCS[\"WGS_1984_UTM_Zone_13N\",GEOGCS[\"GCS_WGS_1984\",DATUM[\"D_WGS_1984\",SPHEROID[\"WGS_1984\",\
            6378137.0,298.257223563]],PRIMEM[\"Greenwich\",0.0],UNIT[\"Degree\",0.0174532925199433]],\
            PROJECTION[\"Transverse_Mercator\"],PARAMETER[\"Central_Meridian\",-105.0],UNIT[\"Meter\",1.0]]";
        assert_eq!(coordinates_of(esri), Some(Coordinates::Metres(32_613)));
        let feet = String::from_utf8_lossy(esri).replace("UNIT[\"Meter\",1.0]", "UNIT[\"Foot_US\",0.3048006096]");
        assert_eq!(coordinates_of(feet.as_bytes()), None);
        let degrees = b"GEOGCS[\"GCS_WGS_1984\",DATUM[\"D_WGS_1984\",SPHEROID[\"WGS_1984\",6378137,298.257223563]],\
            PRIMEM[\"Greenwich\",0],UNIT[\"Degree\",0.017453292519943295]]";
        assert_eq!(coordinates_of(degrees), Some(Coordinates::Degrees));
        let authority = b"PROJCS[\"x\",GEOGCS[\"y\",DATUM[\"z\",AUTHORITY[\"EPSG\",\"6326\"]]],UNIT[\"metre\",1,\
            AUTHORITY[\"EPSG\",\"9001\"]],AUTHORITY[\"EPSG\",\"32719\"]]";
        assert_eq!(coordinates_of(authority), Some(Coordinates::Metres(32_719)));
        for other in [&b""[..], b"GEOGCS[\"Clarke_1866\"", b"PROJCS[\"", b"LOCAL_CS[\"a\"]", b"\xff\xfe\0"] {
            assert_eq!(coordinates_of(other), None);
        }
    }
}
