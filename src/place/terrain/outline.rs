//! The outline of a basin from GeoJSON (RFC 7946): one polygon, or several parts that belong together.

use std::path::Path;

use serde_json::Value;

use super::coordinates::Coordinates;
use super::{at_line, whole};
use crate::place::problem::Problem;

/// Largest outline that is read, in MB; a basin drawn to the metre needs less than one.
const MOST_MEGABYTES: usize = 16;

/// Rings of the basin and its holes, each closed.
pub(super) struct Outline {
    pub rings: Vec<Vec<(f64, f64)>>,
    pub coordinates: Coordinates,
}

/// Reads the outline; every refusal says why.
pub(super) fn read(file: &Path, bytes: &[u8]) -> Result<Outline, Box<Problem>> {
    let refuse = |message| Box::new(Problem::error(whole(file), message));
    if bytes.len() > MOST_MEGABYTES << 20 {
        let told = Problem::error(whole(file), "problem-file-large").with("file", file.display().to_string());
        return Err(Box::new(told.with("most", MOST_MEGABYTES)));
    }
    let bytes = bytes.strip_prefix(b"\xEF\xBB\xBF").unwrap_or(bytes);
    let root: Value = serde_json::from_slice(bytes).map_err(|error| {
        Box::new(Problem::error(at_line(file, error.line(), error.column(), 1), "problem-outline-json"))
    })?;
    let mut polygons = Vec::new();
    find_polygons(&root, &mut polygons);
    let [polygon] = polygons[..] else {
        return Err(if polygons.is_empty() {
            refuse("problem-outline-none")
        } else {
            Box::new(Problem::error(whole(file), "problem-outline-several").with("n", polygons.len()))
        });
    };
    let parts = polygon.get("coordinates");
    let rings: Option<Vec<_>> = match kind_of(polygon) {
        "Polygon" => rings_of(parts),
        _ => parts.and_then(Value::as_array).and_then(|parts| {
            let rings: Option<Vec<_>> = parts.iter().map(|part| rings_of(Some(part))).collect();
            rings.map(|rings| rings.concat())
        }),
    };
    let rings = rings.filter(|rings| !rings.is_empty()).ok_or_else(|| refuse("problem-outline-ring"))?;
    let coordinates = match root.pointer("/crs") {
        None | Some(Value::Null) => Coordinates::Degrees,
        Some(crs) => {
            let name = crs.pointer("/properties/name").and_then(Value::as_str).unwrap_or_default();
            let known = if name.to_uppercase().ends_with("CRS84") {
                Some(Coordinates::Degrees)
            } else {
                Coordinates::from_key(name)
            };
            let short: String = name.chars().take(60).collect();
            known.ok_or_else(|| Box::new(Problem::error(whole(file), "problem-terrain-code").with("text", short)))?
        }
    };
    let on_globe = |(x, y): &(f64, f64)| x.abs() <= 180.0 && y.abs() <= 90.0;
    if coordinates == Coordinates::Degrees && !rings.iter().flatten().all(on_globe) {
        return Err(refuse("problem-outline-not-degrees"));
    }
    Ok(Outline { rings, coordinates })
}

fn kind_of(value: &Value) -> &str {
    value.get("type").and_then(Value::as_str).unwrap_or_default()
}

fn find_polygons<'v>(value: &'v Value, found: &mut Vec<&'v Value>) {
    match kind_of(value) {
        "Polygon" | "MultiPolygon" => found.push(value),
        "Feature" => value.get("geometry").into_iter().for_each(|geometry| find_polygons(geometry, found)),
        "FeatureCollection" | "GeometryCollection" => {
            let inside = value.get("features").or_else(|| value.get("geometries"));
            inside.and_then(Value::as_array).into_iter().flatten().for_each(|one| find_polygons(one, found));
        }
        _ => {}
    }
}

/// Rings of a polygon; `None` where one has too few points, is not closed, or has something that is no number.
fn rings_of(value: Option<&Value>) -> Option<Vec<Vec<(f64, f64)>>> {
    let position = |value: &Value| {
        let parts = value.as_array()?;
        let (x, y) = (parts.first()?.as_f64()?, parts.get(1)?.as_f64()?);
        (x.abs() < 1.0e9 && y.abs() < 1.0e9).then_some((x, y))
    };
    let ring = |value: &Value| -> Option<Vec<(f64, f64)>> {
        let points: Option<Vec<_>> = value.as_array()?.iter().map(position).collect();
        points.filter(|points| points.len() >= 4 && points.first() == points.last())
    };
    value?.as_array()?.iter().map(ring).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    fn told(text: &str) -> Result<(usize, Coordinates), &'static str> {
        read(Path::new("basin.geojson"), text.as_bytes())
            .map(|outline| (outline.rings.len(), outline.coordinates))
            .map_err(|problem| problem.message)
    }

    #[test]
    fn outlines_are_found_in_their_wrapping() {
        let ring = "[[0,0],[1,0],[1,1],[0,0]]";
        let polygon = format!("{{\"type\":\"Polygon\",\"coordinates\":[{ring}]}}");
        assert_eq!(told(&polygon), Ok((1, Coordinates::Degrees)));
        let feature = format!("{{\"type\":\"Feature\",\"geometry\":{polygon}}}");
        let crs = "\"crs\":{\"type\":\"name\",\"properties\":{\"name\":\"urn:ogc:def:crs:EPSG::32613\"}}";
        let all = format!("{{\"type\":\"FeatureCollection\",{crs},\"features\":[{feature}]}}");
        assert_eq!(told(&all), Ok((1, Coordinates::Metres(32_613))));
        let multi = format!("{{\"type\":\"MultiPolygon\",\"coordinates\":[[{ring}],[{ring}]]}}");
        assert_eq!(told(&multi), Ok((2, Coordinates::Degrees)));
        let two = format!("{{\"type\":\"FeatureCollection\",\"features\":[{feature},{feature}]}}");
        assert_eq!(told(&two), Err("problem-outline-several"));
        assert_eq!(told(&all.replace("32613", "3857")), Err("problem-terrain-code"));
        assert_eq!(told(&polygon.replace("[1,0]", "[500000,4400000]")), Err("problem-outline-not-degrees"));
        assert_eq!(told(&polygon.replace("[1,0],[1,1],", "")), Err("problem-outline-ring"));
        assert_eq!(told("{\"type\":\"Point\",\"coordinates\":[0,0]}"), Err("problem-outline-none"));
        assert_eq!(told("{\"type\":"), Err("problem-outline-json"));
    }
}
