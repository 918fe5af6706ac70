"""Starting the window: the application, its look and settings, and what happens to unexpected errors."""

from __future__ import annotations

import os
import signal
from pathlib import Path

from PySide6.QtCore import QEvent, Signal
from PySide6.QtGui import QFileOpenEvent
from PySide6.QtWidgets import QApplication

from fourcount import __version__
from fourcount.face.errors import ErrorListener
from fourcount.face.later import Later
from fourcount.face.look import Look
from fourcount.face.session import Session
from fourcount.face.settings import Settings, own_folder, own_state_folder
from fourcount.face.window import MainWindow
from fourcount.record.paper import Record

LONGEST_WAIT = 5.0
"""Seconds for which a closed window waits for its threads."""


class Application(QApplication):
    """The application, to which some systems hand a file while it runs.

    **Signals**
        file_wanted: a file is to be opened. Carries its path.
    """

    file_wanted = Signal(str)

    def event(self, event: QEvent) -> bool:
        if isinstance(event, QFileOpenEvent) and event.file():
            self.file_wanted.emit(event.file())
            return True
        return super().event(event)


def make_application(arguments: list[str]) -> QApplication:
    """The one application, named and in a style that takes our palette; the one that runs already if there is one."""
    running = QApplication.instance()
    if isinstance(running, QApplication):
        return running
    application = Application(arguments)
    application.setApplicationName("Fourcount")
    application.setApplicationVersion(__version__)
    application.setDesktopFileName("fourcount")
    application.setStyle("Fusion")
    return application


def make_window(
    settings_folder: Path,
    record: Record | None = None,
    later: Later | None = None,
    state_folder: Path | None = None,
) -> MainWindow:
    """A window on a record, or on an empty one with the choices last used; ``later`` is its worker."""
    settings = Settings(settings_folder, state_folder)
    if record is None:
        record = Record(choices=settings.choices())
    look = Look(settings.zoom(), settings.appearance())
    window = MainWindow(Session(record), look, settings, later or Later())
    look.setParent(window)
    window.session.setParent(window)
    return window


def run(path: str = "") -> int:
    """Open the window, on a file where one is given, and stay until it is closed.

    Where another window has that file open, it comes to the front, and none is opened here.
    """
    if path and _shown_elsewhere(path):
        return 0
    application = make_application(["fourcount"])
    folder = own_folder()
    later = Later()
    window = make_window(folder, later=later, state_folder=own_state_folder())
    window.wanted_file = path
    if isinstance(application, Application):
        application.file_wanted.connect(window.take_file)
    listener = ErrorListener(folder)
    listener.happened.connect(window.tell_unexpected)
    listener.install()
    signal.signal(signal.SIGINT, signal.SIG_DFL)
    window.show()
    status = application.exec()
    listener.remove()
    if not later.finish(LONGEST_WAIT):
        os._exit(status)  # a thread that still runs while the interpreter ends would abort it
    return status


def _shown_elsewhere(path: str) -> bool:
    """Whether another window has the file open and answers."""
    from fourcount.face.keeping import absolute
    from fourcount.face.open_files import OPEN_NAME, show_elsewhere

    return show_elsewhere(own_state_folder() / OPEN_NAME, absolute(path))
