"""The reader's own line among the rows of the second column."""

from __future__ import annotations

import msgspec
import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap, OutcomeFindings, OwnLine
from fourcount.face.says_lines import scales_of, shown_lines
from fourcount.record.paper import Choices
from fourcount.wording.example import worked_example

OUTCOME = worked_example().outcomes[0]


def findings(line: OwnLine | Gap | None) -> OutcomeFindings:
    return msgspec.structs.replace(appraise(OUTCOME, Choices()), line=line)


def a_line(measure: str, value: float) -> OwnLine:
    return OwnLine(kind="margin", measure=measure, value=value, lies="short", worse_side=True)


@pytest.mark.parametrize(
    ("measure", "value", "said"), [("risk_difference", 0.02, "2 more per 100"), ("risk_ratio", 1.25, "1.25")]
)
def test_the_flag_stands_on_its_measure_alone(measure: str, value: float, said: str) -> None:
    """One row carries the line, and says what the flag is; its other notes stay."""
    plain, _ = shown_lines(OUTCOME, findings(None), Choices(), more=False)
    lines, _ = shown_lines(OUTCOME, findings(a_line(measure, value)), Choices(), more=False)
    flagged = {line.key: line for line in lines if line.mark is not None}
    assert list(flagged) == [measure]
    assert flagged[measure].mark == value
    assert flagged[measure].note.endswith(f"The flag is your margin, {said}.")
    before = next(line.note for line in plain if line.key == measure)
    assert flagged[measure].note.startswith(before)


def test_the_scale_reaches_to_the_line() -> None:
    """A margin farther out than every limit still stands on the strip."""
    lines, _ = shown_lines(OUTCOME, findings(a_line("risk_difference", 0.4)), Choices(), more=False)
    scales, _ = scales_of(lines)
    assert scales["difference"].high >= 0.4


@pytest.mark.parametrize("line", [None, Gap("line-scale-not-here")])
def test_without_a_line_no_row_changes(line: Gap | None) -> None:
    """No line, or one that cannot be drawn, leaves all rows as they are."""
    plain, _ = shown_lines(OUTCOME, appraise(OUTCOME, Choices()), Choices(), more=True)
    assert shown_lines(OUTCOME, findings(line), Choices(), more=True)[0] == plain
