"""Starting the window: the application, its look and settings, and what happens to unexpected errors."""

from __future__ import annotations

import os
import signal
from pathlib import Path

from PySide6.QtWidgets import QApplication

from fourcount import __version__
from fourcount.face.errors import ErrorListener
from fourcount.face.later import Later
from fourcount.face.look import Look
from fourcount.face.session import Session
from fourcount.face.settings import Settings, own_folder
from fourcount.face.window import MainWindow
from fourcount.record.paper import Record

LONGEST_WAIT = 5.0
"""Seconds for which a closed window waits for its threads."""


def make_application(arguments: list[str]) -> QApplication:
    """The one application, named and in a style that takes our palette; the one that runs already if there is one."""
    running = QApplication.instance()
    if isinstance(running, QApplication):
        return running
    application = QApplication(arguments)
    application.setApplicationName("Fourcount")
    application.setApplicationVersion(__version__)
    application.setDesktopFileName("fourcount")
    application.setStyle("Fusion")
    return application


def make_window(settings_folder: Path, record: Record | None = None, later: Later | None = None) -> MainWindow:
    """A window on a record, or on an empty one with the choices last used; ``later`` is its worker."""
    settings = Settings(settings_folder)
    if record is None:
        record = Record(choices=settings.choices())
    look = Look(settings.zoom(), settings.appearance())
    window = MainWindow(Session(record), look, settings, later or Later())
    look.setParent(window)
    window.session.setParent(window)
    return window


def run() -> int:
    """Open the window and stay until it is closed."""
    application = make_application(["fourcount"])
    folder = own_folder()
    later = Later()
    window = make_window(folder, later=later)
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
