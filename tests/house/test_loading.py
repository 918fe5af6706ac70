"""What is loaded when: the window paints before numpy is there, and figures need no window."""

from __future__ import annotations

import json
import os
import subprocess
import sys
from pathlib import Path

PROBE = "import json, sys; print(json.dumps(sorted(globals().get('loaded', sys.modules))))"
PAINTED = """
import os, sys, tempfile
from pathlib import Path

import fourcount.face.running_start
from fourcount.face.application import make_application, make_window
from fourcount.face.later import Later

os.environ["QT_QPA_PLATFORM"] = "offscreen"
application, later, loaded = make_application(["fourcount"]), Later(), set()
with tempfile.TemporaryDirectory() as folder:
    window = make_window(Path(folder), later=later)
    paint = type(window).paintEvent

    def painted(self, event):
        paint(self, event)
        loaded.update(sys.modules if not loaded else ())

    type(window).paintEvent = painted
    window.first_painted.connect(application.quit)
    window.show()
    application.exec()
    later.finish(60.0)
"""
"""A window up to the end of its first paint, and what was ``loaded`` by then."""


def loaded_after(code: str) -> set[str]:
    """The modules that a fresh interpreter holds after running ``code``, or those that the code names itself."""
    run = subprocess.run([sys.executable, "-c", f"{code}\n{PROBE}"], capture_output=True, text=True, check=False)
    assert run.returncode == 0, run.stderr
    return set(json.loads(run.stdout.splitlines()[-1]))


def test_the_package_alone_loads_nothing_heavy() -> None:
    """Importing the package loads neither Qt nor numpy, scipy or matplotlib."""
    assert not loaded_after("import fourcount") & {"PySide6", "numpy", "scipy", "matplotlib"}


def test_an_answer_needs_no_window() -> None:
    """The figures of a table come without Qt and without matplotlib."""
    code = "from fourcount import answer\nanswer(15, 85, 5, 95)"
    loaded = loaded_after(code)
    assert "fourcount" in loaded
    assert not loaded & {"PySide6", "matplotlib"}


def test_the_window_paints_before_numpy() -> None:
    """When a window has painted, Qt is loaded, but neither numpy nor scipy, nor any room that works out figures."""
    loaded = loaded_after(PAINTED)
    assert "PySide6" in loaded
    assert not loaded & {"numpy", "scipy", "matplotlib"}
    rooms = {name.split(".")[1] for name in loaded if name.startswith("fourcount.")}
    assert {"face", "ink", "picture", "record", "wording"} <= rooms
    assert not rooms & {"appraisal", "stats", "publish"}


CURVE = """
import os, sys

os.environ["QT_QPA_PLATFORM"] = "offscreen"
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.curve import curve
from fourcount.ink.curve import draw_curve
from fourcount.ink.curve_layout import Sheet
from fourcount.ink.palette import LIGHT
from fourcount.wording.curve import View, curve_words
from fourcount.wording.example import worked_example

before = set(sys.modules)
record = worked_example()
findings = appraise(record.outcomes[0], record.choices)
drawn = curve(findings)
words = curve_words(record, record.outcomes[0], findings, drawn, View())
assert "matplotlib" not in before
assert draw_curve(drawn, View(), words, LIGHT, Sheet(600, 400))
"""
"""A curve drawn in a process of its own."""


def test_a_curve_loads_its_library_when_it_is_drawn() -> None:
    """The library comes with the first drawing and not before it; no window system of its own comes with it."""
    loaded = loaded_after(CURVE)
    assert "matplotlib.figure" in loaded
    assert not loaded & {"matplotlib.pyplot", "tkinter", "scipy.stats", "matplotlib.backends.backend_qtagg"}


def test_a_curve_needs_no_folder_to_write_to(tmp_path: Path) -> None:
    """Where the list of fonts can be kept nowhere, a curve is drawn all the same and nothing is said."""
    blocked = tmp_path / "a file, not a folder"
    blocked.write_text("", encoding="utf-8")
    environ = {**os.environ, "XDG_CACHE_HOME": str(blocked / "cache"), "HOME": str(blocked)}
    environ.pop("MPLCONFIGDIR", None)
    run = subprocess.run([sys.executable, "-c", CURVE], capture_output=True, text=True, check=False, env=environ)
    assert (run.returncode, run.stdout, run.stderr) == (0, "", "")
