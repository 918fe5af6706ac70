"""What is loaded when: the window paints before numpy is there, and figures need no window."""

from __future__ import annotations

import json
import subprocess
import sys

PROBE = "import json, sys; print(json.dumps(sorted({name.split('.')[0] for name in sys.modules})))"


def loaded_after(code: str) -> set[str]:
    """The top-level modules that a fresh interpreter holds after running ``code``."""
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
    """Importing the application loads Qt, but neither numpy nor scipy."""
    loaded = loaded_after("import fourcount.face.application")
    assert "PySide6" in loaded
    assert not loaded & {"numpy", "scipy", "matplotlib"}
