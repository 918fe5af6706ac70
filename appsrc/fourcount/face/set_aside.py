"""Unsaved work set aside at each pause, so that the next start can offer it where this one breaks off.

Every window has a file of its own in the reader's own state folder, and a lock beside it that ends with its process: a
file whose lock can be taken belongs to nobody who still runs. The first line says where the record belongs, the rest
is the record as its file would hold it.
"""

from __future__ import annotations

import os
import time
from contextlib import suppress
from datetime import datetime
from pathlib import Path
from uuid import uuid4

import msgspec
from PySide6.QtCore import QElapsedTimer, QLockFile, QObject, QTimer, Signal

from fourcount.face.session import Session
from fourcount.face.whole_file import write_whole
from fourcount.record.codec import LARGEST_FILE, Refused, decode, encode
from fourcount.record.entry.digits import specimen
from fourcount.record.paper import Record
from fourcount.wording import keeping as words
from fourcount.wording.refusals import refusal_text

PAUSE = 1_500
"""Milliseconds without a change after which the state is set aside."""

LONGEST_RUN = 10_000
"""Milliseconds after which it is set aside though changes go on."""

ENDING = ".aside"
LONGEST_HEAD = 100_000
HALF_WRITTEN_STAYS = 3_600
"""Seconds after which what a broken write left behind is cleared away."""


class Head(msgspec.Struct, frozen=True, kw_only=True):
    """Where a state belongs: when it was set aside, its file ("" for none) and what was last known to stand there."""

    when: datetime
    file: str = ""
    digest: str = ""


class Orphan:
    """What a window that broke off had set aside. Its lock is ours, so that no other window offers it too."""

    def __init__(self, path: Path, lock: QLockFile, head: Head | None, found: Record | str) -> None:
        self.path = path
        self.lock = lock
        self.head = head
        self.found = found

    def leave(self) -> None:
        """Leave it for another start."""
        self.lock.unlock()

    def delete(self) -> None:
        """Do away with it."""
        with suppress(OSError):
            self.path.unlink(missing_ok=True)
        self.lock.unlock()


class SetAside(QObject):
    """Sets the state of a session aside while something in it is unsaved, and deletes it once nothing is.

    **Signals**
        failed: the state could not be set aside; told once until it works again. Carries a sentence.
    """

    failed = Signal(str)

    def __init__(self, session: Session, folder: Path, on: bool, parent: QObject) -> None:
        super().__init__(parent)
        self.folder = folder
        self._session = session
        self._on = on
        self._seen = self._state
        self._path: Path | None = None
        self._lock: QLockFile | None = None
        self._told = ""
        self._running = QElapsedTimer()
        self._timer = QTimer(self)
        self._timer.setSingleShot(True)
        self._timer.timeout.connect(self.keep)
        session.changed.connect(self._on_changed)

    @property
    def path(self) -> Path | None:
        """This window's own file, None while nothing is set aside."""
        return self._path

    @property
    def on(self) -> bool:
        """Whether states are set aside at all."""
        return self._on

    def switch(self, on: bool) -> None:
        """Set aside from now on, or no longer; then what is there is deleted."""
        self._on = on
        self.keep()

    def keep(self) -> None:
        """Set the state aside as it is now, or delete what is there where nothing is unsaved."""
        self._timer.stop()
        if not (self._on and self._session.unsaved):
            self.drop()
            return
        reason = self._write()
        if reason and reason != self._told:
            self.failed.emit(reason)
        self._told = reason

    def drop(self) -> None:
        """Delete what this window has set aside."""
        self._timer.stop()
        if self._path is not None:
            with suppress(OSError):
                self._path.unlink(missing_ok=True)
        if self._lock is not None:
            self._lock.unlock()
        self._path = self._lock = None

    def adopt(self, orphan: Orphan) -> None:
        """Go on with what another window had set aside as this window's own."""
        self.drop()
        self._path, self._lock = orphan.path, orphan.lock
        self.keep()

    def orphans(self) -> list[Orphan]:
        """What windows that broke off have set aside, the newest first; each is held until it is left or deleted."""
        if not os.path.isdir(self.folder):  # noqa: PTH112 -- asks without raising
            return []
        found = []
        with suppress(OSError):
            for path in self.folder.glob(f"*{ENDING}"):
                lock = _lock_of(path)
                if path != self._path and lock.tryLock(0):
                    found.append(Orphan(path, lock, *_read(path)))
            self._clear_away()
        return sorted(found, key=_moment, reverse=True)

    def _write(self) -> str:
        """Write this window's own file; "" or the sentence that says why not."""
        data = encode(self._session.record)
        if isinstance(data, Refused):
            return words.ASIDE_REFUSED.format(reason=refusal_text(data))
        document = self._session.document
        head = Head(when=datetime.now().astimezone(), file=str(document.path or ""), digest=document.digest)
        with suppress(OSError):
            self.folder.mkdir(mode=0o700, parents=True, exist_ok=True)
        if self._path is None:
            self._path = self.folder / f"{uuid4().hex}{ENDING}"
            self._lock = _lock_of(self._path)
            self._lock.tryLock(0)
        try:
            line = msgspec.json.encode(head)
        except UnicodeEncodeError:  # a file name that is no text, as some systems allow
            line = msgspec.json.encode(Head(when=head.when))
        written = write_whole(self._path, line + b"\n" + data, None)
        folder = specimen(str(self.folder))
        return words.ASIDE_FAILED.format(folder=folder, reason=written.reason) if written.reason else ""

    @property
    def _state(self) -> tuple[object, ...]:
        session = self._session
        return session.record, session.document, session.document.saved

    def _on_changed(self, *_: object) -> None:
        """Wait for a pause after each new state; findings that arrive are none."""
        now = self._state
        if all(each is before for each, before in zip(now, self._seen, strict=True)):
            return
        self._seen = now
        if not self._session.unsaved:
            self.keep()
        elif self._on:
            if not self._timer.isActive():
                self._running.start()
            self._timer.start(max(0, min(PAUSE, LONGEST_RUN - self._running.elapsed())))

    def _clear_away(self) -> None:
        """Delete what broken writes have left in the folder, once nobody can be writing it any more."""
        for path in self.folder.glob(f"*{ENDING}.*"):
            if time.time() - path.stat().st_mtime > HALF_WRITTEN_STAYS:
                path.unlink(missing_ok=True)


def _lock_of(path: Path) -> QLockFile:
    """The lock beside a file; it is never too old, only its process can be gone."""
    lock = QLockFile(str(path.with_suffix(".lock")))
    lock.setStaleLockTime(0)
    return lock


def _read(path: Path) -> tuple[Head | None, Record | str]:
    """What stands in a file, or the sentence that says why it cannot be read."""
    try:
        with path.open("rb") as file:
            line, data = file.readline(LONGEST_HEAD), file.read(LARGEST_FILE + 1)
    except OSError:
        return None, words.NO_REASON
    try:
        head = msgspec.json.decode(line, type=Head)
        head.when.astimezone()
    except (msgspec.MsgspecError, UnicodeDecodeError, OverflowError, ValueError, OSError):
        head = None  # nobody knows when or where, but the record may be whole
    record = decode(data)
    return head, refusal_text(record) if isinstance(record, Refused) else record


def _moment(orphan: Orphan) -> float:
    return orphan.head.when.timestamp() if orphan.head else 0.0
