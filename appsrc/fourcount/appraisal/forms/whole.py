"""The findings of a table that says something."""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.appraisal.carrying.carry import for_a_patient
from fourcount.appraisal.carrying.study import Study
from fourcount.appraisal.case import Case, ForTheReader
from fourcount.appraisal.cautions import cautions_for
from fourcount.appraisal.findings import AnyNumberNeeded, Counts, Figure, Gap, Mark, OutcomeFindings, OwnLine, Totals
from fourcount.record.entry.starts import StartReading
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
        marks=case.marks + case.reader.marks,
        measures=dict(measures),
        test=case.test,
        conversion=case.reader.conversion,
        patient=case.reader.patient,
        cautions=cautions_for(case),
        strata=case.strata,
        extras=case.extras,
        carriable=case.reader.carriable,
        line=case.reader.line,
    )


def for_the_reader(
    study: Study,
    typed: StartReading,
    measures: Mapping[str, Measure],
    level: float,
    counts: FractionalCounts | Gap | None = None,
) -> ForTheReader:
    """The patient and the reader's own line; ``counts`` and ``level`` are those behind the intervals of the measures.

    ``counts`` is None, or a gap, where the intervals are not those of one unpaired table.
    """
    carried = for_a_patient(study, typed)
    line, marks = line_of(study.outcome, measures, None if isinstance(counts, Gap) else counts, level)
    return ForTheReader(
        conversion=carried.conversion,
        patient=carried.patient,
        carriable=study.carriable,
        line=line,
        marks=carried.marks + marks,
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
