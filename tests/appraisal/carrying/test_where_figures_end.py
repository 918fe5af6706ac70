"""A patient's figures at the ends of what can be given. All tables are invented."""

from __future__ import annotations

import msgspec
import pytest

from forms import at_time, effect_only, of_total, person_time
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Conversion, Gap, Interval, NumberNeededRange, PatientFindings
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.carried import needed_value


def found(outcome, **typed):
    return appraise(msgspec.structs.replace(outcome, patient=Patient(**typed)), Choices())


@pytest.mark.parametrize(
    ("outcome", "typed", "kind"),
    [
        (of_total((0, 50, 5, 50)), {"starting_risk_text": "24 of 200"}, "NNTB"),
        (of_total((5, 50, 0, 50)), {"starting_risk_text": "12% (9 to 15)", "effect": "odds_ratio"}, "NNTH"),
        (effect_only("hazard_ratio", "0 (0 to 0.8)"), {"starting_risk_text": "24 of 200"}, "NNTB"),
    ],
)
def test_a_limit_that_is_withheld_beside_no_effect_does_not_pass_it(outcome, typed, kind):
    """RR 0 (0 to 0.74) lowers every risk: what cannot be propagated lies on the same side, and nothing leans."""
    findings = found(outcome, **typed)
    needed = findings.patient.number_needed
    assert isinstance(needed, NumberNeededRange)
    assert (needed.kind, needed.through_infinity, needed.high) == (kind, False, Gap("endless-log"))
    assert needed.low.kind == kind
    assert "leans" not in {caution.key for caution in findings.cautions}


def test_a_limit_that_is_withheld_beyond_no_effect_passes_it():
    """HR 0 (0 to 1.2) holds more as well as fewer."""
    needed = found(effect_only("hazard_ratio", "0 (0 to 1.2)"), starting_risk_text="24 of 200").patient.number_needed
    assert needed.through_infinity


def test_limits_that_make_a_right_triangle_end_at_no_difference():
    """14% (10 to 19) v 9% (6 to 12): sqrt(3^2 + 4^2) is 5, so the difference of 5 goes from 0, and NNT to infinity."""
    findings = appraise(at_time(("9%", "6 to 12", "14%", "10 to 19")), Choices())
    for difference, needed in (
        (findings.measures["risk_difference"], findings.measures["number_needed"]),
        (findings.patient.difference, findings.patient.number_needed),
    ):
        assert difference.interval.high == 0.0
        assert (needed.high.value, needed.high.kind, needed.through_infinity) == (float("inf"), "NNTB", False)


def test_everybody_stays_everybody_over_another_span():
    """25 of 25 over a year: the upper limit over a month is 100%, as the estimate is."""
    typed = {"starting_risk_text": "25 of 25", "other_span_text": "1 month"}
    without = found(of_total((5, 100, 15, 100)), **typed).patient.without
    assert (without.estimate, without.interval.high) == (1.0, 1.0)


VARIED = {"design": "cohort", "follow_up_varied": True, "adjusted_text": "HR 2.1 (1.1 to 4.0)"}


def test_a_hazard_ratio_at_a_typed_risk_is_free_of_how_long_people_were_followed():
    """It has dealt with that; the table's own risk, and effects of raw counts, have not."""
    typed = {"starting_risk_text": "12%"}
    patient = found(of_total(**VARIED), **typed).patient
    alone = found(effect_only("hazard_ratio", "2.1 (1.1 to 4.0)", design="cohort"), **typed).patient
    assert patient.number_needed == alone.number_needed
    assert found(of_total(**VARIED), other_span_text="5 years", **typed).patient.other_span.years == 5
    for locked in ({}, {"starting_risk_text": "12%", "effect": "risk_ratio"}):
        assert found(of_total(**VARIED), **locked).patient.number_needed == Gap("follow-up-varied")
        assert found(of_total(**VARIED), other_span_text="5 years", **locked).patient == Gap("other-span-varied")


OVERALL = {"start_kind": "overall", "overall_risk_text": "40%", "exposed_share_text": "50%", "effect": "odds_ratio"}


