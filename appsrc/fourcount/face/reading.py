"""The order in which a screen reader goes through the window: that of its layouts, whenever each part was made.

Qt tells a reader the parts of a widget in the order in which they became its children. Many parts are made when they
are first needed, so that this order would be that of their making.
"""

from __future__ import annotations

from typing import TYPE_CHECKING, Any, Protocol, runtime_checkable

from PySide6.QtCore import QEvent, QObject, QTimer
from PySide6.QtWidgets import QGridLayout, QLayout, QLayoutItem, QWidget

if TYPE_CHECKING:
    from fourcount.face.window import MainWindow

PAUSE = 150
"""Milliseconds after the last change of a layout: typing goes first."""


@runtime_checkable
class ReadOtherwise(Protocol):
    """A widget whose parts are read, and reached by Tab, in another order than they stand in."""

    def read_in_order(self, parts: list[QWidget], /) -> list[QWidget]: ...


class Reading(QObject):
    """Keeps the order of a window's parts; it looks again at a pause after anything was laid out anew."""

    def __init__(self, window: MainWindow) -> None:
        super().__init__(window)
        self._window = window
        self._pause = QTimer(self)
        self._pause.setSingleShot(True)
        self._pause.setInterval(PAUSE)
        self._pause.timeout.connect(self.put_in_order)
        window.page.installEventFilter(self)
        self._pause.start()

    def put_in_order(self) -> None:
        """Bring all parts of the window into reading order now."""
        self._pause.stop()
        inside = self._window.centralWidget()
        if inside is not None:
            put_in_order(inside)

    def eventFilter(self, watched: QObject, event: QEvent) -> bool:
        if event.type() == QEvent.Type.LayoutRequest:
            self._pause.start()
        return False


def put_in_order(root: QWidget) -> None:
    """Bring the children of every widget that has a layout into the order of their reading."""
    for widget in (root, *root.findChildren(QWidget)):
        layout = widget.layout()
        if layout is not None:
            wanted = parts(layout)
            if isinstance(widget, ReadOtherwise):
                wanted = widget.read_in_order(wanted)
            places = {part: place for place, part in enumerate(wanted)}
            now = [child for child in widget.children() if child in places]
            if now != wanted:
                for part in wanted:
                    part.raise_()


def parts(layout: QLayout) -> list[QWidget]:
    """The widgets of a layout and of the layouts in it: line by line in a grid, else as they were added."""
    items = [layout.itemAt(place) for place in range(layout.count())]
    if isinstance(layout, QGridLayout):
        cells = sorted(range(layout.count()), key=lambda place: _cell(layout, place))
        items = [items[place] for place in cells]
    return [part for item in items if item is not None for part in _of_item(item)]


def _cell(grid: QGridLayout, place: int) -> tuple[int, int]:
    at: Any = grid.getItemPosition(place)
    return at[0], at[1]


def _of_item(item: QLayoutItem) -> list[QWidget]:
    inner = item.layout()
    widget = item.widget()
    return parts(inner) if inner is not None else [widget] if widget is not None else []
