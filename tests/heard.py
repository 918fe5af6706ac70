"""Listening to a signal that comes from another thread."""

from __future__ import annotations

from PySide6.QtCore import QObject, SignalInstance


class Heard(QObject):
    """Keeps what a signal carried, each time it came.

    It lives as long as its parent: what another thread has posted to a receiver that is gone ends the program.
    """

    def __init__(self, signal: SignalInstance, parent: QObject) -> None:
        super().__init__(parent)
        self.values: list[tuple[object, ...]] = []
        signal.connect(self._on_heard)

    def _on_heard(self, *values: object) -> None:
        self.values.append(values)
