"""The lines of "What it says": order, texts, what is withheld, and the numbers of the strips."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.findings import (
    Figure,
    Gap,
    Interval,
    NumberNeeded,
    NumberNeededLimit,
    NumberNeededRange,
    Range,
)
from fourcount.record.outcome import EventsAndOthers, Outcome, Patient
from fourcount.record.paper import Choices
from fourcount.wording import limits
from fourcount.wording.gaps import gap_text
from fourcount.wording.lines import SCREEN_ORDER, measure_lines


def lines_of(outcome, findings_of, choices=None):
    choices = choices or Choices()
    return {line.key: line for line in measure_lines(outcome, findings_of(outcome, choices), choices)}


def text(line):
    return line.name, line.detail, line.estimate, line.interval


def test_the_example_reads_line_by_line(outcome_of, findings_of):
    """Difference, number needed, both risks, ratio, odds ratio, and the odds under the fold."""
    lines = lines_of(outcome_of(), findings_of)
    assert tuple(lines) == SCREEN_ORDER
    assert [text(line) for line in lines.values()] == [
        ("Difference", "per 100, score", "7.9 fewer", "3.3 to 12.6"),
        ("NNTB in the study", "over 12 months", "13", "8 to 31"),
        ("Risk, usual care", "70 of 409, score", "17.1%", "13.8 to 21.1%"),
        ("Risk, night lights", "38 of 412, score", "9.2%", "6.8 to 12.4%"),
        ("Risk ratio", "score", "0.54", "0.37 to 0.78"),
        ("Odds ratio", "score", "0.49", "0.32 to 0.75"),
        ("Odds, usual care", "70 to 339, score", "0.21", "0.16 to 0.27"),
        ("Odds, night lights", "38 to 374, score", "0.10", "0.07 to 0.14"),
    ]
    assert [line.group for line in lines.values()] == ["main"] * 6 + ["more"] * 2


def test_relative_words_and_the_other_outcome_stand_under_the_risk_ratio(outcome_of, findings_of):
    """The relative figure never stands without the absolute ones above it."""
    assert lines_of(outcome_of(), findings_of)["risk_ratio"].note == (
        "relative reduction 46%: 22% to 63%; ratio of not having the event 1.10 (1.04 to 1.16)"
    )


@pytest.mark.parametrize(
    ("starting_risk", "note"),
    [
        ("", ""),
        ("12%", "as a risk ratio at 12%: 0.52 (0.35 to 0.77)"),
        ("12.25%", "as a risk ratio at 12.25%: 0.52 (0.35 to 0.77)"),
    ],
)
def test_the_odds_ratio_is_followed_by_its_risk_ratio(outcome_of, findings_of, starting_risk, note):
    """At a typed starting risk; at the study's own the line of the risk ratio has said it."""
    outcome = outcome_of(patient=Patient(starting_risk_text=starting_risk))
    assert lines_of(outcome, findings_of)["odds_ratio"].note == note


def test_the_exact_family_says_where_it_is_not_exact(outcome_of, findings_of):
    """Difference and ratio have no exact interval here."""
    lines = lines_of(outcome_of(), findings_of, Choices(family="exact"))
    assert lines["risk_difference"].detail == "per 100, score, approximate"
    assert lines["risk_ratio"].detail == "score, approximate"
    assert lines["risk_index"].detail == "38 of 412, exact"
    assert lines["odds_ratio"].detail == "exact"


def test_a_correction_in_use_is_said_beside_the_figure(outcome_of, findings_of):
    """Zeros are never edited in silence."""
    lines = lines_of(outcome_of((0, 50, 7, 43)), findings_of, Choices(family="textbook"))
    assert lines["odds_ratio"].note == (
        "interval with half added to each of the four counts (Gart): it need not hold the estimate"
    )
    assert lines["risk_ratio"].note == (
        "interval with half added to the events and to the people of each group (Walter): it need not hold the "
        "estimate; relative reduction 100%; ratio of not having the event 1.16 (1.04 to 1.30)"
    )
    assert lines["risk_index"].interval == "withheld"
    assert lines["risk_index"].note.startswith("An interval of zero width is withheld")


