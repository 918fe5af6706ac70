"""A line to type on: a value over a hairline, kept as typed."""

from __future__ import annotations

from collections.abc import Callable

from PySide6.QtCore import QEvent, QRect, QSize, Qt, Signal
from PySide6.QtGui import (
    QAction,
    QContextMenuEvent,
    QDropEvent,
    QFocusEvent,
    QGuiApplication,
    QKeyEvent,
    QKeySequence,
    QPainter,
    QPaintEvent,
)
from PySide6.QtWidgets import QMenu, QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.face.text import TextOnly, tip
from fourcount.ink.style import Role
from fourcount.ink.typeset import bounded

LONGEST_TEXT = 10_000_000
"""Far beyond anything that is pasted: Qt's own limit would cut a text in silence."""

UNDOING = (QKeySequence.StandardKey.Undo, QKeySequence.StandardKey.Redo)


def draw_underline(widget: QWidget, painter: QPainter, look: Look, marked: bool = False) -> None:
    """Draw the edge of a field: a line under it, heavier in the accent's colour while it has the focus."""
    focused = widget.hasFocus()
    part = "caution" if marked else "accent" if focused else "outline"
    width = 2 if focused or marked else 1
    painter.fillRect(QRect(0, widget.height() - width, widget.width(), width), look.colour(part))


class TextField(TextOnly):
    """One line of text that is kept as typed.

    The window's undo is the only one: this field leaves Ctrl+Z to it.

    **Signals**
        edited: a person changed the text. Carries the field's key and the text.
        left: the field lost focus. Carries its key.
        entered: the field got the focus. Carries its key.
    """

    edited = Signal(str, str)
    left = Signal(str)
    entered = Signal(str)

    def __init__(self, look: Look, field: str, name: str, hint: str = "", role: Role = "body") -> None:
        super().__init__()
        self.field = field
        self.marked = False
        self._look = look
        self._role: Role = role
        self.setFrame(False)
        self.setMaxLength(LONGEST_TEXT)
        self.setTextMargins(-2, 0, -2, 0)
        self.setAccessibleName(name)
        self.setPlaceholderText(hint)
        self.setMinimumWidth(0)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        self.textEdited.connect(self._on_text_edited)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_text(self, text: str) -> None:
        """Show a text without moving the cursor where it is the same already."""
        if text != self.text():
            self.setText(text)
            if not self.hasFocus():
                self.setCursorPosition(0)

    def show_mark(self, reason: str) -> None:
        """Mark the field with a reason, or take the mark away with an empty one."""
        if bool(reason) != self.marked:
            self.marked = bool(reason)
            self.update()
        if reason != self.accessibleDescription():
            self.setAccessibleDescription(reason)
            self.setToolTip(tip(reason))

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(80), self._look.px(30))

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(40), self._look.px(30))

    def event(self, event: QEvent) -> bool:
        if event.type() != QEvent.Type.ShortcutOverride or not isinstance(event, QKeyEvent):
            return super().event(event)
        if not any(event.matches(key) for key in UNDOING):
            return super().event(event)
        event.ignore()
        return False

    def keyPressEvent(self, event: QKeyEvent) -> None:
        if any(event.matches(key) for key in UNDOING):
            event.ignore()
            return
        if event.matches(QKeySequence.StandardKey.Paste):
            self.paste_text()
            return
        super().keyPressEvent(event)

    def dropEvent(self, event: QDropEvent) -> None:
        text = event.mimeData().text()
        if event.source() is self or not self._taken_as_table(text):
            super().dropEvent(event)
        else:
            event.acceptProposedAction()

    def paste_text(self) -> None:
        """Paste what is on the clipboard: a table where this part of the window takes one, else text as ever."""
        if not self._taken_as_table(QGuiApplication.clipboard().text()):
            self.paste()

    def _taken_as_table(self, text: str) -> bool:
        parent = self.parentWidget()
        while parent is not None:
            if isinstance(parent, FieldsView) and parent.take_table is not None:
                return parent.take_table(self.field, text)
            parent = parent.parentWidget()
        return False

    def own_paste(self, action: QAction, menu: QMenu) -> QAction:
        """The entry of a menu that pastes as the key does, in place of Qt's own."""
        ours = QAction(action.text(), menu)
        ours.setEnabled(action.isEnabled())
        ours.triggered.connect(self.paste_text)
        return ours

    def contextMenuEvent(self, event: QContextMenuEvent) -> None:
        menu = self.createStandardContextMenu()
        for action in menu.actions():
            if action.objectName() in ("edit-undo", "edit-redo"):
                menu.removeAction(action)
            elif action.objectName() == "edit-paste":
                menu.insertAction(action, self.own_paste(action, menu))
                menu.removeAction(action)
        if menu.actions() and menu.actions()[0].isSeparator():
            menu.removeAction(menu.actions()[0])
        menu.setAttribute(Qt.WidgetAttribute.WA_DeleteOnClose)
        menu.popup(event.globalPos())

    def focusInEvent(self, event: QFocusEvent) -> None:
        super().focusInEvent(event)
        self.entered.emit(self.field)

    def focusOutEvent(self, event: QFocusEvent) -> None:
        super().focusOutEvent(event)
        self.setCursorPosition(0)
        if event.reason() != Qt.FocusReason.PopupFocusReason:
            self.left.emit(self.field)

    def paintEvent(self, event: QPaintEvent) -> None:
        super().paintEvent(event)
        painter = QPainter(self)
        draw_underline(self, painter, self._look, self.marked)
        painter.end()

    def _on_text_edited(self, text: str) -> None:
        self.edited.emit(self.field, text)

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font(self._role))
        self.updateGeometry()


class QuietField(TextField):
    """A field without an edge until it has the focus or the mouse, for a line that reads as a heading."""

    def sizeHint(self) -> QSize:
        return QSize(super().sizeHint().width(), self._look.px(24))

    def minimumSizeHint(self) -> QSize:
        return QSize(super().minimumSizeHint().width(), self._look.px(24))

    def paintEvent(self, event: QPaintEvent) -> None:
        if self.hasFocus() or not self.text():
            super().paintEvent(event)
            return
        painter = QPainter(self)
        painter.setFont(self.font())
        painter.setPen(self._look.colour("ink"))
        words = self.fontMetrics().elidedText(bounded(self.text()), Qt.TextElideMode.ElideRight, self.width())
        whole = tip(self.text()) if words != self.text() else ""
        if whole != self.toolTip():
            self.setToolTip(whole)
        painter.drawText(self.rect(), self.alignment() | Qt.AlignmentFlag.AlignVCenter, words)
        if self.underMouse():
            draw_underline(self, painter, self._look)
        painter.end()


class FieldsView(QWidget):
    """A part of the window that holds fields, and speaks for all of them.

    **Signals**
        edited: a person changed a text. Carries the field and the text.
        left: a field lost focus. Carries the field.

    ``take_table`` is asked about a text that is pasted or dropped into one of the fields; it says whether it took it.
    """

    edited = Signal(str, str)
    left = Signal(str)
    take_table: Callable[[str, str], bool] | None = None

    def _pass_on(self, *fields: TextField | FieldsView) -> None:
        """Speak for these fields, or for another part that holds some."""
        for field in fields:
            field.edited.connect(self.edited)
            field.left.connect(self.left)
