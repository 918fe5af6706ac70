"""How fast the program is, each figure beside its bar; the exit status is 1 if a bar is not met.

    python tests/speed/run.py [--runs 10] [--platform offscreen|xcb] [--only WORD]

Every measurement is a child process, the two sides of a comparison take turns, and medians are compared, so that a
busy machine slows both. The bytecode is compiled first. scipy's conditional odds ratio of the large table takes some
thirteen seconds and is run once.
"""

from __future__ import annotations

import argparse
import compileall
import json
import os
import platform
import statistics
import subprocess
import sys
import tempfile
import time
from collections.abc import Callable, Iterator
from dataclasses import dataclass
from importlib.metadata import version
from pathlib import Path
from typing import Any

HERE = Path(__file__).parent
CHILDREN = HERE / "children"
PACKAGE = HERE.parents[1] / "appsrc"
FOLDER = "an empty folder"  # in its place each child is given one of its own
LARGE = ("15000", "85000", "9000", "91000")
HUGE = ("9300000", "7100000", "8800000", "9700000")


@dataclass(frozen=True, kw_only=True)
class Row:
    """One line of the table."""

    what: str
    measured: str
    bar: str
    met: bool | None = None

    def line(self) -> str:
        verdict = {True: "met", False: "NOT MET", None: ""}[self.met]
        return f"{self.what:66} {self.measured:44} {self.bar:22} {verdict}"


class Children:
    """Starts the measuring scripts."""

    def __init__(self, runs: int, platform_name: str) -> None:
        self.runs = runs
        paths = os.pathsep.join([str(PACKAGE), os.environ.get("PYTHONPATH", "")]).rstrip(os.pathsep)
        self._environment = {**os.environ, "QT_QPA_PLATFORM": platform_name, "PYTHONPATH": paths}

    def run(self, script: str, *arguments: str) -> dict[str, Any]:
        """One child; ``elapsed`` is from its start to the moment that it reports, where it does."""
        with tempfile.TemporaryDirectory(prefix="fourcount-speed-") as folder:
            arguments = tuple(folder if argument == FOLDER else argument for argument in arguments)
            start = time.monotonic()
            done = subprocess.run(
                [sys.executable, str(CHILDREN / script), *arguments],
                env=self._environment,
                capture_output=True,
                text=True,
                timeout=600,
                check=False,
            )
        if done.returncode:
            raise SystemExit(f"{script} {' '.join(arguments)} failed:\n{done.stderr}")
        values: dict[str, Any] = json.loads(done.stdout.splitlines()[-1])
        if "at" in values:
            values["elapsed"] = values["at"] - start
        return values

    def medians(self, key: str, *commands: tuple[str, ...]) -> list[float]:
        """The median of a value for each command, the commands taking turns."""
        taken: list[list[float]] = [[] for _ in commands]
        for _ in range(self.runs):
            for values, command in zip(taken, commands, strict=True):
                values.append(self.run(*command)[key])
        return [statistics.median(values) for values in taken]


def _against(what: str, ours: float, other: float, bar: float, unit: str) -> Row:
    scale, digits = (1000, 0) if unit == "ms" else (1, 1)
    measured = f"{scale * ours:.{digits}f} {unit} / {scale * other:.{digits}f} {unit} = {ours / other:.2f} x"
    return Row(what=what, measured=measured, bar=f"at most {bar} x", met=ours <= bar * other)


def first_paint(children: Children) -> Iterator[Row]:
    ours, bare = children.medians("elapsed", ("our_window.py", "painted", FOLDER), ("bare_window.py",))
    yield _against("first paint of the window / of a bare window", ours, bare, 1.8, "ms")


def findings_on_screen(children: Children) -> Iterator[Row]:
    ours, bare = children.medians("elapsed", ("our_window.py", "findings", FOLDER), ("bare_window.py", "scipy"))
    yield _against("a table's findings on screen / bare window with scipy.special", ours, bare, 1.4, "ms")


def memory(children: Children) -> Iterator[Row]:
    commands = (("our_window.py", "painted", FOLDER), ("our_window.py", "rest", FOLDER), ("bare_window.py",))
    painted, rest, bare = children.medians("memory", *commands)
    yield _against("memory at the first paint / of a bare window", painted, bare, 2.6, "MiB")
    yield _against("memory before the first figure, libraries loaded / bare", rest, bare, 2.6, "MiB")


def keystrokes(children: Children) -> Iterator[Row]:
    for largest, bar in (("100000", 16), ("10000000", 50)):
        for family in ("score", "exact"):
            (taken,) = children.medians("repainted", ("keystrokes.py", family, largest, FOLDER))
            yield Row(
                what=f"keystroke to all views repainted, {float(largest):.0e} a cell, {family} family, 95%",
                measured=f"{taken:.1f} ms",
                bar=f"within {bar} ms",
                met=taken <= bar,
            )
    (most,) = children.medians("most", ("keystrokes.py", "exact", "1000000000", FOLDER))
    yield Row(
        what="keystroke at 1e+09 a cell, exact family: typing is held up at most",
        measured=f"{most:.1f} ms",
        bar="typing never waits, 50",
        met=most <= 50,
    )


