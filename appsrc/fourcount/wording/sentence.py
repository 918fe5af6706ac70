"""The sentences of "What it says": the headline, one for every measure, one for the p value."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, meanings
from fourcount.wording.form import lacking, measure_of, shown_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.headlines import headline
from fourcount.wording.p_value import p_sentence

__all__ = ["headline", "measure_sentence", "p_line", "p_sentence"]


def measure_sentence(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What one measure means in this table, and what it is not; or why it is not given."""
    measure, gap = measure_of(key, findings), lacking(findings)
    if gap is not None:
        return gap_text(gap)
    if isinstance(measure, Gap):
        return gap_text(measure)
    shown = shown_choices(findings, choices)
    if isinstance(measure, AnyNumberNeeded):
        return meanings.number_needed(outcome, measure, findings, shown)
    if isinstance(measure.estimate, Gap):
        if isinstance(measure.interval, Gap):
            return gap_text(measure.estimate)
        interval = f"{limits.interval_name(shown.level)} is {lines.interval_text(key, measure)}"
        return f"{gap_text(measure.estimate)} Its {interval}."
    return meanings.meaning(key, outcome, measure, findings, shown)


def p_line(findings: OutcomeFindings) -> lines.MeasureLine:
    """The p of the family's own test as a line of its own: one sentence, without figures beside it."""
    return lines.MeasureLine(key="test", name=p_sentence(findings))
