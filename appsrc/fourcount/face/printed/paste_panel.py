"""What a pasted text was understood as, shown before it is taken where it might be understood otherwise."""

from __future__ import annotations

from PySide6.QtCore import Qt, Signal
from PySide6.QtGui import QKeyEvent, QPainter, QPaintEvent
from PySide6.QtWidgets import QVBoxLayout, QWidget

from fourcount.face.flow import FlowLayout
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.entry.readings import Pasted
from fourcount.record.outcome import Outcome
from fourcount.wording.printed_labels import PASTE_HEAD, PASTE_LINKS


class PastePanel(QWidget):
    """A quiet panel in the column: what was understood, what is uncertain, and three ways on.

    **Signals**
        taken: what is shown is to be taken. Carries the ``Pasted``.
        left: nothing is to be taken.
    """

    taken = Signal(object)
    left = Signal()

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.outcome = Outcome()
        self.pasted: Pasted | None = None
        self._ways: tuple[Pasted, ...] = ()
        self.head = Words(look, "strong", "ink", PASTE_HEAD)
        self.understood = Words(look, "body", "ink", selectable=True)
        self.uncertain = Words(look, "small", "caution")
        self.take = Link(look, PASTE_LINKS["take"])
        self.turn = Link(look, PASTE_LINKS["turn"])
        self.leave = Link(look, PASTE_LINKS["leave"])
        self._column = QVBoxLayout(self)
        for words in (self.head, self.understood, self.uncertain):
            self._column.addWidget(words)
        links = FlowLayout(look)
        for link in (self.take, self.turn, self.leave):
            links.addWidget(link)
        self._column.addLayout(links)
        self.setAccessibleName(PASTE_HEAD)
        self.take.clicked.connect(self._on_take)
        self.turn.clicked.connect(self._on_turn)
        self.leave.clicked.connect(self._on_leave)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def offer(self, pasted: Pasted, outcome: Outcome) -> None:
        """Show what was understood, with the cursor on taking it."""
        from fourcount.record.entry.turning import ways

        self.outcome = outcome
        self._ways = ways(pasted)
        self.turn.setVisible(len(self._ways) > 1)
        self._show(pasted)
        self.show()
        self.take.setFocus(Qt.FocusReason.OtherFocusReason)

    def _show(self, pasted: Pasted) -> None:
        from fourcount.wording.pasted import uncertain, understood

        self.pasted = pasted
        self.understood.show_words("\n".join(understood(pasted, self.outcome)))
        self.uncertain.show_words("\n".join(uncertain(pasted)))
        said = f"{self.understood.text()}\n{self.uncertain.text()}"
        self.setAccessibleDescription(said)
        self.take.setAccessibleDescription(said)

    def keyPressEvent(self, event: QKeyEvent) -> None:
        if event.key() == Qt.Key.Key_Escape:
            self._on_leave()
        elif event.key() in (Qt.Key.Key_Return, Qt.Key.Key_Enter):
            self._on_take()
        else:
            super().keyPressEvent(event)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.fillRect(self.rect(), self._look.colour("tint"))
        painter.fillRect(0, 0, 3, self.height(), self._look.colour("accent"))
        painter.end()

    def _on_take(self) -> None:
        self.hide()
        self.taken.emit(self.pasted)

    def _on_turn(self) -> None:
        self._ways = (*self._ways[1:], self._ways[0])
        self._show(self._ways[0])

    def _on_leave(self) -> None:
        self.hide()
        self.left.emit()

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(14), px(10), px(12), px(8))
        self._column.setSpacing(px(6))
