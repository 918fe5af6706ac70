"""The handout: its outcomes to tick, its paper, the page as it will be, and the ways out to a file or a printer."""

from __future__ import annotations

from itertools import pairwise
from pathlib import Path
from typing import TYPE_CHECKING

from PySide6.QtCore import QSize, Qt, QTimer
from PySide6.QtGui import QAction, QKeySequence, QResizeEvent
from PySide6.QtWidgets import QBoxLayout, QDialog, QScrollArea, QVBoxLayout, QWidget

from fourcount.face import handout_dialogs
from fourcount.face.buttons import Button
from fourcount.face.choice_field import ChoiceField
from fourcount.face.flow import FlowLayout
from fourcount.face.handout_pages import Candidate, candidates, page_of
from fourcount.face.handout_preview import Preview
from fourcount.face.handout_print import print_page
from fourcount.face.handout_tick import LONGEST_NAME, Tick
from fourcount.face.page_file import write_page
from fourcount.face.scroll_bar import ScrollBar
from fourcount.face.text import Words
from fourcount.ink.handout import Handout, NoPage
from fourcount.record import editing
from fourcount.wording import handout as words
from fourcount.wording import handout_labels as labels

if TYPE_CHECKING:
    from fourcount.face.window import MainWindow

PAUSE = 250
"""Milliseconds after the last change of the record before the page is made anew."""

PANEL = 300
LEAST_PAGE = 340
"""Narrower, in pixels, a page beside the panel could not be read."""

ROOM_FOR_A_FRAME = QSize(0, 40)


def open_handout(window: MainWindow) -> HandoutWindow | None:
    """Show the page; a sentence in the window, and None, where no outcome has all that a page needs."""
    window.session.settle()
    found = candidates(window.session.record)
    if all(one.why for one in found):
        window.banner.tell(words.why_no_page([found[window.session.view].why]))
        return None
    window.banner.hide()
    handout = window.findChild(HandoutWindow) or HandoutWindow(window)
    handout.show()
    handout.raise_()
    handout.activateWindow()
    handout.save.setFocus(Qt.FocusReason.OtherFocusReason)
    return handout


