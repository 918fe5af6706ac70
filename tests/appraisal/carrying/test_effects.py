"""Which effects each form and design can carry, and which one is the usual. All figures are invented."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from forms import at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap, Interval, PatientFindings
from fourcount.record.entry.complement import complement_text
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices

ADJUSTED = {"adjusted_text": "OR 0.45 (90% CI 0.30 to 0.70)", "adjusted_for_text": "age and sex"}


def found(outcome, **choices):
    return appraise(outcome, Choices(**choices))


def keys(findings):
    """The measures that can be carried, the adjusted one in brackets."""
    return [f"({one.measure})" if one.adjusted else one.measure for one in findings.carriable]


@pytest.mark.parametrize(
    ("outcome", "expected"),
    [
        (of_total(), ["risk_ratio", "odds_ratio", "risk_difference"]),
        (of_total(**ADJUSTED), ["risk_ratio", "odds_ratio", "risk_difference", "(odds_ratio)"]),
        (of_total(design="cohort", **ADJUSTED), ["(odds_ratio)", "risk_ratio", "odds_ratio", "risk_difference"]),
        (of_total(design="survey"), ["risk_ratio", "odds_ratio", "risk_difference"]),
        (of_total(design="case-control"), ["odds_ratio"]),
        (of_total(design="case-control", **ADJUSTED), ["(odds_ratio)", "odds_ratio"]),
        (of_total(design="case-control", adjusted_text="RR 0.5 (0.3 to 0.8)"), ["odds_ratio"]),
        (of_total(design="cohort", adjusted_text="HR 0.5 (0.3 to 0.8)"), ["(hazard_ratio)", "risk_ratio"]),
        (of_total(design="cohort", adjusted_text="rate difference -2 (-3 to -1)"), ["risk_ratio", "odds_ratio"]),
        (of_total(design="paired"), []),
        (paired(), ["pair_ratio", "pair_difference", "pair_odds_ratio"]),
        (paired("matched"), ["pair_odds_ratio"]),
        (paired("matched", **ADJUSTED), ["(odds_ratio)", "pair_odds_ratio"]),
        (paired("before-after"), ["pair_ratio", "pair_difference", "pair_odds_ratio"]),
        (paired("paired", ("", 20, 40, "")), ["pair_odds_ratio"]),
        (person_time(), ["rate_ratio"]),
        (at_time(), ["risk_ratio", "risk_difference"]),
        (strata(), ["pooled_risk_ratio", "pooled_odds_ratio", "pooled_risk_difference"]),
        (strata("case-control"), ["pooled_odds_ratio"]),
        (effect_only(), ["hazard_ratio"]),
        (effect_only(adjusted_for_text="age"), ["(hazard_ratio)"]),
        (effect_only("rate_difference", "-2 (-3 to -1)"), []),
    ],
)
def test_what_each_form_and_design_can_carry(outcome, expected):
    """The usual effect stands first: outside trials the adjusted one where there is one."""
    assert keys(found(outcome))[: len(expected)] == expected


@pytest.mark.parametrize(
    ("chosen", "carried"),
    [
        ("usual", "(odds_ratio)"),
        ("odds_ratio", "odds_ratio"),
        ("adjusted", "(odds_ratio)"),
        ("hazard_ratio", "(odds_ratio)"),
    ],
)
def test_an_effect_that_is_not_there_gives_way_to_the_usual_one(chosen, carried):
    """A cohort with an adjusted odds ratio has no hazard ratio."""
    patient = found(of_total(design="cohort", patient=Patient(effect=chosen), **ADJUSTED)).patient
    assert carried == (f"({patient.measure})" if patient.adjusted else patient.measure)


def test_an_adjusted_effect_at_the_own_risk_takes_its_limits_there():
    """It is no figure of this table: its limits hold at the reference risk, which keeps its own interval at 90%."""
    findings = found(of_total(design="cohort", **ADJUSTED), level=0.90)
    patient, reference = findings.patient, findings.measures["risk_reference"]
    assert (patient.range_from, patient.start_from, patient.without) == ("effect", "reference", reference)
    odds = 0.45 * reference.estimate / (1 - reference.estimate)
    assert patient.with_.estimate == pytest.approx(odds / (1 + odds))
    assert (patient.adjusted, patient.adjusted_for, patient.level) == (True, "age and sex", 0.90)


def test_the_conversion_stays_that_of_the_tables_own_odds_ratio():
    """The row of the odds ratio shows what that odds ratio means, whichever effect is carried."""
    conversion = found(of_total(design="cohort", patient=Patient(starting_risk_text="12%"), **ADJUSTED)).conversion
    plain = found(of_total(design="cohort", patient=Patient(starting_risk_text="12%"))).conversion
    assert conversion == plain


def test_a_conversion_at_a_risk_with_limits_holds_both_imprecisions():
    """The odds ratio as a risk ratio at 24 of 200 is less certain than at a bare 12%."""
    at_counts = found(of_total(patient=Patient(starting_risk_text="24 of 200"))).conversion.risk_ratio
    bare = found(of_total(patient=Patient(starting_risk_text="12%"))).conversion.risk_ratio
    assert at_counts.estimate == bare.estimate
    assert at_counts.interval.low < bare.interval.low < bare.interval.high < at_counts.interval.high


def test_swapped_groups_turn_the_adjusted_effect():
    """It is taken as printed of the first group against the second, as the counts are."""
    patient = found(of_total(design="cohort", index_group="second", **ADJUSTED)).patient
    assert patient.carried.estimate == pytest.approx(1 / 0.45)
    assert patient.carried.interval == Interval(low=1 / 0.70, high=1 / 0.30)


def test_an_adjusted_hazard_ratio_says_nothing_of_the_other_outcome():
    """Odds turn with the outcome, hazards do not."""
    rest = {"design": "cohort", "counted": "right"}
    assert "(hazard_ratio)" not in keys(found(of_total(adjusted_text="HR 0.5 (0.3 to 0.8)", **rest)))
    assert found(of_total(**ADJUSTED, **rest)).patient.carried.estimate == pytest.approx(1 / 0.45)


def test_pairs_at_their_own_risk_take_their_direct_intervals():
    """Whatever crude effect of the pairs is chosen, the paired figures stand."""
    for effect in ("usual", "odds_ratio", "risk_difference"):
        findings = found(paired(patient=Patient(effect=effect)))
        patient, measures = findings.patient, findings.measures
        assert (patient.range_from, patient.difference) == ("table", measures["pair_difference"])
        assert (patient.risk_ratio, patient.number_needed) == (measures["pair_ratio"], measures["number_needed"])


@pytest.mark.parametrize("typed", ["", "12%"])
def test_before_and_after_have_no_number_needed(typed):
    """Nobody tells what would have happened without the treatment."""
    patient = found(paired("before-after", patient=Patient(starting_risk_text=typed))).patient
    assert patient.number_needed == Gap("design-before-after")


@pytest.mark.parametrize(
    "make", [paired, lambda design, **rest: effect_only("odds_ratio", "0.5 (0.3 to 0.8)", design=design, **rest)]
)
@pytest.mark.parametrize("welcome", [True, False])
def test_becoming_a_case_is_never_welcome(make, welcome):
    """Night lights halve the odds of being a case: a number needed to benefit, whatever is thought of night lights."""
    typed = {"left_welcome": welcome, "line_kind": "margin", "line_scale": "odds_ratio", "line_text": "1.2"}
    findings = found(make("matched", patient=Patient(starting_risk_text="20%"), line_side="more", **typed))
    assert findings.patient.number_needed.kind == "NNTB"
    assert findings.line.worse_side


def test_a_matched_study_carries_the_odds_ratio_of_its_pairs():
    """20 pairs against 40: half the odds at a starting risk from elsewhere, and a number needed."""
    patient = found(paired("matched", patient=Patient(starting_risk_text="20%"))).patient
    assert patient.with_.estimate == pytest.approx(0.125 / 1.125)
    assert patient.number_needed.kind == "NNTB"


def test_a_rate_ratio_is_carried_as_a_hazard_ratio_is():
    """1 - (1 - q)^r at a typed risk."""
    patient = found(person_time(patient=Patient(starting_risk_text="20%"))).patient
    assert patient.with_.estimate == pytest.approx(1 - 0.8**patient.carried.estimate)


def test_counted_events_carry_nothing():
    """Several events may be one person's: their rate ratio moves no risk."""
    outcome = person_time(counting="events", patient=Patient(starting_risk_text="20%"))
    assert found(outcome).patient == Gap("events-not-people")


