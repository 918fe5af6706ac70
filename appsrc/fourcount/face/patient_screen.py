"""The patient view: one outcome at a time on a full screen, in plain words, dark on white; Escape leaves it."""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import QEvent, QObject, QSize, Qt
from PySide6.QtGui import QKeyEvent, QResizeEvent
from PySide6.QtWidgets import QBoxLayout, QScrollArea, QVBoxLayout, QWidget

from fourcount.appraisal.appraise import appraise
from fourcount.face.flow import FlowLayout
from fourcount.face.header import Hairline
from fourcount.face.links import Link
from fourcount.face.on_white import OnWhite
from fourcount.face.patient_canvas import Canvas, Scroll
from fourcount.face.scroll_bar import ScrollBar
from fourcount.face.text import Words
from fourcount.ink.plain_picture import Shown, shown
from fourcount.wording import plain_texts
from fourcount.wording.plain_refusal import why_not as why_no_screen

if TYPE_CHECKING:
    from fourcount.face.window import MainWindow
    from fourcount.picture.options import PictureOptions
    from fourcount.record.outcome import Outcome
    from fourcount.record.paper import Choices, Record

__all__ = ["PatientScreen", "open_screen", "why_no_screen"]

FORWARD = (Qt.Key.Key_Right, Qt.Key.Key_PageDown, Qt.Key.Key_N)
BACKWARD = (Qt.Key.Key_Left, Qt.Key.Key_PageUp, Qt.Key.Key_B)
ARROWS = (Qt.Key.Key_Left, Qt.Key.Key_Right, Qt.Key.Key_Up, Qt.Key.Key_Down)
FOOT_MARGIN = 45
USUAL_FOOT = 61
"""How high the foot is, in pixels, at 100% text."""

LINK_GAP = 18


def open_screen(window: MainWindow) -> PatientScreen | None:
    """Show the outcome in view to the patient; a sentence in the window, and None, where something is missing."""
    session = window.session
    session.settle()
    why = why_of(session.outcome, session.record.choices)
    if why:
        window.banner.tell(why)
        return None
    window.banner.hide()
    screen = next((one for one in window.findChildren(PatientScreen) if one.isVisible()), None) or PatientScreen(window)
    screen.go_to(session.view)
    screen.showFullScreen()
    screen.raise_()
    screen.activateWindow()
    screen.canvas.setFocus(Qt.FocusReason.OtherFocusReason)
    return screen


class Ready(NamedTuple):
    """Whether an outcome has all that a page needs; held with what that was found of, so that ids stay theirs."""

    outcome: Outcome
    choices: Choices
    is_so: bool


def why_of(outcome: Outcome, choices: Choices) -> str:
    """Why an outcome of a record cannot be shown; "" where it can."""
    return why_no_screen(outcome, appraise(outcome, choices))


