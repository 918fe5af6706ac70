"""The look of what a patient is shown: dark on white, whatever the window looks like, with the window's text size."""

from __future__ import annotations

from fourcount.face.look import Look
from fourcount.ink.palette import PAPER

LEAST_ZOOM = 1.3
"""What a patient reads from across a desk is larger than what the window says."""


class OnWhite(Look):
    """A look that follows the text size of another one, and nothing else of it."""

    def __init__(self, window: Look) -> None:
        super().__init__(max(window.zoom, LEAST_ZOOM))
        self._window = window
        window.changed.connect(self._on_window_changed)

    @property
    def asked(self) -> float:
        """The text size of the window."""
        return self._window.zoom

    def _take_scheme(self) -> None:
        self.palette = PAPER
        self._text_palettes.clear()

    def _on_window_changed(self) -> None:
        self.set_zoom(max(self._window.zoom, LEAST_ZOOM))
        self.changed.emit()
