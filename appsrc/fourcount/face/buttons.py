"""The two buttons of the window that lead to a page of its own: one filled in the accent's colour, one outlined."""

from __future__ import annotations

from PySide6.QtCore import QRectF, QSize, Qt
from PySide6.QtGui import QAction, QPainter, QPaintEvent, QPen

from fourcount.face.links import Link
from fourcount.face.look import Look

ROUND = 4


class Button(Link):
    """A command as a button; the main one of its place is filled."""

    def __init__(self, look: Look, words: str, action: QAction, filled: bool = False, name: str = "") -> None:
        self._filled = filled
        super().__init__(look, words, action, name)

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(60), self._look.px(33))

    def sizeHint(self) -> QSize:
        return QSize(self.fontMetrics().horizontalAdvance(self.text()) + self._look.px(31), self._look.px(33))

    def paintEvent(self, event: QPaintEvent) -> None:
        look, area = self._look, QRectF(self.rect()).adjusted(0.5, 0.5, -0.5, -0.5)
        accent = look.colour("accent")
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        painter.setPen(QPen(accent, 1))
        quiet = look.colour("tint") if self.underMouse() else Qt.GlobalColor.transparent
        painter.setBrush(accent if self._filled else quiet)
        painter.drawRoundedRect(area, ROUND, ROUND)
        if self.hasFocus():  # a ring inside, seen on either ground
            painter.setBrush(Qt.BrushStyle.NoBrush)
            painter.setPen(QPen(look.colour("on_accent" if self._filled else "accent"), 1.5))
            painter.drawRoundedRect(area.adjusted(3, 3, -3, -3), ROUND - 1, ROUND - 1)
        font = self.font()
        font.setUnderline(self._filled and self.underMouse())
        painter.setFont(font)
        painter.setPen(look.colour("on_accent") if self._filled else accent)
        painter.drawText(self.rect(), Qt.AlignmentFlag.AlignCenter, self._shown_words())
        painter.end()

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font("strong"))
        self.updateGeometry()
