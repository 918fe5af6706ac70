"""What the check of a print must catch. All tables and prints are invented unless a test names a source."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import pytest

from fourcount.appraisal.check import check, check_figures
from fourcount.appraisal.check.basis import of_counts
from fourcount.appraisal.findings import CheckFindings, Finding, Match
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from printed_figures import printed
from tables import counts_of

FALLS = (38, 374, 70, 339)
Checked = Callable[..., CheckFindings]


@pytest.fixture
def checked(study: Callable[..., Outcome]) -> Checked:
    """The check of a text beside four counts."""

    def of(cells: tuple[object, ...], text: str, measure: Any = "risk_ratio", **rest: Any) -> CheckFindings:
        choices = Choices(family=rest.pop("family", "score"), level=rest.pop("level", 0.95))
        return check(study(*cells, paper_text=text, paper_measure=measure, **rest), choices)

    return of


def keys(found: CheckFindings, figure: int = 0) -> list[str]:
    return [finding.key for finding in found.figures[figure].findings]


def first(found: CheckFindings) -> Finding:
    return found.figures[0].findings[0]


def methods(found: CheckFindings) -> list[str]:
    return str(first(found).facts["methods"]).split()


def test_what_reproduces_is_said_with_every_method_that_does(checked: Checked) -> None:
    """Three methods give these digits of the risk ratio, and all are named."""
    found = checked(FALLS, "0.54 (95% CI, 0.37 to 0.78)")
    assert keys(found) == ["reproduced"]
    assert sorted(methods(found)) == ["katz", "koopman", "miettinen-nurminen"]
    assert first(found).agrees
    assert {match.fit for match in found.figures[0].matches} == {"all"}
    assert first(found).facts["estimate"] == pytest.approx(0.53890, abs=1e-5)


def test_an_odds_ratio_printed_as_a_risk_ratio(checked: Checked) -> None:
    """The print says risk ratio; its three figures are those of the odds ratio."""
    found = checked(FALLS, "RR 0.49 (95% CI, 0.32 to 0.75)")
    assert keys(found) == ["other-name"]
    assert first(found).facts["measure"] == "odds_ratio"
    assert first(found).facts["own"] == pytest.approx(0.53890, abs=1e-5)
    assert not first(found).agrees


def test_referrals_of_schwartz_woloshin_and_welch(checked: Checked) -> None:
    """84.7% against 90.6% referred, printed as 0.6: an odds ratio, while the risk ratio is 0.93.

    Schwartz, Woloshin and Welch, N Engl J Med 1999; 341:279. The denominators of 1,000 are ours.
    """
    found = checked((847, 153, 906, 94), "relative risk 0.6", design="cohort")
    assert keys(found)[0] == "other-name"
    facts = first(found).facts
    assert (facts["measure"], round(float(facts["own"]), 2)) == ("odds_ratio", 0.93)


def test_swapped_groups(checked: Checked) -> None:
    """A ratio of the reference group to the index group."""
    found = checked(FALLS, "RR 1.86 (95% CI, 1.28 to 2.69)")
    assert keys(found) == ["other-way-round"]
    assert first(found).facts["orientation"] == "groups-swapped"


def test_the_other_outcome_counted(checked: Checked) -> None:
    """Survival printed where deaths were entered: 80 of 100 against 60 of 100 alive is a ratio of 1.33."""
    found = checked((20, 80, 40, 60), "RR 1.33 (95% CI, 1.11 to 1.61)")
    assert keys(found)[0] == "other-way-round"
    assert first(found).facts["orientation"] == "other-outcome"


def test_an_interval_of_90_called_95(checked: Checked) -> None:
    """Katz's limits at 90% beside the words 95% CI; the level that fits is said, and the printed one."""
    found = checked(FALLS, "RR 0.539 (95% CI, 0.395 to 0.735)")
    assert keys(found) == ["other-level"]
    assert (first(found).facts["level"], first(found).facts["printed_level"]) == (0.90, 0.95)
    assert methods(found) == ["katz"]
    assert "printed_level" not in first(checked(FALLS, "RR 0.539 (0.395 to 0.735)")).facts


