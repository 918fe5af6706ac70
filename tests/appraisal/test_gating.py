"""Tests of what each design supports."""

from __future__ import annotations

import pytest

from fourcount.appraisal.findings import MEASURES, Figure, Gap, NumberNeeded, PatientFindings
from fourcount.appraisal.gating import SUPPORT
from fourcount.record.outcome import DESIGNS

TABLE = (38, 374, 70, 339)
NO_RISKS = set(MEASURES) - {"odds_ratio"}


def withheld(findings):
    """The measures that are gaps, with the keys of the reasons."""
    return {key: figure.key for key, figure in findings.measures.items() if isinstance(figure, Gap)}


def test_every_design_has_a_row():
    """The table of designs knows each design of a record."""
    assert set(DESIGNS) == set(SUPPORT)


@pytest.mark.parametrize("design", ["trial", "cohort"])
def test_trials_and_cohorts_give_everything(appraised, design):
    """Nothing is withheld from a trial or a cohort, and the measures stand in their order."""
    findings = appraised(*TABLE, design=design)
    assert withheld(findings) == {}
    assert list(MEASURES) == list(findings.measures)
    assert isinstance(findings.measures["number_needed"], NumberNeeded)
    assert all(isinstance(findings.measures[key], Figure) for key in MEASURES if key != "number_needed")


def test_a_survey_has_no_number_needed(appraised):
    """A cross-sectional survey gives everything but the number needed, in the study and for a patient."""
    findings = appraised(*TABLE, design="survey")
    assert withheld(findings) == {"number_needed": "design-survey-nnt"}
    assert Gap("design-survey-nnt") == findings.patient.number_needed


def test_a_survey_has_no_number_needed_at_a_typed_risk(appraised):
    """A typed starting risk does not bring the number needed back in a survey."""
    findings = appraised(*TABLE, design="survey", baseline="12%")
    assert Gap("design-survey-nnt") == findings.patient.number_needed


def test_a_case_control_study_gives_the_odds_ratio_only(appraised):
    """Every risk, odds and what follows from risks is withheld from a case-control study; test and odds ratio stand."""
    findings = appraised(*TABLE, design="case-control")
    assert dict.fromkeys(NO_RISKS, "design-case-control") == withheld(findings)
    assert isinstance(findings.measures["odds_ratio"], Figure)
    assert isinstance(findings.test.p, float)


def test_a_case_control_study_needs_an_outside_starting_risk(appraised):
    """Without a starting risk a case-control study says nothing of a patient, and its odds ratio is not converted."""
    findings = appraised(*TABLE, design="case-control")
    assert Gap("case-control-needs-baseline") == findings.patient
    assert Gap("case-control-needs-baseline") == findings.conversion


@pytest.mark.parametrize("effect", ["risk_ratio", "odds_ratio"])
def test_a_case_control_study_carries_its_odds_ratio(appraised, effect):
    """With a starting risk the odds ratio is carried whatever was chosen; the study's own risks stay withheld."""
    findings = appraised(*TABLE, design="case-control", baseline="12%", effect=effect)
    patient = findings.patient
    assert isinstance(patient, PatientFindings)
    assert patient.effect == "odds_ratio"
    assert patient.baseline_from == "given"
    assert findings.conversion.risk_ratio == patient.risk_ratio
    assert isinstance(patient.number_needed, NumberNeeded)
    assert dict.fromkeys(NO_RISKS, "design-case-control") == withheld(findings)


def test_a_design_changes_no_figure_it_gives(appraised):
    """The figures of a survey and a trial with the same counts are the same."""
    trial, survey = appraised(*TABLE), appraised(*TABLE, design="survey")
    assert {**trial.measures, "number_needed": None} == {**survey.measures, "number_needed": None}
