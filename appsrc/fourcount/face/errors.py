"""An unexpected error: one sentence on screen, its kind and place in a log, the work untouched."""

from __future__ import annotations

import sys
import traceback
from collections.abc import Callable
from pathlib import Path
from types import TracebackType

from PySide6.QtCore import QObject, Signal

LOG_NAME = "errors.log"
LARGEST_LOG = 200_000


class ErrorListener(QObject):
    """Takes the place of Python's own report of an error that nobody caught.

    The log holds the kind of error and the lines of code it passed, never its message or a value: those may
    hold what was typed.

    **Signals**
        happened: an error reached the top. Carries its kind, and the log's path or "" if it cannot be written.
    """

    happened = Signal(str, str)

    def __init__(self, folder: Path, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._log = folder / LOG_NAME
        self._before: Callable[..., object] = sys.excepthook

    def install(self) -> None:
        """Listen from now on."""
        sys.excepthook = self._on_error

    def remove(self) -> None:
        """Give Python's own report back."""
        sys.excepthook = self._before

    def _on_error(self, kind: type[BaseException], error: BaseException, trace: TracebackType | None) -> None:
        if issubclass(kind, KeyboardInterrupt):
            self._before(kind, error, trace)
            return
        written = self._write(kind, trace)
        sys.stderr.write(f"fourcount: unexpected {kind.__name__}\n")
        self.happened.emit(kind.__name__, str(self._log) if written else "")

    def _write(self, kind: type[BaseException], trace: TracebackType | None) -> bool:
        lines = [f"  {Path(f.filename).name}:{f.lineno} {f.name}" for f in traceback.extract_tb(trace)]
        try:
            self._log.parent.mkdir(parents=True, exist_ok=True)
            if self._log.exists() and self._log.stat().st_size > LARGEST_LOG:
                self._log.unlink()
            with self._log.open("a", encoding="utf-8") as log:
                log.write("\n".join([kind.__name__, *lines, ""]))
        except OSError:
            return False
        return True
