"""What a patient's range holds: the four rules. All tables are invented unless a test names a source."""

from __future__ import annotations

import math

import pytest

from forms import at_time, effect_only, of_total
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Figure, Gap, Interval, PatientFindings, Range
from fourcount.record.outcome import Outcome, Patient
from fourcount.record.paper import Choices
from fourcount.stats.hazards import over_spans
from fourcount.stats.normal import quantile
from fourcount.stats.propagation import limits_as_typed, limits_of_counts, propagated


def patient_of(outcome: Outcome, level: float = 0.95, **typed: str) -> PatientFindings:
    """The patient of an outcome for whom this is typed or chosen."""
    found = appraise(replaced(outcome, **typed), Choices(level=level)).patient
    assert isinstance(found, PatientFindings)
    return found


def replaced(outcome: Outcome, **typed: str) -> Outcome:
    fields = {name: getattr(outcome, name) for name in outcome.__struct_fields__}
    return Outcome(**{**fields, "patient": Patient(**typed)})  # type: ignore[arg-type]


def ends(figure: Figure) -> tuple[float, float, float]:
    assert isinstance(figure.interval, Interval)
    assert not isinstance(figure.estimate, Gap)
    return figure.interval.low, figure.estimate, figure.interval.high


@pytest.mark.parametrize("effect", ["usual", "risk_ratio", "odds_ratio", "risk_difference"])
def test_the_own_risk_with_any_crude_effect_takes_the_direct_intervals(effect):
    """Nothing is combined or converted: all figures are the table's, whichever crude effect is chosen."""
    findings = appraise(replaced(of_total(), effect=effect), Choices())
    patient, measures = findings.patient, findings.measures
    assert (patient.range_from, patient.start_from, patient.baseline_from) == ("table", "reference", "reference")
    assert patient.without == measures["risk_reference"]
    assert patient.with_ == measures["risk_index"]
    assert patient.difference == measures["risk_difference"]
    assert patient.number_needed == measures["number_needed"]
    assert patient.risk_ratio == measures["risk_ratio"]
    assert patient.start_interval == measures["risk_reference"].interval


@pytest.mark.parametrize("effect", ["usual", "risk_difference"])
def test_printed_risks_at_their_own_starting_risk_are_taken_directly(effect):
    """Risks printed with their limits are the patient's as they stand."""
    findings = appraise(replaced(at_time(), effect=effect), Choices())
    assert findings.patient.range_from == "table"
    assert findings.patient.difference == findings.measures["risk_difference"]


@pytest.mark.parametrize("effect", ["risk_ratio", "odds_ratio", "risk_difference"])
def test_other_people_with_counts_have_both_imprecisions_propagated(effect):
    """Both move along Newcombe's circle (2011, Commun Stat Theory Methods 40:3154)."""
    patient = patient_of(of_total(), starting_risk_text="24 of 200", effect=effect)
    start = limits_of_counts(24, 200)
    assert not isinstance(start, Gap)
    both = propagated(effect, patient.carried.estimate, patient.carried.interval, 0.95, start)
    assert not isinstance(both, Gap)
    assert (patient.range_from, patient.start_from, patient.baseline) == ("both", "typed", 0.12)
    for figure, limits in ((patient.with_, both.with_), (patient.difference, both.difference)):
        assert (limits.low, limits.high) == (figure.interval.low, figure.interval.high)
    assert ends(patient.without) == (start.at(-quantile(0.95)), 0.12, start.at(quantile(0.95)))
    assert patient.start_interval == patient.without.interval


def test_wilsons_limits_of_a_counted_starting_risk():
    """24 of 200 has the Wilson limits 8.2% and 17.2% (1927, JASA 22:209), computed by hand."""
    low, _, high = ends(patient_of(of_total(), starting_risk_text="24 of 200").without)
    assert (round(low, 4), round(high, 4)) == (0.0820, 0.1723)


