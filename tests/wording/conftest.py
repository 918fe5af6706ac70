"""Tables as typed, and what follows from them, for the words' tests."""

from __future__ import annotations

from collections.abc import Callable

import msgspec
import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.outcome import CELLS, EventsAndOthers, Outcome
from fourcount.record.paper import Choices
from fourcount.wording.example import worked_example

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
