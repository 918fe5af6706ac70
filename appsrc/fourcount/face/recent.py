"""The files last opened: a menu of them, which can be cleared and switched off."""

from __future__ import annotations

from pathlib import Path
from typing import TYPE_CHECKING

from PySide6.QtCore import Signal
from PySide6.QtGui import QAction
from PySide6.QtWidgets import QMenu

from fourcount.record.entry.digits import specimen
from fourcount.wording import keeping as words

if TYPE_CHECKING:
    from fourcount.face.settings import Settings

MOST = 8


class Recent(QMenu):
    """The menu "Open recent".

    **Signals**
        chosen: a file of the list is to be opened. Carries its path.
    """

    chosen = Signal(str)

    def __init__(self, settings: Settings, menu: QMenu, before: QAction) -> None:
        super().__init__(words.RECENT_MENU, menu)
        self._settings = settings
        self.paths = [Path(text) for text in settings.recent()[:MOST]]
        self.keeps = QAction(words.KEEP_RECENT, self)
        self.keeps.setCheckable(True)
        self.keeps.setChecked(settings.keeps_recent())
        self.clears = QAction(words.CLEAR_RECENT, self)
        # An action that leaves a menu loses what connects it to that menu itself, so its own signals are not used.
        self.triggered.connect(self._on_triggered)
        menu.insertMenu(before, self)
        self._show()

    @property
    def newest(self) -> Path | None:
        """The file last opened or saved."""
        return self.paths[0] if self.paths else None

    def add(self, path: Path) -> None:
        """Put a file at the head of the list, where there is a list."""
        if self.keeps.isChecked():
            self._take([path, *(other for other in self.paths if other != path)][:MOST])

    def forget(self, path: Path) -> None:
        """Take a file off the list, since it could not be opened."""
        self._take([other for other in self.paths if other != path])

    def forget_all(self) -> None:
        """Empty the list."""
        self._take([])

    def _on_switched(self, on: bool) -> None:
        """Remember files from now on, or none, and then not the old ones either."""
        self._settings.keep(keep_recent=on)
        if not on:
            self.forget_all()

    def _on_triggered(self, action: QAction) -> None:
        if action is self.clears:
            self.forget_all()
        elif action is self.keeps:
            self._on_switched(action.isChecked())
        elif action.data():
            self.chosen.emit(action.data())

    def _take(self, paths: list[Path]) -> None:
        if paths != self.paths:
            self.paths = paths
            self._settings.keep(recent=[str(path) for path in paths])
            self._show()

    def _show(self) -> None:
        for action in self.actions():
            self.removeAction(action)
            if action not in (self.keeps, self.clears):
                action.deleteLater()
        names = [path.name for path in self.paths]
        for number, path in enumerate(self.paths, start=1):
            name = specimen(path.name)
            if names.count(path.name) > 1:
                name = words.RECENT_FOLDER.format(name=name, folder=specimen(path.parent.name))
            entry = words.RECENT_ENTRY.format(number=number, name=name.replace("&", "&&"))
            action = QAction(entry, self)
            action.setData(str(path))
            self.addAction(action)
        self.addSeparator()
        self.addAction(self.clears)
        self.addAction(self.keeps)
        self.clears.setEnabled(bool(self.paths))
