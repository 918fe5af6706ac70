"""A walk through Qt's accessibility tree, depth first, as a screen reader goes; what it finds is kept as plain text.

Qt's own objects of the tree must not outlive their widgets, so that none of them leaves the walk.
"""

from __future__ import annotations

import re
from collections import Counter
from collections.abc import Iterator
from dataclasses import dataclass

from PySide6.QtCore import QRect, Qt
from PySide6.QtGui import QAccessible, QAccessibleInterface
from PySide6.QtWidgets import QApplication, QWidget

from fourcount.face.window import MainWindow

Role, Text = QAccessible.Role, QAccessible.Text
OPERATED = (Role.Button, Role.CheckBox, Role.ComboBox, Role.EditableText, Role.PageTab, Role.Table)
READ = (*OPERATED, Role.StaticText, Role.Cell, Role.ColumnHeader, Role.Dialog, Role.Window, Role.MenuItem)
"""Roles that carry meaning, so that each needs words."""

RAW = re.compile(r"[a-z]+_[a-z]+|[{}]|</?[a-z]|&\w|\bnan\b|\bNone\b|\bGap\b")
"""Keys, patterns that were not filled in, markup, marks of a menu's key, and values that nobody should hear."""

LEAST = 24
"""Pixels of a target's side, or between the middles of two smaller ones."""


@dataclass(frozen=True)
class Heard:
    """What a screen reader hears of one thing, and what the eye has of it."""

    role: Role
    name: str
    description: str
    value: str
    label: str
    seen: bool
    shown: bool
    focusable: bool
    area: QRect
    kind: str
    children: int

    @property
    def told_apart(self) -> str:
        """By what it is told from its neighbours: what it is called, not what it holds."""
        called = self.label or self.description or self.name if self.role == Role.ComboBox else self.name
        return f"{self.role.name} {called}"

    @property
    def said(self) -> str:
        """All of its words."""
        return f"{self.label} {self.name} {self.description}"

    @property
    def takes_a_click(self) -> bool:
        """Whether it is a target of its own, large enough or not."""
        return self.role in OPERATED and self.focusable and self.role != Role.Table


def walk(interface: QAccessibleInterface | None, within_seen: bool = True) -> Iterator[Heard]:
    """One thing and all under it, whether it can be seen or not."""
    if interface is None or not interface.isValid():
        return
    one = _heard(interface, within_seen)
    yield one
    for place in range(interface.childCount()):
        yield from walk(interface.child(place), one.seen)


def everything(widget: QWidget) -> list[Heard]:
    """The walk through a window, once it is laid out and its parts are in order."""
    for _ in range(2):  # what is laid out may ask its neighbours to be laid out anew
        QApplication.processEvents()
    if isinstance(widget, MainWindow):
        widget.reading.put_in_order()  # at once, not at the next pause
    return list(walk(QAccessible.queryAccessibleInterface(widget)))


def tree(widget: QWidget) -> list[Heard]:
    """What a screen reader comes by."""
    return [one for one in everything(widget) if one.seen]


def faults(widget: QWidget) -> list[str]:
    """Whatever is wrong with what a screen reader hears of a window; empty where nothing is."""
    every = everything(widget)
    found = [one for one in every if one.seen]
    operated = Counter(one.told_apart for one in found if one.role in OPERATED)
    return [
        *(f"has no name: {one}" for one in found if (one.role in READ or one.focusable) and not one.name.strip()),
        *(f"says what is not for ears: {one}" for one in found if RAW.search(one.said)),
        *(f"a choice that nobody hears the name of: {one}" for one in found if _nameless_choice(one)),
        *(f"{count} are called {name}" for name, count in operated.items() if count > 1),
        *(f"is hidden and is told, or the other way: {one}" for one in every if one.seen != one.shown),
        *(f"takes no room: {one}" for one in found if one.role in READ and one.area.isEmpty()),
        *(f"is no target: {one}" for one in small_targets(found)),
    ]


def small_targets(found: list[Heard]) -> list[Heard]:
    """Targets under the least size around which another target leaves no room either."""
    targets = [one for one in found if one.takes_a_click]
    return [
        one
        for one in targets
        if min(one.area.width(), one.area.height()) < LEAST
        and any(other is not one and _room(one).intersects(other.area) for other in targets)
    ]


def reading_order(window: QWidget) -> list[QWidget]:
    """Where Tab would stop if it went as the reader does."""
    tree(window)
    return [widget for widget in _depth_first(window) if _is_stop(widget)]


def tab_order(window: QWidget) -> list[QWidget]:
    """Where Tab stops, from the first widget of the reading order on."""
    order: list[QWidget] = []
    widget = window.nextInFocusChain()
    while widget is not None and widget is not window:
        if widget.window() is window and _is_stop(widget):
            order.append(widget)
        widget = widget.nextInFocusChain()
    return order


def names(widgets: list[QWidget]) -> list[str]:
    """What these are called, or what they say."""
    return [
        f"{type(widget).__name__} {widget.accessibleName() or getattr(widget, 'text', str)()}" for widget in widgets
    ]


def one_of(found: list[Heard], kind: str) -> Heard:
    """The one thing of a kind."""
    (only,) = (one for one in found if one.kind == kind)
    return only


def rows_of_table(window: QWidget, kind: str) -> list[list[tuple[str, str, str]]]:
    """Each row's cells: the head of its row, the head of its column, and what stands in it."""
    (table,) = (widget for widget in window.findChildren(QWidget) if type(widget).__name__ == kind)
    found = QAccessible.queryAccessibleInterface(table)
    rows: dict[int, list[tuple[str, str, str]]] = {}
    for place in range(found.childCount()):
        child = found.child(place)
        cell = child.tableCellInterface() if child.role() == Role.Cell else None
        if cell is not None:
            heads = (cell.rowHeaderCells()[0], cell.columnHeaderCells()[0], child)
            rows.setdefault(cell.rowIndex(), []).append(tuple(one.text(QAccessible.Text.Name) for one in heads))
    return list(rows.values())


def _heard(interface: QAccessibleInterface, within_seen: bool) -> Heard:
    state, thing = interface.state(), interface.object()
    widget = thing if isinstance(thing, QWidget) else None
    seen = within_seen and not state.invisible
    return Heard(
        role=interface.role(),
        name=interface.text(Text.Name),
        description=interface.text(Text.Description),
        value=interface.text(Text.Value),
        label=" ".join(
            other.text(Text.Name)
            for other, relation in interface.relations()
            if relation & QAccessible.RelationFlag.Label
        ),
        seen=seen,
        shown=seen if widget is None else widget.isVisible(),
        focusable=bool(state.focusable) and (widget is None or widget.focusPolicy() != Qt.FocusPolicy.NoFocus),
        area=interface.rect(),
        kind=type(thing).__name__,
        children=interface.childCount(),
    )


def _nameless_choice(one: Heard) -> bool:
    return one.role == Role.ComboBox and one.name == one.value and not (one.label or one.description)


def _room(one: Heard) -> QRect:
    room = QRect(0, 0, LEAST, LEAST)
    room.moveCenter(one.area.center())
    return room


def _is_stop(widget: QWidget) -> bool:
    return widget.isVisible() and widget.isEnabled() and bool(widget.focusPolicy() & Qt.FocusPolicy.TabFocus)


def _depth_first(widget: QWidget) -> Iterator[QWidget]:
    for child in widget.children():
        if isinstance(child, QWidget) and not child.isWindow():
            yield child
            yield from _depth_first(child)
