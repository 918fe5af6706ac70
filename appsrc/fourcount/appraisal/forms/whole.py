"""The findings of a table that says something."""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.appraisal.case import Case
from fourcount.appraisal.cautions import cautions_for
from fourcount.appraisal.findings import AnyNumberNeeded, Counts, Figure, Gap, Mark, OutcomeFindings, OwnLine, Totals
from fourcount.record.outcome import Outcome
from fourcount.stats.results import FractionalCounts

Measure = Figure | AnyNumberNeeded | Gap


def whole(case: Case, measures: Mapping[str, Measure], totals: Totals | None = None) -> OutcomeFindings:
    """What the case holds, with its cautions; ``counts`` is what it gives, where that is four counts."""
    return OutcomeFindings(
        form=case.form,
        counts=case.given if isinstance(case.given, Counts) else Gap("not-counts"),
        given=case.given,
        totals=totals or Totals(),
        marks=case.marks,
        measures=dict(measures),
        test=case.test,
        conversion=case.conversion,
        patient=case.patient,
        cautions=cautions_for(case),
        strata=case.strata,
        extras=case.extras,
        carriable=case.carriable,
        line=case.line,
    )


def line_of(
    outcome: Outcome, measures: Mapping[str, Measure], counts: FractionalCounts | None, level: float
) -> tuple[OwnLine | Gap | None, tuple[Mark, ...]]:
    """The reader's own line, as ``own_line`` tells it; most tables have none, and start without its tests."""
    if outcome.line_kind == "none":
        return None, ()
    from fourcount.appraisal.own_line import own_line

    return own_line(outcome, measures, counts, level)


def given_or_why(figure: Figure) -> Figure | Gap:
    """The figure; where neither estimate nor interval is given, the reason for the estimate."""
    if isinstance(figure.estimate, Gap) and isinstance(figure.interval, Gap):
        return figure.estimate
    return figure
