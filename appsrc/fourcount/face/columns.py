"""How the three columns stand: side by side where there is room, else stacked, always on one page that scrolls."""

from __future__ import annotations

from itertools import pairwise
from typing import NamedTuple

from PySide6.QtCore import QCoreApplication, QEvent, QPoint, QRect, QSize, Qt, QTimer
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QFrame, QScrollArea, QWidget

from fourcount.face.item_layout import ItemLayout
from fourcount.face.look import Look
from fourcount.face.scroll_bar import ScrollBar

THREE_FROM = 1150
TWO_FROM = 880
"""Widths of the page, at 100% text, from which three columns or two stand side by side."""


MARGIN = 8
"""Pixels that stay free above and below what is brought into view."""


class Arrangement(NamedTuple):
    """Which columns (0 printed, 1 says, 2 patient) are stacked in each pillar, and the pillars' shares of the width."""

    pillars: tuple[tuple[int, ...], ...]
    shares: tuple[int, ...]


THREE = Arrangement(((0,), (1,), (2,)), (385, 506, 389))
TWO = Arrangement(((0, 2), (1,)), (430, 560))
ONE = Arrangement(((0, 1, 2),), (1,))


class ColumnsLayout(ItemLayout):
    """Three items in pillars; each is as tall as its width asks for, and the last of a pillar takes the rest."""

    def __init__(self, look: Look, parent: QWidget) -> None:
        super().__init__(look, parent)
        self._measured: dict[tuple[int, float], list[list[tuple[int, int]]]] = {}
        self.setContentsMargins(0, 0, 0, 0)

    def arrangement(self, width: int) -> Arrangement:
        """The arrangement that a width has room for."""
        room = width / self._look.zoom
        return THREE if room >= THREE_FROM else TWO if room >= TWO_FROM else ONE

    def heightForWidth(self, width: int) -> int:
        return max((sum(h for _, h in pillar) for pillar in self._heights(width)), default=0)

    def invalidate(self) -> None:
        self._measured.clear()
        super().invalidate()

    def minimumSize(self) -> QSize:
        widest = max((item.minimumSize().width() for item in self._items), default=0)
        return QSize(widest, self._look.px(100))

    def setGeometry(self, rect: QRect) -> None:
        super().setGeometry(rect)
        x = rect.x()
        for width, pillar in zip(self._widths(rect.width()), self._heights(rect.width()), strict=True):
            y = rect.y()
            for place, (index, height) in enumerate(pillar):
                tall = rect.bottom() + 1 - y if place == len(pillar) - 1 else height
                self._items[index].setGeometry(QRect(x, y, width, max(tall, height)))
                y += height
            x += width

    def _widths(self, width: int) -> list[int]:
        shares = self.arrangement(width).shares
        edges = [round(width * sum(shares[:i]) / sum(shares)) for i in range(len(shares) + 1)]
        return [right - left for left, right in pairwise(edges)]

    def _heights(self, width: int) -> list[list[tuple[int, int]]]:
        """For each pillar, its columns with the heights they ask for; measured once."""
        asked = (width, self._look.zoom)
        if asked not in self._measured:
            self._measured[asked] = self._measure(width)
        return self._measured[asked]

    def _measure(self, width: int) -> list[list[tuple[int, int]]]:
        pillars = self.arrangement(width).pillars
        return [
            [(index, self._items[index].heightForWidth(wide)) for index in pillar if index < len(self._items)]
            for wide, pillar in zip(self._widths(width), pillars, strict=True)
        ]


class Page(QWidget):
    """The three columns on one page, parted by hairlines."""

    def __init__(self, look: Look, columns: tuple[QWidget, QWidget, QWidget]) -> None:
        super().__init__()
        self._look = look
        self._columns = columns
        layout = ColumnsLayout(look, self)
        for column in columns:
            layout.addWidget(column)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        hairline = self._look.colour("hairline")
        for column in self._columns:
            if column.x() > 0:
                painter.fillRect(column.x(), 0, 1, self.height(), hairline)
            if column.y() > 0:
                painter.fillRect(column.x(), column.y(), column.width(), 1, hairline)
        painter.end()


class PageScroll(QScrollArea):
    """Holds the page, as wide as the window and as tall as it needs.

    Where large text needs more width than a narrow window has, a bar at the foot moves the page sideways.
    """

    def __init__(self, look: Look, page: Page) -> None:
        super().__init__()
        self.setFrameShape(QFrame.Shape.NoFrame)
        self.setWidgetResizable(True)
        self.setVerticalScrollBar(ScrollBar(look))
        self.setVerticalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOn)
        self.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        self.setWidget(page)
        self._page = page
        self._look = look
        self._wanted: tuple[QWidget, QWidget] | None = None

    def take_slim_bar(self) -> None:
        """Take a bar of our own for the foot, which no first paint needs."""
        self.setHorizontalScrollBar(ScrollBar(self._look, Qt.Orientation.Horizontal))

    def show_whole(self, widget: QWidget) -> None:
        """Bring a widget into view, sideways as a whole: Qt itself is content with the cursor in it."""
        self.ensureWidgetVisible(widget)
        if self._page.width() <= self.viewport().width():
            return
        bar, left = self.horizontalScrollBar(), widget.mapTo(self._page, QPoint(0, 0)).x()
        bar.setValue(max(bar.value(), left + widget.width() + MARGIN - self.viewport().width()))
        bar.setValue(min(bar.value(), left - MARGIN))

    def bring(self, first: QWidget, last: QWidget) -> None:
        """Bring two widgets and all between them into view once they are laid out; the first where both is too much."""
        self._wanted = (first, last)
        QTimer.singleShot(0, self._on_laid_out)

    def _on_laid_out(self) -> None:
        wanted, self._wanted = self._wanted, None
        if wanted is None:
            return
        QCoreApplication.sendPostedEvents(None, QEvent.Type.LayoutRequest)
        first, last = wanted
        page, bar = self._page, self.verticalScrollBar()
        top = first.mapTo(page, QPoint(0, 0)).y() - MARGIN
        bottom = last.mapTo(page, QPoint(0, last.height())).y() + MARGIN
        if bottom > bar.value() + self.viewport().height():
            bar.setValue(bottom - self.viewport().height())
        if top < bar.value():
            bar.setValue(top)
