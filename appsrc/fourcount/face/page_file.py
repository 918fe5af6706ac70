"""A finished page written to its file: the whole of it or nothing, and a sentence where that fails."""

from __future__ import annotations

from pathlib import Path

from PySide6.QtCore import QIODevice, QSaveFile

from fourcount.ink.handout import Handout
from fourcount.ink.handout_file import writer_for
from fourcount.record.entry.digits import specimen
from fourcount.wording import handout_labels as labels

NO_REASON = ("", "unknown error")


def write_page(page: Handout, path: str) -> str:
    """Write the page as the kind of file that its name asks for; "" if all went well, else one sentence.

    A file that was there before stays whole until the new one is.
    """
    target = Path(path)
    writer = writer_for(target.name)
    if writer is None:
        return labels.UNKNOWN_SUFFIX.format(name=specimen(target.name))
    file = QSaveFile(str(target))
    if not file.open(QIODevice.OpenModeFlag.WriteOnly):
        return _not_saved(target, file)
    data = writer(page)
    if file.write(data) != len(data) or not file.commit():
        return _not_saved(target, file)
    return ""


def _not_saved(target: Path, file: QSaveFile) -> str:
    reason = file.errorString().rstrip(".").lower()
    if reason in NO_REASON:  # a write that stopped in its middle leaves none
        reason = labels.NO_ROOM
    return labels.NOT_SAVED.format(folder=specimen(str(target.parent)), reason=reason)
