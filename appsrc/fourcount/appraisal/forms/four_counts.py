"""What follows from the four counts of an unpaired table."""

from __future__ import annotations

from fourcount.appraisal.case import Case
from fourcount.appraisal.clusters import clusters_of
from fourcount.appraisal.conversion import convert
from fourcount.appraisal.extras.of_counts import extras_of_counts
from fourcount.appraisal.extras.printed import adjusted_of
from fourcount.appraisal.findings import (
    MEASURES,
    Conversion,
    Gap,
    OutcomeFindings,
    PatientFindings,
)
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import whole
from fourcount.appraisal.gating import Support, support_of
from fourcount.appraisal.losses import losses_of
from fourcount.appraisal.measures import Figures, Table, all_figures, measures, own_test
from fourcount.appraisal.patient import carry
from fourcount.appraisal.postponing import NOTHING, Pace, postponed
from fourcount.appraisal.starting_risk import StartingRisk, marks_of, starting_risk, typed_risk
from fourcount.appraisal.table import read
from fourcount.record.outcome import Form, Outcome, form_of
from fourcount.record.paper import Choices
from fourcount.stats.estimates import risk


def appraise_counts(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:
    """All that four counts say, whichever of three ways they are printed in."""
    form, reading, typed = form_of(outcome.table), read(outcome), typed_risk(outcome)
    clusters, adjusted = clusters_of(outcome), adjusted_of(outcome)
    losses = losses_of(outcome, reading.counts)
    marks = reading.marks + marks_of(typed) + clusters.marks + losses.marks + adjusted.marks
    if isinstance(reading.counts, Gap):
        return nothing_yet(
            _lacking(reading.counts, form), form=form, measures=MEASURES, totals=reading.totals, marks=marks
        )
    counts, support = reading.counts, support_of(outcome)
    later = postponed(counts, choices, pace.loaded) if pace.deferring else NOTHING
    table = Table(counts=counts, choices=choices, postponed=later, behind=clusters.behind(counts))
    figures = all_figures(table, support)
    start = starting_risk(typed, risk(counts.reference_events, counts.reference_total), support)
    conversion, patient = _at(start, figures, outcome, support)
    case = Case(
        outcome=outcome,
        form=form,
        given=counts,
        choices=choices,
        figures=figures,
        test=Gap(support.refused) if support.refused else own_test(table),
        conversion=conversion,
        patient=patient,
        marks=marks,
        extras=extras_of_counts(outcome, counts, table, figures, clusters, losses, adjusted, pace),
        randomised=losses.randomised,
    )
    return whole(case, measures(figures, support, welcome=outcome.welcome), reading.totals)


def _lacking(gap: Gap, form: Form) -> Gap:
    """Why there are no counts; where nothing but percentages and totals is to be typed, counts are not asked for."""
    return Gap("percents-not-typed") if form == "percent-of-total" and gap.key == "not-typed" else gap


def _at(
    start: StartingRisk | Gap, figures: Figures, outcome: Outcome, support: Support
) -> tuple[Conversion | Gap, PatientFindings | Gap]:
    """The two parts that hang on a starting risk."""
    if support.refused:
        return Gap(support.refused), Gap(support.refused)
    if isinstance(start, Gap):
        return start, start
    effect = support.effect(outcome.patient.effect)
    return (convert(figures, start), carry(figures, start, effect, support, welcome=outcome.welcome))
