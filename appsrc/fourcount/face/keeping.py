"""The file of the record in the window: reading it, writing it, and noticing when somebody else has changed it."""

from __future__ import annotations

import os
from pathlib import Path

from PySide6.QtCore import QFileSystemWatcher, QObject, QTimer, Signal

from fourcount.face.session import Document, Session
from fourcount.face.whole_file import Written, digest_at, digest_of, write_whole
from fourcount.publish.files import open_file
from fourcount.record.codec import Refused, encode
from fourcount.record.entry.digits import specimen
from fourcount.wording import keeping as words
from fourcount.wording.refusals import refusal_text

SUFFIX = ".fourcount"
SETTLING = 300
"""Milliseconds after a file has changed, in which whoever writes it may finish."""


def absolute(path: str | os.PathLike[str]) -> Path:
    """A path that stays the same wherever the program is; links in it are kept, as they are the reader's."""
    return Path(os.path.abspath(path))  # noqa: PTH100 -- resolve would follow links


def named(path: Path) -> str:
    """A file's name, to be quoted in a sentence."""
    return specimen(path.name)


def with_suffix(path: Path) -> Path:
    """The path with the suffix of a record; another ending is part of the name, as in "Smith 1.2"."""
    return path if path.suffix.lower() == SUFFIX else path.with_name(path.name + SUFFIX)


class Keeping(QObject):
    """Reads and writes the file of a session's record.

    **Signals**
        changed_elsewhere: the file is no longer as it was last read or written. Carries a sentence.
    """

    changed_elsewhere = Signal(str)

    def __init__(self, session: Session, parent: QObject) -> None:
        super().__init__(parent)
        self._session = session
        self._told: str | None = None
        self._followed: Path | None = None
        self._watcher = QFileSystemWatcher(self)
        self._settling = QTimer(self)
        self._settling.setSingleShot(True)
        self._settling.setInterval(SETTLING)
        self._settling.timeout.connect(self.look)
        self._watcher.fileChanged.connect(self._on_file_changed)
        session.changed.connect(self._on_changed)

    @property
    def path(self) -> Path | None:
        """The record's file, None while it has none."""
        return self._session.document.path

    def open(self, path: Path) -> str:
        """Show the record of a file; "" if all went well, else one sentence, and the window stays as it was."""
        opened = open_file(path)
        if isinstance(opened, str):
            return opened
        self._told = None
        self._session.begin(opened.record, Document(opened.record, path, digest_of(opened.data)))
        return ""

    def save(self, path: Path, over: bool = False) -> Written:
        """Write the record to a file, which is its own from then on; the reason is a whole sentence.

        Nothing that changed meanwhile in the record's own file is written over, unless ``over`` says so. Another file
        has been agreed to by whoever chose its name.
        """
        record, document = self._session.record, self._session.document
        data = encode(record)
        if isinstance(data, Refused):
            return Written(reason=self._sentence(path, refusal_text(data)))
        known = None if over or path != document.path else document.digest
        written = write_whole(path, data, known)
        if written.reason:
            return Written(reason=self._sentence(path, written.reason))
        if written.digest:
            document.path, document.digest, document.saved = path, written.digest, record
            self._told = None
            self._session.end_run()
            self._follow()
            self._session.announce()
        return written

    def look(self) -> None:
        """Tell, once, if the file holds something else than was last read or written there."""
        document = self._session.document
        if document.path is None or not document.digest:
            return
        self._follow()
        now = digest_at(document.path)
        if now == document.digest:
            self._told = None
        elif now != self._told:
            self._told = now
            pattern = words.CHANGED_ELSEWHERE if now else words.GONE
            self.changed_elsewhere.emit(pattern.format(name=named(document.path)))

    def _sentence(self, path: Path, reason: str) -> str:
        return words.NOT_SAVED.format(name=named(path), reason=reason[:1].lower() + reason[1:])

    def _on_changed(self, *_: object) -> None:
        """Watch another file where the record has another; a key that is pressed asks no disk."""
        if self._session.document.path != self._followed:
            self._follow()

    def _follow(self) -> None:
        """Watch the record's file and no other; one that was replaced is watched anew."""
        path = self._followed = self._session.document.path
        wanted = {str(path)} if path is not None else set()
        watched = set(self._watcher.files())
        if watched - wanted:
            self._watcher.removePaths(list(watched - wanted))
        for new in wanted - watched:
            if os.path.isfile(new):  # noqa: PTH113 -- asks without raising
                self._watcher.addPath(new)

    def _on_file_changed(self, _path: str) -> None:
        self._settling.start()
