"""The strip under the columns: what holds here, and what always holds."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QFocusEvent, QPainter, QPaintEvent, QPen, QResizeEvent
from PySide6.QtWidgets import QFrame, QScrollArea, QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.face.scroll_bar import ScrollBar
from fourcount.ink.typeset import draw_text, text_height, text_width
from fourcount.wording import labels
from fourcount.wording.standing import STANDING_SHORT

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings

SAID_AT_THE_CELL = ("percent-disagrees", "read-as")
"""Cautions that stand in full under the table."""

HIGHEST_SHARE = 0.24
"""The largest share of the window's height that the strip takes before it scrolls."""

NARROW = 700
"""Below this width (at 100% text) the standing block ends the page, and its shortest form stays in the strip."""


class CautionsText(QWidget):
    """The cautions, each behind a bar in the caution's colour, and the standing block under them."""

    def __init__(self, look: Look, standing: str, strip: QWidget) -> None:
        super().__init__()
        self._look = look
        self._standing = standing
        self._strip = strip
        self.texts: tuple[str, ...] = ()
        policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        return round(self._run(None, width))

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(400), 0)

    def minimumSizeHint(self) -> QSize:
        return QSize(0, 0)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        self._run(painter, self.width())
        if self._strip.hasFocus():
            painter.setPen(QPen(self._look.colour("accent"), 1, Qt.PenStyle.DotLine))
            painter.drawRect(self.rect().adjusted(1, 1, -2, -2))
        painter.end()

    def _run(self, painter: QPainter | None, width: int) -> float:
        """Walk down the strip and give its height; without a painter only measure."""
        look, colours = self._look, self._look.palette
        px, margin, y = look.px, look.px(24), float(look.px(11))
        head = labels.COLUMNS["cautions"]
        beside = width >= px(NARROW)
        x = margin + max(px(104), text_width(head, look.font("head")) + px(16)) if beside else float(margin)
        if painter:
            draw_text(painter, margin, y + px(1), width, head, look.font("head"), colours.muted)
        room = width - x - margin
        if not beside:
            y += text_height(head, look.font("head"), width) + px(6)
            y += self._stand(painter, x, y, room, STANDING_SHORT) + px(6)  # first, so that it never scrolls away
        for text in self.texts:
            tall = text_height(text, look.font("body"), width - x - margin - px(13))
            if painter:
                painter.fillRect(round(x), round(y), 3, round(tall), look.colour("caution"))
                draw_text(painter, x + px(13), y, width - x - margin - px(13), text, look.font("body"), colours.ink)
            y += tall + px(5)
        if not beside:
            return y + px(6)
        y += px(1)
        return y + self._stand(painter, x, y, room, self._standing) + px(11)

    def _stand(self, painter: QPainter | None, x: float, y: float, room: float, text: str) -> float:
        """What always holds; gives its height."""
        font = self._look.font("small")
        if painter:
            draw_text(painter, x, y, room, text, font, self._look.palette.muted)
        return text_height(text, font, room)


class CautionsStrip(QScrollArea):
    """The strip as one accessible text; it scrolls, by keyboard too, where it would grow too tall."""

    def __init__(self, look: Look, standing: str) -> None:
        super().__init__()
        self._look = look
        self._standing = standing
        self._inside = CautionsText(look, standing, self)
        self.setFrameShape(QFrame.Shape.NoFrame)
        self.setWidgetResizable(True)
        self.setVerticalScrollBar(ScrollBar(look))
        self.setVerticalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOn)
        self.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        self.setFocusPolicy(Qt.FocusPolicy.TabFocus)
        self.setAccessibleName(labels.COLUMNS["cautions"])
        self.setAccessibleDescription(standing)
        self.setWidget(self._inside)
        look.changed.connect(self.fit)

    @property
    def texts(self) -> tuple[str, ...]:
        """The cautions on screen, without the standing block."""
        return self._inside.texts

    @property
    def narrow(self) -> bool:
        """Whether the standing block, which would take too much of a narrow window, ends the page instead."""
        return self.window().width() - self.verticalScrollBar().sizeHint().width() < self._look.px(NARROW)

    def show_state(self, findings: OutcomeFindings | None) -> None:
        """Show a line for each caution that holds."""
        texts: tuple[str, ...] = ()
        if findings and findings.cautions:
            from fourcount.wording.cautions import SAID_OF_THE_PATIENT, caution_text

            said = (*SAID_AT_THE_CELL, *SAID_OF_THE_PATIENT)
            texts = tuple(caution_text(c) for c in findings.cautions if c.key not in said)
        if texts != self._inside.texts:
            self._inside.texts = texts
            self.setAccessibleDescription(" ".join((*texts, self._standing)))
            self.fit()

    def fit(self) -> None:
        """Take the height that the text needs, up to a share of the window's."""
        width = self.window().width() - self.verticalScrollBar().sizeHint().width()
        needed = self._inside.heightForWidth(max(width, 200)) + 1
        highest = max(int(self.window().height() * HIGHEST_SHARE), self._look.px(56))
        if self.height() != min(needed, highest):
            self.setFixedHeight(min(needed, highest))
        self._inside.updateGeometry()
        self._inside.update()

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self.fit()

    def focusInEvent(self, event: QFocusEvent) -> None:
        super().focusInEvent(event)
        self._inside.update()

    def focusOutEvent(self, event: QFocusEvent) -> None:
        super().focusOutEvent(event)
        self._inside.update()
