"""One measure: name, estimate, interval and drawn strip on a line; its working opens under it."""

from __future__ import annotations

from typing import NamedTuple

from PySide6.QtCore import QRectF, QSize, Qt, Signal
from PySide6.QtGui import QKeyEvent, QPainter, QPaintEvent
from PySide6.QtWidgets import QAbstractButton, QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.ink.strips import draw_strip
from fourcount.ink.style import Role
from fourcount.ink.typeset import CENTRE, LEFT, RIGHT, draw_text, text_height, text_width
from fourcount.picture.scales import Scale
from fourcount.wording.lines import MeasureLine
from fourcount.wording.numbers import INFINITY
from fourcount.wording.printed_labels import OPENED

ONE_LINE_FROM = 430
"""Below this width (at 100% text) estimate and interval stand under the name."""


class Places(NamedTuple):
    """Where the parts of a row stand, in logical pixels from its left edge."""

    name: float
    estimate_right: float
    interval: float
    strip: float
    strip_width: float
    narrow: bool


def places(look: Look, width: float) -> Places:
    """Share a row's width among its parts, alike in every row."""
    strip_width = min(look.px(124), width * 0.3)
    if width < look.px(ONE_LINE_FROM):
        return Places(width - strip_width - look.px(12), 0, 0, width - strip_width, strip_width, True)
    strip = width - strip_width
    estimate_right = width * 0.46
    return Places(width * 0.32, estimate_right, estimate_right + look.px(12), strip, strip_width, False)


def _role(line: MeasureLine) -> Role:
    """Figures are set large, words such as "not determined" are not."""
    return "estimate" if any(mark.isdigit() or mark == INFINITY for mark in line.estimate) else "body"


