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


class Newest:
    """Requests of one kind, one thread at a time: while one is worked on, the newest waits and older ones are dropped.

    ``answer`` runs in the thread that ``start`` begins; what it gives for a request goes out by ``arrived``, what it
    raises by ``failed``. Once closed nothing goes out any more.
    """

    def __init__(
        self,
        start: Callable[[Callable[[], None]], None],
        answer: Callable[..., tuple[object, ...]],
        arrived: SignalInstance,
        failed: SignalInstance,
    ) -> None:
        self._start = start
        self._answer = answer
        self._arrived = arrived
        self._failed = failed
        self._lock = threading.Lock()
        self._wanted: tuple[object, ...] | None = None
        self._busy = False
        self._closed = False

    def ask(self, *wanted: object) -> None:
        """Answer this next, in place of whatever waits."""
        with self._lock:
            if self._closed:
                return
            self._wanted = wanted
            if self._busy:
                return
            self._busy = True
        self._start(self._work)

    def close(self) -> None:
        """Answer nothing any more."""
        with self._lock:
            self._closed = True
            self._wanted = None

    def _work(self) -> None:
        while True:
            with self._lock:
                wanted, self._wanted = self._wanted, None
                if wanted is None:
                    self._busy = False
                    return
            try:
                self._tell(self._arrived, *self._answer(*wanted))
            except Exception as error:  # noqa: BLE001 - whatever it is, the window's thread reports it
                self._tell(self._failed, error)

    def _tell(self, signal: SignalInstance, *values: object) -> None:
        with self._lock:
            closed = self._closed
        if not closed:
            with suppress(RuntimeError):  # the window was closed between the question and the answer
                signal.emit(*values)


class Later(QObject):
    """One thread loads the libraries, one computes, one checks; of several requests only the newest is answered.

    A thread must not outlive the interpreter, which would abort on it: ``finish`` waits for both.

    **Signals**
        arrived: figures are there. Carries the outcome, the choices and the findings they belong to.
        checked: what the paper prints was checked. Carries the outcome, the choices and what was found.
        loaded: the numerical libraries are loaded.
        failed: computing raised an error. Carries the error.
    """

    arrived = Signal(object, object, object)
    checked = Signal(object, object, object)
    loaded = Signal()
    failed = Signal(object)

    def __init__(self, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._threads: list[threading.Thread] = []
        self._libraries = Newest(self.start, _loaded, self.loaded, self.failed)
        self._figures = Newest(self.start, _appraised, self.arrived, self.failed)
        self._checks = Newest(self.start, _checked, self.checked, self.failed)
        self.failed.connect(self._on_failed, Qt.ConnectionType.QueuedConnection)

    def load(self) -> None:
        """Load numpy and scipy.special; an import-only thread."""
        self._libraries.ask()

    def ask(self, outcome: Outcome, choices: Choices) -> None:
        """Compute all figures of an outcome, however long they take."""
        self._figures.ask(outcome, choices)

    def ask_check(self, outcome: Outcome, choices: Choices) -> None:
        """Find out whether what the paper prints follows from its counts."""
        self._checks.ask(outcome, choices)

    def start(self, work: Callable[[], None]) -> None:
        """Do something in a thread of its own, which ``finish`` waits for as well."""
        thread = threading.Thread(target=work, daemon=True, name="fourcount-later")
        self._threads = [thread, *(other for other in self._threads if other.is_alive())]
        thread.start()

    def close(self) -> None:
        """Answer nothing any more."""
        for kind in (self._libraries, self._figures, self._checks):
            kind.close()

    def finish(self, seconds: float) -> bool:
        """Wait for the threads to end, so many seconds at most for each; whether they did."""
        self.close()
        for thread in self._threads:
            thread.join(seconds)
        return not any(thread.is_alive() for thread in self._threads)

    def _on_failed(self, error: BaseException) -> None:
        raise error


def _loaded() -> tuple[object, ...]:
    import_module("numpy")
    import_module("scipy.special")
    return ()


def _appraised(outcome: Outcome, choices: Choices) -> tuple[object, ...]:
    from fourcount.appraisal.appraise import appraise

    return outcome, choices, appraise(outcome, choices)


def _checked(outcome: Outcome, choices: Choices) -> tuple[object, ...]:
    from fourcount.appraisal.check import check

    return outcome, choices, check(outcome, choices)
