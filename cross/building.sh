# How a board's program is built, for the scripts beside it: by rustup and zig, or by Debian's own compiler.
# Sourced, not run. The way is in DESHIELO_WAY: "rustup", "debian", or nothing to take what is there.

cd "$(dirname "${BASH_SOURCE[0]}")/.."
export CARGO_TERM_COLOR=never
# Leave out the window and pages to print: a board has neither a desktop nor a printer.
features=(--locked --profile board --no-default-features --features std,board)
most_bytes=$((6 * 1024 * 1024))

need() {
  command -v "$1" > /dev/null || { echo "$1 is missing: see cross/README.md" >&2; exit 1; }
}

way() {
  if [ -n "${DESHIELO_WAY:-}" ]; then
    echo "$DESHIELO_WAY"
  elif command -v rustup > /dev/null && command -v cargo-zigbuild > /dev/null; then
    echo rustup
  else
    echo debian
  fi
}

# One target by `rustup target add` and zig as the linker; $2 is the oldest C library that it must run with, if any.
by_rustup() {
  need rustup
  need cargo-zigbuild
  rustup target add "$1"
  cargo zigbuild "${features[@]}" --target "$1${2:+.$2}"
}

# One target by Debian's rustc and its libraries for other processors; $2 is the linker.
by_debian() {
  need "$2"
  local upper
  upper=$(tr 'a-z-' 'A-Z_' <<< "$1")
  env "PATH=/usr/bin:$PATH" RUSTC=/usr/bin/rustc "CARGO_TARGET_${upper}_LINKER=$2" \
    /usr/bin/cargo build "${features[@]}" --target "$1"
}

# One target that Debian has no library for: the standard library is built as well, and zig links it.
by_debian_with_std() {
  need cargo-zigbuild
  env "PATH=/usr/bin:$PATH" RUSTC=/usr/bin/rustc CARGO=/usr/bin/cargo RUSTC_BOOTSTRAP=1 \
    RUSTFLAGS="-Clink-self-contained=no" \
    "$(command -v cargo-zigbuild)" zigbuild "${features[@]}" --target "$1" -Zbuild-std=std,panic_abort
}

# Says how large the program is, and fails where it is too large for the smallest card that we promise.
weigh() {
  local program="target/$1/board/deshielo" bytes
  bytes=$(stat -c %s "$program")
  echo "$program: $bytes bytes"
  [ "$bytes" -le "$most_bytes" ] || { echo "$program is larger than $most_bytes bytes" >&2; exit 1; }
}
