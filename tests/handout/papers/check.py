"""Opens what `handout` and `data` write with tools that share nothing with the program.

    python3 tests/handout/papers/check.py [PROGRAM]

PDF: qpdf (syntax), pikepdf (structure tree, language, title, figures with words), pdftotext (the text comes out), a
grey rendering by pdftoppm (dark enough to read). NetCDF: netCDF4, and compliance-checker with tables of its own.
Whatever is not installed is said to be skipped; what is installed and finds a fault ends with 1.

    pip install pikepdf netCDF4 numpy pillow compliance-checker
"""

import csv
import io
import shutil
import subprocess
import sys
import tempfile
from pathlib import Path

PROGRAM = sys.argv[1] if len(sys.argv) > 1 else "target/debug/deshielo"
faults = []


def say(what, good, more=""):
    print(("ok      " if good else "FAULT   ") + what + (f": {more}" if more else ""))
    if not good:
        faults.append(what)


def skip(what, needs):
    print(f"skipped {what}: no {needs}")


def module(name):
    try:
        return __import__(name)
    except ImportError:
        return None


def run(*line):
    return subprocess.run(line, capture_output=True, text=True)


def structure(node, found):
    """Counts the kinds of elements, and collects figures without words."""
    import pikepdf

    if isinstance(node, pikepdf.Array):
        for child in node:
            structure(child, found)
    elif isinstance(node, pikepdf.Dictionary) and "/S" in node:
        kind = str(node.S)
        found[kind] = found.get(kind, 0) + 1
        if kind == "/Figure" and not str(node.get("/Alt", "")):
            found["figure without words"] = 1
        if "/K" in node:
            structure(node.K, found)


def check_pdf(path, lang, words):
    name = path.name
    if shutil.which("qpdf"):
        told = run("qpdf", "--check", str(path))
        say(f"{name} qpdf", told.returncode == 0, told.stderr.strip()[:200])
    else:
        skip(f"{name} syntax", "qpdf")
    if module("pikepdf"):
        import pikepdf

        with pikepdf.open(path) as pdf:
            root = pdf.Root
            say(f"{name} marked", bool(root.MarkInfo.Marked))
            say(f"{name} language", str(root.Lang).startswith(lang), str(root.Lang))
            title = str(pdf.docinfo.get("/Title", ""))
            say(f"{name} title", len(title) > 5, title)
            say(f"{name} title is shown", bool(root.ViewerPreferences.DisplayDocTitle))
            found = {}
            structure(root.StructTreeRoot.K, found)
            say(f"{name} headings", found.get("/H1", 0) == 1 and found.get("/H2", 0) >= 3, str(found))
            say(f"{name} figures have words", "figure without words" not in found)
            with pdf.open_metadata() as about:
                say(f"{name} says PDF/UA-1", str(about.get("pdfuaid:part", "")) == "1")
            size = path.stat().st_size / len(pdf.pages)
            say(f"{name} under 60 kB a page", size < 60_000, f"{size:.0f}")
    else:
        skip(f"{name} tree, language, title", "pikepdf")
    if shutil.which("pdftotext"):
        text = " ".join(run("pdftotext", str(path), "-").stdout.split())
        for word in words:
            say(f"{name} text", word in text, word)
    else:
        skip(f"{name} text", "pdftotext")
    if shutil.which("pdftoppm") and module("PIL"):
        from PIL import Image

        grey = subprocess.run(["pdftoppm", "-gray", "-r", "60", "-f", "1", "-l", "1", str(path)], capture_output=True)
        image = Image.open(io.BytesIO(grey.stdout))
        shades = image.convert("L").histogram()
        dark = sum(shades[:110]) / sum(shades)
        say(f"{name} in grey", 0.01 < dark < 0.4, f"{dark:.1%} dark")
    else:
        skip(f"{name} in grey", "pdftoppm, pillow")


def check_net_cdf(path, daily):
    if not module("netCDF4"):
        return skip("run.nc", "netCDF4")
    import netCDF4

    rows = list(csv.DictReader(io.StringIO(daily)))
    with netCDF4.Dataset(path) as data:
        say("run.nc conventions", data.Conventions == "CF-1.11")
        days = len(data.dimensions["time"])
        say("run.nc days", days * 2 == len(rows), str(days))
        first = netCDF4.num2date(data["time"][0], data["time"].units, data["time"].calendar)
        say("run.nc first day", str(first)[:10] == rows[0]["date"], str(first))
        same, seen = True, 0
        keys = ["".join(byte.decode() for byte in key if byte).strip() for key in data["canal_key"][:].filled(b"")]
        for name, variable in data.variables.items():
            if "cell_methods" not in variable.ncattrs():
                continue
            columns = [name] if not name.startswith("canal_") else [f"{key}_{name[6:]}" for key in keys]
            got = variable[:].filled(float("nan")).reshape(len(columns), -1)
            for column, values in zip(columns, got):
                want = [float(row[column]) if row[column] else float("nan") for row in rows]
                same &= all(a == b or (a != a and b != b) for a, b in zip(values.tolist(), want))
                seen += 1
        say("run.nc has the numbers of tell, to the last bit", same and seen == len(rows[0]) - 3, f"{seen} columns")
    beside = Path(sys.executable).with_name("compliance-checker")
    checker = str(beside) if beside.exists() else shutil.which("compliance-checker")
    if checker:
        told = run(checker, "--test", "cf:1.11", "--criteria", "normal", str(path))
        say("run.nc CF 1.11", told.returncode == 0, told.stdout.strip()[-600:] if told.returncode else "")
    else:
        skip("run.nc CF 1.11", "compliance-checker")


def main():
    program = str(Path(PROGRAM).resolve())
    with tempfile.TemporaryDirectory() as folder:
        folder = Path(folder)
        turned = ["--set", "warming=3", "--set", "winter_precipitation=-10", "--years", "dry"]
        pages = {
            "en": ["What changed", "With your changes", "Canals kill"],
            "es": ["Qué cambió", "A dónde se fue el agua", "Los canales matan"],
            "both": ["What changed", "Qué cambió", "Precauciones"],
        }
        for lang, words in pages.items():
            for paper in ["a4", "letter"]:
                path = folder / f"{lang}-{paper}.pdf"
                told = run(program, "handout", "demo", *turned, "--lang", lang, "--paper", paper, "--out", str(path))
                say(f"{path.name} written", told.returncode == 0, told.stderr.strip())
                check_pdf(path, "es" if lang == "es" else "en", words)
        for sheet in ["work", "key"]:
            path = folder / f"lesson-{sheet}.pdf"
            run(program, "handout", "--lesson", "less_snow_more_rain", "--sheet", sheet, "--lang", "es", "--out", str(path))
            check_pdf(path, "es", ["Menos nieve, más lluvia"])
        path = folder / "run.nc"
        choice = ["demo", "--set", "warming=2", "--years", "1988..1990", "--lang", "en"]
        told = run(program, "data", *choice, "--form", "netcdf", "--out", str(path))
        say("run.nc written", told.returncode == 0, told.stderr.strip())
        check_net_cdf(path, run(program, "tell", *choice, "--daily", "--form", "csv").stdout)
    print(f"{len(faults)} faults")
    return 1 if faults else 0


if __name__ == "__main__":
    sys.exit(main())
