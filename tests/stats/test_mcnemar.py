"""McNemar's tests: against statsmodels, scipy and 50 digits."""

from __future__ import annotations

import math
from typing import Any

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy.stats import binomtest
from statsmodels.stats.contingency_tables import mcnemar as library_mcnemar

from fourcount.stats import mcnemar
from fourcount.stats.results import Gap
from paired_tables import CELL, pairs_of, random_pairs

TESTS = (mcnemar.mcnemar, mcnemar.mcnemar_corrected, mcnemar.mcnemar_exact, mcnemar.mcnemar_mid_p)
DISCORDANT = st.tuples(CELL, CELL).filter(any)


def _given(p: float | Gap) -> float:
    assert isinstance(p, float), p
    return p


def test_the_libraries_agree() -> None:
    """300 random tables: statsmodels' asymptotic, corrected and exact p, and scipy's binomial test."""
    for e, f, g, h in random_pairs(11, 300):
        counts = pairs_of((e, f, g, h))
        if f + g == 0:
            assert [test(counts) for test in TESTS] == [Gap("no-discordant-pairs")] * 4
            continue
        table = [[e, f], [g, h]]
        plain = library_mcnemar(table, exact=False, correction=False).pvalue
        assert _given(mcnemar.mcnemar(counts)) == pytest.approx(plain, rel=1e-11)
        if f != g:  # statsmodels leaves a chi-square of 1/(f+g) where there is no difference at all
            corrected = library_mcnemar(table, exact=False, correction=True).pvalue
            assert _given(mcnemar.mcnemar_corrected(counts)) == pytest.approx(corrected, rel=1e-11)
        assert _given(mcnemar.mcnemar_exact(counts)) == pytest.approx(library_mcnemar(table).pvalue, rel=1e-11)
        assert _given(mcnemar.mcnemar_exact(counts)) == pytest.approx(binomtest(f, f + g).pvalue, rel=1e-11)


def _fifty_digits(fewer: int, more: int) -> tuple[Any, Any]:
    """P(X <= fewer) and P(X = fewer) at 1/2, term by term at 50 digits."""
    with mpmath.workdps(50):
        whole = fewer + more
        log_own = mpmath.loggamma(whole + 1) - mpmath.loggamma(fewer + 1) - mpmath.loggamma(more + 1)
        own = mpmath.exp(log_own - whole * mpmath.log(2))
        term = total = mpmath.mpf(1)
        for step in range(fewer):
            term *= mpmath.mpf(fewer - step) / (more + 1 + step)
            total += term
            if term < total * mpmath.mpf(10) ** -40:
                break
        return own * total, own


@pytest.mark.parametrize(
    ("fewer", "more"), [(1, 7), (0, 5), (86, 150), (400, 1600), (90_000, 91_000), (1_000_000, 1_002_000), (3, 10**3)]
)
def test_exact_and_mid_p_agree_with_50_digits(fewer: int, more: int) -> None:
    """Twice the tail, and that less the observed split's own probability, among 5 to 2,002,000 discordant pairs."""
    below, own = _fifty_digits(fewer, more)
    for counts in (pairs_of((0, fewer, more, 0)), pairs_of((9, more, fewer, 10**9))):
        assert _given(mcnemar.mcnemar_exact(counts)) == pytest.approx(float(2 * below), rel=1e-12)
        assert _given(mcnemar.mcnemar_mid_p(counts)) == pytest.approx(float(2 * below - own), rel=1e-12)


STORED = (
    (10**9 - 10**5, 10**9, 0.02534512188737033, 0.02534365753556475),
    (10**9, 10**9 + 30_000, 0.5023524063752515, 0.5023381599135882),
)
"""Fewer, more, exact p, mid-P p: the function above at 40 digits, which takes seconds."""


@pytest.mark.parametrize(("fewer", "more", "exact", "mid_p"), STORED)
def test_very_many_pairs(fewer: int, more: int, exact: float, mid_p: float) -> None:
    """Two thousand million discordant pairs keep twelve digits of p."""
    counts = pairs_of((0, fewer, more, 0))
    assert _given(mcnemar.mcnemar_exact(counts)) == pytest.approx(exact, rel=1e-12)
    assert _given(mcnemar.mcnemar_mid_p(counts)) == pytest.approx(mid_p, rel=1e-12)


def test_equal_splits() -> None:
    """f = g: p is 1, exact, asymptotic and corrected; mid-P is 1 less half of the split's own probability."""
    for pairs_each, own in ((1, 1 / 2), (2, 3 / 8), (10, math.comb(20, 10) / 2**20)):
        counts = pairs_of((3, pairs_each, pairs_each, 4))
        assert [test(counts) for test in TESTS[:3]] == [1, 1, 1]
        assert _given(mcnemar.mcnemar_mid_p(counts)) == pytest.approx(1 - own / 2, rel=1e-13)


@settings(max_examples=300)
@given(discordant=DISCORDANT)
def test_p_is_a_probability_and_mirrors(discordant: tuple[int, int]) -> None:
    """0 <= p <= 1 whatever the size; the sides may be exchanged; mid-P is never above the exact p."""
    f, g = discordant
    for test in TESTS:
        p = _given(test(pairs_of((1, f, g, 2))))
        assert 0 <= p <= 1
        assert p == test(pairs_of((8, g, f, 0)))
    counts = pairs_of((1, f, g, 2))
    assert _given(mcnemar.mcnemar_mid_p(counts)) <= _given(mcnemar.mcnemar_exact(counts))
    assert _given(mcnemar.mcnemar(counts)) <= _given(mcnemar.mcnemar_corrected(counts))


@pytest.mark.parametrize("test", TESTS)
def test_nothing_to_test(test: Any) -> None:
    """No pair, or no discordant one: a gap that says which."""
    assert test(pairs_of((0, 0, 0, 0))) == Gap("empty-pairs")
    assert test(pairs_of((5, 0, 0, 5))) == Gap("no-discordant-pairs")