@pytest.mark.parametrize(
    ("cells", "text", "expected"),
    [
        ((7, 27, 1, 33), "RR 7.00 (0.91 to 53.9)", "katz"),
        ((7, 27, 1, 33), "RR 7.00 (1.22 to 42.6)", "koopman"),
        ((7, 27, 1, 33), "OR 8.56 (0.99 to 73.9)", "woolf"),
        ((12, 38, 5, 45), "RR 2.40 (0.91 to 6.31)", "katz"),
    ],
)
def test_methods_are_told_apart_where_digits_allow(
    checked: Checked, cells: tuple[int, ...], text: str, expected: str
) -> None:
    """Katz's, Koopman's and Woolf's limits of small tables are each known by themselves."""
    found = checked(cells, text)
    assert keys(found) == ["reproduced"]
    assert methods(found)[0] == expected
    assert not {"katz", "koopman", "woolf"} & set(methods(found)[1:])


@pytest.mark.parametrize(
    ("text", "limit"), [("0.54 (0.37 to 0.87)", "high"), ("0.54 (0.73 to 0.78)", "low"), ("0.54 (0.37–0.79)", "")]
)
def test_a_transposed_digit_in_a_limit(checked: Checked, text: str, limit: str) -> None:
    """The limit that does not fit is named, and that two digits may have changed places; one unit off is no slip."""
    found = checked(FALLS, text)
    if limit:
        assert keys(found)[0] == "one-limit"
        assert (first(found).facts["limit"], first(found).facts["slip"]) == (limit, 1)
    else:
        assert keys(found) == ["last-digit"]


def test_an_estimate_that_fits_beside_limits_that_do_not(checked: Checked) -> None:
    """The estimate is right; neither limit is that of any method or level."""
    found = checked(FALLS, "RR 0.54 (95% CI, 0.31 to 0.95)")
    assert keys(found) == ["estimate-only"]
    assert [match.fit for match in found.figures[0].matches] == ["estimate"]
    assert first(found).facts["methods"]


def test_limits_that_fit_beside_an_estimate_that_does_not(checked: Checked) -> None:
    """0.45 for 0.54: the limits tell."""
    found = checked(FALLS, "RR 0.45 (95% CI, 0.372 to 0.781)")
    assert keys(found) == ["interval-only"]
    assert first(found).facts["slip"] == 1


def test_digits_that_are_cut_off(checked: Checked) -> None:
    """All three figures cut after the second decimal: truncation, which is not rounding, is said."""
    found = checked(FALLS, "RR 0.53 (95% CI, 0.37 to 0.78)")
    assert keys(found) == ["cut-off"]


def test_nothing_that_fits_gives_the_nearest(checked: Checked) -> None:
    """Far from all: the counts' own figures, last, after what the limits say of themselves."""
    found = checked(FALLS, "RR 0.70 (95% CI, 0.41 to 0.99)")
    assert keys(found) == ["not-symmetric", "nearest"]
    assert found.figures[0].matches == ()
    assert found.adopt is None


def test_an_adjusted_effect_need_not_follow(checked: Checked) -> None:
    """An effect that is printed as adjusted asks for nothing; one that equals the crude one does."""
    apart = checked(FALLS, "adjusted odds ratio 0.60 (95% CI, 0.41 to 0.88)")
    assert keys(apart) == ["adjusted"]
    assert first(apart).agrees
    assert keys(checked(FALLS, "adjusted odds ratio 0.49 (95% CI, 0.32 to 0.75)")) == ["adjusted-is-crude"]


def test_a_hazard_ratio_is_none_of_counts(checked: Checked) -> None:
    """A note says that counts give none, with the risk ratio beside it; nothing is asked and nothing adopted."""
    for text, fits in (("HR 0.54 (95% CI, 0.37 to 0.78)", 1), ("HR 0.61 (95% CI, 0.41 to 0.91)", None)):
        found = checked(FALLS, text)
        assert keys(found) == ["no-hazard-ratio", "symmetric"]
        assert first(found).agrees
        assert (first(found).facts.get("fits"), first(found).facts["measure"]) == (fits, "risk_ratio")
        assert found.adopt is None


