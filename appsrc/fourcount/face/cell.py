"""A cell of a table: a count, a percentage or limits in a frame, left with the arrow keys."""

from __future__ import annotations

from PySide6.QtCore import QRectF, QSize, Qt, Signal
from PySide6.QtGui import QFocusEvent, QFontMetrics, QKeyEvent, QPainter, QPaintEvent, QPen, QResizeEvent

from fourcount.face.fields import TextField
from fourcount.face.look import Look
from fourcount.ink.style import Role
from fourcount.ink.typeset import bounded

CELL_ROLES: tuple[Role, ...] = ("cell", "total", "body", "small")
COMPACT_ROLES: tuple[Role, ...] = ("body", "small")


class CountCell(TextField):
    """One count, in a frame of its own; a compact one stands in a row with others.

    **Signals**
        moved: an arrow key or Enter asks for another cell. Carries this cell's field and the key.
    """

    moved = Signal(str, object)

    def __init__(self, look: Look, field: str, compact: bool = False) -> None:
        self._compact = compact
        super().__init__(look, field, "", role="body" if compact else "cell")
        self.setAlignment(Qt.AlignmentFlag.AlignRight)

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(48 if self._compact else 84), self._look.px(30 if self._compact else 40))

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(40 if self._compact else 60), self.sizeHint().height())

    def show_text(self, text: str) -> None:
        super().show_text(text)
        self._fit_text()

    def show_known(self, text: str) -> None:
        """Show in an empty cell the number that is known already from what stands beside it."""
        if text != self.placeholderText():
            self.setPlaceholderText(text)

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit_text()

    def keyPressEvent(self, event: QKeyEvent) -> None:
        key = Qt.Key(event.key())
        plain = not event.modifiers() & ~Qt.KeyboardModifier.KeypadModifier
        at_start = self.cursorPosition() == 0 and not self.hasSelectedText()
        at_end = self.cursorPosition() == len(self.text())
        leaves = (
            key in (Qt.Key.Key_Up, Qt.Key.Key_Down, Qt.Key.Key_Return, Qt.Key.Key_Enter)
            or (key == Qt.Key.Key_Left and at_start)
            or (key == Qt.Key.Key_Right and at_end)
        )
        if plain and leaves:
            self.moved.emit(self.field, key)
            return
        super().keyPressEvent(event)

    def _fit_text(self) -> None:
        """Set a long text in a smaller size, so that it is seen whole."""
        left, right = (2, 4) if self._compact else (6, 8)
        self.setTextMargins(self._look.px(left), 0, self._look.px(right), 0)
        room = self.width() - self._look.px(left + right + 4)
        for role in COMPACT_ROLES if self._compact else CELL_ROLES:
            font = self._look.font(role)
            if QFontMetrics(font).horizontalAdvance(bounded(self.text())) <= room:
                break
        if font != self.font():
            self.setFont(font)

    def focusInEvent(self, event: QFocusEvent) -> None:
        super().focusInEvent(event)
        if event.reason() in (Qt.FocusReason.TabFocusReason, Qt.FocusReason.BacktabFocusReason):
            self.selectAll()

    def paintEvent(self, event: QPaintEvent) -> None:
        super(TextField, self).paintEvent(event)
        part = "caution" if self.marked else "accent" if self.hasFocus() else "outline"
        width = 2.0 if self.marked or self.hasFocus() else 1.0
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        painter.setPen(QPen(self._look.colour(part), width))
        inset = width / 2
        painter.drawRoundedRect(QRectF(self.rect()).adjusted(inset, inset, -inset, -inset), 4, 4)
        if self.marked:
            self._draw_mark(painter)
        painter.end()

    def _draw_mark(self, painter: QPainter) -> None:
        """An exclamation mark before the text, or small in the corner where the text leaves no room."""
        text = self.fontMetrics().horizontalAdvance(bounded(self.text()))
        beside = text + self._look.px(28) < self.width()
        painter.setFont(self._look.font("strong" if beside else "small"))
        place = Qt.AlignmentFlag.AlignVCenter if beside else Qt.AlignmentFlag.AlignTop
        painter.drawText(self.rect().adjusted(8 if beside else 4, 0 if beside else 1, 0, 0), place, "!")
