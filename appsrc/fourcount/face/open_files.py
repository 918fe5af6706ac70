"""Which window has a file open, so that opening it once more brings that window to the front.

Each window holds a lock named after its file in a folder of the reader's own. Who wants that file leaves a wish
beside the lock; the window that holds it watches the folder, takes the wish away, which is its answer, and comes to the
front. Locks end with their process, so that one left by a crash stops nobody, and nothing here listens to anything
but that folder.
"""

from __future__ import annotations

import hashlib
import os
import time
from contextlib import suppress
from pathlib import Path

from PySide6.QtCore import QCoreApplication, QEventLoop, QFileSystemWatcher, QLockFile, QObject, Signal

OPEN_NAME = "open"
"""Of the folder, in that of the reader's own state."""

LONGEST_WAIT = 2.0
"""Seconds for which an answer is waited for: a window that is busy with a figure takes less."""

LOOK_EVERY = 0.02


class OpenFiles(QObject):
    """The file that one window has open, as other windows see it.

    **Signals**
        wanted: somebody opened this window's file once more; come to the front.
    """

    wanted = Signal()

    def __init__(self, folder: Path, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._folder = folder
        self._held: Path | None = None
        self._shared = False
        self._lock: QLockFile | None = None
        self._wish: Path | None = None
        self._watcher = QFileSystemWatcher(self)
        self._watcher.directoryChanged.connect(self._on_folder_changed)

    @property
    def held(self) -> Path | None:
        """The file that this window says it has open."""
        return self._held

    def hold(self, path: Path | None) -> bool:
        """Say that this window has a file open and no other one; False where another window holds it already."""
        if path == self._held:
            return not self._shared
        self.release()
        self._held = path
        if path is None:
            return True
        with suppress(OSError):
            self._folder.mkdir(mode=0o700, parents=True, exist_ok=True)
        lock = _lock(self._folder, path)
        if not lock.tryLock(0):
            self._shared = lock.error() == QLockFile.LockError.LockFailedError
            return not self._shared
        self._lock, self._wish = lock, _wish(self._folder, path)
        with suppress(OSError):
            self._wish.unlink(missing_ok=True)
        if not self._watcher.directories():
            self._watcher.addPath(str(self._folder))
        return True

    def release(self) -> None:
        """Hold nothing any more."""
        if self._lock is not None:
            self._lock.unlock()
        self._held = self._lock = self._wish = None
        self._shared = False

    def _on_folder_changed(self, _folder: str) -> None:
        if self._wish is None or not self._wish.exists():
            return
        with suppress(OSError):
            self._wish.unlink()
            self.wanted.emit()


def show_elsewhere(folder: Path, path: Path) -> bool:
    """Ask the window that has a file open to come to the front; False where there is none, or none that answers."""
    if not os.path.isdir(folder):  # noqa: PTH112 -- asks without raising
        return False
    lock = _lock(folder, path)
    if lock.tryLock(0) or lock.error() != QLockFile.LockError.LockFailedError:
        lock.unlock()
        return False
    wish = _wish(folder, path)
    try:
        wish.write_bytes(b"")
    except OSError:
        return False
    until = time.monotonic() + LONGEST_WAIT
    while time.monotonic() < until:
        if not wish.exists():
            return True
        if QCoreApplication.instance():
            QCoreApplication.processEvents(QEventLoop.ProcessEventsFlag.ExcludeUserInputEvents)
        time.sleep(LOOK_EVERY)
    with suppress(OSError):
        wish.unlink(missing_ok=True)
    return False


def _stem(path: Path) -> str:
    """A name for a file wherever it lies: links followed, and letters alike where the system takes them for alike."""
    with suppress(OSError):
        path = path.resolve()
    return hashlib.sha256(os.fsencode(os.path.normcase(path))).hexdigest()


def _lock(folder: Path, path: Path) -> QLockFile:
    lock = QLockFile(str(folder / f"{_stem(path)}.open"))
    lock.setStaleLockTime(0)
    return lock


def _wish(folder: Path, path: Path) -> Path:
    return folder / f"{_stem(path)}.wanted"
