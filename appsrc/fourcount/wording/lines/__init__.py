"""The lines of "What it says": one for every measure of a form, in screen order, each with all its text."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from types import MappingProxyType

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.outcome import Form, Outcome
from fourcount.record.paper import Choices
from fourcount.wording.lines.effect import effect_lines
from fourcount.wording.lines.line import LineGroup, MeasureLine, told_once
from fourcount.wording.lines.pairs import pair_lines
from fourcount.wording.lines.person_time import rate_lines
from fourcount.wording.lines.strata import strata_lines
from fourcount.wording.lines.text import estimate_text, interval_text
from fourcount.wording.lines.timed import timed_lines
from fourcount.wording.lines.unpaired import (
    SCREEN_ORDER,
    baseline_text,
    conversion_text,
    family_name,
    measure_name,
    unpaired_lines,
    whole_needed,
)
from fourcount.wording.lines.words import FOLLOWS, IN_THE_STUDY, KINDS, NO_SPAN, NOT_DETERMINED, WITHHELD, Kind

__all__ = [
    "FOLLOWS", "IN_THE_STUDY", "KINDS", "NOT_DETERMINED", "NO_SPAN", "SCREEN_ORDER", "WITHHELD", "Kind", "LineGroup",
    "MeasureLine", "baseline_text", "conversion_text", "estimate_text", "family_name", "interval_text", "measure_lines",
    "measure_name", "told_once", "whole_needed",
]  # fmt: skip

LinesOf = Callable[[Outcome, OutcomeFindings, Choices], tuple[MeasureLine, ...]]

LINES: Mapping[Form, LinesOf] = MappingProxyType(
    {
        "events-and-others": unpaired_lines,
        "events-of-total": unpaired_lines,
        "percent-of-total": unpaired_lines,
        "effect-only": effect_lines,
        "pairs": pair_lines,
        "person-time": rate_lines,
        "risk-at-time": timed_lines,
        "strata": strata_lines,
    }
)


def measure_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """All lines in screen order: difference first, ratios after it, the odds ratio last unless it is alone."""
    return LINES[findings.form](outcome, findings, choices)
