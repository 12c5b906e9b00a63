//! The `deshielo` program: parses, calls the library, and maps the outcome to an exit code.

fn main() -> std::process::ExitCode {
    deshielo::commands::run(std::env::args_os())
}