def test_a_correction_and_a_reason_are_two_sentences(outcome_of, findings_of):
    """What is no sentence ends before one begins."""
    line = lines_of(outcome_of((0, 50, 0, 50)), findings_of, Choices(family="textbook"))["risk_ratio"]
    assert line.note == (
        "interval with half added to the events and to the people of each group (Walter): it need not hold the "
        "estimate; ratio of not having the event 1.00. Nobody in either group had the event, so this figure is not "
        "determined."
    )


def test_zero_and_infinity_are_shown_as_they_are(outcome_of, findings_of):
    """And 0/0 is said not to be determined, with its interval."""
    assert text(lines_of(outcome_of((50, 0, 1, 49)), findings_of)["odds_ratio"])[2:] == ("∞", "322 to ∞")
    both_zero = lines_of(outcome_of((0, 50, 0, 40)), findings_of)["risk_ratio"]
    assert text(both_zero)[2:] == ("not determined", "0 to ∞")
    assert both_zero.estimate_value is None


def test_no_difference_has_an_infinite_number_needed(outcome_of, findings_of):
    """Through infinity, from NNTB to NNTH, never a simple range."""
    lines = lines_of(outcome_of((10, 90, 10, 90)), findings_of)
    assert text(lines["number_needed"]) == (
        "NNT in the study",
        "over 12 months",
        "∞",
        "NNTB 12 to ∞ to NNTH 12",
    )
    assert text(lines["risk_difference"])[2:] == ("0.0", "8.8 fewer to 8.8 more")


def test_a_number_needed_comes_from_whole_counts(outcome_of, findings_of):
    """30 of 100 against 25 of 100 is 20, although 1/(0.30 - 0.25) in floats is a little more."""
    assert lines_of(outcome_of((30, 70, 25, 75)), findings_of)["number_needed"].estimate == "20"


def test_a_missing_span_is_said(outcome_of, findings_of):
    """A number needed without its time is not whole."""
    assert lines_of(outcome_of(span_text=""), findings_of)["number_needed"].detail == "time span not given"


def test_a_survey_has_prevalences_and_no_number_needed(outcome_of, findings_of):
    """The reason stands in the line's place."""
    lines = lines_of(outcome_of(design="survey"), findings_of)
    assert lines["risk_index"].name == "Prevalence, night lights"
    assert lines["risk_ratio"].name == "Prevalence ratio"
    assert lines["number_needed"].withheld.startswith("A cross-sectional survey")
    assert lines["number_needed"].estimate == ""


def test_a_case_control_study_shows_its_odds_ratio_first_and_no_number_elsewhere(outcome_of, findings_of):
    """What is withheld has a reason and no figure."""
    lines = measure_lines(outcome_of(design="case-control"), findings_of(outcome_of(design="case-control")), Choices())
    assert lines[0].key == "odds_ratio"
    assert lines[0].note == ""
    for line in lines[1:]:
        assert line.withheld.startswith("A case-control study")
        assert (line.estimate, line.interval, line.low, line.high) == ("", "", None, None)


def test_an_empty_table_has_names_and_nothing_else(findings_of):
    """A quiet page before the first count."""
    outcome = Outcome(table=EventsAndOthers())
    for line in lines_of(outcome, findings_of).values():
        assert line.name
        assert (line.estimate, line.interval, line.note, line.withheld) == ("", "", "", "")


def test_the_strip_gets_the_unrounded_numbers(outcome_of, findings_of):
    """Fractions and ratios, for drawing only."""
    line = lines_of(outcome_of(), findings_of)["risk_difference"]
    assert line.kind == "difference"
    assert line.low < line.estimate_value < line.high < 0
    assert line.estimate_value == pytest.approx(38 / 412 - 70 / 409)