def conditional(children: Children) -> Iterator[Row]:
    values = [children.run("figures.py", "conditional", *LARGE) for _ in range(children.runs)]
    ours = statistics.median(value["seconds"] for value in values)
    library = children.run("figures.py", "scipy-conditional", *LARGE)
    times = library["seconds"] / ours
    yield Row(
        what="conditional exact odds ratio with limits, 15000/85000 v 9000/91000",
        measured=f"{1000 * ours:.2f} ms, scipy {library['seconds']:.1f} s: {times:,.0f} x",
        bar="5,000 x faster",
        met=times >= 5000,
    )
    pairs = zip(values[0]["figures"], library["figures"], strict=True)
    apart = max(abs(one / other - 1) for one, other in pairs)
    yield Row(what="the same figures, relative difference", measured=f"{apart:.1e}", bar="1e-9", met=apart <= 1e-9)
    (huge,) = children.medians("seconds", ("figures.py", "conditional", *HUGE))
    yield Row(what="the same near 1e+07 a cell", measured=f"{1000 * huge:.2f} ms", bar="16 ms", met=huge < 0.016)


def everything(children: Children) -> Iterator[Row]:
    most = "10000"
    commands = [("figures.py", side, most, "without-conditional") for side in ("ours", "libraries")]
    ours, library = children.medians("seconds", *commands)
    yield Row(
        what="all measures, intervals, tests of 20 tables, no conditional odds ratio",
        measured=f"{1000 * ours:.1f} ms, libraries {1000 * library:.0f} ms: {library / ours:.1f} x",
        bar="5 x faster",
        met=library >= 5 * ours,
    )
    ours = children.medians("seconds", ("figures.py", "ours", most))[0]
    library = children.run("figures.py", "libraries", most)["seconds"]
    yield Row(
        what="the same with the conditional odds ratio (libraries once)",
        measured=f"{1000 * ours:.1f} ms, libraries {1000 * library:.0f} ms: {library / ours:.1f} x",
        bar="5 x faster",
        met=library >= 5 * ours,
    )


def check(children: Children) -> Iterator[Row]:
    values = [children.run("check.py", "10000") for _ in range(children.runs)]
    for key, what in (("first", "the first of a process"), ("most", "the slowest of 100")):
        taken = statistics.median(value[key] for value in values)
        yield Row(
            what=f"the check of the print, to 1e+04 a cell, {what}",
            measured=f"{1000 * taken:.1f} ms",
            bar="under 50 ms",
            met=taken < 0.05,
        )
    loading = statistics.median(value["loading"] for value in values)
    yield Row(what="loading numpy for it, in a thread at the start", measured=f"{1000 * loading:.0f} ms", bar="")


def picture(children: Children) -> Iterator[Row]:
    values = [children.run("picture.py") for _ in range(children.runs)]
    for key, what in (
        ("first", "both arrays of 10,000 icons painted, for the first time"),
        ("again", "the same again, as in every repaint"),
        ("again_sharp", "the same again, at twice the pixels"),
    ):
        taken = statistics.median(value[key] for value in values)
        yield Row(what=what, measured=f"{taken:.1f} ms", bar="within a frame, 16 ms", met=taken <= 16)
    single = statistics.median(value["one_by_one"] for value in values)
    yield Row(what="the same with one call an icon", measured=f"{single:.0f} ms", bar="")


def curve(children: Children) -> Iterator[Row]:
    values = [children.run("curve.py", FOLDER) for _ in range(children.runs)]
    first, held, later = (statistics.median(value[key] for value in values) for key in ("first", "held", "later"))
    yield Row(
        what="the first curve on screen, its library loaded in a thread",
        measured=f"{1000 * first:.0f} ms",
        bar="within 2 s",
        met=first <= 2,
    )
    yield Row(
        what="the window is held up meanwhile at most",
        measured=f"{1000 * held:.0f} ms",
        bar="within 100 ms",
        met=held <= 0.1,
    )
    yield Row(
        what="a later curve on screen, after the pause in typing",
        measured=f"{1000 * later:.0f} ms",
        bar="within 150 ms",
        met=later <= 0.15,
    )


MEASUREMENTS: dict[str, Callable[[Children], Iterator[Row]]] = {
    "paint": first_paint,
    "findings": findings_on_screen,
    "memory": memory,
    "keystrokes": keystrokes,
    "conditional": conditional,
    "everything": everything,
    "check": check,
    "picture": picture,
    "curve": curve,
}


def main() -> int:
    parser = argparse.ArgumentParser(description="Speed and memory beside their bars.")
    parser.add_argument("--runs", type=int, default=10, help="child processes a side (10)")
    parser.add_argument("--platform", default="offscreen", help="Qt's platform: offscreen (default) or xcb")
    parser.add_argument("--only", choices=MEASUREMENTS, help="only one of the measurements")
    options = parser.parse_args()
    for folder in (PACKAGE, CHILDREN):
        compileall.compile_dir(folder, quiet=2)
    names = ("PySide6-Essentials", "numpy", "scipy", "statsmodels")
    print(f"Python {platform.python_version()}, {', '.join(f'{name} {version(name)}' for name in names)}")
    load = f"load {os.getloadavg()[0]:.1f} at the start"
    print(f"{os.cpu_count()} processors, {load}, Qt on {options.platform}, medians of {options.runs}")
    children = Children(options.runs, options.platform)
    met = True
    for name, measure in MEASUREMENTS.items():
        if options.only in (None, name):
            for row in measure(children):
                print(row.line(), flush=True)
                met = met and row.met is not False
    return 0 if met else 1


if __name__ == "__main__":
    sys.exit(main())
