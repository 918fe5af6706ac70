"""What the window remembers between starts: its look, its choices, the names of files. Nothing of any record."""

from __future__ import annotations

import os
from pathlib import Path
from typing import TYPE_CHECKING

from PySide6.QtCore import QByteArray, QSettings, QStandardPaths

from fourcount.face.look import APPEARANCES, ZOOMS
from fourcount.record.paper import FAMILIES, HIGHEST_LEVEL, LOWEST_LEVEL, Choices

if TYPE_CHECKING:
    from fourcount.picture.options import Arrangement, Icons

FOLDER_VARIABLE = "FOURCOUNT_SETTINGS_FOLDER"
"""An environment variable that names another folder for settings and log."""

STATE_NAME = "state"


def own_folder() -> Path:
    """The folder for settings and the log of errors; it is made when something is kept."""
    location = QStandardPaths.writableLocation(QStandardPaths.StandardLocation.GenericConfigLocation)
    return Path(os.environ.get(FOLDER_VARIABLE) or Path(location) / "fourcount")


def own_state_folder() -> Path:
    """The folder for unsaved work and for which files are open, beside the settings where those are elsewhere."""
    location = QStandardPaths.writableLocation(QStandardPaths.StandardLocation.GenericStateLocation)
    elsewhere = os.environ.get(FOLDER_VARIABLE)
    return Path(elsewhere) / STATE_NAME if elsewhere else Path(location) / "fourcount"


class Settings:
    """An ini file in a folder; a folder that cannot be written is no trouble, things are just not remembered."""

    def __init__(self, folder: Path, state_folder: Path | None = None) -> None:
        self.folder = folder
        self.state_folder = state_folder or folder / STATE_NAME
        self._store = QSettings(str(folder / "window.ini"), QSettings.Format.IniFormat)

    def zoom(self) -> float:
        """The text size as a factor, 0.8 to 2; 1 where it is not a number in that range."""
        try:
            zoom = float(str(self._store.value("zoom", 1.0)))
        except ValueError:
            return 1.0
        return zoom if ZOOMS[0] <= zoom <= ZOOMS[-1] else 1.0

    def appearance(self) -> str:
        """ "system", "light" or "dark"."""
        value = str(self._store.value("appearance", "system"))
        return value if value in APPEARANCES else APPEARANCES[0]

    def geometry(self) -> QByteArray:
        """The window's place and size as Qt saved them; empty at the first start."""
        value = self._store.value("geometry", QByteArray())
        return value if isinstance(value, QByteArray) else QByteArray()

    def choices(self) -> Choices:
        """The family and level that a new record starts with."""
        family = str(self._store.value("family", "score"))
        try:
            level = float(str(self._store.value("level", 0.95)))
        except ValueError:
            level = 0.95
        known = next((name for name in FAMILIES if name == family), FAMILIES[0])
        return Choices(family=known, level=level if LOWEST_LEVEL <= level <= HIGHEST_LEVEL else Choices().level)

    def drawing(self) -> tuple[Icons, Arrangement]:
        """How people are drawn, and how the groups of a picture stand, as last chosen."""
        from fourcount.picture.options import ARRANGEMENTS, ICONS  # no first paint draws a picture

        icons, arrangement = str(self._store.value("icons", "")), str(self._store.value("arrangement", ""))
        known = next((name for name in ICONS if name == icons), ICONS[0])
        kept = next((name for name in ARRANGEMENTS if name == arrangement != "bars"), ARRANGEMENTS[0])
        return known, kept  # bars are drawn on demand

    def recent(self) -> list[str]:
        """The paths of the files last opened, the newest first."""
        value = self._store.value("recent", [])
        entries = value if isinstance(value, list) else [value]  # a list of one is read as its one entry
        return [entry for entry in entries if isinstance(entry, str) and entry and "\0" not in entry]

    def keeps_recent(self) -> bool:
        """Whether those names are remembered."""
        return self._switch("keep_recent")

    def sets_aside(self) -> bool:
        """Whether unsaved work is set aside."""
        return self._switch("set_aside")

    def _switch(self, key: str) -> bool:
        """On unless it was switched off."""
        return str(self._store.value(key, "true")).lower() != "false"

    def keep(self, **values: object) -> None:
        """Remember values by name."""
        for key, value in values.items():
            self._store.setValue(key, value)
        self._store.sync()
