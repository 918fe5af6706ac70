"""Effects across starting risks: the printed effect at every one, nothing cut, the points where they belong."""

from __future__ import annotations

from collections.abc import Callable

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from drawn_forms import outcomes
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.curve import curve, highest_start
from fourcount.appraisal.findings import Carriable, Figure, Gap, Interval, OutcomeFindings, PatientFindings
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurvePoint
from fourcount.record.outcome import Outcome, Pairs, Patient
from fourcount.record.paper import Choices


def lines(drawn: Curve) -> dict[str, CurveLine]:
    return {line.effect.effect: line for line in drawn.lines}


def at(line: CurveLine, start: float) -> CurvePoint:
    return min(line.points, key=lambda point: abs(point.start - start))


def carrying(findings: OutcomeFindings, effect: str, estimate: float, low: float, high: float) -> OutcomeFindings:
    """The same findings with one effect alone to carry."""
    figure = Figure(estimate=estimate, interval=Interval(low=low, high=high), method="printed")
    one = Carriable(effect=effect, measure=effect, figure=figure)  # type: ignore[arg-type]
    return msgspec.structs.replace(findings, carriable=(one,))


def test_every_effect_passes_through_the_study(appraised: Callable[..., OutcomeFindings]) -> None:
    """At the reference group's own risk each crude effect gives back the index group's risk."""
    drawn = curve(appraised(38, 374, 70, 339))
    assert set(lines(drawn)) == {"risk_ratio", "odds_ratio", "risk_difference"}
    for line in drawn.lines:
        assert at(line, 70 / 409).value == pytest.approx(38 / 412, abs=1e-12)
    assert (drawn.marks[0].without, drawn.marks[0].with_) == (70 / 409, 38 / 412)


def test_an_odds_ratio_is_the_risk_ratio_that_was_published(appraised: Callable[..., OutcomeFindings]) -> None:
    """RR = OR / (1 - P0 + P0 OR): an odds ratio of 2.5 at 50% is 1.43 (Zhang and Yu 1998's formula, by hand)."""
    findings = carrying(appraised(38, 374, 70, 339, baseline="50%"), "odds_ratio", 2.5, 1.5, 4.0)
    drawn = curve(findings)
    (ratio,) = drawn.ratios
    point = at(ratio, 0.5)
    assert [point.value, point.low, point.high] == pytest.approx([2.5 / 1.75, 1.5 / 1.25, 4 / 2.5])
    assert at(ratio, 0.0).value == 2.5
    assert at(ratio, 1.0).value == 1.0


def test_a_patient_of_the_study_stands_at_the_studys_point() -> None:
    """Carried by an odds ratio of the pairs that differ, which leads elsewhere, the study's own risk keeps its own."""
    table = Pairs(first_left_text="15", first_right_text="85", second_left_text="5", second_right_text="95")
    outcome = Outcome(table=table, design="paired", patient=Patient(effect="odds_ratio"))
    findings = appraise(outcome, Choices())
    assert isinstance(findings.patient, PatientFindings)
    assert findings.patient.range_from == "table"
    (mark,) = curve(findings).marks
    assert (mark.without, mark.with_) == (0.1, findings.patient.with_.estimate) == (0.1, 0.5)
    assert not isinstance(mark.low, Gap)
    assert not isinstance(mark.high, Gap)
    assert mark.low < 0.5 < mark.high


def test_an_effect_without_a_line_is_no_other_one(appraised: Callable[..., OutcomeFindings]) -> None:
    """A risk ratio without end has no line, and none of the others is taken for the one that is carried."""
    drawn = curve(appraised(55, 4, 0, 9))
    assert "risk_ratio" not in lines(drawn)
    assert drawn.carried == -1


def test_risk_with_and_risk_ratio_are_two_views_of_one(appraised: Callable[..., OutcomeFindings]) -> None:
    """The odds ratio's risk with is its risk ratio times the starting risk, everywhere."""
    drawn = curve(appraised(60, 140, 22, 178))
    risks, (ratios,) = lines(drawn)["odds_ratio"], drawn.ratios
    for risk, ratio in zip(risks.points, ratios.points, strict=True):
        assert risk.start == ratio.start
        assert risk.value == pytest.approx(ratio.value * ratio.start, abs=1e-12)


def test_a_line_ends_where_it_reaches_100(appraised: Callable[..., OutcomeFindings]) -> None:
    """A risk ratio of 2.5 reaches 100% at 40%; beyond that there is a gap, and below the end no value above 1."""
    findings = carrying(appraised(38, 374, 70, 339), "risk_ratio", 2.5, 2.0, 4.0)
    (line,) = curve(findings).lines
    assert (line.first, line.last) == (0.0, 0.4)
    assert at(line, 0.4).value == pytest.approx(1.0)
    assert at(line, 0.25).high == pytest.approx(1.0)
    beyond = [point for point in line.points if point.start > 0.4]
    assert beyond
    assert all(point.value == Gap("beyond-one") for point in beyond)
    assert all(isinstance(point.low, float) for point in line.points if point.start <= 0.5)


