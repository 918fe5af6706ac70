"""The curve across starting risks, in a window beside the main one, which stays live while this one draws."""

from __future__ import annotations

from functools import partial
from itertools import pairwise
from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import QSize, Qt, QTimer
from PySide6.QtGui import QAction, QGuiApplication, QImage, QKeySequence, QShowEvent
from PySide6.QtWidgets import QDialog, QScrollArea, QVBoxLayout, QWidget

from fourcount.appraisal.curve import curve, highest_start
from fourcount.appraisal.findings.curve import Curve
from fourcount.face import curve_file
from fourcount.face.buttons import Button
from fourcount.face.choice_field import ChoiceField
from fourcount.face.curve_parts import CurveCanvas, CurveTable
from fourcount.face.curve_worker import CurveWorker
from fourcount.face.flow import FlowLayout
from fourcount.face.links import Link
from fourcount.face.look import family_in_use
from fourcount.face.scroll_bar import ScrollBar
from fourcount.face.text import Words
from fourcount.ink.curve import draw_curve
from fourcount.ink.curve_sheet import Sheet
from fourcount.ink.palette import PAPER, Palette
from fourcount.picture.curve_axes import even_marks, reach_for
from fourcount.wording import curve_labels as labels
from fourcount.wording.curve import CurveWords, View, curve_words, views
from fourcount.wording.curve_cautions import curve_cautions
from fourcount.wording.curve_table import curve_head, curve_rows

if TYPE_CHECKING:
    from fourcount.face.window import MainWindow

PAUSE = 150
"""Milliseconds after the last change before it is drawn: typing goes first."""

SIZE = QSize(900, 660)
MARGIN = 20


class Request(NamedTuple):
    """All that a drawing depends on."""

    curve: Curve
    view: View
    words: CurveWords
    palette: Palette
    sheet: Sheet


def open_curve(window: MainWindow) -> CurveWindow:
    """Show the curve of the outcome in view, or bring its window to the front."""
    window.session.settle()
    shown = window.findChild(CurveWindow) or CurveWindow(window)
    shown.show()
    shown.raise_()
    shown.activateWindow()
    return shown


class Inside(QWidget):
    """What is scrolled: as high as its width asks for, whatever its texts would take in a narrower one."""

    def minimumSizeHint(self) -> QSize:
        return QSize(0, 0)


