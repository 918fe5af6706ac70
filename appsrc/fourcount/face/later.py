"""What must not hold up typing: loading the numerical libraries, and figures that take longer than a frame."""

from __future__ import annotations

import threading
from collections.abc import Callable
from contextlib import suppress
from importlib import import_module
from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, Qt, Signal, SignalInstance

if TYPE_CHECKING:
    from fourcount.record.outcome import Outcome
    from fourcount.record.paper import Choices


class Later(QObject):
    """One thread loads the libraries, one computes; of several requests only the newest is computed.

    A thread must not outlive the interpreter, which would abort on it: ``finish`` waits for both.

    **Signals**
        arrived: figures are there. Carries the outcome, the choices and the findings they belong to.
        loaded: the numerical libraries are loaded.
        failed: computing raised an error. Carries the error.
    """

    arrived = Signal(object, object, object)
    loaded = Signal()
    failed = Signal(object)

    def __init__(self, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._wanted: tuple[Outcome, Choices] | None = None
        self._lock = threading.Lock()
        self._busy = False
        self._closed = False
        self._threads: list[threading.Thread] = []
        self.failed.connect(self._on_failed, Qt.ConnectionType.QueuedConnection)

    def load(self) -> None:
        """Load numpy and scipy.special; an import-only thread."""
        self._start(self._load)

    def ask(self, outcome: Outcome, choices: Choices) -> None:
        """Compute all figures of an outcome, however long they take."""
        with self._lock:
            self._wanted = (outcome, choices)
            if self._busy:
                return
            self._busy = True
        self._start(self._compute)

    def close(self) -> None:
        """Answer nothing any more."""
        with self._lock:
            self._closed = True
            self._wanted = None

    def finish(self, seconds: float) -> bool:
        """Wait for the threads to end, so many seconds at most for each; whether they did."""
        self.close()
        for thread in self._threads:
            thread.join(seconds)
        return not any(thread.is_alive() for thread in self._threads)

    def _start(self, work: Callable[[], None]) -> None:
        thread = threading.Thread(target=work, daemon=True, name="fourcount-later")
        self._threads = [thread, *(other for other in self._threads if other.is_alive())]
        thread.start()

    def _load(self) -> None:
        try:
            import_module("numpy")
            import_module("scipy.special")
            self._tell(self.loaded)
        except Exception as error:  # noqa: BLE001 - whatever it is, the window's thread reports it
            self._tell(self.failed, error)

    def _compute(self) -> None:
        from fourcount.appraisal.appraise import appraise

        while True:
            with self._lock:
                wanted, self._wanted = self._wanted, None
                if wanted is None:
                    self._busy = False
                    return
            try:
                self._tell(self.arrived, *wanted, appraise(*wanted))
            except Exception as error:  # noqa: BLE001 - whatever it is, the window's thread reports it
                self._tell(self.failed, error)

    def _tell(self, signal: SignalInstance, *values: object) -> None:
        """Emit unless the window is gone."""
        with self._lock:
            closed = self._closed
        if not closed:
            with suppress(RuntimeError):  # the window was closed between the question and the answer
                signal.emit(*values)

    def _on_failed(self, error: BaseException) -> None:
        raise error
