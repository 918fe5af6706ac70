"""The sentence of the reader's own line: on which side of it the interval lies, and the p of a margin."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings, OwnLine
from fourcount.record.outcome import Outcome
from fourcount.wording import limits, numbers
from fourcount.wording.facts import MEASURE_NAMES, RATIO_OF_PREVALENCES
from fourcount.wording.gaps import gap_text
from fourcount.wording.p_value import NO_P, clause

MATTERS = {
    "beyond": "lies wholly beyond your line of {value}: everything in it passes what you said would matter",
    "short": "lies wholly short of your line of {value}: nothing in it reaches what you said would matter",
    "across": "lies on both sides of your line of {value}: "
    "it holds effects that would matter and effects that would not",
}
MARGIN = {
    "better": "lies wholly on the better side of your margin of {value}",
    "worse": "lies wholly on the worse side of your margin of {value}",
    "across": "lies on both sides of your margin of {value}: it holds effects better and effects worse than the margin",
}
BY = {"margin-score": "Miettinen–Nurminen", "margin-printed": "from the interval"}
MARK = "The flag is your {kind}, {value}."
ON_THE_BETTER_SIDE = " (itself better than no effect)"
PARTED = " The interval rests on another method than the p, and here the two disagree."
KINDS = {"matters": "line", "margin": "margin"}


def own_line_sentence(outcome: Outcome, findings: OutcomeFindings) -> str:
    """What is said of an outcome's line, or why there is none; "" where none is drawn."""
    if findings.line is None:
        return ""
    if isinstance(findings.line, Gap):
        return gap_text(findings.line)
    return line_sentence(outcome, findings.line)


def line_sentence(outcome: Outcome, line: OwnLine) -> str:
    """One sentence on which side of the line the measure's interval lies; for a margin with its one-sided p.

    It says where the interval lies and leaves the verdict to the reader.
    """
    subject = f"The {limits.interval_name(line.level)} of the {measure_name(outcome, line)}"
    if line.kind == "matters":
        return f"{subject} {MATTERS[line.lies].format(value=value_text(line))}."
    side = "across" if line.lies == "across" else _side(line)
    value = value_text(line) if line.worse_side else f"{value_text(line)}{ON_THE_BETTER_SIDE}"
    return f"{subject} {MARGIN[side].format(value=value)}{_p(line)}{PARTED if line.parted else ''}"


def value_text(line: OwnLine) -> str:
    """``2 fewer per 100``, or a ratio."""
    if not line.measure.endswith("difference"):
        return numbers.ratio(line.value)
    return f"{numbers.percent_given(abs(line.value)).rstrip('%')} {limits.side(line.value)} per 100"


def mark_words(line: OwnLine) -> str:
    """What the flag on the strip is, under the figures and for those who cannot see it."""
    return MARK.format(kind=KINDS[line.kind], value=value_text(line))


def measure_name(outcome: Outcome, line: OwnLine) -> str:
    """The measure whose interval is meant."""
    if line.measure == "risk_ratio" and outcome.design == "survey":
        return RATIO_OF_PREVALENCES
    return MEASURE_NAMES.get(line.measure, line.measure)


def _side(line: OwnLine) -> str:
    """Short of a margin on the worse side is the better side of it, and so is beyond one on the better side."""
    return "better" if (line.lies == "short") == line.worse_side else "worse"


def _p(line: OwnLine) -> str:
    if isinstance(line.p, Gap):
        return f". {NO_P}{clause(gap_text(line.p))}"
    if line.p is None:
        return "."
    by = BY.get(line.method, line.method)
    return f" (one-sided {numbers.p_phrase(line.p)} against an effect at the margin or worse; {by})."
