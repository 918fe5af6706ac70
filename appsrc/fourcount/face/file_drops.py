"""What the system tells the window itself: that a file was dropped on it, and that it is in front again."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QEvent, QObject, QTimer
from PySide6.QtGui import QDragEnterEvent, QDragMoveEvent, QDropEvent

from fourcount.wording.keeping import NOT_LOCAL, ONE_FILE

if TYPE_CHECKING:
    from fourcount.face.file_commands import FileCommands
    from fourcount.face.window import MainWindow


class FileDrops(QObject):
    """Opens the file that is dropped on a window, once the drop is over: a question must not hold up its source."""

    def __init__(self, window: MainWindow, files: FileCommands) -> None:
        super().__init__(window)
        self._files = files
        self._dropped = ""
        window.setAcceptDrops(True)
        window.installEventFilter(self)

    def eventFilter(self, _watched: QObject, event: QEvent) -> bool:
        if event.type() == QEvent.Type.WindowActivate:
            self._files.look()
        elif isinstance(event, QDropEvent) and event.mimeData().hasUrls():  # a drag that enters or moves is one too
            event.acceptProposedAction()
            if not isinstance(event, QDragEnterEvent | QDragMoveEvent):
                self._take([url.toLocalFile() for url in event.mimeData().urls()])
            return True
        return False

    def _take(self, paths: list[str]) -> None:
        if len(paths) != 1:
            self._files.failed.emit(ONE_FILE)
        elif not paths[0]:
            self._files.failed.emit(NOT_LOCAL)
        else:
            self._dropped = paths[0]
            QTimer.singleShot(0, self._open)

    def _open(self) -> None:
        path, self._dropped = self._dropped, ""
        if path:
            self._files.open_path(path)
