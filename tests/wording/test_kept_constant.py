"""What is kept constant for a patient, over which time, and what its relative figure is of. All figures are invented."""

from __future__ import annotations

import pytest

from carried_patients import carried, effect, findings_with
from forms import of_total
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.basis import basis
from fourcount.wording.effects import carriable_words
from fourcount.wording.patient import patient_words

RR, OR, HR = effect(0.54, 0.37, 0.78), effect(0.49, 0.32, 0.75), effect(0.72, 0.55, 0.92)
YEAR, FIVE_YEARS = Duration(value=12, unit="month"), Duration(value=5, unit="year")


def typed(**more):
    return Patient(starting_risk_text="12%", **more)


def words_of(outcome, patient):
    return patient_words(outcome, findings_with(outcome, patient), Choices(), 100)


@pytest.mark.parametrize(
    ("patient", "said"),
    [
        (carried("risk_ratio", RR, 0.12), "In relative words 46% lower ("),
        (carried("odds_ratio", OR, 0.12), "In relative words the risk (not the odds) is 48% lower ("),
        (carried("hazard_ratio", HR, 0.2), "In relative words the risk (not the hazard) is 26% lower ("),
        (
            carried("risk_ratio", RR, 0.12, study_span=YEAR, other_span=FIVE_YEARS),
            "In relative words the risk over 5 years is 46% lower (",
        ),
    ],
)
def test_the_relative_figure_says_what_it_is_of_where_that_is_not_what_is_kept(patient, said):
    """Of risks, at the span in use: a ratio of odds or hazards, or one over another time, has another size."""
    assert said in words_of(of_total(patient=typed()), patient).detail


def test_an_effect_is_kept_over_the_studys_time_where_another_is_asked_for():
    """A ratio of risks is; one of hazards is the same over any time."""
    outcome = of_total(span_text="12 months", patient=typed(other_span_text="5 years"))
    rr = carried("risk_ratio", RR, 0.12, study_span=YEAR, other_span=FIVE_YEARS)
    hr = carried("hazard_ratio", HR, 0.12, study_span=YEAR, other_span=FIVE_YEARS)
    (one,), (other,) = findings_with(outcome, rr).carriable, findings_with(outcome, hr).carriable
    assert carriable_words(outcome, one) == "risk ratio 0.54, kept constant over 12 months"
    assert carriable_words(outcome, other) == "hazard ratio 0.72, kept constant"
    assert "risk ratio 0.54 (0.37 to 0.78) kept constant over 12 months, carried to 5 years" in basis(outcome, rr)
    assert carriable_words(of_total(patient=typed()), one) == "risk ratio 0.54, kept constant"
