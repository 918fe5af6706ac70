"""Our window: from the start of the interpreter to its first paint, to a table's findings, or until it is at rest.

our_window.py painted     an empty window, at the end of its first paint
our_window.py findings    a window on a table, at the end of the paint that shows its findings
our_window.py rest        an empty window, once the numerical libraries are loaded
"""

from __future__ import annotations

import os
import sys
from pathlib import Path

import fourcount.__main__

import fourcount.face.running_start  # isort: skip  # noqa: F401
from first_paint import SIZE, FirstPaint, report  # isort: skip

from fourcount.face.application import make_application, make_window
from fourcount.record.outcome import EventsAndOthers, Outcome
from fourcount.record.paper import Record

TABLE = EventsAndOthers(first_left_text="15", first_right_text="85", second_left_text="5", second_right_text="95")


def _done() -> None:
    """Report and end at once: nothing is asked, nothing is kept."""
    report()
    os._exit(0)


class Watch:
    """Waits for the findings, then for the paint that shows them."""

    def __init__(self, window: object) -> None:
        self._window = window

    def on_changed(self, _record: object, findings: object) -> None:
        if findings is not None:
            FirstPaint(self._window.says.sentence, _done)  # type: ignore[attr-defined]


def main() -> None:
    what, folder = sys.argv[1:]
    application = make_application(sys.argv[:1])
    record = Record(outcomes=(Outcome(table=TABLE),)) if what == "findings" else None
    window = make_window(Path(folder), record)
    watch = Watch(window)
    if what == "painted":
        FirstPaint(window, _done)
    elif what == "findings":
        window.session.changed.connect(watch.on_changed)
    else:
        window._later.loaded.connect(_done)
    window.resize(*SIZE)  # as the bare window, whatever the screen
    window.show()
    sys.exit(application.exec())


if __name__ == "__main__":
    main()
