"""A window that a file can be dropped on, and that notices when it is in front again.

The window overrides its own events: a filter of events, written in Python, would hear those of its end as well.
"""

from __future__ import annotations

from PySide6.QtCore import QEvent, Signal
from PySide6.QtGui import QDragEnterEvent, QDropEvent
from PySide6.QtWidgets import QMainWindow


class FileTarget(QMainWindow):
    """Takes files, once somebody listens to what is dropped.

    **Signals**
        dropped: files were dropped. Carries the list of their paths, "" for one that is not on this computer.
        came_forward: the window is the active one again.
    """

    dropped = Signal(object)
    came_forward = Signal()
    wanted_file = ""
    """What it is to open once it has painted."""

    def dragEnterEvent(self, event: QDragEnterEvent) -> None:
        if event.mimeData().hasUrls():
            event.acceptProposedAction()

    def dropEvent(self, event: QDropEvent) -> None:
        event.acceptProposedAction()
        self.dropped.emit([url.toLocalFile() for url in event.mimeData().urls()])

    def changeEvent(self, event: QEvent) -> None:
        super().changeEvent(event)
        if event.type() == QEvent.Type.ActivationChange and self.isActiveWindow():
            self.came_forward.emit()
