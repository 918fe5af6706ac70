"""All that one outcome says under the record's choices."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings.extras import Extras
from fourcount.appraisal.findings.figures import AnyNumberNeeded, Caution, Figure, Probability
from fourcount.appraisal.findings.patient import Carriable, Conversion, OwnLine, PatientFindings
from fourcount.appraisal.findings.strata import StrataFindings
from fourcount.record.entry.readings import Mark, PrintedFigure
from fourcount.record.outcome import Form
from fourcount.stats.results import Counts, Gap, PairCounts, Rates, TimedRisks


class Totals(msgspec.Struct, frozen=True, kw_only=True):
    """The live margins in the print's order; None where a part is not known yet."""

    first_left: int | None = None
    first_right: int | None = None
    second_left: int | None = None
    second_right: int | None = None
    first: int | None = None
    second: int | None = None
    left: int | None = None
    right: int | None = None
    everyone: int | None = None


Given = Counts | PairCounts | Rates | TimedRisks | PrintedFigure
"""What a form gives to compute with; several strata give the counts of all of them together."""


class OutcomeFindings(msgspec.Struct, frozen=True, kw_only=True):
    """All that one outcome says under the record's choices.

    Every key of ``MEASURES`` is in ``measures``; what cannot be given is a ``Gap`` there. While the table is not whole,
    ``counts`` is a Gap ("unreadable", "not-typed" or its form's own such key), and all measures then hold that Gap.

    ``form`` is the form of print. ``given`` is what it gives to compute with, a Gap while that is not whole; ``counts``
    is the same for the forms of four counts (and for strata), and for every other form the Gap "not-counts" once
    ``given`` is whole. The keys of ``measures`` are those of the form: ``MEASURES``, ``PAIR_MEASURES`` and so on.

    ``carriable`` lists the effects that can be carried to a patient, the usual one first. ``line`` is the reader's own
    line, None where none is drawn.
    """

    counts: Counts | Gap
    totals: Totals
    marks: tuple[Mark, ...]
    measures: dict[str, Figure | AnyNumberNeeded | Gap]
    test: Probability | Gap
    conversion: Conversion | Gap
    patient: PatientFindings | Gap
    cautions: tuple[Caution, ...]
    form: Form = "events-and-others"
    given: Given | Gap = Gap("not-typed")
    strata: StrataFindings | Gap | None = None
    extras: Extras = Extras()
    carriable: tuple[Carriable, ...] = ()
    line: OwnLine | Gap | None = None
