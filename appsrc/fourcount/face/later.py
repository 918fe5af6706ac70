"""What must not hold up typing: loading the numerical libraries, and figures that take longer than a frame."""

from __future__ import annotations

import threading
from collections.abc import Callable
from contextlib import suppress
from functools import partial
from importlib import import_module
from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, Qt, Signal, SignalInstance

if TYPE_CHECKING:
    from fourcount.appraisal.findings import CheckFindings, OutcomeFindings
    from fourcount.record.outcome import Outcome
    from fourcount.record.paper import Choices

    Asked = tuple[Outcome, Choices]
    Answer = OutcomeFindings | CheckFindings


class _Lane:
    """Requests of one kind: while one is worked on, the newest waits and older ones are dropped."""

    def __init__(self, answer: Callable[[Outcome, Choices], Answer], arrived: SignalInstance) -> None:
        self.answer = answer
        self.arrived = arrived
        self.wanted: Asked | None = None
        self.busy = False


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
        self._lock = threading.Lock()
        self._figures = _Lane(_appraised, self.arrived)
        self._checks = _Lane(_checked, self.checked)
        self._closed = False
        self._threads: list[threading.Thread] = []
        self.failed.connect(self._on_failed, Qt.ConnectionType.QueuedConnection)

    def load(self) -> None:
        """Load numpy and scipy.special; an import-only thread."""
        self._start(self._load)

    def ask(self, outcome: Outcome, choices: Choices) -> None:
        """Compute all figures of an outcome, however long they take."""
        self._ask(self._figures, (outcome, choices))

    def ask_check(self, outcome: Outcome, choices: Choices) -> None:
        """Find out whether what the paper prints follows from its counts."""
        self._ask(self._checks, (outcome, choices))

    def start(self, work: Callable[[], None]) -> None:
        """Do something else in a thread of its own, which ``finish`` waits for as well."""
        self._start(work)

    def close(self) -> None:
        """Answer nothing any more."""
        with self._lock:
            self._closed = True
            self._figures.wanted = self._checks.wanted = None

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

    def _ask(self, lane: _Lane, asked: Asked) -> None:
        with self._lock:
            lane.wanted = asked
            if lane.busy:
                return
            lane.busy = True
        self._start(partial(self._work, lane))

    def _work(self, lane: _Lane) -> None:
        while True:
            with self._lock:
                wanted, lane.wanted = lane.wanted, None
                if wanted is None:
                    lane.busy = False
                    return
            try:
                self._tell(lane.arrived, *wanted, lane.answer(*wanted))
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


def _appraised(outcome: Outcome, choices: Choices) -> OutcomeFindings:
    from fourcount.appraisal.appraise import appraise

    return appraise(outcome, choices)


def _checked(outcome: Outcome, choices: Choices) -> CheckFindings:
    from fourcount.appraisal.check import check

    return check(outcome, choices)
