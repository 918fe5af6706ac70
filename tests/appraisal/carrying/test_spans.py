"""Another time span, through constant hazards of both groups. All figures are invented."""

from __future__ import annotations

import pytest

from forms import at_time, effect_only, of_total, paired, person_time
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap, Interval, PatientFindings
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.stats.results import LimitedRisk, TimedRisks
from fourcount.stats.timed import square_and_add

TWO_FIFTHS = (20, 100, 40, 100)
FIVE = {"other_span_text": "5 years"}


def found(make, *arguments, span="1 year", **typed):
    return appraise(make(*arguments, span_text=span, patient=Patient(**typed)), Choices())


@pytest.mark.parametrize("effect", ["usual", "odds_ratio", "risk_difference"])
def test_both_risks_are_carried_and_not_the_ratio(effect):
    """40% v 20% at 1 year are 92% v 67% at 5 years by hazards; carrying the ratio of 0.5 would say 46%."""
    patient = found(of_total, TWO_FIFTHS, effect=effect, **FIVE).patient
    assert (round(patient.without.estimate, 2), round(patient.with_.estimate, 2)) == (0.92, 0.67)
    assert patient.difference.estimate == pytest.approx(patient.with_.estimate - patient.without.estimate)
    assert patient.risk_ratio.estimate == pytest.approx(patient.with_.estimate / patient.without.estimate)
    assert (patient.baseline, patient.range_from) == (0.4, "table")


@pytest.mark.parametrize("typed", ["40%", "80 of 200"])
def test_a_typed_risk_is_carried_with_its_ratio_at_the_studys_span_first(typed):
    """The same two risks, once the ratio has given the second one at 1 year."""
    patient = found(of_total, TWO_FIFTHS, starting_risk_text=typed, **FIVE).patient
    assert (round(patient.without.estimate, 2), round(patient.with_.estimate, 2)) == (0.92, 0.67)
    assert (patient.baseline, patient.study_span, patient.other_span) == (
        0.4,
        Duration(value=1.0, unit="year"),
        Duration(value=5.0, unit="year"),
    )


def test_limits_of_a_table_over_another_span():
    """Each risk's limits are carried as its estimate is, and the difference's are those that square-and-add gives."""
    own = found(of_total, TWO_FIFTHS).patient
    patient = found(of_total, TWO_FIFTHS, **FIVE).patient
    risks = []
    for before, after in ((own.with_, patient.with_), (own.without, patient.without)):
        low, high = (1 - (1 - limit) ** 5 for limit in (before.interval.low, before.interval.high))
        assert (after.interval.low, after.interval.high) == pytest.approx((low, high))
        risks.append(LimitedRisk(risk=after.estimate, low=after.interval.low, high=after.interval.high))
    limits = square_and_add(TimedRisks(index=risks[0], reference=risks[1], level=0.95), 0.95)
    assert patient.difference.interval == limits
    assert patient.number_needed.low.value == pytest.approx(-1 / patient.difference.interval.low)


def test_printed_risks_over_another_span():
    """Risks at a time with their limits are carried alike."""
    patient = found(at_time, ("20%", "15 to 25", "40%", "34 to 46"), **FIVE).patient
    assert (round(patient.without.estimate, 2), round(patient.with_.estimate, 2)) == (0.92, 0.67)
    assert isinstance(patient.difference.interval, Interval)


def test_a_hazard_ratio_over_another_span():
    """1 - (1 - q)^(h t2/t1): with 40% at 1 year and a hazard ratio of 0.4368 that is 67% at 5 years."""
    patient = found(effect_only, "hazard_ratio", "0.4368 (0.3 to 0.6)", starting_risk_text="40%", **FIVE).patient
    assert patient.with_.estimate == pytest.approx(1 - 0.6 ** (0.4368 * 5))
    assert round(patient.with_.estimate, 2) == 0.67


def test_there_and_back_is_the_same():
    """What is carried from 1 year to 5 and from 5 to 1 comes back."""
    there = found(of_total, TWO_FIFTHS, starting_risk_text="12%", **FIVE).patient
    text = f"{100 * there.without.estimate:.12f}%"
    effect = f"{-100 * there.difference.estimate:.12f}"
    back = found(
        effect_only,
        "risk_difference",
        f"-{effect}%",
        span="5 years",
        starting_risk_text=text,
        other_span_text="12 months",
    ).patient
    assert (back.without.estimate, back.with_.estimate) == pytest.approx((0.12, 0.06), abs=1e-9)


def test_the_studys_own_span_in_other_words_is_no_other_span():
    """12 months are 1 year, and nothing is assumed."""
    patient = found(of_total, TWO_FIFTHS, other_span_text="12 months").patient
    assert patient.other_span is None
    assert patient == found(of_total, TWO_FIFTHS).patient


@pytest.mark.parametrize(
    ("make", "span", "rest", "key"),
    [
        (of_total, "", {}, "other-span-needs-study-span"),
        (of_total, "median 2 years", {}, "other-span-needs-study-span"),
        (of_total, "1 year", {"other_span_text": "some time"}, "span-unreadable"),
        (lambda **fields: of_total(design="survey", **fields), "1 year", {}, "other-span-survey"),
        (lambda **fields: of_total(follow_up_varied=True, **fields), "1 year", {}, "other-span-varied"),
    ],
)
def test_where_no_other_span_can_be_had(make, span, rest, key):
    """The study's own span has to be a time, and its risks have to belong to it."""
    findings = found(make, span=span, **{**FIVE, **rest})
    assert findings.patient == Gap(key)
    assert isinstance(found(make, span=span).patient, PatientFindings)


def test_an_unreadable_span_is_marked():
    """The field of the other span says what is wrong with it."""
    findings = found(of_total, other_span_text="some time")
    assert [(mark.field, mark.used) for mark in findings.marks] == [("other_span_text", False)]


def test_pairs_over_another_span_have_risks_and_no_interval_of_what_parts_them():
    """The same people on both sides: the limits of two risks do not tell those of their difference."""
    patient = found(paired, **FIVE).patient
    assert isinstance(patient.with_.interval, Interval)
    assert patient.difference.interval == patient.number_needed == Gap("other-span-pairs")


def test_a_rate_with_a_rate_ratio_needs_no_span_of_the_study():
    """Both hold whatever the time: 3 per 100 a year over 5 years, and a ratio of rates."""
    patient = found(person_time, span="", start_kind="rate", rate_text="3% per year", **FIVE).patient
    assert patient.without.estimate == pytest.approx(0.139292, abs=5e-7)
    assert patient.with_.estimate == pytest.approx(1 - (1 - patient.without.estimate) ** patient.carried.estimate)
    assert (patient.study_span, patient.other_span) == (None, Duration(value=5.0, unit="year"))


def test_a_rate_over_another_span_is_the_risk_over_that_span():
    """Carrying 1 year's risk to 5 years by a constant hazard is what the rate says itself."""
    patient = found(of_total, TWO_FIFTHS, start_kind="rate", rate_text="3% per year", **FIVE).patient
    assert patient.without.estimate == pytest.approx(0.139292, abs=5e-7)
