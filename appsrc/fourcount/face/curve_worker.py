"""Drawing away from the window's thread: loading the library takes a second, a drawing some frames."""

from __future__ import annotations

import threading
from collections.abc import Callable
from contextlib import suppress

from PySide6.QtCore import QObject, Qt, Signal, SignalInstance

from fourcount.face.later import Later

Draw = Callable[[], bytes]


class CurveWorker(QObject):
    """One thread at a time; of several requests only the newest is answered.

    **Signals**
        drawn: a drawing is there. Carries the key that it was asked for by, and its bytes.
        failed: drawing raised an error. Carries the error.
    """

    drawn = Signal(object, object)
    failed = Signal(object)

    def __init__(self, later: Later, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._later = later
        self._lock = threading.Lock()
        self._wanted: tuple[object, Draw] | None = None
        self._busy = False
        self._closed = False
        self.failed.connect(self._on_failed, Qt.ConnectionType.QueuedConnection)

    def ask(self, key: object, draw: Draw) -> None:
        """Draw something, and say so by ``key``."""
        with self._lock:
            if self._closed:
                return
            self._wanted = (key, draw)
            if self._busy:
                return
            self._busy = True
        self._later.start(self._work)

    def close(self) -> None:
        """Answer nothing any more."""
        with self._lock:
            self._closed = True
            self._wanted = None

    def _work(self) -> None:
        while True:
            with self._lock:
                wanted, self._wanted = self._wanted, None
                if wanted is None:
                    self._busy = False
                    return
            key, draw = wanted
            try:
                self._tell(self.drawn, key, draw())
            except Exception as error:  # noqa: BLE001 - whatever it is, the window's thread reports it
                self._tell(self.failed, error)

    def _tell(self, signal: SignalInstance, *values: object) -> None:
        """Emit unless the window is gone."""
        with self._lock:
            closed = self._closed
        if not closed:
            with suppress(RuntimeError):  # the window was closed between the question and the answer
                signal.emit(*values)

    def _on_failed(self, error: BaseException) -> None:
        raise error