class ColumnHead(QWidget):
    """Names the column of intervals above the rows, so that no interval stands without its level."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._words = ""
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        look.changed.connect(self._on_look_changed)

    def show_words(self, words: str) -> None:
        """Show the head, or nothing."""
        self.setVisible(bool(words))
        if words != self._words:
            self._words = words
            self.setAccessibleName(words)
            self.update()

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(100), self._look.px(18))

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        x = places(self._look, self.width()).interval
        draw_text(painter, x, 0, self.width() - x, self._words, self._look.font("small"), self._look.palette.muted)
        painter.end()

    def _on_look_changed(self) -> None:
        self.updateGeometry()
        self.update()


class MeasureRow(QAbstractButton):
    """A row that paints itself; Enter, Space or a click shows and hides its working.

    **Signals**
        chosen: the row was pressed. Carries the measure's key.
    """

    chosen = Signal(str)

    def __init__(self, look: Look, key: str) -> None:
        super().__init__()
        self.key = key
        self._look = look
        self._line: MeasureLine | None = None
        self._scale: Scale | None = None
        self._axis: tuple[str, str, str] | None = None
        self._open = False
        self._heights: dict[int, int] = {}
        self.setFocusPolicy(Qt.FocusPolicy.TabFocus)
        self.setCursor(Qt.CursorShape.PointingHandCursor)
        policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)
        self.clicked.connect(self._on_clicked)
        look.changed.connect(self._on_look_changed)

    def show_line(
        self, line: MeasureLine, scale: Scale | None, axis: tuple[str, str, str] | None, is_open: bool
    ) -> None:
        """Show a line on a scale; ``axis`` is given to the last row that shares the scale."""
        if (line, scale, axis, is_open) == (self._line, self._scale, self._axis, self._open):
            return
        self._line, self._scale, self._axis, self._open = line, scale, axis, is_open
        self._heights.clear()
        self.updateGeometry()
        self.update()
        values = line.withheld or ", ".join(part for part in (line.estimate, line.interval) if part)
        name = line.name.replace("\n", ", ")
        self.setAccessibleName(f"{name}: {values}" if values else name)
        opened = OPENED if is_open else ""
        self.setAccessibleDescription("; ".join(part for part in (line.detail, line.note, opened) if part))

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        return self._height(width)

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(300), self._height(self.width()))

    def minimumSizeHint(self) -> QSize:
        return QSize(0, self._height(self.width()))

    def keyPressEvent(self, event: QKeyEvent) -> None:
        if event.key() in (Qt.Key.Key_Return, Qt.Key.Key_Enter):
            self.click()
            return
        super().keyPressEvent(event)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        if self.hasFocus():
            painter.fillRect(self.rect(), self._look.colour("tint"))
            painter.fillRect(0, 0, self.width(), 2, self._look.colour("accent"))
        else:
            painter.fillRect(0, 0, self.width(), 1, self._look.colour("hairline"))
        if self._line:
            self._run(painter, self._line, self.width())
        painter.end()

    def _height(self, width: int) -> int:
        if not self._line:
            return self._look.px(48)
        if width not in self._heights:  # a layout asks many times
            self._heights[width] = round(self._run(None, self._line, width))
        return self._heights[width]

    def _run(self, painter: QPainter | None, line: MeasureLine, width: float) -> float:
        """Walk down the row and give its height; without a painter only measure."""
        look, colours = self._look, self._look.palette
        at = places(look, width)
        top = float(look.px(8))
        room = self._name_room(line, at)
        opener = "▾" if self._open else "▸"
        name = line.name if line.detail else f"{line.name}  {opener}"
        detail = f"{line.detail}  {opener}" if line.detail else ""
        name_height = self._text(painter, 0, top, room, name, "body", colours.ink)
        name_height += self._text(painter, 0, top + name_height, room, detail, "small", colours.muted)
        if line.withheld:
            bottom = self._draw_withheld(painter, line, at, top, name_height, width)
        elif at.narrow:
            bottom = self._draw_values_below(painter, line, at, top, name_height, width)
        else:
            bottom = self._draw_values_beside(painter, line, at, top, name_height, width)
        if self._scale and not line.withheld:
            tall = look.px(20)
            if painter:
                area = QRectF(at.strip + 4, top + look.px(1), at.strip_width - 8, tall)
                draw_strip(painter, area, self._scale, colours, line.estimate_value, line.low, line.high, line.mark)
            bottom = max(bottom, top + tall + look.px(2))
        if self._axis:
            bottom = max(bottom, self._draw_axis(painter, at, top + look.px(24)))
        if line.note:
            bottom += self._text(painter, 0, bottom + look.px(2), width, line.note, "small", colours.muted) + look.px(2)
        return bottom + look.px(8)

    def _name_room(self, line: MeasureLine, at: Places) -> float:
        """Width for the name and its detail: up to the estimate, where the row has one beside it."""
        if not line.estimate and not line.withheld:
            return at.strip + at.strip_width
        if at.narrow or line.withheld:
            return at.name
        return at.estimate_right - text_width(line.estimate, self._look.font(_role(line))) - self._look.px(10)

    def _draw_withheld(
        self, painter: QPainter | None, line: MeasureLine, at: Places, top: float, name_height: float, width: float
    ) -> float:
        if at.narrow:
            y = top + name_height + self._look.px(2)
            return y + self._text(painter, 0, y, width, line.withheld, "body", self._look.palette.muted)
        x = at.name + self._look.px(12)
        tall = self._text(painter, x, top, width - x, line.withheld, "body", self._look.palette.muted)
        return top + max(name_height, tall)

    def _draw_values_below(
        self, painter: QPainter | None, line: MeasureLine, at: Places, top: float, name_height: float, width: float
    ) -> float:
        look, colours = self._look, self._look.palette
        y = top + name_height + look.px(2)
        if self._scale:
            width = at.name
        tall = self._text(painter, 0, y, width, line.estimate, "estimate", colours.ink)
        after = text_width(line.estimate, look.font("estimate")) + look.px(12)
        if after + text_width(line.interval, look.font("body")) > width:
            y += tall
            return y + self._text(painter, 0, y, width, line.interval, "body", colours.muted)
        drop = tall - text_height(line.interval, look.font("body"), width) - look.px(1)
        self._text(painter, after, y + drop, width - after, line.interval, "body", colours.muted)
        return y + tall

    def _draw_values_beside(
        self, painter: QPainter | None, line: MeasureLine, at: Places, top: float, name_height: float, width: float
    ) -> float:
        look, colours = self._look, self._look.palette
        font, body = look.font(_role(line)), look.font("body")
        tall = text_height(line.estimate, font, at.estimate_right) if line.estimate else 0.0
        room = (at.strip - look.px(8) if self._scale else width) - at.interval
        left = at.estimate_right - text_width(line.estimate, font) - 2
        if painter and line.estimate:
            draw_text(painter, left, top, at.estimate_right - left, line.estimate, font, colours.ink, RIGHT)
        drop = max(tall - text_height("0", body, 1_000) - look.px(1), 0)
        interval = self._text(painter, at.interval, top + drop, room, line.interval, "body", colours.muted)
        return top + max(name_height, tall, drop + interval)

    def _draw_axis(self, painter: QPainter | None, at: Places, y: float) -> float:
        look = self._look
        font = look.font("small")
        low, middle, high = self._axis or ("", "", "")
        colour, half = look.palette.muted, at.strip_width / 2 - look.px(4)
        tall = max(text_height(end, font, half) for end in (low, high))
        beside = sum(text_width(f"{part} ", font) for part in (low, middle, high)) < at.strip_width
        if painter:
            draw_text(painter, at.strip, y, half, low, font, colour, LEFT)
            draw_text(painter, at.strip + at.strip_width - half, y, half, high, font, colour, RIGHT)
            below = y if beside else y + tall
            draw_text(painter, at.strip, below, at.strip_width, middle, font, colour, CENTRE)
        return y + tall + (0 if beside else text_height(middle, font, at.strip_width))

    def _text(
        self, painter: QPainter | None, x: float, y: float, width: float, text: str, role: Role, colour: str
    ) -> float:
        if not text:
            return 0.0
        font = self._look.font(role)
        if painter is None:
            return text_height(text, font, width)
        return draw_text(painter, x, y, width, text, font, colour)

    def _on_clicked(self) -> None:
        self.chosen.emit(self.key)

    def _on_look_changed(self) -> None:
        self._heights.clear()
        self.updateGeometry()
        self.update()