@pytest.mark.parametrize("span", ["", "5 years"])
@pytest.mark.parametrize(
    ("outcome", "level"),
    [(of_total(), 0.95), (of_total(), 0.9), (effect_only("hazard_ratio", "0.72 (90% CI 0.6 to 0.9)"), 0.9)],
)
def test_every_interval_under_one_head_has_its_level(outcome, level, span):
    """Limits of 12% typed at 99% are told as typed, with their level; all figures have the level of the effect's."""
    typed = {"starting_risk_text": "12% (99% CI 9 to 15)", "other_span_text": span}
    patient = patient_of(outcome, 0.9 if level == 0.9 else 0.95, **typed)
    start = limits_as_typed(0.12, 0.09, 0.15, 0.99)
    spans, carried = 5.0 if span else 1.0, patient.carried
    both = propagated(patient.effect, carried.estimate, carried.interval, level, start, spans)
    assert (patient.level, patient.start_level) == (level, 0.99)
    assert Interval(low=0.09, high=0.15) == patient.start_interval
    for figure, limits in (
        (patient.with_, both.with_), (patient.difference, both.difference), (patient.risk_ratio, both.risk_ratio)
    ):  # fmt: skip
        assert (figure.interval.low, figure.interval.high) == (limits.low, limits.high)
    own = [over_spans(start.at(sign * quantile(level)), spans) for sign in (-1, 1)]
    assert [patient.without.interval.low, patient.without.interval.high] == own


def test_an_effect_without_limits_leaves_the_start_at_the_level_of_the_head():
    """A bare ratio at 12% (99% interval 9 to 15): the head says 95%, and so do the limits of the risk."""
    patient = patient_of(effect_only("risk_ratio", "0.72"), starting_risk_text="12% (99% CI 9 to 15)")
    start = limits_as_typed(0.12, 0.09, 0.15, 0.99)
    assert ends(patient.without) == (start.at(-quantile(0.95)), 0.12, start.at(quantile(0.95)))


def test_the_studys_own_risk_has_no_interval_of_another_level():
    """An adjusted effect printed at 90% beside a table at 95%: the table's interval of its risk stays in the table."""
    outcome = of_total(design="cohort", adjusted_text="OR 0.45 (90% CI 0.30 to 0.70)")
    patient = patient_of(outcome)
    assert (patient.level, patient.start_level, patient.without.interval) == (0.9, 0.95, Gap("other-level"))
    assert isinstance(patient_of(outcome, 0.9).without.interval, Interval)


def test_typed_limits_keep_their_own_level():
    """A starting risk of 12% (90% interval 9 to 15) is as precise as these limits say at 90%."""
    patient = patient_of(of_total(), starting_risk_text="12% (90% CI 9-15)")
    start = limits_as_typed(0.12, 0.09, 0.15, 0.90)
    assert not isinstance(start, Gap)
    both = propagated("risk_ratio", patient.carried.estimate, patient.carried.interval, 0.95, start)
    assert not isinstance(both, Gap)
    assert ends(patient.difference)[::2] == (both.difference.low, both.difference.high)
    assert Interval(low=0.09, high=0.15) == patient.start_interval
    assert ends(patient.without)[::2] == (start.at(-quantile(0.95)), start.at(quantile(0.95)))


def test_a_propagated_range_is_wider_than_that_of_a_bare_value():
    """What a bare value leaves out is more than nothing."""
    low, _, high = ends(patient_of(of_total(), starting_risk_text="24 of 200").difference)
    bare_low, _, bare_high = ends(patient_of(of_total(), starting_risk_text="12%").difference)
    assert low < bare_low < bare_high < high


def test_a_difference_kept_constant_has_its_own_limits_whatever_the_start():
    """Adding the same difference to another risk leaves its interval as it was."""
    findings = appraise(replaced(of_total(), starting_risk_text="80 of 200", effect="risk_difference"), Choices())
    assert ends(findings.patient.difference) == pytest.approx(ends(findings.measures["risk_difference"]), rel=1e-9)


def test_a_bare_value_takes_the_effects_limits_there():
    """The range holds the effect's limits at 12% and nothing of what is not known of the 12%."""
    patient = patient_of(of_total(), starting_risk_text="12%")
    assert (patient.range_from, patient.without.interval) == ("effect", Gap("bare-starting-risk"))
    assert ends(patient.with_) == pytest.approx(tuple(0.12 * limit for limit in ends(patient.carried)))


