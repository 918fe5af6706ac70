"""Drawing away from the window's thread: loading the library takes a second, a drawing some frames."""

from __future__ import annotations

import threading
from collections.abc import Callable
from contextlib import suppress
from typing import Literal

from PySide6.QtCore import QObject, Qt, Signal

from fourcount.face.later import Later

Purpose = Literal["screen", "file", "copy"]
Draw = Callable[[], bytes]
ORDER: tuple[Purpose, ...] = ("file", "copy", "screen")


class CurveWorker(QObject):
    """One thread at a time; of several requests for one purpose only the newest is answered.

    **Signals**
        drawn: a drawing is there. Carries its purpose, the key that it was asked for by, and its bytes.
        failed: drawing raised an error. Carries the error.
    """

    drawn = Signal(str, object, object)
    failed = Signal(object)

    def __init__(self, later: Later, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._later = later
        self._lock = threading.Lock()
        self._wanted: dict[Purpose, tuple[object, Draw]] = {}
        self._busy = False
        self._closed = False
        self.failed.connect(self._on_failed, Qt.ConnectionType.QueuedConnection)

    def ask(self, purpose: Purpose, key: object, draw: Draw) -> None:
        """Draw something, and say so by ``key``."""
        with self._lock:
            self._wanted[purpose] = (key, draw)
            if self._busy or self._closed:
                return
            self._busy = True
        self._later.start(self._work)

    def close(self) -> None:
        """Answer nothing any more."""
        with self._lock:
            self._closed = True
            self._wanted.clear()

    def _work(self) -> None:
        while True:
            with self._lock:
                purpose = next((purpose for purpose in ORDER if purpose in self._wanted), None)
                if purpose is None:
                    self._busy = False
                    return
                key, draw = self._wanted.pop(purpose)
            try:
                drawn = draw()
            except Exception as error:  # noqa: BLE001 - whatever it is, the window's thread reports it
                self._tell(error)
            else:
                self._tell(purpose, key, drawn)

    def _tell(self, *values: object) -> None:
        """Emit unless the window is gone."""
        with self._lock:
            closed = self._closed
        if not closed:
            with suppress(RuntimeError):  # the window was closed between the question and the answer
                (self.failed if len(values) == 1 else self.drawn).emit(*values)

    def _on_failed(self, error: BaseException) -> None:
        raise error
