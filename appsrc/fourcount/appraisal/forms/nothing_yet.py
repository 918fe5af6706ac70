"""The findings of a table that says nothing yet, or nothing in its design."""

from __future__ import annotations

from collections.abc import Iterable

from fourcount.appraisal.findings import Gap, Mark, OutcomeFindings, OwnLine, PrintedFigure, Totals
from fourcount.record.outcome import Form


def nothing_yet(
    gap: Gap,
    *,
    form: Form,
    measures: Iterable[str],
    totals: Totals | None = None,
    marks: tuple[Mark, ...] = (),
    given: PrintedFigure | None = None,
    line: OwnLine | Gap | None = None,
) -> OutcomeFindings:
    """Every figure is withheld for one and the same reason; an effect that was read stays told all the same.

    ``line`` is why the reader's own one cannot be drawn on such an effect, where one is typed.
    """
    return OutcomeFindings(
        form=form,
        counts=gap if given is None else Gap("not-counts"),
        given=gap if given is None else given,
        totals=totals or Totals(),
        marks=marks,
        measures=dict.fromkeys(measures, gap),
        test=gap,
        conversion=gap,
        patient=gap,
        cautions=(),
        line=line,
        strata=gap if form == "strata" else None,
    )
