"""The strip under the columns: what holds here, and what always holds."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QEvent, QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QFrame, QHBoxLayout, QScrollArea, QSizePolicy, QVBoxLayout, QWidget

from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.wording import labels

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings

HIGHEST_SHARE = 0.28
"""The largest share of the window's height that the strip takes before it scrolls."""


class CautionLine(QWidget):
    """One caution behind a bar in the caution's colour."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.words = Words(look, selectable=True)
        self.words.setFocusPolicy(Qt.FocusPolicy.ClickFocus)
        layout = QHBoxLayout(self)
        layout.setContentsMargins(12, 0, 0, 0)
        layout.addWidget(self.words)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.fillRect(0, 1, 3, self.height() - 2, self._look.colour("caution"))
        painter.end()


class CautionsStrip(QScrollArea):
    """The cautions of the outcome in view above the block that always stands; scrolls where it would grow too tall."""

    def __init__(self, look: Look, standing: str) -> None:
        super().__init__()
        self._look = look
        self._lines: list[CautionLine] = []
        self._texts: tuple[str, ...] = ()
        self.standing = Words(look, "small", "muted", standing)
        self.setFrameShape(QFrame.Shape.NoFrame)
        self.setWidgetResizable(True)
        self.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        self.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        self.setAccessibleName(labels.COLUMNS["cautions"])
        self._inside = QWidget()
        self._row = QHBoxLayout(self._inside)
        self._head = Words(look, "head", "muted", labels.COLUMNS["cautions"].upper(), wraps=False)
        self._row.addWidget(self._head, 0, Qt.AlignmentFlag.AlignTop)
        self._column = QVBoxLayout()
        self._column.addWidget(self.standing)
        self._row.addLayout(self._column, 1)
        self.setWidget(self._inside)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_state(self, findings: OutcomeFindings | None) -> None:
        """Show a line for each caution that holds."""
        texts: tuple[str, ...] = ()
        if findings and findings.cautions:
            from fourcount.wording.cautions import caution_text

            texts = tuple(caution_text(caution) for caution in findings.cautions)
        if texts == self._texts:
            return
        self._texts = texts
        while len(self._lines) < len(texts):
            line = CautionLine(self._look)
            self._lines.append(line)
            self._column.insertWidget(len(self._lines) - 1, line)
        for i, line in enumerate(self._lines):
            line.words.show_words(texts[i] if i < len(texts) else "")
            line.setVisible(i < len(texts))
        self.fit()

    def fit(self) -> None:
        """Take the height that the text needs, up to a share of the window's."""
        window = self.window()
        width = max(self.viewport().width(), 1)
        needed = self._inside.layout().heightForWidth(width) if self._inside.layout().hasHeightForWidth() else 0
        highest = int(window.height() * HIGHEST_SHARE)
        self.setFixedHeight(min(max(needed, self._look.px(48)), max(highest, self._look.px(64))))

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(600), self.height())

    def paintEvent(self, event: QPaintEvent) -> None:
        super().paintEvent(event)
        painter = QPainter(self.viewport())
        painter.fillRect(0, 0, self.viewport().width(), 1, self._look.colour("hairline"))
        painter.end()

    def event(self, event: QEvent) -> bool:
        if event.type() == QEvent.Type.Resize:
            self.fit()
        return super().event(event)

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._row.setContentsMargins(px(24), px(10), px(24), px(10))
        self._row.setSpacing(px(32))
        self._column.setSpacing(px(4))
        self.fit()
