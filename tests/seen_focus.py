"""Where the focus is, as the eye sees it: a widget rendered with the focus and without."""

from __future__ import annotations

from collections.abc import Sequence

import numpy as np
from PySide6.QtCore import Qt
from PySide6.QtGui import QImage
from PySide6.QtWidgets import QApplication, QWidget

from screen_reader import names

LEAST = 8
"""Columns of logical pixels that have to change: a caret alone, which also blinks, is not enough."""


def unseen_focus(stops: Sequence[QWidget]) -> list[str]:
    """Those of some widgets that look the same with the focus as without."""
    return names([widget for widget in stops if not _shows_focus(widget)])


def _shows_focus(widget: QWidget) -> bool:
    """Whether a widget looks different with the focus, by more than a caret: columns of logical pixels that differ."""
    widget.clearFocus()
    without = widget.grab().toImage()
    widget.setFocus(Qt.FocusReason.TabFocusReason)
    assert QApplication.focusWidget() is widget
    focused = widget.grab().toImage()
    assert focused.size() == without.size()
    return len(_changed_columns(without, focused)) / focused.devicePixelRatio() >= LEAST


def _changed_columns(one: QImage, other: QImage) -> set[int]:
    """Columns of pixels in which two pictures of one size differ."""
    wide = one.width()
    first, second = (np.frombuffer(_pixels(image), np.uint32).reshape(-1, wide) for image in (one, other))
    return set(np.nonzero((first != second).any(axis=0))[0].tolist())


def _pixels(image: QImage) -> bytes:
    return bytes(image.convertToFormat(QImage.Format.Format_RGB32).constBits())