@pytest.mark.parametrize("typed", ["60%", "60% (55 to 65)"])
def test_a_ratio_that_passes_100_percent_is_withheld_and_the_odds_are_there(typed):
    """Twice 60% is no risk: the estimate is a gap, the lower limit of 1.5 times stands, and odds can be carried."""
    outcome = effect_only("risk_ratio", "2.0 (1.5 to 3.0)")
    patient = patient_of(outcome, starting_risk_text=typed)
    assert (Gap("beyond-one"), Gap("beyond-one")) == (patient.with_.estimate, patient.number_needed)
    assert isinstance(patient.with_.interval, Range)
    assert patient.with_.interval.high == Gap("beyond-one")
    odds = patient_of(of_total((80, 100, 40, 100)), starting_risk_text=typed, effect="odds_ratio")
    assert odds.with_.estimate < 1


def test_a_limit_that_passes_100_percent_is_withheld_alone():
    """At 45% a ratio of 2 (1.6 to 2.5) has an estimate and a lower limit, and no upper one."""
    patient = patient_of(effect_only("risk_ratio", "2.0 (1.6 to 2.5)"), starting_risk_text="45%")
    assert math.isclose(0.9, patient.with_.estimate)
    assert isinstance(patient.with_.interval, Range)
    assert math.isclose(0.72, patient.with_.interval.low)
    assert patient.with_.interval.high == Gap("beyond-one")


def test_a_difference_that_takes_a_risk_below_nobody_is_withheld():
    """8 fewer per 100 from a starting risk of 5%."""
    patient = patient_of(effect_only("risk_difference", "-8% (-13% to -3%)"), starting_risk_text="5%")
    assert patient.with_.estimate == Gap("carried-beyond-zero")


# Altman and Andersen 1999 (BMJ 319:1492): with S the control survival and h the hazard ratio, ARR = S^h - S.
def test_a_hazard_ratio_at_a_starting_risk():
    """At a risk of 20% a hazard ratio of 0.72 leaves 0.8^0.72 without the event, by the printed formula."""
    patient = patient_of(effect_only(), starting_risk_text="20%")
    assert (patient.effect, patient.measure) == ("hazard_ratio", "hazard_ratio")
    assert patient.difference.estimate == pytest.approx(0.8 - 0.8**0.72)
    assert patient.number_needed.estimate == pytest.approx(1 / (0.8**0.72 - 0.8))
    assert patient.risk_ratio.estimate == pytest.approx((1 - 0.8**0.72) / 0.2)


@pytest.mark.parametrize(("typed", "with_"), [("0%", 0.0), ("100%", 1.0)])
@pytest.mark.parametrize(
    ("measure", "text"), [("hazard_ratio", "0.72 (0.55 to 0.92)"), ("odds_ratio", "0.5 (0.3 to 0.8)")]
)
def test_nobody_and_everybody_stay_so(typed, with_, measure, text):
    """A starting risk of 0 or 100% is moved by no odds and no hazard; the field says so."""
    findings = appraise(replaced(effect_only(measure, text), starting_risk_text=typed), Choices())
    assert findings.patient.with_.estimate == with_
    assert [mark.used for mark in findings.marks if mark.field == "starting_risk_text"] == [True]


def test_a_difference_at_nobody_has_no_ratio():
    """From 0 to 5 in 100 is no number of times."""
    patient = patient_of(effect_only("risk_difference", "5% (2% to 8%)"), starting_risk_text="0%")
    assert (patient.with_.estimate, patient.risk_ratio.estimate) == (0.05, Gap("undetermined-at-baseline"))


@pytest.mark.parametrize("typed", ["120%", "x", "-3%", "12% (15 to 9)"])
def test_what_is_no_risk_carries_nothing(typed):
    """A risk over 100%, below 0, limits that do not hold it, or no number: the field is marked and says why."""
    findings = appraise(replaced(of_total(), starting_risk_text=typed), Choices())
    assert Gap("baseline-unreadable") == findings.patient
    assert any(mark.field == "starting_risk_text" and not mark.used for mark in findings.marks)
