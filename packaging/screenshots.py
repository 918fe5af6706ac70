"""Make the pictures of the README anew, from the worked example, without a screen.

    python packaging/screenshots.py [FOLDER]

Run it in the project's environment (``.venv/bin/python``). It writes into assets/screenshots unless another
folder is named.
"""

from __future__ import annotations

import os
import sys
import tempfile
from collections.abc import Callable
from pathlib import Path
from typing import NamedTuple

os.environ["QT_QPA_PLATFORM"] = "offscreen"

from PySide6.QtCore import QEventLoop, QTimer
from PySide6.QtWidgets import QApplication

from fourcount.face.application import make_application, make_window
from fourcount.face.window import MainWindow
from fourcount.record import editing
from fourcount.record.paper import Record
from fourcount.wording.example import worked_example

HERE = Path(__file__).resolve().parent
LONGEST_WAIT = 20_000


class Shot(NamedTuple):
    """One picture: its file, the window's size, text size, appearance, and whether it shows the example."""

    name: str
    width: int = 1280
    height: int = 800
    zoom: float = 1.0
    appearance: str = "light"
    example: bool = True


SHOTS = (
    Shot("light"),
    Shot("dark", appearance="dark"),
    Shot("narrow", 1024, 700),
    Shot("large-text", zoom=2.0),
    Shot("first-start", example=False),
)


def example_at_twelve() -> Record:
    """The worked example carried to a starting risk of 12%."""
    record = worked_example()
    outcome = editing.edit_text(record.outcomes[0], "starting_risk_text", "12%")
    outcome = editing.edit_text(outcome, "starting_risk_source_text", "an invented register")
    return editing.with_outcome(record, 0, outcome)


def wait_for(connect: Callable[[Callable[[], None]], object]) -> None:
    """Run the application until a signal comes, a bounded time."""
    loop = QEventLoop()
    connect(loop.quit)
    QTimer.singleShot(LONGEST_WAIT, loop.quit)
    loop.exec()


def take(shot: Shot, folder: Path, application: QApplication) -> None:
    """Open a window, let it come to rest, and save its picture."""
    with tempfile.TemporaryDirectory() as settings:
        window: MainWindow = make_window(Path(settings), example_at_twelve() if shot.example else None)
        window.look.set_zoom(shot.zoom)
        window.look.set_appearance(shot.appearance)
        window.resize(shot.width, shot.height)
        window.show()
        wait_for(window.numbers_ready.connect)
        if shot.example and window.checking and not window.checking.found:
            wait_for(window.checking.changed.connect)
        for _ in range(3):
            application.processEvents()
        window.grab().save(str(folder / f"{shot.name}.png"))
        if shot.name == "light":
            take_patient(window, folder, application)
        window.hide()


def take_patient(window: MainWindow, folder: Path, application: QApplication) -> None:
    """The page that a patient is shown, and the one to print."""
    from datetime import date

    from fourcount import __version__
    from fourcount.appraisal.appraise import appraise
    from fourcount.face.patient_screen import open_screen
    from fourcount.ink.handout import PAPERS, NoPage, compose
    from fourcount.ink.handout_file import page_image

    screen = open_screen(window)
    if screen is not None:
        screen.showNormal()
        screen.resize(1280, 800)
        for _ in range(3):
            application.processEvents()
        screen.grab().save(str(folder / "patient.png"))
        screen.close()
    record = window.session.record
    named = [(outcome, appraise(outcome, record.choices)) for outcome in record.outcomes]
    page = compose(record, named, PAPERS["a4"], __version__, date(2026, 12, 1))
    if not isinstance(page, NoPage):
        page_image(page, 96).save(str(folder / "handout.png"))


def main() -> int:
    """Take all pictures."""
    folder = Path(sys.argv[1]) if len(sys.argv) > 1 else HERE.parent / "assets" / "screenshots"
    folder.mkdir(parents=True, exist_ok=True)
    application = make_application(["fourcount"])
    for shot in SHOTS:
        take(shot, folder, application)
        print(folder / f"{shot.name}.png")
    return 0


if __name__ == "__main__":
    sys.exit(main())