def test_a_conversion_is_that_of_the_studys_span_whatever_other_one_is_asked_for():
    """Solved anew at each limit of the odds ratio, as without another span."""
    outcome = of_total((10, 15, 1, 11))
    own, other = (found(outcome, **OVERALL, other_span_text=span).conversion for span in ("", "2 years"))
    assert isinstance(own, Conversion)
    assert own == other


@pytest.mark.parametrize("effect", ["odds_ratio", "hazard_ratio", "risk_ratio"])
@pytest.mark.parametrize("span", ["", "5 years"])
def test_an_overall_risk_of_nobody_is_a_starting_risk_of_nobody(effect, span):
    """The same ratio as at a typed 0%."""
    outcome = effect_only(effect, "0.5 (0.3 to 0.8)")
    solved = found(outcome, **{**OVERALL, "overall_risk_text": "0%", "other_span_text": span}).patient
    typed = found(outcome, starting_risk_text="0%", other_span_text=span).patient
    assert solved.risk_ratio == typed.risk_ratio


def test_where_all_are_exposed_theirs_is_the_overall_risk():
    """Whatever the effect and its limits."""
    typed = {**OVERALL, "exposed_share_text": "100%"}
    with_ = found(effect_only("odds_ratio", "0.31 (0.17 to 0.83)"), **typed).patient.with_
    assert (with_.estimate, with_.interval) == (0.4, Interval(low=0.4, high=0.4))


def test_a_risk_next_to_everybody_is_withheld_with_its_own_reason():
    """A rate ratio never passes 100%; no digit is left of what is missing to it."""
    typed = {"start_kind": "overall", "overall_risk_text": "12%", "exposed_share_text": "90%"}
    patient = found(person_time((1, "4,120", 1, "10")), **typed).patient
    assert isinstance(patient, PatientFindings)
    assert patient.difference.interval.low == Gap("next-to-certain")


def test_typed_limits_come_back_as_typed():
    """At their own level, to the last bit."""
    without = found(of_total(), starting_risk_text="12% (9 to 15)").patient.without
    assert without.interval == Interval(low=0.09, high=0.15)


@pytest.mark.parametrize(
    ("outcome", "typed", "reason"),
    [
        (effect_only("risk_ratio", "0.54"), {"starting_risk_text": "12%"}, "no-interval-printed"),
        (of_total(icc_text="", cluster_size_text="21"), {"starting_risk_text": "12%"}, "cluster-without-icc"),
        (effect_only("risk_ratio", "1.2 (1.05 to 1.3)"), {"starting_risk_text": "83%"}, None),
    ],
)
def test_a_number_needed_without_a_range_stands_alone(outcome, typed, reason):
    """Papers that print a bare ratio are read for this one figure; both of its limits say why they are not there."""
    patient = found(outcome, **typed).patient
    needed = patient.number_needed
    assert needed.estimate == pytest.approx(1 / abs(patient.difference.estimate))
    if reason is not None:
        assert (needed.low, needed.high, needed.through_infinity) == (Gap(reason), Gap(reason), False)
    assert needed_value(needed).startswith(f"{needed.kind} ")


def test_the_studys_own_number_needed_stays_withheld_with_its_interval():
    """There the row of the study says why, and the patient's figures are the study's."""
    findings = found(of_total(icc_text="", cluster_size_text="21"))
    assert findings.patient.number_needed == findings.measures["number_needed"] == Gap("cluster-without-icc")


def test_a_line_on_a_printed_effect_that_is_withheld_says_why():
    """A survey has no hazard ratio to draw a margin on."""
    line = {"line_kind": "margin", "line_scale": "hazard_ratio", "line_text": "1.2", "line_side": "more"}
    assert appraise(effect_only(design="survey", **line), Choices()).line == Gap("design-no-rates")


def test_a_risk_without_width_may_be_any_within_its_formula():
    """1 of 10 v 0 of 10 by Wald: 8.6 fewer to 28.6 more per 100, of which the bare formula rules nothing out."""
    findings = appraise(of_total((1, 10, 0, 10)), Choices(family="textbook"))
    assert findings.patient.difference == findings.measures["risk_difference"]
    assert isinstance(findings.patient.difference.interval, Interval)
