"""Tables as typed, and what follows from them, for the words' tests."""

from __future__ import annotations

from collections.abc import Callable

import msgspec
import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import OutcomeFindings, PatientFindings
from fourcount.record.outcome import CELLS, EventsAndOthers, Outcome
from fourcount.record.paper import Choices
from fourcount.wording.example import worked_example
from fourcount.wording.plain_outcome import PlainWords, plain_words
from fourcount.wording.plain_risks import plain_risks

OutcomeOf = Callable[..., Outcome]


@pytest.fixture(scope="session")
def outcome_of() -> OutcomeOf:
    """The worked example with other counts (in the print's order) and other fields."""

    def make(counts: tuple[int, int, int, int] = (38, 374, 70, 339), **changes: object) -> Outcome:
        cells = dict(zip(CELLS, (str(count) for count in counts), strict=True))
        table = EventsAndOthers(**cells)
        return msgspec.structs.replace(worked_example().outcomes[0], table=table, **changes)

    return make


@pytest.fixture(scope="session")
def findings_of() -> Callable[..., OutcomeFindings]:
    """What follows from an outcome, by the score family unless told otherwise."""

    def follow(outcome: Outcome, choices: Choices | None = None) -> OutcomeFindings:
        return appraise(outcome, choices or Choices())

    return follow


@pytest.fixture
def say(findings_of: Callable[..., OutcomeFindings]) -> Callable[..., PlainWords]:
    """The words of an outcome, of 100 people unless told otherwise."""

    def words(outcome: Outcome, people: int = 100) -> PlainWords:
        patient = findings_of(outcome).patient
        assert isinstance(patient, PatientFindings)
        risks = plain_risks(patient, outcome.welcome)
        assert risks is not None
        return plain_words(outcome, patient, risks, people)

    return words
