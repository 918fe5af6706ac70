"""Every text has the room it needs, in every arrangement and at every size of text."""

from __future__ import annotations

from typing import Any

import pytest
from PySide6.QtWidgets import QWidget

from fourcount.face.for_one_patient import PictureView
from fourcount.face.measure_row import MeasureRow
from fourcount.face.text import Words
from fourcount.record import editing
from fourcount.record.outcome import Design
from fourcount.wording.example import worked_example

SIZES = ((1280, 800), (1024, 700), (700, 600), (1920, 1080))
ZOOMS = (1.0, 1.5, 2.0)


def cut(window: Any) -> list[str]:
    """The visible texts, rows and pictures that are lower than their words are tall, or reach out of the page."""
    result = []
    page = window.page
    for widget in page.findChildren(QWidget):
        if not isinstance(widget, Words | MeasureRow | PictureView) or not widget.isVisible():
            continue
        needed = widget.heightForWidth(widget.width()) if widget.hasHeightForWidth() else widget.sizeHint().height()
        right = widget.mapTo(page, widget.rect().topRight()).x()
        if widget.height() < needed or right > page.width():
            result.append(f"{type(widget).__name__} {widget.accessibleName() or getattr(widget, 'text', str)()}")
    return result


@pytest.mark.parametrize("design", ["trial", "case-control"])
def test_nothing_is_cut(open_window: Any, qtbot: Any, design: Design) -> None:
    """All sizes and text sizes, with a starting risk, a mark and an open working."""
    record = worked_example()
    outcome = editing.edit_text(record.outcomes[0], "starting_risk_text", "12%")
    outcome = editing.with_design(outcome, design)
    window = open_window(editing.with_outcome(record, 0, outcome))
    qtbot.waitUntil(lambda: "odds_ratio" in window.says._rows)
    window.says._on_row_chosen("odds_ratio")
    for width, height in SIZES:
        for zoom in ZOOMS:
            window.resize(width, height)
            window.look.set_zoom(zoom)
            qtbot.waitUntil(lambda: cut(window) == [])
            assert window.page_scroll.horizontalScrollBar().maximum() == 0
