"""The outcomes of the paper as tabs at the right of the header, and a plus that adds one."""

from __future__ import annotations

from PySide6.QtCore import QPoint, QRect, QSize, Qt, Signal
from PySide6.QtGui import QAction, QContextMenuEvent, QMouseEvent, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QApplication, QHBoxLayout, QMenu, QSizePolicy, QTabBar, QToolButton, QWidget

from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import tip
from fourcount.ink.typeset import bounded
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording.patient_labels import ADD_OUTCOME, OUTCOME_PLACE, OUTCOMES, outcome_title

WIDEST_TAB = 190
NARROWEST_TAB = 48
"""Pixels at 100% text; a longer name ends in dots and stands whole in its tip."""

ROUND = 3

SCROLLERS = "QTabBar::scroller {{ width: {width}px; }} QToolButton {{ border: none; background: {page}; }}"
"""The two arrows that are there while the tabs need more room: large enough to be hit, and flat."""


class OutcomeTabs(QTabBar):
    """One tab an outcome; Left and Right go through them, a pull moves the one in view.

    **Signals**
        looked_at: another outcome is to be shown. Carries its place.
        moved: the outcome in view was pulled elsewhere. Carries the place where it goes.
    """

    looked_at = Signal(int)
    moved = Signal(int)

    def __init__(self, look: Look, menu: QMenu) -> None:
        super().__init__()
        self._look = look
        self._menu = menu
        self._pressed: QPoint | None = None
        self._target = -1
        self.setDrawBase(False)
        self.setExpanding(False)
        self.setUsesScrollButtons(True)
        self.setElideMode(Qt.TextElideMode.ElideRight)
        self.setFocusPolicy(Qt.FocusPolicy.StrongFocus)
        self.setSizePolicy(QSizePolicy.Policy.Maximum, QSizePolicy.Policy.Fixed)
        self.setAccessibleName(OUTCOMES)
        for arrow in self.findChildren(QToolButton):
            arrow.setFocusPolicy(Qt.FocusPolicy.NoFocus)  # the keys go through the tabs themselves
        self.currentChanged.connect(self._on_current_changed)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_outcomes(self, outcomes: tuple[Outcome, ...], view: int) -> None:
        """Show a tab for each outcome, and which one is in view."""
        blocked = self.blockSignals(True)
        while self.count() > len(outcomes):
            self.removeTab(self.count() - 1)
        while self.count() < len(outcomes):
            self.addTab("")
        for place, outcome in enumerate(outcomes):
            self._show_name(place, bounded(outcome_title(outcome, place)), len(outcomes))
        self.setCurrentIndex(view)
        self.blockSignals(blocked)

    def tabSizeHint(self, index: int) -> QSize:
        wanted = self.fontMetrics().horizontalAdvance(self._name(index)) + self._look.px(24)
        wide = min(max(wanted, self._look.px(NARROWEST_TAB)), self._look.px(WIDEST_TAB))
        return QSize(wide, self._look.px(28))

    def minimumTabSizeHint(self, index: int) -> QSize:
        return self.tabSizeHint(index)

    def minimumSizeHint(self) -> QSize:
        return QSize(min(self._look.px(NARROWEST_TAB + 60), super().sizeHint().width()), self._look.px(28))

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        for place in range(self.count()):
            self._paint_tab(painter, place)
        if self._target >= 0:
            self._paint_target(painter)
        painter.end()

    def _paint_tab(self, painter: QPainter, place: int) -> None:
        look, area, current = self._look, self.tabRect(place), place == self.currentIndex()
        if current:
            painter.setPen(Qt.PenStyle.NoPen)
            painter.setBrush(look.colour("tint"))
            painter.drawRoundedRect(area, ROUND, ROUND)
        if current and self.hasFocus():
            painter.setBrush(Qt.BrushStyle.NoBrush)
            painter.setPen(QPen(look.colour("accent"), 2))
            painter.drawRoundedRect(area.adjusted(1, 1, -1, -1), ROUND, ROUND)
        painter.setFont(look.font("strong" if current else "body"))
        under = area.contains(self.mapFromGlobal(self.cursor().pos())) and self.underMouse()
        painter.setPen(look.colour("accent" if current else "ink" if under else "muted"))
        room = area.adjusted(look.px(8), 0, -look.px(8), 0)
        words = painter.fontMetrics().elidedText(self._name(place), Qt.TextElideMode.ElideRight, room.width())
        painter.drawText(room, Qt.AlignmentFlag.AlignCenter, words)

    def _paint_target(self, painter: QPainter) -> None:
        """A bar where a pulled tab would go."""
        area = self.tabRect(self._target)
        x = area.left() if self._target < self.currentIndex() else area.right() - 1
        painter.fillRect(QRect(x, area.top(), 2, area.height()), self._look.colour("accent"))

    def mousePressEvent(self, event: QMouseEvent) -> None:
        super().mousePressEvent(event)
        here = event.position().toPoint()
        own = event.button() == Qt.MouseButton.LeftButton and self.tabAt(here) == self.currentIndex()
        self._pressed = here if own else None

    def mouseMoveEvent(self, event: QMouseEvent) -> None:
        super().mouseMoveEvent(event)
        here = event.position().toPoint()
        if self._pressed is None or abs(here.x() - self._pressed.x()) < QApplication.startDragDistance():
            return
        over = self.tabAt(QPoint(here.x(), self.height() // 2))
        self._target = over if over != self.currentIndex() else -1
        self.update()

    def mouseReleaseEvent(self, event: QMouseEvent) -> None:
        super().mouseReleaseEvent(event)
        target, self._pressed, self._target = self._target, None, -1
        self.update()
        if target >= 0:
            self.moved.emit(target)

    def contextMenuEvent(self, event: QContextMenuEvent) -> None:
        by_mouse = event.reason() == QContextMenuEvent.Reason.Mouse
        place = self.tabAt(event.pos()) if by_mouse else self.currentIndex()
        if place < 0:
            return
        self.setCurrentIndex(place)
        self._menu.popup(event.globalPos() if by_mouse else self.mapToGlobal(self.tabRect(place).bottomLeft()))

    def _show_name(self, place: int, name: str, count: int) -> None:
        text = name.replace("&", "&&")
        if text != self.tabText(place):
            self.setTabText(place, text)
            self.setTabToolTip(place, tip(name))
        self.setAccessibleTabName(place, f"{name}, {OUTCOME_PLACE.format(place=place + 1, all=count)}")

    def _name(self, place: int) -> str:
        return self.tabText(place).replace("&&", "&")

    def _on_current_changed(self, place: int) -> None:
        if place >= 0:
            self.looked_at.emit(place)

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font("strong"))
        self.setStyleSheet(SCROLLERS.format(width=2 * self._look.px(24), page=self._look.palette.page))
        self.updateGeometry()
        self.update()


class PlusLink(Link):
    """A plus large enough to be hit."""

    def minimumSizeHint(self) -> QSize:
        return self.sizeHint()

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(28), self._look.px(28))

    def _alignment(self) -> Qt.AlignmentFlag:
        return Qt.AlignmentFlag.AlignCenter


class OutcomesBar(QWidget):
    """The tabs and the plus. Made once the window has painted."""

    def __init__(self, look: Look, add: QAction, menu: QMenu) -> None:
        super().__init__()
        self._look = look
        self.tabs = OutcomeTabs(look, menu)
        self.plus = PlusLink(look, "+", add, ADD_OUTCOME)
        self._row = QHBoxLayout(self)
        self._row.setContentsMargins(0, 0, 0, 0)
        self._row.addWidget(self.tabs)
        self._row.addWidget(self.plus)
        self.setSizePolicy(QSizePolicy.Policy.Maximum, QSizePolicy.Policy.Fixed)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_state(self, record: Record, view: int) -> None:
        """Show the paper's outcomes and the one in view."""
        self.tabs.show_outcomes(record.outcomes, view)

    def _on_look_changed(self) -> None:
        self._row.setSpacing(self._look.px(4))
