"""Keystrokes in a filled table: how long until every view is repainted, and how long the key event itself takes.

    keystrokes.py score|textbook|exact LARGEST FOLDER

Digits near the end of the four cells are overtyped one at a time, so that each state of the table is a new one and
the size of the counts stays. FOLDER is an empty one for the settings. Times are in milliseconds.
"""

from __future__ import annotations

import json
import os
import random
import sys
import time
from pathlib import Path

from PySide6.QtCore import QEvent, QObject
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QApplication, QWidget

from fourcount.face.application import make_application, make_window
from fourcount.record.outcome import CELLS, EventsAndOthers, Outcome
from fourcount.record.paper import Choices, Record

KEYS = 80
QUIET = 0.015  # seconds without a paint after which the window is at rest
SHARES = (0.93, 0.71, 0.88, 0.97)  # of the largest count, one a cell


class Paints(QObject):
    """Counts the paint events of every widget of the window."""

    def __init__(self, window: QWidget) -> None:
        super().__init__(window)
        self.count = 0
        for widget in (window, *window.findChildren(QWidget)):
            widget.installEventFilter(self)

    def eventFilter(self, _watched: QObject, event: QEvent) -> bool:  # noqa: N802  Qt's own name
        if event.type() == QEvent.Type.Paint:
            self.count += 1
        return False


def settle(paints: Paints) -> float:
    """Run the event loop until nothing has been painted for a while; the end of the last paint."""
    last = time.perf_counter()
    while time.perf_counter() - last < QUIET:
        before = paints.count
        QApplication.processEvents()
        if paints.count > before:
            last = time.perf_counter()
    return last


def main() -> None:
    family, folder = sys.argv[1], sys.argv[3]
    largest = int(sys.argv[2])
    make_application(sys.argv[:1])
    texts = {name: str(round(share * largest)) for name, share in zip(CELLS, SHARES, strict=True)}
    outcome = Outcome(table=EventsAndOthers(**texts))
    record = Record(outcomes=(outcome,), choices=Choices(family=family))  # type: ignore[arg-type]
    window = make_window(Path(folder), record)
    loaded: list[bool] = []
    window._later.loaded.connect(lambda: loaded.append(True))
    window.show()
    while not loaded:
        QApplication.processEvents()
    paints = Paints(window)
    settle(paints)
    chance = random.Random(5)
    cells = [window.printed.grid.cells[name] for name in CELLS]
    repainted, blocked = [], []
    for _ in range(KEYS):
        cell = chance.choice(cells)
        cell.setFocus()
        at = len(cell.text()) - chance.randint(1, 3)
        cell.setSelection(at, 1)
        digit = chance.choice([key for key in "123456789" if key != cell.text()[at]])
        settle(paints)
        before, start = paints.count, time.perf_counter()
        QTest.keyClicks(cell, digit)
        blocked.append(time.perf_counter() - start)
        end = settle(paints)
        assert paints.count > before
        repainted.append(end - start)
    print(
        json.dumps(
            {"repainted": _share(repainted, 0.95), "blocked": _share(blocked, 0.95), "most": max(blocked) * 1000}
        )
    )
    sys.stdout.flush()
    os._exit(0)


def _share(times: list[float], share: float) -> float:
    """The time within which this share of the keystrokes is done, in milliseconds."""
    return sorted(times)[min(len(times) - 1, int(share * len(times)))] * 1000


if __name__ == "__main__":
    main()