class HandoutWindow(QDialog):
    """Follows the record while it is open; ticking an outcome is a step that can be undone like any other."""

    def __init__(self, window: MainWindow) -> None:
        super().__init__(window)
        self._session = window.session
        self._look = window.look
        self._page: Handout | NoPage = NoPage("")
        self._ticks: list[Tick] = []
        self.setWindowTitle(labels.WINDOW_TITLE)
        self.setAttribute(Qt.WidgetAttribute.WA_DeleteOnClose)
        self.preview = Preview(self._look)
        self.heading = Words(self._look, "strong", text=labels.OUTCOMES_NAME)
        self.notes = Words(self._look, "small", "muted")
        self.paper = ChoiceField(self._look, labels.PAPER_NAME, tuple(labels.PAPERS.items()), labels.PAPER_PREFIX)
        self.range = Tick(self._look, words=labels.SHOW_RANGE)
        self.notice = Words(self._look, selectable=True)
        self.save_action = self._action(labels.SAVE, QKeySequence.StandardKey.Save)
        self.print_action = self._action(labels.PRINT, QKeySequence.StandardKey.Print)
        self.close_action = self._action(labels.CLOSE, QKeySequence.StandardKey.Close)
        self._build()
        self._pause = QTimer(self)
        self._pause.setSingleShot(True)
        self._pause.setInterval(PAUSE)
        self._pause.timeout.connect(self._show_page)
        self.save_action.triggered.connect(self._on_save)
        self.print_action.triggered.connect(self._on_print)
        self.close_action.triggered.connect(self.close)
        self.range.clicked.connect(self._show_page)
        self.paper.chosen.connect(self._show_page)
        self._session.changed.connect(self._on_changed)
        self._look.changed.connect(self._on_look_changed)
        self._show_page()
        self.resize(self.sizeHint().boundedTo(self.screen().availableSize() - ROOM_FOR_A_FRAME))

    def _action(self, words_: str, keys: QKeySequence.StandardKey) -> QAction:
        action = QAction(words_, self)
        action.setShortcut(QKeySequence(keys))
        self.addAction(action)
        return action

    def _build(self) -> None:
        self._scroll = QScrollArea()
        self._scroll.setWidget(self.preview)
        self._scroll.setFrameShape(QScrollArea.Shape.NoFrame)
        self._scroll.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        self._scroll.setVerticalScrollBar(ScrollBar(self._look))
        self._scroll.setVerticalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOn)
        self._scroll.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self._panel = QWidget()
        self._column = QVBoxLayout(self._panel)
        self._column.addWidget(self.heading)
        self._list = QVBoxLayout()
        self._column.addLayout(self._list)
        self._column.addWidget(self.notes)
        self._column.addWidget(self.range)
        self._column.addWidget(self.paper)
        self._column.addWidget(self.notice)
        buttons = FlowLayout(self._look, gap=8)
        self.save = Button(self._look, labels.SAVE, self.save_action, filled=True)
        self.print = Button(self._look, labels.PRINT, self.print_action)
        for button in (self.save, self.print):
            buttons.addWidget(button)
        self._column.addLayout(buttons)
        self._column.addStretch(1)
        side = QScrollArea()
        side.setWidget(self._panel)
        side.setWidgetResizable(True)
        side.setFrameShape(QScrollArea.Shape.NoFrame)
        side.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        side.setVerticalScrollBar(ScrollBar(self._look))
        side.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self._side = side
        self._row = row = QBoxLayout(QBoxLayout.Direction.LeftToRight, self)
        row.setContentsMargins(0, 0, 0, 0)
        row.addWidget(self._scroll, 1)
        row.addWidget(side)
        self._on_look_changed()

    # What is shown

    @property
    def page(self) -> Handout | NoPage:
        """The page as the preview shows it, or why there is none."""
        return self._page

    def _show_page(self) -> None:
        """Make the page anew from the record as it stands."""
        self._pause.stop()
        record = self._session.record
        found = candidates(record)
        self._show_ticks(found)
        self._page = page_of(record, found, str(self.paper.currentData()), self.range.isChecked())
        self.preview.show_page(self._page)
        self._fit()
        self.notice.show_words(self._page.sentence if isinstance(self._page, NoPage) else "")
        for action, button in ((self.save_action, self.save), (self.print_action, self.print)):
            action.setEnabled(isinstance(self._page, Handout))
            button.setEnabled(isinstance(self._page, Handout))
            button.setVisible(isinstance(self._page, Handout))

    def _show_ticks(self, found: tuple[Candidate, ...]) -> None:
        while len(self._ticks) > len(found):
            tick = self._ticks.pop()
            self._list.removeWidget(tick)
            tick.deleteLater()
        while len(self._ticks) < len(found):
            tick = Tick(self._look, len(self._ticks))
            tick.clicked.connect(self._on_ticked)
            self._list.addWidget(tick)
            self._ticks.append(tick)
        for below in (self.notes, self.range, self.paper, self.notice, self.save, self.print):
            below.raise_()  # what was made last is read last
        order = [*self._ticks, self.range, self.paper, self.save, self.print, self.preview]
        for before, after in pairwise(order):
            self.setTabOrder(before, after)
        for tick, one in zip(self._ticks, found, strict=True):
            tick.show_candidate(one)
        said = [labels.NOT_READY.format(name=one.name[:LONGEST_NAME], why=one.why) for one in found if one.why]
        self.notes.show_words("\n".join(said))

    # Slots

    def _on_ticked(self, checked: bool) -> None:
        tick = self.sender()
        if isinstance(tick, Tick):
            record = self._session.record
            outcome = editing.with_on_handout(record.outcomes[tick.place], checked)
            self._session.change_record(editing.with_outcome(record, tick.place, outcome), self._session.view)
            self._show_page()

    def _on_changed(self) -> None:
        self._pause.start()

    def _on_save(self) -> None:
        if self._pause.isActive():
            self._show_page()
        if not isinstance(self._page, Handout):
            return
        path = handout_dialogs.ask_path(self, words.file_name(self._session.record))
        if path:
            sentence = write_page(self._page, path)
            self.notice.show_words(sentence or labels.SAVED.format(name=Path(path).name))

    def _on_print(self) -> None:
        if self._pause.isActive():
            self._show_page()
        if not isinstance(self._page, Handout):
            return
        sentence = print_page(self, self._page)
        if sentence:
            self.notice.show_words(sentence)

    # Qt's own

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(PANEL) + 640, 780)

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit()

    def _fit(self) -> None:
        """The panel stands beside the page where that leaves the page a width to be read at, else below it."""
        beside = self.width() >= self._look.px(PANEL) + LEAST_PAGE
        ways, most = QBoxLayout.Direction, 16_777_215  # Qt's own for no limit
        self._row.setDirection(ways.LeftToRight if beside else ways.TopToBottom)
        self._side.setMinimumWidth(self._look.px(PANEL) if beside else 0)
        self._side.setMaximumWidth(self._look.px(PANEL) if beside else most)
        tall = min(self._panel.sizeHint().height(), self.height() // 2)
        self._side.setMinimumHeight(0 if beside else tall)
        self._side.setMaximumHeight(most if beside else tall)
        self._row.activate()
        bar = self._scroll.verticalScrollBar().sizeHint().width()
        self.preview.fit(max(self._scroll.width() - bar, 160))

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(20), px(20), px(20), px(20))
        self._column.setSpacing(px(12))
        self._list.setSpacing(px(4))
        self.setPalette(self._look.qt_palette())
        self._fit()
