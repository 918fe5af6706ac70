"""A slim scroll bar: a handle on the page, without arrows."""

from __future__ import annotations

from PySide6.QtCore import QRectF, QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QScrollBar

from fourcount.face.look import Look


class ScrollBar(QScrollBar):
    """A vertical bar drawn in the palette's outline.

    It always keeps its room and is empty where there is nothing to scroll: a bar that came and went would change the
    width of the text, and with it the height that decides whether the bar is needed.
    """

    def __init__(self, look: Look) -> None:
        super().__init__(Qt.Orientation.Vertical)
        self._look = look

    def sizeHint(self) -> QSize:
        return QSize(12, super().sizeHint().height())

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
        painter.drawRoundedRect(QRectF(handle).adjusted(3, 0, -3, 0), 3, 3)
        painter.end()
