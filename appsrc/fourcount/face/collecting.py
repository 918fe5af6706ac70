"""Python's collector of cycles, run by the window's thread alone.

A worker that allocates would otherwise collect whatever lies about, and destroy a widget or a timer in its own thread,
which ends the program. The generations are looked at one by one, as Python itself does, but on a timer.
"""

from __future__ import annotations

import gc

from PySide6.QtCore import QObject, QTimer

PAUSE = 1000
"""Milliseconds between two looks."""


class Collecting(QTimer):
    """Takes over from the automatic collector for as long as it runs."""

    def __init__(self, parent: QObject) -> None:
        super().__init__(parent)
        self.setInterval(PAUSE)
        self.timeout.connect(self._on_timeout)

    def take_over(self) -> None:
        """Collect here, and nowhere else, from now on."""
        gc.disable()
        self.start()

    def _on_timeout(self) -> None:
        for generation, (count, most) in enumerate(zip(gc.get_count(), gc.get_threshold(), strict=True)):
            if count > most:
                gc.collect(generation)