def test_a_figure_that_follows_says_so(outcome_of, findings_of):
    """Neither a blank nor a number."""
    findings = findings_of(outcome_of())
    later = Figure(estimate=0.4921, interval=Gap("follows"), method="conditional-exact")
    findings.measures["odds_ratio"], before = later, findings.measures["odds_ratio"]
    line = {line.key: line for line in measure_lines(outcome_of(), findings, Choices(family="exact"))}["odds_ratio"]
    findings.measures["odds_ratio"] = before
    assert (line.estimate, line.interval) == ("0.49", "follows")


@pytest.mark.parametrize(
    ("low", "high", "estimate", "text"),
    [
        (-0.124, -0.033, -0.0789, "3.3 to 12.4"),
        (0.033, 0.124, 0.0789, "3.3 to 12.4"),
        (-0.021, 0.05, 0.01, "2.1 fewer to 5.0 more"),
        (-0.000004, 0.05, 0.02, "0.00040 fewer to 5.0 more"),
        (0.0, 0.05, 0.02, "0.0 to 5.0"),
        (-0.05, 0.0, -0.02, "0.0 to 5.0"),
        (-0.03, 0.03, 0.0, "3.0 fewer to 3.0 more"),
    ],
)
def test_each_limit_of_a_difference_has_the_word_it_needs(low, high, estimate, text):
    """Both words where the interval holds no effect (Cochrane Handbook 5.1, 12.5.4.5)."""
    assert limits.difference_interval(Interval(low=low, high=high), estimate) == text


@pytest.mark.parametrize(
    ("low", "high", "estimate", "text"),
    [
        (0.02, Gap("beyond-one"), 0.05, "2.0 to an open end"),
        (-0.02, Gap("beyond-one"), -0.01, "2.0 fewer to an open end"),
        (Gap("beyond-one"), 0.02, 0.01, "an open end to 2.0 more"),
        (Gap("beyond-one"), -0.02, -0.05, "2.0 to an open end"),
        (Gap("formula-beyond-risks"), -0.02, -0.05, "2.0 to a withheld limit"),
    ],
)
def test_a_limit_beyond_everybody_is_on_its_own_side_of_no_effect(low, high, estimate, text):
    """A range that is open at its upper end and starts at fewer holds no effect, whatever its estimate."""
    assert limits.difference_interval(Range(low=low, high=high), estimate) == text


@pytest.mark.parametrize(
    ("low", "high", "through", "text"),
    [
        ((9.0, "NNTB"), (31.0, "NNTB"), False, "9 to 31"),
        ((11.2, "NNTB"), (39.5, "NNTH"), True, "NNTB 12 to ∞ to NNTH 40"),
        ((11.2, "NNTB"), (math.inf, "NNTB"), False, "12 to ∞"),
        ((9.0, "NNTB"), (math.inf, "neither"), False, "NNTB 9 to ∞"),
        ((1203.5, "NNTB"), (1e7, "NNTB"), False, "1,204 to 10,000,000"),
    ],
)
def test_a_number_needed_runs_through_infinity(low, high, through, text):
    """Altman 1998, BMJ 317:1309: never "-40 to 12"."""
    first, second = (NumberNeededLimit(value=value, kind=kind) for value, kind in (low, high))
    needed = NumberNeeded(estimate=20.0, kind="NNTB", low=first, high=second, through_infinity=through)
    assert limits.number_needed_interval(needed) == text


WITHHELD = Gap("beyond-one")


