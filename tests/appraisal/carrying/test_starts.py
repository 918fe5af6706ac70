"""Where a patient starts: one risk, three, a rate, or an overall risk. All figures are invented."""

from __future__ import annotations

import math

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from forms import effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap, Interval, PatientFindings
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices

OVERALL = {"start_kind": "overall", "overall_risk_text": "12%", "exposed_share_text": "30%"}
EFFECTS = {
    "risk_ratio": "1.8 (1.3 to 2.5)",
    "odds_ratio": "1.8 (1.3 to 2.5)",
    "hazard_ratio": "0.6 (0.4 to 0.9)",
    "risk_difference": "-4% (-7% to -1%)",
}


def found(outcome=of_total, **typed):
    return appraise(outcome(patient=Patient(**typed)), Choices())


def three(low="5%", usual="12%", high="20%", **rest):
    typed = {"start_kind": "three", "low_risk_text": low, "starting_risk_text": usual, "high_risk_text": high}
    return found(**typed, **rest)


def test_three_starting_risks_are_each_carried():
    """The usual one's findings hold the low and the high one's, as if each had been typed alone."""
    patient = three().patient
    assert [one.rank for one in (patient.low, patient, patient.high)] == ["low", "usual", "high"]
    for one, text in ((patient.low, "5%"), (patient, "12%"), (patient.high, "20%")):
        alone = found(starting_risk_text=text).patient
        assert (one.with_, one.difference, one.number_needed) == (alone.with_, alone.difference, alone.number_needed)


def test_three_risks_whose_usual_one_is_the_studys():
    """An empty usual risk is the reference group's own, and the table's direct intervals hold there alone."""
    patient = three(usual="").patient
    assert (patient.range_from, patient.low.range_from, patient.high.range_from) == ("table", "effect", "effect")


def test_a_risk_on_the_wrong_side_of_the_studys_is_marked():
    """A low risk above the study's 17.1% gives nothing; the other two stand."""
    findings = three(low="18%", usual="")
    assert findings.patient.low == Gap("low-above-usual")
    assert isinstance(findings.patient.high, PatientFindings)
    assert ("low_risk_text", "low-above-usual") in [(mark.field, mark.key) for mark in findings.marks]


def test_a_low_risk_above_the_usual_one_gives_nothing():
    """30% is no low risk beside a usual one of 12%."""
    findings = three(low="30%")
    assert findings.patient.low == Gap("low-above-usual")
    assert findings.patient.baseline == 0.12
    assert any(mark.field == "low_risk_text" and not mark.used for mark in findings.marks)


def test_the_high_risk_alone_may_pass_100_percent():
    """At 90% twice the risk is none; the usual one is carried all the same."""
    patient = found(
        lambda patient: effect_only("risk_ratio", "2.0 (1.5 to 3.0)", patient=patient),
        start_kind="three",
        starting_risk_text="12%",
        high_risk_text="90%",
    ).patient
    assert (patient.with_.estimate, patient.high.with_.estimate) == (0.24, Gap("beyond-one"))
    assert patient.low is None


# By hand: 1 - exp(-0.012 x 5) = 0.0582 and 1 - exp(-0.004 x 12) = 0.0469.
@pytest.mark.parametrize(
    ("rate", "span", "risk"),
    [
        ("12 per 1,000 person-years", "5 years", 0.058235),
        ("1.2% per year", "60 months", 0.058235),
        ("0.4 per 100 person-months", "1 year", 0.046866),
    ],
)
def test_a_rate_gives_the_risk_over_the_span(rate, span, risk):
    """1 - exp(-rate x time), the rate and the time in one unit."""
    patient = found(
        lambda patient: of_total(span_text=span, patient=patient), start_kind="rate", rate_text=rate
    ).patient
    assert (patient.start_from, patient.range_from) == ("rate", "effect")
    assert patient.baseline == pytest.approx(risk, abs=5e-7)


@pytest.mark.parametrize(
    ("rate", "span", "key"),
    [
        ("", "1 year", "rate-not-typed"),
        ("x", "1 year", "rate-unreadable"),
        ("1% per year", "", "rate-needs-span"),
        ("1% per year", "until death", "rate-needs-span"),
    ],
)
def test_a_rate_without_what_it_needs(rate, span, key):
    """A rate, and a time over which it becomes a risk."""
    findings = found(lambda patient: of_total(span_text=span, patient=patient), start_kind="rate", rate_text=rate)
    assert findings.patient == Gap(key)


def test_a_survey_takes_no_rate():
    """It does not follow people over time."""
    findings = found(
        lambda patient: of_total(design="survey", patient=patient), start_kind="rate", rate_text="1% per year"
    )
    assert findings.patient == Gap("design-no-rates")


@pytest.mark.parametrize("measure", EFFECTS)
def test_a_starting_risk_from_an_overall_one_gives_the_overall_one_back(measure):
    """70% without the exposure and 30% with it have 12% together, at the estimate and at each limit."""
    patient = found(lambda patient: effect_only(measure, EFFECTS[measure], patient=patient), **OVERALL).patient
    assert (patient.start_from, patient.range_from) == ("overall", "effect")
    assert 0.7 * patient.without.estimate + 0.3 * patient.with_.estimate == pytest.approx(0.12)
    # The starting risk is the lowest where the effect is the greatest.
    without, with_ = patient.without.interval, patient.with_.interval
    assert 0.7 * without.high + 0.3 * with_.low == pytest.approx(0.12)
    assert 0.7 * without.low + 0.3 * with_.high == pytest.approx(0.12)
    assert patient.difference.interval.low == pytest.approx(with_.low - without.high)


