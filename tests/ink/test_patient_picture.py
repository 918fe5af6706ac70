"""From findings to pictures: the patient's own risks are drawn, and nothing where there are none."""

from __future__ import annotations

import msgspec
import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap, PatientFindings
from fourcount.ink.patient_picture import picture_of, plan_of, relative_picture_of
from fourcount.picture.options import PictureOptions
from fourcount.record.editing import edit_text
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.results import Interval
from fourcount.wording.example import worked_example
from fourcount.wording.picture_words import Said

CHOICES = Choices()


def at(risk: str = "") -> Outcome:
    """The worked example at a starting risk; "" is the study's own."""
    return edit_text(worked_example().outcomes[0], "starting_risk_text", risk)


def patient(outcome: Outcome) -> PatientFindings:
    found = appraise(outcome, CHOICES).patient
    assert isinstance(found, PatientFindings)
    return found


def test_the_patients_risks_are_drawn() -> None:
    """At 12% the picture is of 12% and of what the effect makes of it, not of the study's groups."""
    outcome = at("12%")
    picture = picture_of(outcome, appraise(outcome, CHOICES), CHOICES)
    assert picture is not None
    found = patient(outcome)
    assert (picture.plan.without_risk, picture.plan.with_risk) == (found.without.estimate, found.with_.estimate)
    assert (picture.words.without.number, picture.words.with_.number) == ("12 in 100", "6 in 100")


def test_uncertainty_is_drawn_only_where_it_is_asked_for() -> None:
    """The interval of the risk with is in the plan on demand, and its words are in the note then."""
    outcome = at("12%")
    findings = appraise(outcome, CHOICES)
    usual = picture_of(outcome, findings, CHOICES)
    asked = picture_of(outcome, findings, CHOICES, PictureOptions(uncertainty=True))
    assert usual is not None
    assert asked is not None
    assert (usual.plan.low, usual.words.note) == (None, "")
    interval = patient(outcome).with_.interval
    assert isinstance(interval, Interval)
    assert (asked.plan.low, asked.plan.high) == (interval.low, interval.high)
    assert "95% interval" in asked.words.note


def test_a_withheld_limit_is_said_and_not_drawn() -> None:
    """Where one limit cannot be given no icon is uncertain, and the picture says why."""
    outcome = at("12%")
    findings = appraise(outcome, CHOICES)
    found = patient(outcome)
    half = msgspec.structs.replace(found.with_, interval=Gap("beyond-one"))
    cut = msgspec.structs.replace(findings, patient=msgspec.structs.replace(found, with_=half))
    picture = picture_of(outcome, cut, CHOICES, PictureOptions(uncertainty=True))
    assert picture is not None
    assert picture.plan.with_.uncertain == 0
    assert "not drawn" in picture.words.note


def test_turned_risks_are_complements_of_the_same_findings() -> None:
    """A page that counts the unwelcome side everywhere draws 1 - risk, with the limits in their order."""
    found = patient(at("12%"))
    straight, turned = plan_of(found, uncertainty=True), plan_of(found, turned=True, uncertainty=True)
    assert straight is not None
    assert turned is not None
    assert turned.without_risk == pytest.approx(1 - straight.without_risk)
    assert turned.with_risk == pytest.approx(1 - straight.with_risk)
    assert (turned.low, turned.high) == (pytest.approx(1 - straight.high), pytest.approx(1 - straight.low))
    assert turned.low <= turned.with_risk <= turned.high


def test_turned_words_change_sides() -> None:
    """Turned, the affected are those without the event: the key and the other frame say so."""
    outcome = at("12%")
    picture = picture_of(outcome, appraise(outcome, CHOICES), CHOICES, said=Said(turned=True))
    assert picture is not None
    assert [entry.text for entry in picture.key if entry.state in ("affected", "others")] == ["did not fall", "fell"]
    assert picture.words.without == ("Without: usual care", "88 in 100", "(88%)", "12 fell at least once")


@pytest.mark.parametrize("asked", [PictureOptions(), PictureOptions("dot", "one", uncertainty=True)])
def test_without_two_risks_there_is_no_picture(asked: PictureOptions) -> None:
    """A case-control study has no risks; nothing is drawn, and nothing of a relative figure."""
    outcome = msgspec.structs.replace(at(), design="case-control")
    findings = appraise(outcome, CHOICES)
    assert isinstance(findings.patient, Gap)
    assert picture_of(outcome, findings, CHOICES, asked) is None
    assert relative_picture_of(outcome, findings) is None


def test_a_missing_risk_with_draws_nothing() -> None:
    """Where the effect would take the risk past 100% there is one risk, and no picture of two."""
    found = patient(at("12%"))
    beyond = msgspec.structs.replace(found.with_, estimate=Gap("beyond-one"))
    assert plan_of(msgspec.structs.replace(found, with_=beyond)) is None


def test_the_relative_figure_is_that_of_the_patient() -> None:
    """The risk ratio kept constant sounds alike at every starting risk; in people it is not."""
    low, high = (relative_picture_of(at(risk), appraise(at(risk), CHOICES)) for risk in ("2%", "40%"))
    assert low is not None
    assert high is not None
    assert low.plan.sounds == pytest.approx(high.plan.sounds)
    assert high.plan.people[0] == pytest.approx(20 * low.plan.people[0])
    assert low.words.sounds.values == high.words.sounds.values


def test_nobody_without_the_event_gives_no_relative_picture() -> None:
    """With a starting risk of none there is no relative figure to draw."""
    table = worked_example().outcomes[0]
    for field, text in zip(
        ("first_left_text", "first_right_text", "second_left_text", "second_right_text"),
        ("30", "70", "0", "100"),
        strict=True,
    ):
        table = edit_text(table, field, text)
    assert relative_picture_of(table, appraise(table, CHOICES)) is None
