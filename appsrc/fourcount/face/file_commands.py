"""What each command of the menu File does, and what becomes of unsaved work when a window goes."""

from __future__ import annotations

import os
import sys
from pathlib import Path
from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, QProcess, QTimer, Signal
from PySide6.QtWidgets import QApplication

from fourcount.face import keeping_dialogs as dialogs
from fourcount.face.keeping import SUFFIX, Keeping, absolute, named, with_suffix
from fourcount.face.open_files import OPEN_NAME, OpenFiles, show_elsewhere
from fourcount.face.recent import Recent
from fourcount.face.session import Document
from fourcount.face.set_aside import SetAside
from fourcount.record.entry.digits import specimen
from fourcount.record.paper import Record
from fourcount.wording import keeping as words

if TYPE_CHECKING:
    from fourcount.face.set_aside import Orphan
    from fourcount.face.settings import Settings
    from fourcount.face.window import MainWindow


class FileCommands(QObject):
    """The slots of one window's files.

    **Signals**
        noticed: a short notice of what went well. Carries its sentence.
        failed: something could not be done. Carries its sentence.
    """

    noticed = Signal(str)
    failed = Signal(str)

    def __init__(self, window: MainWindow, settings: Settings) -> None:
        super().__init__(window)
        self._window = window
        self._session = window.session
        self.keeping = Keeping(window.session, self)
        self.set_aside = SetAside(window.session, settings.state_folder / "aside", settings.sets_aside(), self)
        self.recent = Recent(settings, window.menus["file"], window.actions_by_key["example"])
        self._open = settings.state_folder / OPEN_NAME
        self._settings = settings
        self._left = False
        self._dropped = ""
        self.open_files = OpenFiles(self._open, self)
        self.recent.chosen.connect(self.open_path)
        self.keeping.changed_elsewhere.connect(self.failed)
        self.set_aside.failed.connect(self.failed)
        self.open_files.wanted.connect(self._come_forward)

    # Commands

    def new(self) -> None:
        """Begin with an empty record that has no file yet."""
        if self.may_leave():
            self._window.commands.new_table()

    def example(self) -> None:
        """Show the worked example, which has no file."""
        if self.may_leave():
            self._window.commands.open_example()

    def open(self) -> None:
        """Ask for a file and open it."""
        path = dialogs.ask_open_path(self._window, self._folder())
        if path:
            self.open_path(path)

    def save(self) -> bool:
        """Save into the record's own file, or ask for one; whether it is saved."""
        path = self.keeping.path
        return self.save_as() if path is None else self._save(path)

    def save_as(self) -> bool:
        """Ask for a file and save into it; whether it is saved."""
        chosen = dialogs.ask_save_path(self._window, str(Path(self._folder()) / self._suggested()))
        if not chosen:
            return False
        path = with_suffix(absolute(chosen))
        renamed = path.name != Path(chosen).name
        if renamed and os.path.exists(path) and not dialogs.ask_replace(self._window, named(path)):  # noqa: PTH110
            return False
        return self._save(path)

    def switch_set_aside(self, on: bool) -> None:
        """Set unsaved work aside from now on, or no longer."""
        self._settings.keep(set_aside=on)
        self.set_aside.switch(on)

    def kept(self) -> None:
        """Open the help on what is kept, and where."""
        from fourcount.face.kept_window import kept_window

        kept_window(self._window.look, self._window, self._settings, self.set_aside.folder).show()

    # Opening

    def open_path(self, path: str) -> None:
        """Open a file in this window, or bring the window to the front that has it open already."""
        wanted = absolute(path)
        if wanted != self.keeping.path and show_elsewhere(self._open, wanted):
            self.noticed.emit(words.OPEN_ELSEWHERE.format(name=named(wanted)))
            return
        if not self.may_leave():
            return
        sentence = self.keeping.open(wanted)
        if sentence:
            self.recent.forget(wanted)
            self.failed.emit(sentence)
            return
        self._window.commands.own.bring(self._session.record.choices)
        self._window.commands.cell_wanted.emit()
        self.noticed.emit(words.OPENED.format(name=named(wanted)))
        self._settled_in(wanted)

    def take_dropped(self, paths: list[str]) -> None:
        """Open the file that was dropped, once the drop is over: a question must not hold up where it comes from."""
        if len(paths) != 1:
            self.failed.emit(words.ONE_FILE)
        elif not paths[0]:
            self.failed.emit(words.NOT_LOCAL)
        else:
            self._dropped = paths[0]
            QTimer.singleShot(0, self._open_dropped)

    def _open_dropped(self) -> None:
        self.open_path(self._dropped)

    def open_beside(self, path: str) -> None:
        """Open a file that the system hands over: here while nothing has begun, else in a window of its own."""
        untouched = self.keeping.path is None and self._session.record == self._session.document.saved
        if untouched or absolute(path) == self.keeping.path:
            self.open_path(path)
            self._come_forward()
        else:
            start_another(path)

    def begin(self, path: str) -> None:
        """What a start does once the window stands: open the file it was started with, and offer what was set aside."""
        if path:
            self.open_path(path)
        QTimer.singleShot(0, self.offer)

    def offer(self) -> None:
        """Offer what windows that broke off had set aside, one after the other, until one is opened or none is left."""
        from fourcount.face.recovering import offer_of

        orphans = self.set_aside.orphans()
        for orphan in orphans:
            offered = offer_of(orphan)
            answer = dialogs.ask_recover(self._window.look, self._window, offered)
            if answer == "delete":
                orphan.delete()
            elif answer == "open" and isinstance(orphan.found, Record) and self.may_leave():
                self._recover(orphan, orphan.found, offered.saved, offered.path)
                break
        for other in orphans:
            if other.path != self.set_aside.path:
                other.leave()

    # Leaving

    def may_leave(self) -> bool:
        """Whether the record may go: it is saved, or the reader saves it now or lets it go."""
        if not self._session.unsaved:
            return True
        path = self.keeping.path
        name = f"“{named(path)}”" if path else specimen(self._session.record.title_text) or words.UNTITLED
        answer = dialogs.ask_losing(self._window, name)
        return answer == "discard" or (answer == "save" and self.save())

    def leave(self) -> None:
        """The window closes as usual: nothing of this record is left but its file."""
        self._left = True
        self.set_aside.drop()
        self.open_files.release()

    def follow(self) -> None:
        """Hold the file of the record in view, which an undo can change."""
        if not self._left and self.keeping.path != self.open_files.held:
            self.open_files.hold(self.keeping.path)

    def _save(self, path: Path) -> bool:
        written = self.keeping.save(path)
        if written.conflict:
            answer = dialogs.ask_over(self._window, named(path))
            if answer == "other":
                return self.save_as()
            if answer == "cancel":
                return False
            written = self.keeping.save(path, over=True)
        if written.reason:
            self.failed.emit(written.reason)
            return False
        self.noticed.emit(words.SAVED.format(name=named(path)))
        self._settled_in(path)
        return True

    def _settled_in(self, path: Path) -> None:
        """The record has this file now."""
        self.recent.add(path)
        if not self.open_files.hold(path):
            self.failed.emit(words.OPEN_TWICE.format(name=named(path)))

    def _recover(self, orphan: Orphan, found: Record, saved: Record | None, path: Path | None) -> None:
        """Show a state that was set aside as unsaved; undo leads to what its file holds."""
        digest = orphan.head.digest if orphan.head else ""
        before = saved or Record(choices=found.choices)
        self._session.begin(before, Document(before if path is None else saved, path, digest))
        self._session.change_record(found)
        self._window.commands.own.bring(found.choices)
        self.set_aside.adopt(orphan)
        if path is not None:
            self._settled_in(path)

    def _come_forward(self) -> None:
        window = self._window
        window.setWindowState(window.windowState() & ~window.windowState().WindowMinimized)
        window.show()
        window.raise_()
        window.activateWindow()
        QApplication.alert(window)

    def _folder(self) -> str:
        """Where a question about files begins: beside the record's own file, or the last one."""
        path = self.keeping.path or self.recent.newest
        return str(path.parent) if path else str(Path.home())

    def _suggested(self) -> str:
        path = self.keeping.path
        if path is not None:
            return path.name
        title = specimen(self._session.record.title_text)
        kept = "".join(each if each.isalnum() or each in " -_" else " " for each in title)
        return (" ".join(kept.split()) or words.FIRST_NAME) + SUFFIX


def start_another(path: str) -> None:
    """One more window, as a process of its own: whatever happens to one leaves the other alone."""
    frozen = getattr(sys, "frozen", False)
    arguments = [path] if frozen else ["-m", "fourcount", path]
    QProcess.startDetached(sys.executable, arguments)
