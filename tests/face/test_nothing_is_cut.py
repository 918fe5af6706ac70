"""Every text has the room it needs, in every arrangement and at every size of text."""

from __future__ import annotations

from typing import Any

import pytest
from PySide6.QtWidgets import QWidget

from fourcount.face.cell import CountCell
from fourcount.face.choice_field import ChoiceField
from fourcount.face.links import Link
from fourcount.face.measure_row import MeasureRow
from fourcount.face.patient.table import PatientTable
from fourcount.face.picture_view import PictureView
from fourcount.face.text import Words
from fourcount.record import editing
from fourcount.record.outcome import CELLS, FORMS, START_KINDS, Design, Form, StartKind
from fourcount.wording.example import worked_example

SIZES = ((1280, 800), (1024, 700), (700, 600), (1920, 1080))
ZOOMS = (1.0, 1.5, 2.0)
NARROWEST = 340
"""Below so many pixels at 100% text, cells stand narrower than they would like."""


def cut(window: Any) -> list[str]:
    """The visible texts, rows and pictures that are lower than their words are tall, or reach out of the page."""
    result = []
    page = window.page
    for widget in page.findChildren(QWidget):
        if (
            not isinstance(widget, Words | MeasureRow | PictureView | PatientTable | CountCell | ChoiceField | Link)
            or not widget.isVisible()
        ):
            continue
        needed = widget.heightForWidth(widget.width()) if widget.hasHeightForWidth() else widget.sizeHint().height()
        right = widget.mapTo(page, widget.rect().topRight()).x()
        if isinstance(widget, CountCell | ChoiceField) and widget.width() < widget.minimumSizeHint().width():
            result.append(f"narrow {widget.accessibleName()}")
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


@pytest.mark.parametrize("kind", START_KINDS)
def test_nothing_is_cut_for_any_patient(open_window: Any, qtbot: Any, kind: StartKind) -> None:
    """Every way of giving a starting risk, its rarer rows open, both pictures, a line, and many outcomes."""
    record = worked_example()
    outcome = editing.with_line_kind(editing.with_start_kind(record.outcomes[0], kind), "margin")
    texts = {
        "starting_risk_text": "12% (9 to 15)", "low_risk_text": "8%", "high_risk_text": "20%",
        "rate_text": "12 per 1,000 person-years", "overall_risk_text": "10%", "exposed_share_text": "30%",
        "other_span_text": "3 years", "line_text": "5", "starting_risk_source_text": "our own register",
    }  # fmt: skip
    for field, text in texts.items():
        outcome = editing.edit_text(outcome, field, text)
    record = editing.with_outcome(record, 0, outcome)
    for _ in range(6):
        record = editing.copy_outcome(record, 1)
    window = open_window(record)
    qtbot.waitUntil(window.patient.figures.picture.isVisible)
    for link in window.patient.quiet.links.values():
        link.click()
    window.actions_by_key["relative"].trigger()
    for width, height in ((1280, 800), (1024, 700), (700, 600), (480, 600)):
        for zoom in (1.0, 1.5, 2.0):
            if width / zoom < NARROWEST:
                continue
            window.resize(width, height)
            window.look.set_zoom(zoom)
            qtbot.waitUntil(lambda: cut(window) == [])


CELLS_OF: dict[Form, tuple[str, str, str, str]] = {
    "percent-of-total": ("9.2%", "412", "17.1%", "409"),
    "pairs": ("12", "21", "9", "58"),
    "person-time": ("38", "4,120", "70", "3,980"),
    "risk-at-time": ("9%", "6 to 12", "17%", "13 to 21"),
}


@pytest.mark.parametrize("form", FORMS)
def test_nothing_is_cut_in_any_form(open_window: Any, qtbot: Any, form: Form) -> None:
    """Every form with all its rarer fields open, a check that asks to look again, and the fold open."""
    record = worked_example()
    outcome = editing.in_form(record.outcomes[0], form)
    for field, text in zip(CELLS, CELLS_OF.get(form, ()), strict=False):
        outcome = editing.edit_text(outcome, field, text)
    outcome = editing.edit_text(outcome, "paper_text", "0.49 (0.32 to 0.75), P = 0.9")
    window = open_window(editing.with_outcome(record, 0, outcome))
    rare = window.printed.rare
    qtbot.waitUntil(lambda: rare.check.sentences != [])
    for link in rare.optional.links.values():
        if link.isVisible():
            link.click()
    window.actions_by_key["more"].trigger()
    for width, height in ((1280, 800), (1024, 700), (700, 600), (480, 600)):
        for zoom in (1.0, 1.5, 2.0):
            if width / zoom < NARROWEST:
                continue
            window.resize(width, height)
            window.look.set_zoom(zoom)
            qtbot.waitUntil(lambda: cut(window) == [])


def test_what_is_wider_than_a_narrow_window_is_reached_sideways(open_window: Any, qtbot: Any) -> None:
    """Only there a bar moves the page to the side, and the field with the cursor comes into view whole."""
    outcome = editing.in_form(worked_example().outcomes[0], "pairs")
    window = open_window(editing.with_outcome(worked_example(), 0, outcome))
    bar = window.page_scroll.horizontalScrollBar()
    assert bar.maximum() == 0
    window.resize(480, 700)
    window.look.set_zoom(2.0)
    qtbot.waitUntil(lambda: bar.maximum() > 0)
    cell = window.printed.grid.cells["first_right_text"]
    cell.setFocus()

    def seen() -> bool:
        port = window.page_scroll.viewport()
        left = cell.mapTo(port, cell.rect().topLeft()).x()
        return left >= 0 and left + cell.width() <= port.width()

    qtbot.waitUntil(seen)
