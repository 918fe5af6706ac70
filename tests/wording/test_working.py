"""The working: formula with the reader's numbers, method, and every other method."""

from __future__ import annotations

import pytest

from fourcount.record.outcome import EventsAndOthers, Outcome, Patient
from fourcount.record.paper import Choices
from fourcount.stats.methods import METHODS, TESTS
from fourcount.wording.working import METHOD_MEASURES, working


def rows_of(measure, outcome, findings_of, choices=None):
    choices = choices or Choices()
    return dict(working(measure, outcome, findings_of(outcome, choices), choices).rows)


@pytest.mark.parametrize(
    ("measure", "formula"),
    [
        ("risk_difference", "38/412 − 70/409 = 0.0922 − 0.1711 = −0.0789"),
        ("number_needed", "1/0.0789 = 12.67, rounded up 13"),
        ("risk_index", "38/412 = 0.0922"),
        ("risk_reference", "70/409 = 0.1711"),
        ("odds_index", "38/374 = 0.1016"),
        ("odds_reference", "70/339 = 0.2065"),
        ("risk_ratio", "(38/412) / (70/409) = 0.0922 / 0.1711 = 0.5389"),
        ("other_risk_ratio", "(374/412) / (339/409) = 0.9078 / 0.8289 = 1.0952"),
        ("odds_ratio", "(38 × 339) / (374 × 70) = 12,882/26,180 = 0.4921"),
    ],
)
def test_the_formula_holds_the_readers_numbers(outcome_of, findings_of, measure, formula):
    """Each step can be checked with a pencil."""
    assert rows_of(measure, outcome_of(), findings_of)["Estimate"] == formula


@pytest.mark.parametrize("measure", ["risk_index", "risk_difference", "risk_ratio", "odds_ratio"])
def test_every_other_method_of_the_measure_is_listed(outcome_of, findings_of, measure):
    """With its title, and the shown one by its own rows."""
    rows = rows_of(measure, outcome_of(), findings_of)
    titles = {method.title for method in METHODS if method.measure == METHOD_MEASURES[measure]}
    assert titles <= {*rows, rows["Method"]}
    assert rows["Formula"]
    assert rows["Source"]


def test_a_difference_is_given_in_points_and_per_1000(outcome_of, findings_of):
    """Never as a percentage."""
    rows = rows_of("risk_difference", outcome_of(), findings_of)
    assert (rows["In percentage points"], rows["Per 1,000 people"]) == ("7.9 fewer", "79 fewer")
    assert rows["Interval, 95%, per 100"] == "3.3 to 12.6"


def test_the_odds_ratio_shows_its_conversion_and_its_source(outcome_of, findings_of):
    """At the typed starting risk."""
    rows = rows_of("odds_ratio", outcome_of(patient=Patient(starting_risk_text="12%")), findings_of)
    assert rows["As a risk ratio at 12%"] == "0.52 (0.35 to 0.77)"
    assert "Zhang and Yu 1998" in rows["How"]
    assert rows["Conditional estimate, given both margins"] == "0.49"


def test_at_the_own_starting_risk_the_odds_ratio_shows_the_direct_risk_ratio(outcome_of, findings_of):
    """The interval is the risk ratio's own, and nothing claims to be converted."""
    rows = rows_of("odds_ratio", outcome_of(), findings_of)
    assert rows["As a risk ratio at 17.1%"] == "0.54 (0.37 to 0.78)"
    assert (
        rows["How"] == "At the study’s own risk this is the table’s own risk ratio and interval: nothing is converted"
    )


def test_the_p_values_of_all_tests_stand_together(outcome_of, findings_of):
    """In one way of writing."""
    rows = rows_of("test", outcome_of((12, 88, 10, 90)), findings_of)
    assert [rows[test.title] for test in TESTS] == ["p = 0.82", "p = 0.74", "p = 0.65", "p = 0.65"]
    assert rows["Method"] == "(N−1) chi-square"


def test_a_correction_is_said_in_the_row_of_its_method(outcome_of, findings_of):
    """Also where it is not the family's own method."""
    rows = rows_of("odds_ratio", outcome_of((0, 50, 7, 43)), findings_of)
    assert rows["Woolf logit"].endswith(
        "(interval with half added to each of the four counts (Gart): it need not hold the estimate)"
    )


def test_what_cannot_be_worked_out_is_a_sentence(outcome_of, findings_of):
    """0/0 and division by 0 are written, not computed."""
    assert rows_of("risk_ratio", outcome_of((0, 50, 0, 40)), findings_of)["Estimate"] == (
        "(0/50) / (0/40) = 0 / 0 = not determined"
    )
    assert rows_of("odds_ratio", outcome_of((50, 0, 1, 49)), findings_of)["Estimate"].endswith("2,450/0 = ∞")
    wald = rows_of("risk_index", outcome_of((0, 50, 1, 49)), findings_of)["Wald"]
    assert wald.startswith("An interval of zero width is withheld")


@pytest.mark.parametrize("measure", ["risk_difference", "test"])
def test_nothing_is_worked_out_without_counts(findings_of, measure):
    """An empty table has a sentence and no rows."""
    outcome = Outcome(table=EventsAndOthers())
    work = working(measure, outcome, findings_of(outcome), Choices())
    assert work.rows == ()
    assert work.sentence == "Type the four counts of the table."