class CurveWindow(QDialog):
    """Follows the record; nothing in it changes the record. ``drawn`` says whether the drawing is that of its words."""

    def __init__(self, window: MainWindow) -> None:
        super().__init__(window)
        self._session = window.session
        self._look = window.look
        self._worker = CurveWorker(window.later, self)
        self._whole = False
        self._wanted = ""
        self._views: dict[str, View] = {}
        self._now: Request | None = None
        self._asked: Request | None = None
        self.drawn = False
        self.setWindowTitle(labels.WINDOW_TITLE)
        self.setAttribute(Qt.WidgetAttribute.WA_DeleteOnClose)
        self.canvas = CurveCanvas(self._look)
        self.view = ChoiceField(self._look, labels.VIEW_NAME, (), snug=True)
        self.whole = Link(self._look, labels.WHOLE)
        self.numbers = Link(self._look, labels.SHOW_NUMBERS)
        self.sentence = Words(self._look, selectable=True)
        self.notes = Words(self._look, "small", "muted", selectable=True)
        self.table = CurveTable(self._look)
        self.notice = Words(self._look, selectable=True)
        self.save_action = self._action(labels.SAVE, QKeySequence.StandardKey.Save)
        self.copy_action = self._action(labels.COPY_NAME, QKeySequence.StandardKey.Copy)
        self.close_action = self._action(labels.CLOSE, QKeySequence.StandardKey.Close)
        self.save = Button(self._look, labels.SAVE, self.save_action, filled=True)
        self.copy = Button(self._look, labels.COPY, self.copy_action, name=labels.COPY_NAME)
        self._pause = QTimer(self)
        self._pause.setSingleShot(True)
        self._pause.setInterval(PAUSE)
        self._build()
        self._connect_all()
        self._show_state()
        self.view.setFocus(Qt.FocusReason.OtherFocusReason)

    def _action(self, words: str, keys: QKeySequence.StandardKey) -> QAction:
        action = QAction(words, self)
        action.setShortcut(QKeySequence(keys))
        self.addAction(action)
        return action

    def _build(self) -> None:
        top, bottom = FlowLayout(self._look, gap=20), FlowLayout(self._look, gap=12)
        for widget in (self.view, self.whole, self.numbers):
            top.addWidget(widget)
        for button in (self.save, self.copy):
            bottom.addWidget(button)
        inside = Inside()
        self._inside = QVBoxLayout(inside)
        self._inside.setContentsMargins(0, 0, 0, 0)
        self._inside.addWidget(self.canvas, 1)
        for below in (self.sentence, self.notes, self.table):
            self._inside.addWidget(below)
        self.table.hide()
        scroll = QScrollArea()
        scroll.setWidget(inside)
        scroll.setWidgetResizable(True)
        scroll.setFrameShape(QScrollArea.Shape.NoFrame)
        scroll.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        scroll.setVerticalScrollBar(ScrollBar(self._look))
        scroll.setVerticalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOn)
        scroll.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self._scroll = scroll
        self._column = QVBoxLayout(self)
        self._column.addLayout(top)
        self._column.addWidget(scroll, 1)
        self._column.addWidget(self.notice)
        self._column.addLayout(bottom)
        order = (self.view, self.whole, self.numbers, self.canvas, self.sentence, self.notes, self.table, self.save)
        for before, after in pairwise((*order, self.copy)):
            self.setTabOrder(before, after)
        room = self.screen().availableSize() - QSize(40, 60)
        self.resize((SIZE * max(1.0, self._look.zoom)).boundedTo(room))
        self._on_look_changed()

    def _connect_all(self) -> None:
        self._session.changed.connect(self._on_changed)
        self._look.changed.connect(self._on_look_changed)
        self._pause.timeout.connect(self._show_state)
        self._worker.drawn.connect(self._on_drawn)
        self.canvas.resized.connect(self._pause.start)
        self.view.chosen.connect(self._on_view)
        self.whole.clicked.connect(self._on_whole)
        self.numbers.clicked.connect(self._on_numbers)
        self.save_action.triggered.connect(self._on_save)
        self.copy_action.triggered.connect(self._on_copy)
        self.close_action.triggered.connect(self.close)
        self.finished.connect(self._worker.close)

    # What is shown

    def _show_state(self) -> None:
        """Show the words and the numbers of the record as it stands, and ask for the drawing."""
        self._pause.stop()
        findings, outcome = self._session.findings, self._session.outcome
        if findings is None:
            return
        found = curve(findings, 1.0 if self._whole else reach_for(highest_start(findings)))
        offered = [(_key(found, view), view, text) for view, text in views(outcome, found)]
        self._views = {key: view for key, view, _ in offered}
        self.view.show_choices([(key, text) for key, _, text in offered])
        key = self._wanted if self._wanted in self._views else next(iter(self._views), "")
        self.view.show_choice(key)
        view = self._views.get(key, View())
        words = curve_words(self._session.record, outcome, findings, found, view)
        self.canvas.show_words(words.title, words.described)
        self.sentence.show_words(words.sentence)
        self.notes.show_words(" ".join(words.notes))
        self.table.show_rows(curve_head(outcome, found, view), curve_rows(found, view, even_marks(found.reach)))
        self._show_enabled()
        ratio, size = self.devicePixelRatioF(), self.canvas.size()
        sheet = Sheet(size.width(), size.height(), self._look.zoom, ratio, family_in_use())
        self._now = Request(found, view, words, self._look.palette, sheet)
        if self._now != self._asked and self.isVisible():
            self._asked = self._now
            self.drawn = False
            self._worker.ask(self._now, partial(draw_curve, *self._now))

    def _show_enabled(self) -> None:
        """What leaves the window is drawn here and now, so that the library has to be there."""
        for widget in (self.view, self.whole, self.numbers):
            widget.setEnabled(bool(self._views))
        for action, button in ((self.save_action, self.save), (self.copy_action, self.copy)):
            action.setEnabled(bool(self._views) and not self.canvas.image.isNull())
            button.setEnabled(action.isEnabled())

    def _page(self) -> Request | None:
        """The present drawing on a page of its own; None where there is nothing to draw."""
        self._show_state()
        if self._now is None or not self._views or self._session.findings is None:
            return None
        told = curve_cautions(self._session.findings, self._now.curve, self._now.view)
        sheet = curve_file.sheet_of(told, family_in_use())
        return self._now._replace(palette=PAPER, sheet=sheet)

    # Slots

    def _on_changed(self) -> None:
        self.notice.show_words("")
        self._pause.start()

    def _on_drawn(self, key: object, data: bytes) -> None:
        if key is self._asked and isinstance(key, Request):
            image = QImage.fromData(data)
            image.setDevicePixelRatio(key.sheet.ratio)
            self.canvas.show_image(image)
            self.drawn = True
            self._show_enabled()

    def _on_view(self, key: object) -> None:
        self._wanted = str(key)
        self._show_state()

    def _on_whole(self) -> None:
        self._whole = not self._whole
        self.whole.show_words(labels.NEAR if self._whole else labels.WHOLE)
        self._show_state()

    def _on_numbers(self) -> None:
        shown = self.table.isHidden()
        self.table.setVisible(shown)
        self.numbers.show_words(labels.HIDE_NUMBERS if shown else labels.SHOW_NUMBERS)
        if shown:
            QTimer.singleShot(0, self._bring_table)

    def _bring_table(self) -> None:
        self._scroll.ensureWidgetVisible(self.table)

    def _on_save(self) -> None:
        path = curve_file.ask_path(self)
        if not path:
            return
        page, kind = self._page(), curve_file.format_of(path)
        if kind is None:
            self.notice.show_words(curve_file.unknown(path))
        elif page is not None:
            self.notice.show_words(curve_file.write(path, draw_curve(*page, kind)))

    def _on_copy(self) -> None:
        page = self._page()
        if page is not None:
            QGuiApplication.clipboard().setImage(QImage.fromData(draw_curve(*page)))
            self.notice.show_words(labels.COPIED)

    # Qt's own

    def showEvent(self, event: QShowEvent) -> None:
        super().showEvent(event)
        self._pause.start()

    def sizeHint(self) -> QSize:
        return SIZE

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(MARGIN), px(MARGIN), px(8), px(MARGIN))
        self._column.setSpacing(px(12))
        self._inside.setSpacing(px(8))
        self.setPalette(self._look.qt_palette())
        self._pause.start()


def _key(found: Curve, view: View) -> str:
    """A view's name by its effect, which stays where other effects come and go."""
    one = (found.ratios if view.ratios else found.lines)[view.place].effect
    return "-".join(("ratio" if view.ratios else "risk", one.effect, one.measure, "adjusted" if one.adjusted else ""))