@pytest.mark.parametrize(
    ("kind", "low", "high", "through", "text"),
    [
        ("NNTH", WITHHELD, (28.0, "NNTH"), False, "up to 28; at the other limit the risk would pass 100%"),
        ("NNTH", WITHHELD, (9.0, "NNTB"), True, "NNTH, limit not given, to ∞ to NNTB 9"),
        ("NNTB", (3.0, "NNTB"), WITHHELD, True, "NNTB 3 to ∞ to NNTH, limit not given"),
        ("NNTH", (3.0, "NNTH"), WITHHELD, True, "NNTH 3 to ∞ to NNTB, limit not given"),
        ("neither", (3.0, "NNTB"), WITHHELD, True, "NNTB 3 to ∞ to NNTH, limit not given"),
        ("NNTB", (3.0, "NNTB"), Gap("formula-beyond-risks"), False, "from 3; the other limit is not given"),
        ("neither", (math.inf, "NNTH"), WITHHELD, False, "from ∞; at the other limit the risk would pass 100%"),
    ],
)
def test_a_withheld_limit_of_a_number_needed_is_said_to_be(kind, low, high, through, text):
    """The estimate's other limit stays, and each side keeps its kind."""
    first, second = (
        end if isinstance(end, Gap) else NumberNeededLimit(value=end[0], kind=end[1]) for end in (low, high)
    )
    needed = NumberNeededRange(estimate=20.0, kind=kind, low=first, high=second, through_infinity=through)
    assert limits.number_needed_interval(needed) == text


def test_a_limit_beyond_everybody_is_said_beside_the_row(outcome_of, findings_of):
    """Wald's limits stand as papers print them, and the row says that nothing lies there."""
    lines = lines_of(outcome_of((9, 1, 1, 9)), findings_of, Choices(family="textbook"))
    assert lines["risk_index"].note == "the bare formula reaches beyond 100%"
    assert lines["risk_reference"].note == "the bare formula reaches below 0%"
    assert (lines["risk_difference"].interval, lines["risk_difference"].note) == (
        "53.7 to 106.3",
        "the bare formula reaches past 100 in 100",
    )
    assert lines["number_needed"].interval == "up to 2; the other limit is not given"
    assert lines["number_needed"].note == gap_text(Gap("formula-beyond-risks"))


def test_a_limit_beyond_both_ends_is_said_so(outcome_of, findings_of):
    """Wald's interval of 1 of 2 leaves the scale on both sides."""
    lines = lines_of(outcome_of((1, 1, 1, 1)), findings_of, Choices(family="textbook"))
    assert lines["risk_index"].note == "the bare formula reaches below 0% and beyond 100%"


def test_a_risk_without_an_upper_limit_keeps_its_sign():
    """The sign of per cent stands behind the last number there is."""
    assert limits.percent_interval(Range(low=0.138, high=Gap("beyond-one")), 0.171) == "13.8% to past 100%"
    assert limits.ratio_interval(Range(low=1.38, high=Gap("beyond-one")), 1.71) == "1.38 to an open end"
    assert limits.relative_interval(Range(low=1.38, high=Gap("beyond-one")), 1.71) == "38% to an open end"
    assert limits.percent_interval(Interval(low=0.138, high=0.211), 0.171) == "13.8 to 21.1%"


def test_no_limit_is_said_to_lie_beyond_where_none_does(outcome_of, findings_of):
    """The score family's limits are possible whatever the table."""
    lines = lines_of(outcome_of((9, 1, 1, 9)), findings_of)
    assert all("formula" not in line.note for line in lines.values())


@pytest.mark.parametrize(
    ("ratio", "low", "high", "text"),
    [
        (0.54, 0.37, 0.78, "22% to 63%"),
        (1.86, 1.28, 2.69, "28% to 169%"),
        (0.88, 0.60, 1.30, "40% lower to 30% higher"),
        (2.0, 0.9, math.inf, "10% lower to ∞ higher"),
        (0.5, 0.0, 1.0, "0% to 100%"),
        (1.2, 0.9, 1.6, "10% lower to 60% higher"),
        (1.0, 0.8, 1.0, "20% lower to 0%"),
    ],
)
def test_a_relative_interval_has_the_word_it_needs(ratio, low, high, text):
    """On one side plain, across 1 with lower and higher."""
    assert limits.relative_interval(Interval(low=low, high=high), ratio) == text
