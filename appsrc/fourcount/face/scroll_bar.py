"""A slim scroll bar: a handle on the page, without arrows."""

from __future__ import annotations

from PySide6.QtCore import QRectF, QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QScrollBar

from fourcount.face.look import Look


class ScrollBar(QScrollBar):
    """A bar drawn in the palette's outline.

    An upright one always keeps its room and is empty where there is nothing to scroll: a bar that came and went would
    change the width of the text, and with it the height that decides whether the bar is needed.
    """

    def __init__(self, look: Look, orientation: Qt.Orientation = Qt.Orientation.Vertical) -> None:
        super().__init__(orientation)
        self._look = look

    def sizeHint(self) -> QSize:
        hint = super().sizeHint()
        return QSize(12, hint.height()) if self.orientation() == Qt.Orientation.Vertical else QSize(hint.width(), 12)

    def paintEvent(self, event: QPaintEvent) -> None:
        if self.maximum() == self.minimum():
            painter = QPainter(self)
            painter.fillRect(self.rect(), self._look.colour("page"))
            painter.end()
            return
        from PySide6.QtWidgets import QStyle, QStyleOptionSlider  # the first paint needs no bar

        option = QStyleOptionSlider()
        self.initStyleOption(option)
        slider = QStyle.SubControl.SC_ScrollBarSlider
        handle = self.style().subControlRect(QStyle.ComplexControl.CC_ScrollBar, option, slider, self)
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        painter.fillRect(self.rect(), self._look.colour("page"))
        painter.setPen(Qt.PenStyle.NoPen)
        painter.setBrush(self._look.colour("outline"))
        upright = self.orientation() == Qt.Orientation.Vertical
        slim = QRectF(handle).adjusted(3, 0, -3, 0) if upright else QRectF(handle).adjusted(0, 3, 0, -3)
        painter.drawRoundedRect(slim, 3, 3)
        painter.end()
