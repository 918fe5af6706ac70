"""Tests of the effect carried to a patient's starting risk."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.appraisal.carrying.carry import for_a_patient
from fourcount.appraisal.carrying.study import Study
from fourcount.appraisal.findings import Carriable, Figure, Gap, Interval, NumberNeeded, NumberNeededRange, Range
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Outcome, Patient
from fourcount.record.paper import FAMILIES

TABLE = (38, 374, 70, 339)


def at(baseline, effect, estimate, low, high, welcome=False):
    """The patient's findings of a bare effect in a trial."""
    figure = Figure(estimate=estimate, interval=Interval(low=low, high=high), method="katz")
    one = Carriable(effect=effect, measure=effect, figure=figure)
    study = Study(outcome=Outcome(left_welcome=welcome), carriable=(one,))
    return for_a_patient(study, read_start(Patient(starting_risk_text=f"{100 * baseline}%"))).patient


# Cochrane Handbook 5.1, 12.5.4.2 and 12.5.4.3: a risk ratio of 0.92 and an odds ratio of 0.73 at 30%.
@pytest.mark.parametrize(
    ("effect", "value", "fewer_per_1000", "number_needed"),
    [("risk_ratio", 0.92, 24, 42), ("odds_ratio", 0.73, 62, 17)],
)
def test_worked_examples_of_the_cochrane_handbook(effect, value, fewer_per_1000, number_needed):
    """The absolute effect and the number needed of the handbook's two examples, to its digits."""
    patient = at(0.3, effect, value, value, value)
    assert fewer_per_1000 == round(-1000 * patient.difference.estimate)
    assert number_needed == math.ceil(patient.number_needed.estimate * (1 - 1e-9))


# Cook and Sackett 1995 (BMJ 310:452), Table I, from memory: a risk ratio of 0.60 at 20% and at 1.5%.
@pytest.mark.parametrize(("baseline", "difference", "number_needed"), [(0.2, -0.08, 13), (0.015, -0.006, 167)])
def test_one_relative_effect_at_two_starting_risks(baseline, difference, number_needed):
    """The same risk ratio means a larger difference at the larger starting risk."""
    patient = at(baseline, "risk_ratio", 0.6, 0.5, 0.7)
    assert math.isclose(difference, patient.difference.estimate, rel_tol=1e-12)
    assert number_needed == math.ceil(patient.number_needed.estimate * (1 - 1e-9))
    assert patient.number_needed.kind == "NNTB"


# Altman 1998 (BMJ 317:1309): a reduction of 10 points (-5 to 25) is NNTB 10, from NNTB 4 through infinity to NNTH 20.
def test_a_number_needed_that_goes_through_infinity():
    """Limits on both sides of no effect have their own kinds."""
    needed = at(0.5, "risk_ratio", 0.8, 0.5, 1.1).number_needed
    assert needed.through_infinity
    assert (needed.kind, round(needed.estimate, 9)) == ("NNTB", 10)
    assert (needed.low.kind, round(needed.low.value, 9)) == ("NNTB", 4)
    assert (needed.high.kind, round(needed.high.value, 9)) == ("NNTH", 20)


def test_the_risk_ratio_kept_constant_at_a_typed_risk(appraised):
    """38/412 v 70/409 carried to 12% by the risk ratio of 0.54 is 6.47% with the treatment (by hand)."""
    patient = appraised(*TABLE, baseline="12%").patient
    assert round(patient.carried.estimate, 2) == 0.54
    assert round(patient.with_.estimate, 4) == 0.0647
    assert math.isclose(0.12 * (38 / 412) / (70 / 409), patient.with_.estimate, rel_tol=1e-12)
    assert (patient.baseline_from, patient.range_from, patient.baseline) == ("given", "effect", 0.12)
    assert patient.carried == patient.risk_ratio


def test_limits_at_a_typed_risk_are_the_effects(appraised):
    """Each limit of the risk with is the starting risk times the effect's limit, and the difference follows it."""
    patient = appraised(*TABLE, baseline="12%").patient
    for side in ("low", "high"):
        limit = getattr(patient.carried.interval, side) * 0.12
        assert math.isclose(limit, getattr(patient.with_.interval, side), rel_tol=1e-12)
        assert math.isclose(limit - 0.12, getattr(patient.difference.interval, side), rel_tol=1e-12)
    assert Figure(estimate=0.12, interval=Gap("bare-starting-risk"), method="") == patient.without


def test_the_odds_ratio_carried_multiplies_the_odds(appraised):
    """At 12% the odds with are the odds without times the odds ratio, and the relative figure is converted."""
    findings = appraised(*TABLE, baseline="12%", effect="odds_ratio")
    patient = findings.patient
    risk = patient.with_.estimate
    odds_ratio = findings.measures["odds_ratio"].estimate
    assert math.isclose(odds_ratio * 0.12 / 0.88, risk / (1 - risk), rel_tol=1e-12)
    assert findings.conversion.risk_ratio == patient.risk_ratio
    assert math.isclose(risk / 0.12, patient.risk_ratio.estimate, rel_tol=1e-12)


