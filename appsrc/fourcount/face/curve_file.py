"""The curve as it leaves the window: on white, with its heading and its cautions, to a file or the clipboard."""

from __future__ import annotations

from datetime import date
from pathlib import Path
from typing import TYPE_CHECKING

from PySide6.QtCore import QIODevice, QSaveFile
from PySide6.QtWidgets import QFileDialog, QWidget

from fourcount import __version__
from fourcount.ink.curve_sheet import Sheet
from fourcount.record.entry.digits import specimen
from fourcount.wording import curve_labels as labels
from fourcount.wording.exports import PICTURE_FOOT
from fourcount.wording.standing import STANDING

if TYPE_CHECKING:
    from fourcount.ink.curve import Format

WIDTH, HEIGHT = 760, 490
"""Of a page without the texts above and under its curve, for which it grows."""

NO_REASON = ("", "unknown error")

FORMATS: dict[str, Format] = {".png": "png", ".svg": "svg", ".pdf": "pdf"}


def sheet_of(told: tuple[str, ...], family: str) -> Sheet:
    """A page for a file, with the cautions that hold of its curve."""
    last = PICTURE_FOOT.format(standing=STANDING, version=__version__, date=date.today().isoformat())
    return Sheet(WIDTH, HEIGHT, ratio=2.0, family=family, foot=(*told, last))


def format_of(path: str) -> Format | None:
    """The kind of file that a name asks for; None for another one."""
    return FORMATS.get(Path(path).suffix.lower())


def ask_path(parent: QWidget) -> str:
    """Ask where to save; "" where nothing was chosen. A name without a suffix gets that of the kind chosen."""
    path, kind = QFileDialog.getSaveFileName(
        parent, labels.SAVE_TITLE, f"{labels.FILE_NAME}.png", ";;".join(labels.FILTERS.values())
    )
    if path and not Path(path).suffix:
        path += next((suffix for suffix, said in labels.FILTERS.items() if said == kind), ".png")
    return path


def write(path: str, data: bytes) -> str:
    """Write a file, the whole of it or nothing; one sentence that says how it went."""
    target, file = Path(path), QSaveFile(path)
    if file.open(QIODevice.OpenModeFlag.WriteOnly) and file.write(data) == len(data) and file.commit():
        return labels.SAVED.format(name=target.name)
    reason = file.errorString().rstrip(".").lower()
    if reason in NO_REASON:  # a write that stopped in its middle leaves none
        reason = labels.NO_ROOM
    return labels.NOT_SAVED.format(folder=specimen(str(target.parent)), reason=reason)


def unknown(path: str) -> str:
    """The sentence about a kind of file that there is not."""
    return labels.UNKNOWN_SUFFIX.format(name=specimen(Path(path).name))
