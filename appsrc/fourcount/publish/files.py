"""A record read from its file, for the command and the window alike."""

from __future__ import annotations

import os
import stat
from pathlib import Path
from typing import NamedTuple

from fourcount.record.codec import LARGEST_FILE, decode
from fourcount.record.entry.digits import specimen
from fourcount.record.paper import Record
from fourcount.wording import refusals as words


class Opened(NamedTuple):
    """A record, and the bytes that it was read from."""

    record: Record
    data: bytes


def read_file(path: str | os.PathLike[str]) -> Record | str:
    """The record in a file, or one sentence that says why there is none."""
    opened = open_file(path)
    return opened if isinstance(opened, str) else opened.record


def open_file(path: str | os.PathLike[str]) -> Opened | str:
    """The record in a file with its bytes, or one sentence that says why there is none. The file stays as it is.

    Whatever the file holds, nothing is raised; of a huge one, no more is read than a record may have, and what is no
    ordinary file (a pipe, a device) is not waited for.
    """
    try:
        reason: str | bytes = _bytes(Path(path))
    except FileNotFoundError:
        reason = words.NO_SUCH_FILE
    except IsADirectoryError:
        reason = words.A_FOLDER
    except PermissionError:
        reason = words.NOT_PERMITTED
    except (OSError, ValueError):
        reason = words.UNREADABLE
    if isinstance(reason, bytes):
        record = decode(reason)
        if isinstance(record, Record):
            return Opened(record, reason)
        reason = _lowered(words.refusal_text(record))
    return words.CANNOT_BE_OPENED.format(name=specimen(Path(path).name or str(path)), reason=reason)


def _bytes(path: Path) -> bytes | str:
    """The bytes of an ordinary file, at most one more than a record may have."""
    mode = path.stat().st_mode
    if stat.S_ISDIR(mode):
        return words.A_FOLDER
    if not stat.S_ISREG(mode):
        return words.NOT_A_FILE
    with path.open("rb") as file:
        return file.read(LARGEST_FILE + 1)


def _lowered(sentence: str) -> str:
    """A sentence as it goes on behind a colon."""
    return sentence[:1].lower() + sentence[1:]