@pytest.mark.parametrize("effect", ["risk_ratio", "odds_ratio"])
@pytest.mark.parametrize("family", ["score", "textbook", "exact"])
def test_the_tables_own_risk_takes_the_tables_intervals(appraised, effect, family):
    """With no starting risk typed the patient's figures are the study's, whichever crude effect is chosen."""
    findings = appraised(*TABLE, effect=effect, family=family)
    patient, measures = findings.patient, findings.measures
    assert ("reference", "table", effect) == (patient.baseline_from, patient.range_from, patient.effect)
    assert measures["risk_reference"] == patient.without
    assert measures["risk_index"] == patient.with_
    assert measures["risk_difference"] == patient.difference
    assert measures["number_needed"] == patient.number_needed
    assert measures["risk_ratio"] == patient.risk_ratio
    assert measures[effect] == patient.carried


def test_the_tables_own_risk_stands_where_no_ratio_has_a_value(appraised):
    """0/20 v 0/30 has no ratio, and both risks and their difference stand."""
    patient = appraised(0, 20, 0, 30).patient
    assert (patient.without.estimate, patient.with_.estimate, patient.difference.estimate) == (0.0, 0.0, 0.0)
    assert Gap("no-events") == patient.risk_ratio.estimate


def test_an_effect_without_a_value_is_not_carried(appraised):
    """0/20 v 0/30 gives no ratio to carry to a typed risk."""
    assert Gap("carried-gap") == appraised(0, 20, 0, 30, baseline="12%").patient


def test_an_empty_index_group_gives_no_patient(appraised):
    """Nobody in the index group: neither the table nor an effect says anything of a patient."""
    assert Gap("carried-gap") == appraised(0, 0, 3, 7).patient
    assert Gap("carried-gap") == appraised(0, 0, 3, 7, baseline="12%").patient


def test_a_limit_that_passes_100_percent_is_withheld_alone():
    """At 60% a risk ratio of 1.5 (1.2 to 2.0) has its upper limit withheld; the estimate and the lower limit stand."""
    patient = at(0.6, "risk_ratio", 1.5, 1.2, 2.0)
    assert math.isclose(0.9, patient.with_.estimate)
    assert isinstance(patient.with_.interval, Range)
    assert math.isclose(0.72, patient.with_.interval.low)
    assert patient.with_.interval.high.key == "beyond-one"
    assert math.isclose(0.12, patient.difference.interval.low)
    assert patient.difference.interval.high.key == "beyond-one"
    needed = patient.number_needed
    assert isinstance(needed, NumberNeededRange)
    assert (needed.kind, needed.through_infinity, needed.low) == ("NNTH", False, patient.difference.interval.high)
    assert math.isclose(1 / 0.3, needed.estimate)
    assert math.isclose(1 / 0.12, needed.high.value)


@pytest.mark.parametrize("welcome", [False, True])
def test_a_withheld_limit_still_decides_about_infinity(welcome):
    """At 60% a risk ratio of 0.9 (0.3 to 2.5) runs from fewer through none to a limit beyond 100%."""
    needed = at(0.6, "risk_ratio", 0.9, 0.3, 2.5, welcome=welcome).number_needed
    assert needed.through_infinity
    assert needed.kind == needed.low.kind == ("NNTH" if welcome else "NNTB")
    assert math.isclose(1 / 0.42, needed.low.value)
    assert needed.high.key == "beyond-one"


def test_an_estimate_that_passes_100_percent_is_withheld():
    """At 60% a risk ratio of 2 is no risk; a lower limit of 1.5 still is one."""
    patient = at(0.6, "risk_ratio", 2.0, 1.5, 3.0)
    assert patient.with_.estimate.key == "beyond-one"
    assert math.isclose(0.9, patient.with_.interval.low)
    assert patient.difference.estimate.key == "beyond-one"
    assert patient.number_needed.key == "beyond-one"
    assert patient.risk_ratio.estimate == 2.0


def test_nothing_is_withheld_at_exactly_100_percent():
    """A limit that reaches 100% and does not pass it stands."""
    assert Interval(low=0.5, high=1.0) == at(0.5, "risk_ratio", 1.5, 1.0, 2.0).with_.interval


def test_the_odds_scale_never_passes_100_percent():
    """An odds ratio carried to 60% has every limit, an infinite one at 100%."""
    patient = at(0.6, "odds_ratio", 9.0, 2.0, math.inf)
    assert math.isclose(0.75, patient.with_.interval.low)
    assert patient.with_.interval.high == 1.0


