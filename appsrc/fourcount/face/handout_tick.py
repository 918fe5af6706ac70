"""A box to tick, as large as the text beside it and drawn in the palette: one outcome, or the range, for the page."""

from __future__ import annotations

from PySide6.QtCore import QPoint, QPointF, QRectF, QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QCheckBox, QSizePolicy

from fourcount.face.handout_pages import Candidate
from fourcount.face.look import Look
from fourcount.face.text import tip

LONGEST_NAME = 60
BOX, GAP, HEIGHT = 16, 8, 28


class Tick(QCheckBox):
    """One outcome of the record, at its ``place``; one that is not ready cannot be ticked, and says why."""

    def __init__(self, look: Look, place: int = -1, words: str = "") -> None:
        super().__init__(words)
        self.setAccessibleName(words)
        self.place = place
        self._look = look
        self.setCursor(Qt.CursorShape.PointingHandCursor)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_candidate(self, one: Candidate) -> None:
        """Show its name and whether it is on the page."""
        self.setText(one.name)
        self.setToolTip(tip(one.why or one.name))
        self.setAccessibleName(one.name)
        self.setAccessibleDescription(one.why)
        self.setEnabled(not one.why)
        self.setChecked(one.outcome.on_handout and not one.why)

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(120), self._look.px(HEIGHT))

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(60), self._look.px(HEIGHT))

    def hitButton(self, pos: QPoint) -> bool:
        return self.rect().contains(pos)

    def paintEvent(self, event: QPaintEvent) -> None:
        look, side = self._look, self._look.px(BOX)
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        box = QRectF(2.5, (self.height() - side) / 2 + 0.5, side - 1, side - 1)
        painter.setPen(QPen(look.colour("accent" if self.isChecked() or self.hasFocus() else "outline"), 1.5))
        painter.drawRoundedRect(box, 2, 2)
        if self.isChecked():
            painter.setPen(QPen(look.colour("accent"), side / 7))
            corners = [QPointF(box.left() + box.width() * x, box.top() + box.height() * y) for x, y in MARK]
            painter.drawPolyline(corners)
        words = self.rect().adjusted(side + look.px(GAP), 0, -2, 0)
        painter.setPen(look.colour("ink" if self.isEnabled() else "muted"))
        shown = self.fontMetrics().elidedText(self.text(), Qt.TextElideMode.ElideRight, words.width())
        painter.drawText(words, Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignVCenter, shown)
        if self.hasFocus():
            painter.setPen(QPen(look.colour("accent"), 1, Qt.PenStyle.DotLine))
            painter.drawRect(self.rect().adjusted(0, 0, -1, -1))
        painter.end()

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font("body"))
        self.updateGeometry()
        self.update()


MARK = ((0.22, 0.52), (0.43, 0.74), (0.8, 0.26))
"""The corners of the tick, in shares of its box."""
