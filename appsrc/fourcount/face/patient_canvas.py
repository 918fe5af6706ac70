"""The patient's page as one object on the screen, and the area that it is scrolled in."""

from __future__ import annotations

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QKeyEvent, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QScrollArea, QWidget

from fourcount.face.on_white import OnWhite
from fourcount.ink.patient_page import MARGIN, Fit, PatientPage
from fourcount.ink.plain_picture import Shown


class Canvas(QWidget):
    """The page as one object: painted, and described in full sentences."""

    def __init__(self, look: OnWhite) -> None:
        super().__init__()
        self._look = look
        self._shown: Shown | None = None
        self._page: PatientPage | None = None
        self._laid: Fit | None = None
        self._room = QSize()
        self._usual_height = 0
        self.setFocusPolicy(Qt.FocusPolicy.StrongFocus)
        look.changed.connect(self._fit)

    def show_page(self, it: Shown) -> None:
        """Show another outcome, or the same one as it is now."""
        if it == self._shown:
            return
        self._shown = it
        self._page = PatientPage(it)
        self.setAccessibleName(it.words.title)
        self.setAccessibleDescription(it.words.told(ranged=it.options.uncertainty))
        self._fit()

    @property
    def margin(self) -> int:
        """How far the page's text stands from its edges."""
        return self._laid.style.px(MARGIN) if self._laid else 0

    def take_room(self, room: QSize, usual_height: int) -> None:
        """Fill the room that there is, and would be at 100% text; what needs more can be scrolled to."""
        if (room, usual_height) != (self._room, self._usual_height):
            self._room, self._usual_height = room, usual_height
            self._fit()

    def _fit(self) -> None:
        if self._page is not None and not self._room.isEmpty():
            self._laid = fit = self._page.fitted(
                self._room.width(), self._room.height(), self._look.asked, self._usual_height
            )
            self.setFixedSize(self._room.width(), round(fit.height))
        self.update()

    def paintEvent(self, event: QPaintEvent) -> None:
        if self._page is None or self._laid is None:
            return
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        self._page.draw(painter, self._laid.style, self.width(), self.height(), self._laid.headline_first)
        if self.hasFocus() and self.height() > self._room.height():
            painter.setPen(QPen(self._look.colour("accent"), 2))
            painter.setBrush(Qt.BrushStyle.NoBrush)  # what painted the page last may have left one
            painter.drawRect(self.rect().adjusted(1, 1, -1, -1))
        painter.end()


class Scroll(QScrollArea):
    """A scroll area that leaves every key to the screen: arrows to the side are outcomes here."""

    def keyPressEvent(self, event: QKeyEvent) -> None:
        event.ignore()
