"""Which lines stand in the second column, and on which scales their strips are drawn."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.picture.scales import (
    Scale,
    difference_scale,
    rate_difference_scale,
    rate_scale,
    ratio_scale,
    risk_scale,
)
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording.extras import extra_lines
from fourcount.wording.lines import MeasureLine, measure_lines, told_once
from fourcount.wording.sentence import p_line

SCALES = {
    "risk": risk_scale,
    "difference": difference_scale,
    "ratio": ratio_scale,
    "rate": rate_scale,
    "rate_difference": rate_difference_scale,
}


def shown_lines(
    outcome: Outcome, findings: OutcomeFindings, choices: Choices, *, more: bool
) -> tuple[MeasureLine, ...]:
    """The measures, those under the fold where they are asked for, and the p."""
    every = measure_lines(outcome, findings, choices)
    shown = tuple(line for line in every if more or line.group == "main")
    extras = extra_lines(outcome, findings, choices) if more else ()
    tested = not (isinstance(findings.test, Gap) and findings.test.key == "not-counts")
    return (*told_once(shown), *((p_line(findings),) if tested else ()), *extras)


def scales_of(lines: Sequence[MeasureLine]) -> tuple[dict[str, Scale], dict[str, str]]:
    """One scale for each kind of measure, and the key of the last row of the kind, which names its ends."""
    scales: dict[str, Scale] = {}
    last: dict[str, str] = {}
    for kind, maker in SCALES.items():
        mine = [line for line in lines if line.kind == kind and not line.withheld]
        values = [v for line in mine for v in (line.estimate_value, line.low, line.high) if v is not None]
        if values:
            scales[kind] = maker(values)
            last[kind] = mine[-1].key
    return scales, last
