"""The pairs that differ, also where those that agree were never typed."""

from __future__ import annotations

from fourcount.appraisal.findings import OutcomeFindings, PairCounts
from fourcount.record.outcome import Outcome


def pairs_that_differ(outcome: Outcome, findings: OutcomeFindings) -> tuple[int, int] | None:
    """Pairs with the event on the index side only, and on the reference side only; None where neither is known.

    Without all pairs the findings give none, but the table's margins hold those typed, in the print's order. They
    change places with the groups, and with the outcome that is counted.
    """
    pairs, totals = findings.given, findings.totals
    if isinstance(pairs, PairCounts):
        return pairs.index_only, pairs.reference_only
    if findings.form != "pairs" or totals.first_right is None or totals.second_left is None:
        return None
    turned = (outcome.index_group == "second") != (outcome.counted == "right")
    first, second = totals.first_right, totals.second_left
    return (second, first) if turned else (first, second)


def pairs_as_typed(outcome: Outcome, findings: OutcomeFindings) -> PairCounts | None:
    """The pairs, those that agree as none where they were not typed: for what rests on the others alone."""
    if isinstance(findings.given, PairCounts):
        return findings.given
    differ, totals = pairs_that_differ(outcome, findings), findings.totals
    if differ is None:
        return None
    both, neither = totals.first_left or 0, totals.second_right or 0
    if outcome.counted == "right":
        both, neither = neither, both
    return PairCounts(both=both, index_only=differ[0], reference_only=differ[1], neither=neither)