def test_an_overall_risk_of_people_without_the_exposure_is_their_own():
    """With nobody exposed the overall risk is a bare starting risk."""
    patient = found(**{**OVERALL, "exposed_share_text": "0%"}).patient
    alone = found(starting_risk_text="12%").patient
    assert (patient.without.estimate, patient.without.interval) == (0.12, Gap("bare-starting-risk"))
    assert patient.difference == alone.difference


@pytest.mark.parametrize(
    ("make", "overall", "key"),
    [
        (lambda patient: effect_only("risk_ratio", "4.0 (3.0 to 5.0)", patient=patient), "90%", "solved-beyond-one"),
        (lambda patient: of_total((70, 409, 1, 409), patient=patient), "90%", "solved-beyond-one-odds"),
        (
            lambda patient: effect_only("risk_difference", "20% (10% to 30%)", patient=patient),
            "1%",
            "solved-beyond-zero",
        ),
        (
            lambda patient: of_total(
                (70, 409, 1, 409), patient=msgspec.structs.replace(patient, effect="risk_difference")
            ),
            "1%",
            "solved-beyond-zero-odds",
        ),
    ],
)
def test_an_overall_risk_that_no_starting_risk_gives(make, overall, key):
    """Of 90% overall, half exposed with four times the risk, the exposed would have over 100%; odds never do."""
    typed = {**OVERALL, "overall_risk_text": overall, "exposed_share_text": "50%"}
    assert found(make, **typed).patient == Gap(key)


def test_low_and_high_without_a_usual_one_have_to_be_in_order():
    """In a study without a risk of its own neither of the two can be the one that is right."""
    findings = three(low="30%", usual="", high="20%")
    assert findings.patient.low == Gap("low-above-high")
    assert findings.patient.high == Gap("high-below-low")


@pytest.mark.parametrize(
    ("overall", "share", "key"),
    [("", "30%", "overall-not-typed"), ("12%", "", "overall-not-typed"), ("120%", "30%", "overall-unreadable")],
)
def test_an_overall_risk_without_what_it_needs(overall, share, key):
    """Both the risk of all people and the share exposed."""
    findings = found(start_kind="overall", overall_risk_text=overall, exposed_share_text=share)
    assert findings.patient == Gap(key)


def test_texts_of_the_kinds_not_chosen_do_nothing():
    """What stands in the fields of another kind is kept and not read."""
    typed = {"rate_text": "x", "overall_risk_text": "x", "low_risk_text": "x", "starting_risk_text": "12%"}
    findings = found(**typed)
    assert findings.marks == ()
    assert findings.patient == found(starting_risk_text="12%").patient


@pytest.mark.parametrize(
    ("outcome", "key"),
    [
        (lambda patient: of_total(design="case-control", patient=patient), "case-control-needs-baseline"),
        (lambda patient: paired("matched", patient=patient), "case-control-needs-baseline"),
        (lambda patient: paired("paired", ("", 20, 40, ""), patient=patient), "pairs-need-baseline"),
        (lambda patient: effect_only(patient=patient), "effect-needs-baseline"),
        (
            lambda patient: effect_only("risk_difference", "-8% (-13% to -3%)", patient=patient),
            "difference-needs-baseline",
        ),
        (lambda patient: person_time(patient=patient), "rates-need-baseline"),
        (lambda patient: strata(patient=patient), "strata-need-baseline"),
    ],
)
def test_a_form_without_a_risk_of_its_own_asks_for_one(outcome, key):
    """Each says in its own words what is missing, and is carried once a risk is typed."""
    assert found(outcome).patient == Gap(key)
    assert isinstance(found(outcome, starting_risk_text="12%").patient, PatientFindings)


@given(
    start=st.floats(0.001, 0.999),
    ratio=st.floats(0.05, 20),
    spread=st.floats(1.01, 4),
    kind=st.sampled_from(["risk_ratio", "odds_ratio", "hazard_ratio"]),
    limits=st.sampled_from(["", " of 1000"]),
)
def test_what_holds_at_every_starting_risk(start, ratio, spread, kind, limits):
    """The difference is with minus without, every estimate lies in its interval, and all are risks or gaps."""
    text = f"{ratio:.4f} ({ratio / spread:.4f} to {ratio * spread:.4f})"
    typed = f"{round(1000 * start)} of 1000" if limits else f"{100 * start:.3f}%"
    patient = found(lambda patient: effect_only(kind, text, patient=patient), starting_risk_text=typed).patient
    if isinstance(patient.with_.estimate, Gap):
        assert patient.with_.estimate == Gap("beyond-one")
        return
    assert patient.difference.estimate == pytest.approx(patient.with_.estimate - patient.without.estimate, abs=1e-12)
    assert 0 <= patient.with_.estimate <= 1
    for figure in (patient.without, patient.with_, patient.difference, patient.risk_ratio):
        if isinstance(figure.interval, Interval) and math.isfinite(figure.interval.high):
            assert figure.interval.low - 1e-12 <= figure.estimate <= figure.interval.high + 1e-12
