"""Methods that are recognised in print only."""

from __future__ import annotations

import math
from collections.abc import Callable

import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.stats import chi2_contingency

from fourcount.stats import methods, print_only
from fourcount.stats.entries.print_only import PRINT_METHODS, PRINT_TESTS
from fourcount.stats.results import Counts, FractionalCounts, Gap
from tables import CELLS, counts_of, given_interval

Table = Callable[..., Counts]
POSITIVE = st.tuples(*[st.integers(1, 500)] * 4)


@given(POSITIVE)
def test_yates_and_the_likelihood_ratio_are_those_of_scipy(cells: tuple[int, int, int, int]) -> None:
    """Against scipy.stats.chi2_contingency, with correction and with lambda_="log-likelihood"."""
    observed, counts = [cells[:2], cells[2:]], counts_of(cells)
    corrected = chi2_contingency(observed, correction=True).pvalue
    assert print_only.yates(counts) == pytest.approx(corrected, rel=1e-9, abs=1e-300)
    likelihood = chi2_contingency(observed, correction=False, lambda_="log-likelihood").pvalue
    assert print_only.likelihood_ratio(counts) == pytest.approx(likelihood, rel=1e-6, abs=1e-9)


def test_wald_with_continuity_correction_as_printed(table: Table) -> None:
    """56 of 70 against 48 of 80: 0.0441 to 0.3559 (Newcombe 1998, Stat Med 17:873, table II, method 2, from memory)."""
    found = given_interval(print_only.wald_continuity(table(56, 14, 48, 32), 0.95))
    assert (round(found.low, 4), round(found.high, 4)) == (0.0441, 0.3559)


def test_one_risk_with_continuity_correction_as_printed() -> None:
    """81 of 263: 0.2503 to 0.3657 (Newcombe 1998, Stat Med 17:857, table I, method 2)."""
    found = given_interval(print_only.risk_wald_continuity(81, 263, 0.95))
    assert (round(found.low, 4), round(found.high, 4)) == (0.2503, 0.3657)


@given(POSITIVE)
def test_the_tests_of_logs_agree_with_their_intervals(cells: tuple[int, int, int, int]) -> None:
    """At the level 1 - p the interval of Woolf, and that of Katz, just reaches no effect."""
    counts = counts_of(cells)
    for p, measure, key in (
        (print_only.log_odds_ratio_z(counts), "odds_ratio", "woolf"),
        (print_only.log_risk_ratio_z(counts), "risk_ratio", "katz"),
    ):
        assert isinstance(p, float)
        if not 1e-6 < p < 0.999:
            continue
        interval = given_interval(methods.method(measure, key).interval(counts, 1 - p))
        assert min(abs(math.log(interval.low)), abs(math.log(interval.high))) == pytest.approx(0, abs=1e-6)


@given(POSITIVE)
def test_test_based_limits_agree_with_their_test(cells: tuple[int, int, int, int]) -> None:
    """At the level 1 - p of the (N-1) chi-square the test-based limits just reach no effect."""
    counts = counts_of(cells)
    p = methods.test("n-minus-1").p(counts)
    if not isinstance(p, float) or not 1e-6 < p < 0.999:
        return
    for function in (print_only.test_based_odds_ratio, print_only.test_based_risk_ratio):
        interval = given_interval(function(counts, 1 - p))
        nearest = min(abs(math.log(interval.low)), abs(math.log(interval.high)))
        assert nearest == pytest.approx(0, abs=1e-6)


@given(CELLS)
def test_every_table_has_a_figure_or_a_reason(cells: tuple[int, int, int, int]) -> None:
    """No method for print fails on zeros or the largest counts, and limits stand in their order."""
    counts = counts_of(cells)
    for entry in PRINT_METHODS:
        given_to = (counts.index_events, counts.index_total) if entry.measure == "risk" else (counts,)
        found = entry.interval(*given_to, 0.95)
        assert isinstance(found, Gap) or found.low <= found.high
    for test in PRINT_TESTS:
        p = test.p(counts)
        assert isinstance(p, Gap) or 0 <= p <= 1


def test_none_of_them_is_shown_as_ours() -> None:
    """Their keys stand in no list of ours, and no two are alike."""
    listed = [(entry.measure, entry.key) for entry in PRINT_METHODS]
    assert len(set(listed)) == len(listed)
    assert not set(listed) & {(entry.measure, entry.key) for entry in methods.METHODS}
    assert not {test.key for test in PRINT_TESTS} & {test.key for test in methods.TESTS}


def fraction_of(cells: tuple[float, float, float, float]) -> FractionalCounts:
    """Counts as a design effect leaves them."""
    a, b, c, d = cells
    return FractionalCounts(index_events=a, index_non_events=b, reference_events=c, reference_non_events=d)


@given(CELLS, st.floats(1.0, 1e9))
def test_counts_thinned_by_clusters_have_a_figure_or_a_reason(cells: tuple[int, int, int, int], effect: float) -> None:
    """Near one person in all or below, nothing fails: a reason, or a limit of 0 or infinity."""
    a, b, c, d = (cell / effect for cell in cells)
    counts = fraction_of((a, b, c, d))
    for entry in PRINT_METHODS:
        given_to = (counts.index_events, counts.index_total) if entry.measure == "risk" else (counts,)
        found = entry.interval(*given_to, 0.95)
        assert isinstance(found, Gap) or found.low <= found.high
    for test in PRINT_TESTS:
        p = test.p(counts)
        assert isinstance(p, Gap) or 0 <= p <= 1


def test_test_based_limits_of_hardly_anybody() -> None:
    """One person or fewer is the reason; a little more lets the limits run to 0 and infinity."""
    for function in (print_only.test_based_odds_ratio, print_only.test_based_risk_ratio):
        assert function(fraction_of((0.3, 0.1, 0.5, 0.1)), 0.95) == Gap("too-few-left")
        found = given_interval(function(fraction_of((0.4, 0.2, 0.1, 0.3 + 1e-9)), 0.95))
        assert (found.low, found.high) == (0.0, math.inf)