def test_a_case_control_study_with_an_outside_risk_gives_what_follows_from_it():
    """Risks, difference, risk ratio and number needed under the patient, and none of them in the study."""
    findings = found(of_total(design="case-control", patient=Patient(starting_risk_text="24 of 200")))
    patient = findings.patient
    for figure in (patient.without, patient.with_, patient.difference, patient.risk_ratio):
        assert isinstance(figure.estimate, float)
        assert isinstance(figure.interval, Interval)
    assert patient.number_needed.kind == "NNTB"
    assert isinstance(findings.measures["risk_ratio"], Gap)


@pytest.mark.parametrize("where", ["table", "typed"])
@given(cells=st.tuples(*[st.integers(1, 60)] * 4), start=st.integers(1, 99))
def test_odds_say_the_same_of_the_other_outcome(where, cells, start):
    """Counting the other outcome turns both risks to their complements and the difference's sign, limits included."""
    counts = (cells[0], cells[0] + cells[1], cells[2], cells[2] + cells[3])
    typed, turned = ("", "") if where == "table" else (f"{start}%", complement_text(f"{start}%"))
    one = found(of_total(counts, patient=Patient(starting_risk_text=typed, effect="odds_ratio"))).patient
    other = found(
        of_total(counts, counted="right", patient=Patient(starting_risk_text=turned, effect="odds_ratio"))
    ).patient
    assert isinstance(one, PatientFindings)
    assert isinstance(other, PatientFindings)
    assert other.with_.estimate == pytest.approx(1 - one.with_.estimate)
    assert other.difference.estimate == pytest.approx(-one.difference.estimate, abs=1e-12)
    for mine, theirs, whole in ((one.with_, other.with_, 1.0), (one.difference, other.difference, 0.0)):
        ends = (whole - mine.interval.high, whole - mine.interval.low)
        assert (theirs.interval.low, theirs.interval.high) == pytest.approx(ends, abs=1e-9)
    assert math.isclose(one.baseline, 1 - other.baseline)
