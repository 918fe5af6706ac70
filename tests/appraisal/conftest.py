"""Outcomes for the tests of the appraisal. All tables are invented unless a test names a source."""

from __future__ import annotations

from collections.abc import Callable

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Fact, OutcomeFindings
from fourcount.record.outcome import EventsAndOthers, Outcome, Patient
from fourcount.record.paper import Choices


def _study(a: object, b: object, c: object, d: object, **rest: object) -> Outcome:
    table = EventsAndOthers(
        first_left_text=str(a), first_right_text=str(b), second_left_text=str(c), second_right_text=str(d)
    )
    patient = Patient(
        starting_risk_text=rest.pop("baseline", ""),  # type: ignore[arg-type]
        effect=rest.pop("effect", "risk_ratio"),  # type: ignore[arg-type]
    )
    return Outcome(table=table, patient=patient, **rest)  # type: ignore[arg-type]


@pytest.fixture(scope="session")
def study() -> Callable[..., Outcome]:
    """Four cells as typed, with any field of the outcome, ``baseline`` and ``effect`` by name."""
    return _study


@pytest.fixture(scope="session")
def appraised() -> Callable[..., OutcomeFindings]:
    """The findings of four cells; ``family`` and ``level`` by name beside what ``study`` takes."""

    def of(a: object, b: object, c: object, d: object, **rest: object) -> OutcomeFindings:
        choices = Choices(family=rest.pop("family", "score"), level=rest.pop("level", 0.95))  # type: ignore[arg-type]
        return appraise(_study(a, b, c, d, **rest), choices)

    return of


@pytest.fixture
def facts(appraised: Callable[..., OutcomeFindings]) -> Callable[..., dict[str, list[dict[str, Fact]]]]:
    """The facts of the cautions that hold, by key; several cautions of one key in a list."""

    def of(*cells: object, **rest: object) -> dict[str, list[dict[str, Fact]]]:
        found: dict[str, list[dict[str, Fact]]] = {}
        for caution in appraised(*cells, **rest).cautions:
            found.setdefault(caution.key, []).append(caution.facts)
        return found

    return of