@pytest.mark.parametrize(
    ("text", "measure", "method"),
    [
        ("risk difference -7.9 percentage points (-12.5 to -3.3)", "risk_difference", "wald"),
        ("risk difference -7.89% (95% CI -12.53 to -3.28)", "risk_difference", "newcombe"),
        ("relative risk reduction 46% (22% to 63%)", "relative_reduction", "katz"),
        ("NNT 13 (8 to 31)", "number_needed", "wald"),
    ],
)
def test_other_measures_of_the_same_counts(checked: Checked, text: str, measure: str, method: str) -> None:
    """Differences in points, relative reductions and numbers needed are looked for as what they are."""
    found = checked(FALLS, text)
    assert keys(found) == ["reproduced"]
    assert first(found).facts["measure"] == measure
    assert method in methods(found)


def test_a_relative_reduction_printed_as_a_difference(checked: Checked) -> None:
    """46% is what the ratio takes off; the difference is 7.9 points."""
    found = checked(FALLS, "risk difference -46%")
    assert keys(found)[0] == "other-name"
    assert first(found).facts["measure"] in ("relative_reduction", "relative_increase")


def test_a_percentage_that_no_whole_number_gives(checked: Checked) -> None:
    """38 of 412 is 9.2% and 39 is 9.5%: nobody is 9.3% of 412 people. In a cell it is told likewise."""
    found = checked(FALLS, "9.3% vs 17.1%")
    assert keys(found) == ["percent-none"]
    assert (first(found).facts["events"], first(found).facts["total"]) == (38, 412)
    assert keys(found, 1) == ["reproduced"]
    cells = checked(("38 (9.3%)", 374, 70, 339), "").cells
    assert [cell.key for cell in cells] == ["percent-none-of-total"]
    other = checked(("38 (9.5%)", 374, 70, 339), "").cells
    assert (other[0].key, other[0].facts["fitting"]) == ("percent-other-count", 39)


def test_large_groups_leave_no_percentage_out(checked: Checked) -> None:
    """Where any percentage of these digits is some whole number's, only the nearest is said."""
    assert keys(checked((380, 3740, 700, 3390), "9.3% vs 17.1%")) == ["last-digit"]


def test_several_figures_are_checked_one_by_one(checked: Checked) -> None:
    """One text may hold a ratio that fits and an odds ratio that does not."""
    found = checked(FALLS, "RR 0.54 (95% CI, 0.37 to 0.78); OR 0.39 (95% CI, 0.32 to 0.75)")
    assert keys(found, 0) == ["reproduced"]
    assert keys(found, 1) != ["reproduced"]


def test_nothing_printed_says_nothing(checked: Checked) -> None:
    """An empty text, and one that holds no figure, give no figures; the latter is marked."""
    assert checked(FALLS, "") == CheckFindings()
    unreadable = checked(FALLS, "not estimable")
    assert unreadable.figures == ()
    assert [mark.field for mark in unreadable.marks] == ["paper_text"]


def test_without_counts_only_the_print_is_asked(checked: Checked) -> None:
    """A table that is not whole yet leaves symmetry and p to be looked at."""
    found = checked((38, "", 70, 339), "RR 0.54 (95% CI, 0.37 to 0.87)")
    assert keys(found) == ["not-symmetric"]
    assert first(found).facts["slip_high"] == "0.78"


def test_the_same_question_is_answered_once(study: Callable[..., Outcome]) -> None:
    """An equal outcome gets the remembered answer."""
    outcome = study(*FALLS, paper_text="RR 0.54 (0.37 to 0.78)")
    assert check(outcome, Choices()) is check(outcome, Choices())


@pytest.mark.parametrize("cells", [(0, 10, 5, 5), (0, 10, 0, 10), (10, 0, 10, 0), (0, 0, 5, 5), (10**9,) * 4])
@pytest.mark.parametrize("text", ["RR 0.50 (0.10 to 2.00), P=0.40", "OR 1.00 (0.99 to 1.01)", "NNT 10", "9.3% vs 10%"])
def test_no_table_stops_the_check(checked: Checked, cells: tuple[int, ...], text: str) -> None:
    """Zeros, empty groups and the largest counts: something is said of every figure."""
    found = checked(cells, text)
    assert found.figures
    assert all(figure.findings for figure in found.figures)


