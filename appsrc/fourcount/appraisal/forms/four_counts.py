"""What follows from the four counts of an unpaired table."""

from __future__ import annotations

from fourcount.appraisal.carrying.carry import marks_of
from fourcount.appraisal.carrying.studies import study_of_counts
from fourcount.appraisal.case import Case
from fourcount.appraisal.clusters import clusters_of
from fourcount.appraisal.extras.of_counts import extras_of_counts
from fourcount.appraisal.extras.printed import adjusted_of
from fourcount.appraisal.findings import (
    MEASURES,
    Gap,
    OutcomeFindings,
)
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import for_the_reader, whole
from fourcount.appraisal.gating import support_of
from fourcount.appraisal.losses import losses_of
from fourcount.appraisal.measures import Table, all_figures, measures, own_test
from fourcount.appraisal.postponing import NOTHING, Pace, postponed
from fourcount.appraisal.table import read
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Form, Outcome, form_of
from fourcount.record.paper import Choices


def appraise_counts(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:
    """All that four counts say, whichever of three ways they are printed in."""
    form, reading, typed = form_of(outcome.table), read(outcome), read_start(outcome.patient)
    clusters, adjusted = clusters_of(outcome), adjusted_of(outcome)
    losses = losses_of(outcome, reading.counts)
    marks = reading.marks + marks_of(outcome, typed) + clusters.marks + losses.marks + adjusted.marks
    if isinstance(reading.counts, Gap):
        return nothing_yet(
            _lacking(reading.counts, form), form=form, measures=MEASURES, totals=reading.totals, marks=marks
        )
    counts, support = reading.counts, support_of(outcome)
    later = postponed(counts, choices, pace.loaded) if pace.deferring else NOTHING
    table = Table(counts=counts, choices=choices, postponed=later, behind=clusters.behind(counts))
    figures = all_figures(table, support)
    study = study_of_counts(outcome, figures, support, adjusted, choices.level)
    shown = measures(figures, support, welcome=outcome.welcome)
    case = Case(
        outcome=outcome,
        form=form,
        given=counts,
        choices=choices,
        figures=figures,
        test=Gap(support.refused) if support.refused else own_test(table),
        reader=for_the_reader(study, typed, shown, choices.level, table.effective),
        marks=marks,
        extras=extras_of_counts(outcome, counts, table, figures, clusters, losses, adjusted, pace),
        randomised=losses.randomised,
    )
    return whole(case, shown, reading.totals)


def _lacking(gap: Gap, form: Form) -> Gap:
    """Why there are no counts; where nothing but percentages and totals is to be typed, counts are not asked for."""
    return Gap("percents-not-typed") if form == "percent-of-total" and gap.key == "not-typed" else gap