@pytest.mark.parametrize(
    ("baseline", "effect", "value"),
    [(0.0, "risk_ratio", math.inf), (0.0, "odds_ratio", math.inf), (1.0, "odds_ratio", 0.0)],
)
def test_an_endless_effect_at_the_end_of_the_scale_is_undetermined(baseline, effect, value):
    """0 times infinity is no risk: the figure is withheld and nothing becomes nan."""
    assert at(baseline, effect, value, value, value).with_.estimate == Gap("undetermined-at-baseline")


@pytest.mark.parametrize(
    ("cells", "limit", "key"), [((1, 9, 5, 5), "low", "beyond-zero"), ((9, 1, 5, 5), "high", "formula-beyond-one")]
)
def test_a_limit_of_the_table_that_is_no_risk_is_withheld_from_the_patient(appraised, cells, limit, key):
    """Wald's limit of 1/10 is below 0 and that of 9/10 above 100%: the study's row shows it, the patient's does not."""
    findings = appraised(*cells, family="textbook")
    assert not 0 <= getattr(findings.measures["risk_index"].interval, limit) <= 1
    assert Gap(key) == getattr(findings.patient.with_.interval, limit)
    assert findings.measures["risk_difference"] == findings.patient.difference


# By hand: Wald's limits of 2/50 v 500/5,000 are 0.0400 - 0.1 - 1.96 sqrt(0.000768 + 0.000018) = -0.1149 and -0.0051,
# and those of the risks -0.0143 to 0.0943 and 0.0917 to 0.1083.
def test_a_difference_that_the_two_risks_cannot_reach_is_withheld_from_the_patient(appraised):
    """11.5 fewer per 100 of at most 10.8: the study's row shows it, the patient's range and number needed do not."""
    findings = appraised(2, 48, 500, 4500, family="textbook")
    shown = findings.measures["risk_difference"].interval
    assert (round(shown.low, 4), round(shown.high, 4)) == (-0.1149, -0.0051)
    patient = findings.patient
    assert Range(low=Gap("formula-beyond-risks"), high=shown.high) == patient.difference.interval
    assert (patient.number_needed.kind, patient.number_needed.low) == ("NNTB", Gap("formula-beyond-risks"))
    assert findings.measures["number_needed"].low.value == -1 / shown.low


def test_a_difference_beyond_everybody_has_no_number_needed_there(appraised):
    """10/10 v 1/10 by Wald reaches 1.086: the study's row keeps it, and no number needed is under one person."""
    findings = appraised(10, 0, 1, 9, family="textbook")
    assert round(findings.measures["risk_difference"].interval.high, 3) == 1.086
    needed = findings.measures["number_needed"]
    assert (needed.kind, needed.low) == ("NNTH", Gap("formula-beyond-risks"))
    assert Gap("formula-beyond-risks") == findings.patient.difference.interval.high


@given(
    cells=st.tuples(*[st.integers(0, 60)] * 4), family=st.sampled_from(FAMILIES), level=st.sampled_from([0.8, 0.999])
)
def test_no_number_needed_is_under_one_person(appraised, cells, family, level):
    """By any family, in the study and for a patient, at the limits as at the estimate."""
    findings = appraised(*cells, family=family, level=level)
    patient = findings.patient
    for needed in (findings.measures["number_needed"], Gap("") if isinstance(patient, Gap) else patient.number_needed):
        if not isinstance(needed, Gap):
            limits = [limit.value for limit in (needed.low, needed.high) if not isinstance(limit, Gap)]
            assert min(needed.estimate, *limits) >= 1 - 1e-12


def test_a_welcome_event_turns_the_kind_of_the_number_needed(appraised):
    """Fewer of a welcome event is harm."""
    assert appraised(*TABLE, baseline="12%").patient.number_needed.kind == "NNTB"
    assert appraised(*TABLE, baseline="12%", left_welcome=True).patient.number_needed.kind == "NNTH"


def test_an_interval_that_is_withheld_leaves_the_estimates(appraised):
    """5/5 v 8/8 by the textbook has no interval for the risk ratio of 1, and the risk with still stands at 12%."""
    patient = appraised(5, 0, 8, 0, baseline="12%", family="textbook").patient
    assert patient.with_.estimate == 0.12
    assert Gap("zero-width") == patient.with_.interval == patient.number_needed


def test_the_number_needed_is_of_the_patients_own_difference(appraised):
    """At another starting risk the number needed is the reciprocal of that difference."""
    patient = appraised(*TABLE, baseline="12%").patient
    assert isinstance(patient.number_needed, NumberNeeded)
    assert math.isclose(-1 / patient.difference.estimate, patient.number_needed.estimate, rel_tol=1e-12)
    assert math.isclose(-1 / patient.difference.interval.low, patient.number_needed.low.value, rel_tol=1e-12)
    assert math.isclose(-1 / patient.difference.interval.high, patient.number_needed.high.value, rel_tol=1e-12)