def test_the_matches_carry_our_digits(checked: Checked) -> None:
    """A match of points has points, on the print's own scale."""
    match: Match = checked(FALLS, "risk difference -7.9 percentage points (-12.5 to -3.3)").figures[0].matches[0]
    assert [round(float(value or 0), 2) for value in match.computed] == [-7.89, -12.49, -3.29]
    assert (match.method, match.level, match.orientation) == ("wald", 0.95, "as-read")


@pytest.mark.parametrize("text", ["OR 2.5 (0.9 to ∞)", "RR 0.54 (0.37 to ∞), P=0.03", "HR 0.5 (0.3 to ∞)"])
def test_an_infinite_limit_is_met_by_none_that_is_finite(checked: Checked, text: str) -> None:
    """No match, and no failure."""
    found = checked(FALLS, text)
    assert not [match for match in found.figures[0].matches if match.fit == "all"]


def test_an_infinite_limit_is_met_by_an_infinite_one() -> None:
    """5 of 10 against 0 of 10: the conditional exact limits of the odds ratio run from 1.2 to infinity."""
    figure = printed("odds_ratio", "", "1.2", "inf")
    counts = counts_of((5, 5, 0, 10))
    matches = check_figures((figure,), of_counts(counts), Choices()).figures[0].matches
    assert "conditional-exact" in {match.method for match in matches}
    assert all(match.computed[2] == math.inf for match in matches if match.fit != "estimate")


def test_a_difference_may_have_either_sign(checked: Checked) -> None:
    """A reduction of 7.9 points is the difference of -7.9, and its method can be adopted."""
    found = checked(FALLS, "ARR 7.9% (3.3 to 12.5)")
    assert keys(found) == ["other-sign"]
    assert first(found).agrees
    assert found.adopt == ("textbook", 0.95)
    assert keys(checked((70, 339, 38, 374), "RD -7.9% (-12.5 to -3.3)")) == ["other-sign"]
    last = checked(FALLS, "ARR 9.9% (4.3 to 15.5)").figures[0].findings[-1]
    assert (last.key, round(float(last.facts["estimate"]), 2)) == ("nearest", 7.89)
    assert first(checked(FALLS, "ARR 7.9% (3.3 to 15.2)")).key == "one-limit"


def test_a_percentage_that_no_word_calls_a_difference(checked: Checked) -> None:
    """46% (22 to 63) alone is the relative reduction; called a difference, it asks to check the name."""
    found = checked(FALLS, "46% (22 to 63)")
    assert keys(found) == ["reproduced"]
    assert found.figures[0].printed.measure == "relative_reduction"
    assert keys(checked(FALLS, "risk difference 46% (22 to 63)"))[0] == "other-name"


def test_the_method_on_screen_is_told_first(checked: Checked) -> None:
    """Of those that give the digits; where another level is shown, none is on screen."""
    found = checked(FALLS, "0.54 (95% CI, 0.37 to 0.78)")
    assert first(checked(FALLS, "0.54 (0.37 to 0.78)", family="textbook")).facts["shown"] == 1
    assert (methods(found)[0], first(found).facts["shown"]) == ("miettinen-nurminen", 1)
    assert first(checked(FALLS, "0.54 (95% CI, 0.37 to 0.78)", level=0.9)).facts["shown"] == 0


def test_a_half_added_is_carried_by_the_match(checked: Checked) -> None:
    """Katz's key with the correction in use; the sentence has Walter's."""
    found = checked((0, 14, 117, 92), "RR 0.000 (99% CI, 0.002 to 2.212)")
    match = found.figures[0].matches[0]
    assert (match.method, match.adjusted) == ("katz", "half")
    assert (methods(found), first(found).facts["halved"]) == (["walter"], "walter")
    assert checked(FALLS, "0.54 (0.37 to 0.78)").figures[0].matches[0].adjusted == ""


def test_what_a_table_cannot_give_is_said(checked: Checked) -> None:
    """Nobody had the event: the counts give no risk ratio to hold a print against."""
    assert keys(checked((0, 10, 0, 10), "RR 0.50 (0.10 to 2.40)"))[-1] == "not-given"
