"""A choice among a few: its value over a hairline, with a small triangle."""

from __future__ import annotations

from collections.abc import Mapping, Sequence

from PySide6.QtCore import QEvent, QRect, QSize, Qt, Signal
from PySide6.QtGui import QEnterEvent, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QComboBox, QSizePolicy

from fourcount.face.fields import draw_underline
from fourcount.face.look import Look
from fourcount.face.text import name_choice, tip


class ChoiceField(QComboBox):
    """A choice among a few, shown as its value with a small triangle over a hairline.

    ``notes`` say in the list, and only there, what each choice stands for. Disabled it is a text to read, without
    triangle and hairline.

    **Signals**
        chosen: a person chose. Carries the key of the choice.
    """

    chosen = Signal(object)

    def __init__(
        self, look: Look, name: str, choices: Sequence[tuple[object, str]], prefix: str = "", plain: bool = False,
        whole: bool = False, snug: bool = False, notes: Mapping[str, str] | None = None,
    ) -> None:  # fmt: skip
        super().__init__()
        self._look = look
        self._prefix = prefix
        self._plain = plain
        self._whole = whole or snug
        self._snug = plain or snug
        self._notes = notes
        self._measured: tuple[str, ...] = ()
        self._widest = 0
        for key, text in choices:
            self.addItem(text, key)
        name_choice(self, name)
        self.setFocusPolicy(Qt.FocusPolicy.StrongFocus)  # not by the wheel
        self.setMinimumWidth(0)
        self.setSizeAdjustPolicy(QComboBox.SizeAdjustPolicy.AdjustToMinimumContentsLengthWithIcon)
        fixed = QSizePolicy.Policy.Fixed
        self.setSizePolicy(fixed if self._snug else QSizePolicy.Policy.Expanding, fixed)
        self.activated.connect(self._on_activated)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_choice(self, key: object) -> None:
        """Show the choice with this key."""
        index = self.findData(key)
        if index != self.currentIndex():
            self.setCurrentIndex(index)
            self.updateGeometry()

    def show_choices(self, choices: Sequence[tuple[object, str]]) -> None:
        """Offer these choices; the one chosen stays so, where it is still there."""
        if [self.itemData(place) for place in range(self.count())] != [key for key, _ in choices]:
            chosen = self.currentData()
            self.clear()
            for key, text in choices:
                self.addItem(text, key)
            self.show_choice(chosen)
        for place, (_, text) in enumerate(choices):
            if self.itemText(place) != text:
                self.setItemText(place, text)
                self.updateGeometry()

    def showPopup(self) -> None:
        from fourcount.face.printed.specimens import show_notes

        show_notes(self, self._look, self._notes or {})
        super().showPopup()

    def enterEvent(self, event: QEnterEvent) -> None:
        super().enterEvent(event)
        self.setToolTip(self._notes[self.currentData()] if self._notes else "")

    def wheelEvent(self, event: QEvent) -> None:
        """Leave the wheel to the page: a choice must not change because somebody scrolled over it."""
        event.ignore()

    def sizeHint(self) -> QSize:
        texts = (
            (self._prefix + self.currentText(),) if self._snug else tuple(self.itemText(i) for i in range(self.count()))
        )
        if texts != self._measured:  # a layout asks many times
            self._measured = texts
            self._widest = max((self.fontMetrics().horizontalAdvance(text) for text in texts), default=0)
        return QSize(self._widest + self._look.px(17), self._look.px(26 if self._plain else 30))

    def minimumSizeHint(self) -> QSize:
        return self.sizeHint() if self._plain or self._whole else QSize(self._look.px(56), self._look.px(30))

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        mark = self._look.px(16)
        text_area = self.rect().adjusted(0, 0, -mark, 0)
        quiet = self._plain and not (self.underMouse() or self.hasFocus())
        painter.setFont(self.font())
        painter.setPen(QPen(self._look.colour("muted" if quiet else "ink")))
        words = self._shown_words(text_area.width())
        painter.drawText(text_area, Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignVCenter, words)
        if self.isEnabled():
            painter.drawText(self.rect(), Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignVCenter, "▾")
        if self._notes:
            used = self.fontMetrics().horizontalAdvance(words) + self._look.px(10)
            self._draw_note(painter, text_area.adjusted(used, 0, 0, 0))
        if self.isEnabled() and (not self._plain or self.hasFocus()):
            draw_underline(self, painter, self._look)
        painter.end()

    def _shown_words(self, width: int) -> str:
        """The choice; where it is too long, what stands before its last comma, and what is left out in the tip."""
        whole = self._prefix + self.currentText()
        fits = self.fontMetrics().horizontalAdvance(whole) <= width
        told = "" if fits else tip(whole)
        if not self._notes and told != self.toolTip():
            self.setToolTip(told)
        text = whole if fits else whole.rpartition(", ")[0] or whole
        return self.fontMetrics().elidedText(text, Qt.TextElideMode.ElideRight, width)

    def _draw_note(self, painter: QPainter, area: QRect) -> None:
        """What the choice stands for, beside it, where there is room for all of it."""
        note = self._notes[self.currentData()] if self._notes else ""
        painter.setFont(self._look.font("small"))
        if painter.fontMetrics().horizontalAdvance(note) <= area.width():
            painter.setPen(self._look.colour("muted"))
            painter.drawText(area, Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignVCenter, note)
        painter.setFont(self.font())

    def _on_activated(self, index: int) -> None:
        self.chosen.emit(self.itemData(index))
        self.updateGeometry()

    def _on_look_changed(self) -> None:
        self._measured = ()
        self.setFont(self._look.font("body"))
        self.updateGeometry()
