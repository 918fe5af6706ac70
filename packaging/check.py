"""Check the whole tree, on a machine that has nothing but Python.

    python3 packaging/check.py

Lint, format, types, the tests without a screen (those of the window beside all others, on another core), then
the tests that need a real window on a screen in memory. A step that fails does not stop the next one; the exit
status says whether all of them passed.
"""

from __future__ import annotations

import os
import re
import subprocess
import sys
import tempfile
import time
from collections import Counter
from collections.abc import Sequence
from concurrent.futures import ThreadPoolExecutor
from pathlib import Path
from typing import NamedTuple

import setup_environment
import system_needs

# The window manager starts beside the tests and ends with them; the tests' own status is the step's.
_WITH_WINDOW_MANAGER = 'openbox >/dev/null 2>&1 & manager=$!; "$@"; status=$?; kill $manager; exit $status'
_ON_SCREEN_IN_MEMORY = ["xvfb-run", "-a", "-s", "-screen 0 1600x1200x24", "sh", "-c", _WITH_WINDOW_MANAGER, "sh"]


class Step(NamedTuple):
    """One check: its name, what it runs, and the Qt platform it runs on.

    ``beside`` runs at the same time, on another core; what it says is printed once it has ended.
    """

    name: str
    command: list[str]
    qt_platform: str = "offscreen"
    runs_tests: bool = False
    beside: Step | None = None


def main() -> int:
    began = time.monotonic()
    try:
        _make_ready()
    except system_needs.SetUpError as reason:
        print(reason, flush=True)
        return 1
    _report("set-up", "ready", began)
    counts: Counter[str] = Counter()
    statuses = []
    with tempfile.TemporaryDirectory(prefix="fourcount-check-") as scratch:
        environ = _environment(Path(scratch))
        statuses = [status for step in steps(sys.platform) for status in _run_both(step, environ, counts)]
    _report("all of it", "failed" if any(statuses) else "passed", began)
    print(_closing_line(counts, time.monotonic() - began), flush=True)
    return 1 if any(statuses) else 0


def steps(platform: str) -> list[Step]:
    """The checks in their order. A screen in memory exists on Linux only; elsewhere that step is left out."""
    python = [str(setup_environment.python_of(setup_environment.FOLDER)), "-m"]
    tests = [*python, "pytest", "-q", "--color=no", "--continue-on-collection-errors", "-m"]
    listed = [
        Step("ruff check", [*python, "ruff", "check", "."]),
        Step("ruff format", [*python, "ruff", "format", "--check", "."]),
        Step("mypy", [*python, "mypy"]),
        Step(
            "tests",
            [*tests, "not real_window", "--ignore=tests/face"],
            runs_tests=True,
            beside=Step("tests of the window", [*tests, "not real_window", "tests/face"], runs_tests=True),
        ),
    ]
    if platform.startswith("linux"):
        in_window = [*_ON_SCREEN_IN_MEMORY, *tests, "real_window"]
        listed.append(Step("tests in a real window", in_window, qt_platform="xcb", runs_tests=True))
    return listed


def _make_ready() -> None:
    system_needs.require_python(sys.version_info[:3], "packaging/check.py")
    ready = setup_environment.is_ready(setup_environment.TO_TEST)

    def look() -> list[system_needs.Need]:
        on_linux = sys.platform.startswith("linux")
        on_x = system_needs.PAINTING_LIBRARIES + system_needs.X_LIBRARIES
        commands = system_needs.missing_commands(system_needs.TEST_COMMANDS if on_linux else ())
        libraries = system_needs.missing_libraries(on_x if on_linux else ())
        return ([] if ready else system_needs.missing_venv()) + libraries + commands

    system_needs.require(look, _say)
    if not ready:
        setup_environment.make_ready(setup_environment.TO_TEST, _say)


def _environment(scratch: Path) -> dict[str, str]:
    """The environment of the steps: the reader's own, with a home of its own, so that no test meets real settings."""
    environ = {name: value for name, value in os.environ.items() if name not in ("PYTHONPATH", "PYTHONHOME")}
    home, runtime = scratch / "home", scratch / "runtime"
    for folder in (home, runtime):
        folder.mkdir(mode=0o700)
    own = {"HOME": str(home), "XDG_RUNTIME_DIR": str(runtime)}
    elsewhere = [name for name in environ if name.startswith("XDG_") and name.endswith("_HOME")]
    return {name: value for name, value in {**environ, **own}.items() if name not in elsewhere}


def _run_both(step: Step, environ: dict[str, str], counts: Counter[str]) -> list[int]:
    """Run a step, and the one beside it at the same time; the statuses of both."""
    if step.beside is None:
        return [_run(step, environ, counts)]
    with ThreadPoolExecutor(max_workers=1) as other_core:
        quietly: list[str] = []
        other = other_core.submit(_run, step.beside, environ, counts, quietly)
        status = _run(step, environ, counts)
        statuses = [status, other.result()]
    print("\n".join(quietly), flush=True)
    return statuses


def _run(step: Step, environ: dict[str, str], counts: Counter[str], instead: list[str] | None = None) -> int:
    """Run a step and print what it says, or keep that in ``instead``."""
    began = time.monotonic()
    running = subprocess.Popen(
        step.command,
        cwd=setup_environment.ROOT,
        env={**environ, "QT_QPA_PLATFORM": step.qt_platform},
        stdin=subprocess.DEVNULL,
        stdout=subprocess.PIPE,
        stderr=subprocess.STDOUT,
        text=True,
        errors="replace",
    )
    lines = _heard(running, aloud=step.runs_tests and instead is None)
    status = running.wait()
    if instead is not None:
        instead += lines
    if step.runs_tests:
        counts.update(counted(lines))
    elif status != 0:
        print("\n".join(lines), flush=True)
    _report(step.name, "passed" if status == 0 else "failed", began)
    return status


def _heard(running: subprocess.Popen[str], *, aloud: bool) -> list[str]:
    assert running.stdout is not None
    lines = []
    for line in running.stdout:
        lines.append(line.rstrip("\n"))
        if aloud:
            print(lines[-1], flush=True)
    return lines


def counted(lines: Sequence[str]) -> dict[str, int]:
    """What pytest's closing line counts, such as ``3 passed, 1 failed in 0.20s``."""
    closing = [line for line in lines if re.search(r"\bin \d+\.\d+s", line)]
    found = re.findall(r"(\d+) ([a-z]+)", closing[-1].rsplit(" in ", 1)[0]) if closing else []
    return {kind.replace("errors", "error"): int(number) for number, kind in found}


def _closing_line(counts: Counter[str], seconds: float) -> str:
    order = ("failed", "passed", "skipped", "xfailed", "error")
    words = ["%d %s" % (counts[kind], kind) for kind in order if counts[kind]]
    return "%s in %.2fs" % (", ".join(words) or "no tests ran", seconds)


def _report(name: str, verdict: str, began: float) -> None:
    print("%-24s %-8s %7.1f s" % (name, verdict, time.monotonic() - began), flush=True)


def _say(line: str) -> None:
    print(line, flush=True)


if __name__ == "__main__":
    try:
        sys.exit(main())
    except KeyboardInterrupt:
        sys.exit("Stopped.")
