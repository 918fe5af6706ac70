"""Tell when a window's first paint has ended: the same watch for our window and for a bare one."""

from __future__ import annotations

import json
import time
from collections.abc import Callable
from pathlib import Path

from PySide6.QtCore import QEvent, QObject, QTimer
from PySide6.QtWidgets import QWidget

SIZE = (1280, 800)


class FirstPaint(QObject):
    """Calls ``then`` once, with the clock's reading at the end of the paint in which the window first appears.

    The window's own paint event comes before those of its children, in one pass of the event loop; a timer of 0
    fires after that pass.
    """

    def __init__(self, window: QWidget, then: Callable[[], None]) -> None:
        super().__init__(window)
        self._window = window
        self._then = then
        window.installEventFilter(self)

    def eventFilter(self, _watched: QObject, event: QEvent) -> bool:  # noqa: N802  Qt's own name
        if event.type() == QEvent.Type.Paint:
            self._window.removeEventFilter(self)
            QTimer.singleShot(0, self._painted)
        return False

    def _painted(self) -> None:
        self._then()


def resident_mebibytes() -> float:
    """The memory of this process that is in RAM (Linux)."""
    status = Path("/proc/self/status").read_text(encoding="ascii")
    line = next(line for line in status.splitlines() if line.startswith("VmRSS"))
    return int(line.split()[1]) / 1024


def report(**values: float) -> None:
    """One line for the parent: the clock, the memory and whatever was measured."""
    print(json.dumps({"at": time.monotonic(), "memory": resident_mebibytes(), **values}), flush=True)
