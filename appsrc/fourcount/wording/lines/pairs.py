"""The lines of pairs: the paired difference, number needed, both risks, the ratio, the odds ratio of the pairs."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Gap, OutcomeFindings, PairCounts
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers
from fourcount.wording.form import given, lacking, measure_of
from fourcount.wording.lines.line import MeasureLine, blank_line, figure_line, withheld_line
from fourcount.wording.lines.unpaired import beyond, needed_line, relative_note
from fourcount.wording.lines.words import IN_THE_STUDY, method_word
from fourcount.wording.pairs import pairs_that_differ, who_differ

PAIRS_ORDER = (
    "pair_difference",
    "number_needed",
    "pair_risk_reference",
    "pair_risk_index",
    "pair_ratio",
    "pair_odds_ratio",
)
MATCHED_ORDER = ("pair_odds_ratio", *(key for key in PAIRS_ORDER if key != "pair_odds_ratio"))


def pair_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """Difference first and the odds ratio last; in a matched case-control study the odds ratio is alone."""
    order = MATCHED_ORDER if outcome.design == "matched" else PAIRS_ORDER
    return tuple(_line(key, outcome, findings, choices) for key in order)


def pair_name(key: str, outcome: Outcome, needed: AnyNumberNeeded | None = None) -> str:
    """What a line of pairs calls its measure."""
    if key == "number_needed":
        return f"{limits.needed_kind(needed)}{IN_THE_STUDY}"
    return {
        "pair_difference": "Difference, paired",
        "pair_risk_reference": f"Risk, {names.label_within(outcome, 'reference')}",
        "pair_risk_index": f"Risk, {names.label_within(outcome, 'index')}",
        "pair_ratio": "Risk ratio, paired",
        "pair_odds_ratio": "Odds ratio of the pairs",
    }[key]


def whole_needed_of_pairs(pairs: PairCounts) -> str:
    """The number needed of a paired difference, rounded up from the whole counts themselves."""
    apart = abs(pairs.index_only - pairs.reference_only)
    return numbers.whole(-(-pairs.total // apart)) if apart else numbers.INFINITY


def _line(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> MeasureLine:
    pairs, measure = given(findings), measure_of(key, findings)
    if lacking(findings):
        return blank_line(key, pair_name(key, outcome))
    if isinstance(measure, Gap):
        return withheld_line(key, pair_name(key, outcome), measure)
    if isinstance(measure, AnyNumberNeeded):
        people = whole_needed_of_pairs(pairs) if isinstance(pairs, PairCounts) else ""
        return needed_line(pair_name(key, outcome, measure), measure, outcome, people)
    notes = (beyond(key, measure), relative_note(measure) if key == "pair_ratio" else "")
    word = method_word(measure.method, choices)
    detail = ", ".join(part for part in (_counts(key, outcome, findings), word) if part)
    return figure_line(key, pair_name(key, outcome), measure, detail=detail, notes=notes)


def _counts(key: str, outcome: Outcome, findings: OutcomeFindings) -> str:
    """The counts that a figure rests on; the odds ratio's are there without the pairs that agree."""
    pairs, differ = given(findings), pairs_that_differ(outcome, findings)
    if key == "pair_odds_ratio":
        if differ is None:
            return ""
        return f"{numbers.whole(differ[0])} to {numbers.whole(differ[1])} {who_differ(outcome, sum(differ))}"
    if not isinstance(pairs, PairCounts):
        return ""
    total = numbers.whole(pairs.total)
    if key == "pair_difference":
        return "per 100"
    if key == "pair_risk_index":
        return f"{numbers.whole(pairs.both + pairs.index_only)} of {total}"
    if key == "pair_risk_reference":
        return f"{numbers.whole(pairs.both + pairs.reference_only)} of {total}"
    return f"{total} people" if outcome.design == "before-after" else f"{total} pairs"
