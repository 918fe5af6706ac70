"""The line under the menus: the paper's title, where its numbers stand, its outcomes, and short notices."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import Qt, QTimer
from PySide6.QtGui import QPainter, QPaintEvent, QResizeEvent
from PySide6.QtWidgets import QBoxLayout, QHBoxLayout, QSizePolicy, QWidget

from fourcount.face.fields import FieldsView, QuietField
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.paper import Record
from fourcount.wording import labels

if TYPE_CHECKING:
    from fourcount.face.outcomes_bar import OutcomesBar

NOTICE_STAYS = 6_000
"""Milliseconds for which a notice stays."""

NARROW = 700
"""Below this width (at 100% text) title and source stand under each other."""


class Hairline(QWidget):
    """A thin line across the window, between two of its parts."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.setFixedHeight(1)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.fillRect(self.rect(), self._look.colour("hairline"))
        painter.end()


class Header(FieldsView):
    """Title and source, and at the right the paper's outcomes, with a notice of what was just done before them."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.title = QuietField(
            look, "title_text", labels.FIELDS["title_text"], labels.HINTS["title_text"], role="strong"
        )
        self.source = QuietField(look, "source_text", labels.FIELDS["source_text"], labels.HINTS["source_text"])
        self.notice = Words(look, "body", "ink", wraps=False)
        self._timer = QTimer(self)
        self._timer.setSingleShot(True)
        self._timer.setInterval(NOTICE_STAYS)
        self._timer.timeout.connect(self._on_notice_over)
        self._keep_room(True)
        self.notice.setAlignment(Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignVCenter)
        self.bar: OutcomesBar | None = None
        self._narrow = False
        self._right = QHBoxLayout()
        self._right.addWidget(self.notice, 1)
        self._row = QBoxLayout(QBoxLayout.Direction.LeftToRight, self)
        self._row.addWidget(self.title, 5)
        self._row.addWidget(self.source, 4)
        self._row.addLayout(self._right, 6)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        self._pass_on(self.title, self.source)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def take_bar(self, bar: OutcomesBar) -> None:
        """Put the outcomes of the paper at the right end."""
        self.bar = bar
        self._right.addWidget(bar)
        QWidget.setTabOrder(self.source, bar.tabs)
        QWidget.setTabOrder(bar.tabs, bar.plus)
        self._align_bar()

    def tell(self, notice: str) -> None:
        """Show a notice for a while, in room that is kept for it."""
        self._say(notice)
        self._timer.start()

    def _on_notice_over(self) -> None:
        self._say("")

    def _say(self, notice: str) -> None:
        self.notice.setText(notice)
        self.notice.setAccessibleName(notice)
        self.notice.setVisible(bool(notice))
        self._make_room(self.notice.sizeHint().width() if notice else 0)

    def _make_room(self, needed: int) -> None:
        """While a long notice stands, tabs draw together for it, and then what the reader is not typing in."""
        self.notice.setMinimumWidth(0 if self._narrow else needed)
        bar = self.bar.minimumSizeHint().width() + self._right.spacing() if self.bar else 0
        room = (self.width() - self._row.contentsMargins().left() * 2 - self._row.spacing() * 2) * 6 // 15 - bar
        aside = not self._narrow and needed > max(room, 0)
        typing = self.title if self.source.hasFocus() else self.source
        for field in (self.title, self.source):
            field.setVisible(not (aside and field is typing))

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit()

    def _fit(self) -> None:
        """Title, source and notice side by side, or under each other where the window is narrow."""
        narrow = self.width() < self._look.px(NARROW)
        if narrow != self._narrow:
            self._narrow = narrow
            ways = QBoxLayout.Direction
            self._row.setDirection(ways.TopToBottom if narrow else ways.LeftToRight)
            self._keep_room(not narrow)
            self._align_bar()
            self._on_look_changed()
            self._say(self.notice.text())

    def _keep_room(self, kept: bool) -> None:
        """Whether the room of a notice is kept while there is none."""
        policy = QSizePolicy(QSizePolicy.Policy.Ignored, QSizePolicy.Policy.Preferred)
        policy.setRetainSizeWhenHidden(kept)
        self.notice.setSizePolicy(policy)

    def _align_bar(self) -> None:
        """At the right end, or at the left where everything stands under each other."""
        if self.bar:
            sides = Qt.AlignmentFlag
            self._right.setAlignment(self.bar, sides.AlignLeft if self._narrow else sides.AlignRight)

    def show_state(self, record: Record) -> None:
        """Show the paper's own texts."""
        self.title.show_text(record.title_text)
        self.source.show_text(record.source_text)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.fillRect(0, 0, self.width(), 1, self._look.colour("hairline"))
        painter.fillRect(0, self.height() - 1, self.width(), 1, self._look.colour("hairline"))
        painter.end()

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._row.setContentsMargins(px(24), px(5), px(24), px(5))
        self._row.setSpacing(px(2 if self._narrow else 16))
        self._right.setSpacing(px(16))
        self._fit()


class Banner(QWidget):
    """One sentence about something unexpected, until it is dismissed."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.words = Words(look, selectable=True)
        self.dismiss = Link(look, labels.DISMISS)
        self._row = QHBoxLayout(self)
        self._row.addWidget(self.words, 1)
        self._row.addWidget(self.dismiss)
        self.dismiss.clicked.connect(self.hide)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()
        self.hide()

    def tell(self, sentence: str) -> None:
        """Show a sentence."""
        self.words.show_words(sentence)
        self.show()

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.fillRect(self.rect(), self._look.colour("tint"))
        painter.fillRect(0, 0, 4, self.height(), self._look.colour("caution"))
        painter.end()

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._row.setContentsMargins(px(24), px(8), px(24), px(8))
