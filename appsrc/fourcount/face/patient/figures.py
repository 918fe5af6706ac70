"""Under the third column's fields: the picture, what it comes to, and the ways on from there."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QPoint, Qt, Signal
from PySide6.QtGui import QAction
from PySide6.QtWidgets import QMenu, QVBoxLayout, QWidget

from fourcount.face.buttons import Button
from fourcount.face.flow import FlowLayout
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.patient.table import PatientTable
from fourcount.face.picture_view import PictureView
from fourcount.face.reading import parts
from fourcount.face.text import Words
from fourcount.wording.patient_labels import (
    BUTTONS,
    CARRY_ODDS,
    PICTURE_LINK_NAMES,
    PICTURE_LINKS,
    PICTURE_NAMES,
)

if TYPE_CHECKING:
    from fourcount.face.patient_view import PatientView
    from fourcount.ink.picture import Picture


class Figures(QWidget):
    """Picture, sentence, table, and the commands that lead to the patient's view, the page and the curve.

    **Signals**
        odds_wanted: the odds ratio is to be carried, since the effect in use would pass 100%.
        moved: the table stands elsewhere, and with it the order of Tab.
    """

    odds_wanted = Signal()
    moved = Signal()

    def __init__(self, look: Look, actions: dict[str, QAction], menu: QMenu) -> None:
        super().__init__()
        self._look = look
        self._menu = menu
        self.drawn: Picture | None = None
        self.picture = PictureView(look, PICTURE_NAMES["picture"])
        self.relative = PictureView(look, PICTURE_NAMES["relative"])
        self.summary = Words(look, "strong", selectable=True)
        self.detail = Words(look, "body", "muted", selectable=True)
        self.odds = Link(look, CARRY_ODDS)
        self.table = PatientTable(look)
        self.show_patient = Button(look, BUTTONS["show-patient"], actions["show-patient"], filled=True)
        self.handout = Button(look, BUTTONS["handout"], actions["handout"])
        self.curve = Link(look, PICTURE_LINKS["curve"], actions["curve"])
        self.draw = Link(look, PICTURE_LINKS["picture"], name=PICTURE_LINK_NAMES["picture"])
        self.copy = Link(
            look, PICTURE_LINKS["copy-picture"], actions["copy-picture"], PICTURE_LINK_NAMES["copy-picture"]
        )
        self._several = False
        self._build()
        self.draw.clicked.connect(self._on_draw)
        self.odds.clicked.connect(self._on_odds)
        look.changed.connect(self._on_look_changed)

    @property
    def stops(self) -> tuple[QWidget, ...]:
        """What Tab stops at, in order."""
        return tuple(part for part in parts(self._column) if part.focusPolicy() & Qt.FocusPolicy.TabFocus)

    def show_view(self, view: PatientView) -> None:
        """Show the picture and all that goes with it."""
        there = view.picture is not None
        self.drawn = view.picture
        self.picture.show_picture(view.picture, view.sentence, view.summary)
        relative = view.relative.words.sentence if view.relative else ""
        self.relative.show_picture(view.relative, relative)
        self.summary.show_words(view.summary)
        self.detail.show_words(view.detail)
        self.table.show_rows(view.rows, view.rows_head, view.rows_corner, view.rows_sentence)
        for link in (self.draw, self.copy, self.show_patient, self.handout):
            link.setVisible(there)
        self.curve.setVisible(view.to_curve)
        self.odds.setVisible(view.to_odds)
        self._place_table(len(view.rows) > 1)

    def _build(self) -> None:
        links, buttons = FlowLayout(self._look, gap=14), FlowLayout(self._look, gap=12)
        for link in (self.draw, self.copy, self.curve):
            links.addWidget(link)
        for button in (self.show_patient, self.handout):
            buttons.addWidget(button)
        self._column = QVBoxLayout(self)
        self._column.setContentsMargins(0, 0, 0, 0)
        for widget in (self.picture, self.summary, self.detail, self.odds, self.relative):
            self._column.addWidget(widget)
        self._column.addLayout(buttons)
        self._column.addLayout(links)
        self._column.addWidget(self.table)
        self._on_look_changed()

    def _place_table(self, several: bool) -> None:
        """Right under the sentence where it holds several starting risks, else last: one row repeats what is said."""
        if several != self._several:
            self._several = several
            self._column.removeWidget(self.table)
            self._column.insertWidget(self._column.indexOf(self.detail) + 1 if several else -1, self.table)
            self.moved.emit()

    def _on_odds(self) -> None:
        self.odds_wanted.emit()

    def _on_draw(self) -> None:
        self._menu.popup(self.draw.mapToGlobal(QPoint(0, self.draw.height())))

    def _on_look_changed(self) -> None:
        self._column.setSpacing(self._look.px(10))
