"""From one outcome and the record's choices to all that follows from it."""

from __future__ import annotations

from functools import lru_cache

from fourcount.appraisal.cautions import Case, cautions_for
from fourcount.appraisal.conversion import convert
from fourcount.appraisal.findings import MEASURES, Conversion, Gap, Mark, OutcomeFindings, PatientFindings, Totals
from fourcount.appraisal.gating import SUPPORT, Support
from fourcount.appraisal.measures import Figures, Table, all_figures, measures, own_test
from fourcount.appraisal.patient import carry
from fourcount.appraisal.postponing import NOTHING, numbers_loaded, postponed
from fourcount.appraisal.starting_risk import StartingRisk, Typed, marks_of, starting_risk, typed_risk
from fourcount.appraisal.table import read
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.estimates import risk

REMEMBERED = 512
"""How many answers are kept: more than the outcomes of the largest record, and some of its past."""


def appraise(outcome: Outcome, choices: Choices, deferring: bool = False) -> OutcomeFindings:
    """All that one outcome says under the record's choices.

    The answer is remembered for equal arguments. With ``deferring`` a figure that would make a keystroke
    wait is the Gap "follows" (a slow one, or one of the exact family while numpy and scipy.special are not
    loaded yet); the caller asks again without it, away from the keyboard.
    """
    may_wait = deferring and choices.family == "exact"
    return _appraise(outcome, choices, may_wait, numbers_loaded() if may_wait else True)


@lru_cache(maxsize=REMEMBERED)
def _appraise(outcome: Outcome, choices: Choices, deferring: bool, loaded: bool) -> OutcomeFindings:
    reading = read(outcome)
    typed = typed_risk(outcome)
    marks = reading.marks + marks_of(typed)
    if isinstance(reading.counts, Gap):
        return _without_counts(reading.counts, reading.totals, marks)
    later = postponed(reading.counts, choices, loaded) if deferring else NOTHING
    table = Table(counts=reading.counts, choices=choices, postponed=later)
    return _with_counts(outcome, table, typed, reading.totals, marks)


def _without_counts(gap: Gap, totals: Totals, marks: tuple[Mark, ...]) -> OutcomeFindings:
    return OutcomeFindings(
        counts=gap,
        totals=totals,
        marks=marks,
        measures=dict.fromkeys(MEASURES, gap),
        test=gap,
        conversion=gap,
        patient=gap,
        cautions=(),
    )


def _with_counts(
    outcome: Outcome, table: Table, typed: Typed, totals: Totals, marks: tuple[Mark, ...]
) -> OutcomeFindings:
    support = SUPPORT[outcome.design]
    figures = all_figures(table, support)
    start = starting_risk(typed, risk(table.counts.reference_events, table.counts.reference_total), support)
    conversion, patient = _at(start, figures, outcome, support)
    test = own_test(table)
    case = Case(
        outcome=outcome,
        table=table,
        figures=figures,
        test=test,
        conversion=conversion,
        patient=patient,
        marks=marks,
    )
    return OutcomeFindings(
        counts=table.counts,
        totals=totals,
        marks=marks,
        measures=measures(figures, support, welcome=outcome.welcome),
        test=test,
        conversion=conversion,
        patient=patient,
        cautions=cautions_for(case),
    )


def _at(
    start: StartingRisk | Gap, figures: Figures, outcome: Outcome, support: Support
) -> tuple[Conversion | Gap, PatientFindings | Gap]:
    """The two parts that hang on a starting risk."""
    if isinstance(start, Gap):
        return start, start
    effect = support.effect(outcome.patient.effect)
    return (convert(figures, start), carry(figures, start, effect, support, welcome=outcome.welcome))