class PatientScreen(QWidget):
    """A window of its own over the whole screen; arrows move among the outcomes that have what they need."""

    def __init__(self, window: MainWindow) -> None:
        super().__init__(window, Qt.WindowType.Window)
        self._session = window.session
        self._look = OnWhite(window.look)
        self._look.setParent(self)
        self._options: PictureOptions = window.patient.options  # icons and arrangement as the clinician chose them
        self._range = False
        self._place = 0
        self._pages: list[int] = []
        self._ready: dict[tuple[int, int], Ready] = {}
        self._outcome: Outcome | None = None
        self.setAttribute(Qt.WidgetAttribute.WA_DeleteOnClose)
        self.setWindowTitle(plain_texts.SCREEN_TITLE)
        self.setAutoFillBackground(True)
        self.setPalette(self._look.qt_palette())
        self.canvas = Canvas(self._look)
        self.foot = Words(self._look, part="muted", text=plain_texts.ONE_STUDY)
        self.place = Words(self._look, part="muted", wraps=False)
        self.back = Link(self._look, plain_texts.BACK)
        self.next = Link(self._look, plain_texts.NEXT)
        self.range = Link(self._look, plain_texts.SHOW_RANGE)
        self.leave = Link(self._look, plain_texts.LEAVE)
        self._build()
        self.back.clicked.connect(self._on_back)
        self.next.clicked.connect(self._on_next)
        self.range.clicked.connect(self._on_range)
        self.leave.clicked.connect(self.close)
        self._look.changed.connect(self._on_look_changed)
        self._session.changed.connect(self._on_changed)
        self._count = len(self._session.record.outcomes)
        self._take_pages()
        self.go_to(self._session.view)

    def _build(self) -> None:
        self._scroll = Scroll()
        self._scroll.setWidget(self.canvas)
        self._scroll.setFrameShape(QScrollArea.Shape.NoFrame)
        self._scroll.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        self._scroll.setVerticalScrollBar(ScrollBar(self._look))
        self._scroll.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self._foot_row = QBoxLayout(QBoxLayout.Direction.LeftToRight)
        self._foot_row.addWidget(self.foot, 1)
        self._links = QWidget()
        links = FlowLayout(self._look, self._links, gap=LINK_GAP)
        for widget in (self.place, self.back, self.next, self.range, self.leave):
            links.addWidget(widget)
        self._foot_row.addWidget(self._links)
        self._column = column = QVBoxLayout(self)
        column.setContentsMargins(0, 0, 0, 0)
        column.setSpacing(0)
        column.addWidget(self._scroll, 1)
        column.addWidget(Hairline(self._look))
        column.addLayout(self._foot_row)
        for before, after in (
            (self.canvas, self.back),
            (self.back, self.next),
            (self.next, self.range),
            (self.range, self.leave),
        ):
            self.setTabOrder(before, after)
        for link in (self.back, self.next, self.range, self.leave):
            link.installEventFilter(self)
        self._on_look_changed()

    @property
    def outcome(self) -> int:
        """The place in the record of the outcome shown."""
        return self._pages[self._place]

    def go_to(self, outcome: int) -> None:
        """Show an outcome of the record, or the nearest one before it that can be shown."""
        self._place = max((place for place, at in enumerate(self._pages) if at <= outcome), default=0)
        self._show()

    def _take_pages(self) -> None:
        """The outcomes that have all they need: a patient is led past the others. Only changed ones are looked at."""
        record, known = self._session.record, self._ready
        self._ready = {}
        for outcome in record.outcomes:
            key = (id(outcome), id(record.choices))
            before = known.get(key)
            self._ready[key] = before or Ready(outcome, record.choices, not why_of(outcome, record.choices))
        self._pages = [
            place for place, outcome in enumerate(record.outcomes) if self._ready[id(outcome), id(record.choices)].is_so
        ]

    def _shown(self, place: int) -> Shown | None:
        record: Record = self._session.record
        outcome = record.outcomes[place]
        options = self._options._replace(uncertainty=self._range, relative=False)
        return shown(outcome, appraise(outcome, record.choices), options)

    def _show(self) -> None:
        it = self._shown(self.outcome)
        if it is None:
            return
        self._outcome = self._session.record.outcomes[self.outcome]
        self.canvas.show_page(it)
        number, count = self._place + 1, len(self._pages)
        several = count > 1
        self.place.show_words(plain_texts.PLACE.format(number=number, all=count) if several else "")
        self.back.setVisible(several)
        self.next.setVisible(several)
        self.back.setEnabled(number > 1)
        self.next.setEnabled(number < count)
        self.range.setVisible(bool(it.words.range_))
        self.range.show_words(plain_texts.HIDE_RANGE if self._range else plain_texts.SHOW_RANGE)
        self._fit()

    def _step(self, by: int) -> None:
        place = min(max(self._place + by, 0), len(self._pages) - 1)
        if place != self._place:
            self._place = place
            self._show()
            self._scroll.verticalScrollBar().setValue(0)

    # Qt's own

    def eventFilter(self, watched: QObject, event: QEvent) -> bool:
        """Arrows turn pages whatever has the focus: buttons side by side would take them to move among themselves."""
        if isinstance(event, QKeyEvent) and event.type() == QEvent.Type.KeyPress and event.key() in ARROWS:
            self.keyPressEvent(event)
            return True
        return super().eventFilter(watched, event)

    def keyPressEvent(self, event: QKeyEvent) -> None:
        key, bar = event.key(), self._scroll.verticalScrollBar()
        if key == Qt.Key.Key_Escape:
            self.close()
        elif key in FORWARD:
            self._step(1)
        elif key in BACKWARD:
            self._step(-1)
        elif key == Qt.Key.Key_Home:
            self._step(-len(self._pages))
        elif key == Qt.Key.Key_End:
            self._step(len(self._pages))
        elif key in (Qt.Key.Key_Down, Qt.Key.Key_Up):
            bar.setValue(bar.value() + self._look.px(60) * (1 if key == Qt.Key.Key_Down else -1))
        else:
            super().keyPressEvent(event)

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit()

    def changeEvent(self, event: QEvent) -> None:
        super().changeEvent(event)
        if event.type() == QEvent.Type.WindowStateChange:
            self._fit()

    def _fit(self) -> None:
        """What can be done stands beside the words where there is room for both, else below them."""
        shown = [
            widget for widget in (self.place, self.back, self.next, self.range, self.leave) if not widget.isHidden()
        ]
        wide = sum(widget.sizeHint().width() for widget in shown) + self._look.px(LINK_GAP) * len(shown)
        words = self.foot.fontMetrics().horizontalAdvance(self.foot.text())
        margins = 2 * max(self.canvas.margin, self._look.px(FOOT_MARGIN))
        beside = wide + words + margins + self._look.px(LINK_GAP) <= self.width()
        ways = QBoxLayout.Direction
        self._foot_row.setDirection(ways.LeftToRight if beside else ways.TopToBottom)
        self._links.setMinimumWidth(wide if beside else 0)
        self._column.activate()
        room = self._scroll.size()
        bar = self._scroll.verticalScrollBar().sizeHint().width()
        self.canvas.take_room(QSize(room.width() - bar, room.height()), self.height() - USUAL_FOOT)
        edge, above = self.canvas.margin or self._look.px(FOOT_MARGIN), self._look.px(10)
        self._foot_row.setContentsMargins(edge, above, edge + bar, above)  # as the page above it

    # Slots

    def _on_back(self) -> None:
        self._step(-1)

    def _on_next(self) -> None:
        self._step(1)

    def _on_range(self) -> None:
        self._range = not self._range
        self._show()

    def _on_changed(self) -> None:
        """Follow the record; where nothing of it can be shown any more, there is nothing to see."""
        at = self._followed()
        self._take_pages()
        if self._pages:
            self.go_to(at)
        else:
            self.close()

    def _followed(self) -> int:
        """Where the outcome shown stands now: moved along; where it is gone, the window's is shown."""
        outcomes, count = self._session.record.outcomes, self._count
        self._count = len(outcomes)
        at = self.outcome if self._pages else 0
        if at < len(outcomes) and outcomes[at] is self._outcome:
            return at
        moved = next((place for place, outcome in enumerate(outcomes) if outcome is self._outcome), None)
        if moved is not None:
            return moved
        return at if count == self._count else self._session.view

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._foot_row.setSpacing(px(10))
        self.place.setFixedHeight(px(26))  # as high as the links beside it
        self._fit()
