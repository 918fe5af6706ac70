"""Drawing away from the window's thread: loading the library takes a second, a drawing some frames."""

from __future__ import annotations

from collections.abc import Callable

from PySide6.QtCore import QObject, Qt, Signal

from fourcount.face.later import Later, Newest

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
        self._drawings = Newest(later.start, _drawn, self.drawn, self.failed)
        self.failed.connect(self._on_failed, Qt.ConnectionType.QueuedConnection)

    def ask(self, key: object, draw: Draw) -> None:
        """Draw something, and say so by ``key``."""
        self._drawings.ask(key, draw)

    def close(self) -> None:
        """Answer nothing any more."""
        self._drawings.close()

    def _on_failed(self, error: BaseException) -> None:
        raise error


def _drawn(key: object, draw: Draw) -> tuple[object, bytes]:
    return key, draw()
