"""A picture in the window: painted as one object that Tab stops at, and described in a full sentence."""

from __future__ import annotations

from typing import TYPE_CHECKING, Protocol

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.wording.spoken import PICTURE

if TYPE_CHECKING:
    from fourcount.ink.style import Style


class Drawn(Protocol):
    """Whatever draws itself at a width."""

    def height(self, style: Style, width: float, /) -> int: ...
    def draw(self, painter: QPainter, style: Style, x: float, y: float, width: float, /) -> float: ...


class PictureView(QWidget):
    """The picture as one object; as tall as its width asks for."""

    def __init__(self, look: Look, name: str) -> None:
        super().__init__()
        self._look = look
        self.picture: Drawn | None = None
        self._heights: dict[int, int] = {}
        policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)
        self._name = name
        self.setAccessibleName(name)
        self.setFocusPolicy(Qt.FocusPolicy.TabFocus)
        self.hide()
        look.changed.connect(self._on_look_changed)

    def show_picture(self, picture: Drawn | None, sentence: str, summary: str = "") -> None:
        """Show a picture, or nothing; an equal one changes nothing. Whoever listens is told what changed."""
        name = PICTURE.format(name=self._name, summary=summary) if summary else self._name
        if name != self.accessibleName():
            self.setAccessibleName(name)
        if sentence != self.accessibleDescription():
            self.setAccessibleDescription(sentence)
        if picture is not None and picture == self.picture:
            return
        self.picture = picture
        self._heights.clear()
        self.setVisible(picture is not None)
        self.updateGeometry()
        self.update()

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        if self.picture is None:
            return 0
        if width not in self._heights:  # a layout asks many times
            self._heights[width] = self.picture.height(self._look, width)
        return self._heights[width]

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(280), self.heightForWidth(max(self.width(), self._look.px(200))))

    def minimumSizeHint(self) -> QSize:
        return QSize(0, self.heightForWidth(self.width()))

    def paintEvent(self, event: QPaintEvent) -> None:
        if self.picture:
            painter = QPainter(self)
            self.picture.draw(painter, self._look, 0, 0, self.width())
            if self.hasFocus():  # above and below, since words and icons begin at the very edge
                for y in (0, self.height() - 2):
                    painter.fillRect(0, y, self.width(), 2, self._look.colour("accent"))
            painter.end()

    def _on_look_changed(self) -> None:
        self._heights.clear()
        self.updateGeometry()
        self.update()
