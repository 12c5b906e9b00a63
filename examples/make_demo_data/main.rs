//! Writes the invented weather of the demo places; run it from the root of the repository.
//!
//! `cargo run --example make_demo_data`

mod records;

fn main() -> std::io::Result<()> {
    for record in records::RECORDS {
        std::fs::write(record.file, record.text())?;
    }
    std::fs::write(records::OBSERVED_FILE, records::observed_text())
}