def test_a_difference_begins_where_it_leaves_nobody(appraised: Callable[..., OutcomeFindings]) -> None:
    """Ten fewer in 100 give no risk below a starting risk of 10%, and no limit is cut there either."""
    findings = carrying(appraised(38, 374, 70, 339), "risk_difference", -0.1, -0.2, 0.05)
    (line,) = curve(findings).lines
    assert (line.first, line.last) == (0.1, 1.0)
    assert at(line, 0.1).value == 0.0
    below = [point for point in line.points if point.start < 0.1]
    assert below
    assert all(point.value == Gap("carried-beyond-zero") for point in below)
    assert at(line, 0.15).low == Gap("carried-beyond-zero")


def test_a_patient_stands_on_the_line_that_is_carried(appraised: Callable[..., OutcomeFindings]) -> None:
    """The mark is what column three says: starting risk, risk with, and its limits."""
    findings = appraised(38, 374, 70, 339, baseline="12%", effect="odds_ratio")
    drawn = curve(findings)
    patient = findings.patient
    mark = drawn.marks[1]
    assert (mark.without, mark.with_, mark.of_study) == (0.12, patient.with_.estimate, False)
    assert (mark.low, mark.high) == (patient.with_.interval.low, patient.with_.interval.high)
    assert drawn.lines[drawn.carried].effect.effect == "odds_ratio"
    assert at(drawn.lines[drawn.carried], 0.12).value == mark.with_


def test_the_study_and_its_own_patient_are_one_point(appraised: Callable[..., OutcomeFindings]) -> None:
    """Without a typed starting risk one mark stands for both, with the table's own limits."""
    findings = appraised(38, 374, 70, 339)
    (mark,) = curve(findings).marks
    assert mark.of_study
    assert mark.of_patient
    assert mark.low == findings.measures["risk_index"].interval.low


def test_a_case_control_study_has_no_point_of_its_own(appraised: Callable[..., OutcomeFindings]) -> None:
    """Its totals are no risks: the patient's point alone is marked, and the odds ratio alone drawn."""
    drawn = curve(appraised(60, 40, 30, 70, design="case-control", baseline="2%"))
    assert [mark.of_study for mark in drawn.marks] == [False]
    assert set(lines(drawn)) == {"odds_ratio"}


@pytest.mark.parametrize(("baseline", "highest"), [("2%", 70 / 409), ("12%", 70 / 409), ("30%", 0.3), ("100%", 1.0)])
def test_the_highest_start_is_the_studys_or_the_patients(
    appraised: Callable[..., OutcomeFindings], baseline: str, highest: float
) -> None:
    """An axis that holds it holds every point."""
    assert highest_start(appraised(38, 374, 70, 339, baseline=baseline)) == pytest.approx(highest)


@pytest.mark.parametrize("reach", [0.2, 0.4, 1.0])
def test_lines_run_as_far_as_they_are_asked_for(appraised: Callable[..., OutcomeFindings], reach: float) -> None:
    """From nobody to the end of the axis."""
    drawn = curve(appraised(38, 374, 70, 339), reach)
    assert drawn.reach == reach
    assert all((line.points[0].start, line.points[-1].start) == (0.0, reach) for line in drawn.lines)


def test_an_effect_without_end_has_no_line(appraised: Callable[..., OutcomeFindings]) -> None:
    """Where nobody of the reference group had the event, the ratios are named as left out, the difference drawn."""
    drawn = curve(appraised(5, 95, 0, 100))
    assert {one.effect for one in drawn.left_out} >= {"risk_ratio", "odds_ratio"}
    assert set(lines(drawn)) == {"risk_difference"}
    assert drawn.ratios == ()


def test_nothing_typed_draws_nothing(appraised: Callable[..., OutcomeFindings]) -> None:
    """An empty table has no line and no point."""
    drawn = curve(appraised("", "", "", ""))
    assert (drawn.lines, drawn.ratios, drawn.marks) == ((), (), ())


@given(outcomes(), st.sampled_from((0.02, 0.5, 1.0)))
def test_whatever_is_typed_no_risk_leaves_its_bounds(outcome: object, reach: float) -> None:
    """Every value is a risk from 0 to 1 or a gap, the estimate lies between its limits, and points are in order."""
    drawn = curve(appraise(outcome, Choices()), reach)  # type: ignore[arg-type]
    for line in drawn.lines:
        starts = [point.start for point in line.points]
        assert starts == sorted(set(starts))
        for point in line.points:
            values = [value for value in (point.low, point.value, point.high) if not isinstance(value, Gap)]
            assert all(0.0 <= value <= 1.0 for value in values)
            assert values == pytest.approx(sorted(values), abs=1e-9)
