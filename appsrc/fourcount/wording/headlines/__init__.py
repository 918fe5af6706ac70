"""The one sentence above all lines: what a table of any form says, in whole people or person-time where that is honest.

Where a form has no risks to speak of, it speaks of odds, of rates, or of what the paper prints.
"""

from __future__ import annotations

from fourcount.appraisal.findings import Counts, Figure, Gap, OutcomeFindings, Rates
from fourcount.record.outcome import EffectOnly, Outcome, Pairs, Strata, Table
from fourcount.record.paper import Choices
from fourcount.wording import meanings
from fourcount.wording.form import given, lacking, measure_of, shown_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.headlines.people import counts_headline, people_headline
from fourcount.wording.headlines.rates import rates_headline
from fourcount.wording.meanings import pairs, printed, strata

NOW_THE_OTHER = "Now the other group."
UNPAIRED_KEYS = ("risk_difference", "risk_reference", "risk_index")  # the difference's gap names the empty group
PAIR_KEYS = ("pair_difference", "pair_risk_reference", "pair_risk_index")
RATE_KEYS = ("rate_difference", "rate_reference", "rate_index")


def headline(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What the table says, or what it still needs."""
    gap = lacking(findings)
    if gap is not None:
        return NOW_THE_OTHER if one_group_typed(outcome.table) else gap_text(gap)
    shown = shown_choices(findings, choices)
    if findings.form == "effect-only":
        return _effect(outcome, findings, shown)
    if findings.form == "strata":
        return _strata(outcome, findings, shown)
    if findings.form == "person-time":
        return _rates(outcome, findings, shown)
    if findings.form == "pairs":
        return _pairs(outcome, findings, shown)
    if outcome.design == "case-control" and "odds_ratio" in findings.measures:
        return _odds(outcome, findings, shown)
    if outcome.follow_up_varied and isinstance(findings.counts, Counts):
        return counts_headline(outcome, findings.counts)
    figures = _three(UNPAIRED_KEYS, findings)
    return gap_text(figures) if isinstance(figures, Gap) else people_headline(outcome, figures, shown)


def one_group_typed(table: Table) -> bool:
    """Whether one group's two cells are typed and nothing of the other group's."""
    if isinstance(table, EffectOnly | Strata | Pairs):
        return False
    rows = (
        (table.first_left_text, table.first_right_text),
        (table.second_left_text, table.second_right_text),
    )
    typed = [sum(bool(text.strip()) for text in row) for row in rows]
    return sorted(typed) == [0, len(rows[0])]


def _three(keys: tuple[str, str, str], findings: OutcomeFindings) -> tuple[Figure, Figure, Figure] | Gap:
    """The reference group's figure, the index group's and the difference, or why one has no estimate."""
    figures: list[Figure] = []
    for key in keys:
        figure = measure_of(key, findings)
        gap = figure if isinstance(figure, Gap) else figure.estimate
        if isinstance(gap, Gap):
            return gap
        figures += [figure] if isinstance(figure, Figure) else []
    difference, reference, index = figures
    return reference, index, difference


def _odds(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    figure = findings.measures["odds_ratio"]
    if isinstance(figure, Figure) and not isinstance(figure.estimate, Gap):
        return f"{meanings.odds_ratio_claim(outcome, figure, choices)}."
    return _why("odds_ratio", findings)


def _rates(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    figures, rates = _three(RATE_KEYS, findings), given(findings)
    if isinstance(figures, Gap):
        return gap_text(figures)
    return rates_headline(outcome, figures, rates, choices) if isinstance(rates, Rates) else ""


def _pairs(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """People where all pairs are known; odds, and the pairs that differ, in a matched study or where only these are."""
    figures = _three(PAIR_KEYS, findings)
    if not isinstance(figures, Gap):
        return people_headline(outcome, figures, choices)
    figure = measure_of("pair_odds_ratio", findings)
    if isinstance(figure, Figure) and not isinstance(figure.estimate, Gap):
        claim = pairs.odds_ratio_claim(outcome, figure, choices)
        return f"{claim}. {pairs.those_that_differ(outcome, findings)}"
    return _why("pair_odds_ratio", findings)


def _effect(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    key = next(iter(findings.measures), outcome.paper_measure)
    figure = measure_of(key, findings)
    if isinstance(figure, Figure) and not isinstance(figure.estimate, Gap):
        return printed.effect(key, outcome, figure, findings, choices)
    return _why(key, findings)


def _strata(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """The pooled difference, or the pooled odds ratio where there is none, beside the crude figure."""
    by_odds = ("pooled_odds_ratio", strata.odds_ratio_claim)
    claims = (("pooled_risk_difference", strata.difference_claim), by_odds)
    for key, claim in (by_odds,) if outcome.design == "case-control" else claims:
        figure = measure_of(key, findings)
        if isinstance(figure, Figure) and not isinstance(figure.estimate, Gap):
            return " ".join(filter(None, (f"{claim(outcome, figure, choices)}.", strata.crude_text(key, findings))))
    return _why("pooled_odds_ratio", findings)


def _why(key: str, findings: OutcomeFindings) -> str:
    """Why a measure, or its estimate, is not there."""
    measure = measure_of(key, findings)
    if isinstance(measure, Gap):
        return gap_text(measure)
    return gap_text(measure.estimate) if isinstance(measure.estimate, Gap) else ""
