"""Bytes written to a file, the whole of them or none, and never over something that has not been seen."""

from __future__ import annotations

import hashlib
import os
from pathlib import Path
from typing import NamedTuple

from PySide6.QtCore import QIODevice, QSaveFile

from fourcount.record.codec import LARGEST_FILE
from fourcount.record.entry.digits import specimen
from fourcount.wording import keeping as words

UNSEEN = "unseen"
"""Stands for bytes that cannot be read, and so are none that were read or written."""

NO_REASON = ("", "unknown error")
"""What Qt says of a write that fell short."""


class Written(NamedTuple):
    """How writing went: the digest of what stands there now, or a reason for a sentence, or a conflict."""

    digest: str = ""
    reason: str = ""
    conflict: bool = False


def digest_of(data: bytes) -> str:
    """What bytes are remembered by."""
    return hashlib.sha256(data).hexdigest()


def digest_at(path: Path) -> str:
    """The digest of what stands in a file; "" where there is no file, ``UNSEEN`` where it cannot be read."""
    try:
        if not path.is_file():
            return UNSEEN if path.exists() else ""
        with path.open("rb") as file:
            return digest_of(file.read(LARGEST_FILE + 1))
    except FileNotFoundError:
        return ""
    except (OSError, ValueError):
        return UNSEEN


def write_whole(path: Path, data: bytes, known: str | None) -> Written:
    """Write a file so that it holds the old bytes or the new ones at every moment, whatever breaks off.

    ``known`` is the digest of what was last read or written there. Where the file holds something else by the moment
    before it is replaced, it stays as it is and this is a conflict; None writes over anything. A file that is gone is
    nothing to lose.
    """
    if "\0" in str(path):
        return Written(reason=words.NO_NAME)
    if os.path.isdir(path):  # noqa: PTH112 -- asks without raising where a folder may not be looked into
        return Written(reason=words.A_FOLDER)
    if os.path.exists(path) and not os.path.isfile(path):  # noqa: PTH110, PTH113 -- likewise
        return Written(reason=words.A_DEVICE)  # a pipe or a device would be replaced by a file
    if not os.path.isdir(path.parent):  # noqa: PTH112 -- likewise
        return Written(reason=words.NO_FOLDER.format(folder=specimen(str(path.parent))))
    file = QSaveFile(str(path))
    if not file.open(QIODevice.OpenModeFlag.WriteOnly):
        return Written(reason=_reason(file, words.NO_REASON))
    if file.write(data) != len(data) or not file.flush():
        reason = _reason(file, words.FULL)
        file.cancelWriting()
        return Written(reason=reason)
    if known is not None and digest_at(path) not in ("", known, digest_of(data)):
        file.cancelWriting()
        return Written(conflict=True)
    if not file.commit():
        return Written(reason=_reason(file, words.FULL))
    return Written(digest=digest_of(data))


def _reason(file: QSaveFile, otherwise: str) -> str:
    """What the system says, or a likely reason where it says nothing."""
    said = file.errorString().strip().rstrip(".")
    if said.lower() in NO_REASON:
        return otherwise
    return words.A_REASON.format(reason=said[:1].lower() + said[1:])
