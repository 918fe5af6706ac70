"""Pooled measures and tests of strata against statsmodels and against 90 digits."""

from __future__ import annotations

import itertools
import math
import random
import warnings
from collections.abc import Callable, Sequence
from typing import Any

import numpy as np
import pytest
from mpmath import mpf
from statsmodels.stats.contingency_tables import StratifiedTable

import strata_digits as digits
from fourcount.stats import homogeneity
from fourcount.stats import strata as ours
from fourcount.stats.results import Counts, Gap, HomogeneityTest, Interval
from tables import counts_of

Stratum = tuple[int, int, int, int]

VAST = (0, 1, 7, 10**9)
EXTREMES = [t for t in itertools.product(VAST, repeat=4) if t[0] + t[1] and t[2] + t[3]]


def _drawn(seed: int, how_many: int) -> list[list[Stratum]]:
    """Strata of 1 to 12 tables, a third of them sparse, a third large, a third with cells of every size."""
    source = random.Random(seed)
    found: list[list[Stratum]] = []
    while len(found) < how_many:
        most = source.choice((3, 200, 10 ** source.randint(1, 9)))
        strata = [_table(source, most) for _ in range(source.randint(1, 12))]
        if all(a + b and c + d for a, b, c, d in strata):
            found.append(strata)
    return found


def _table(source: random.Random, most: int) -> Stratum:
    a, b, c, d = (source.randint(0, most) for _ in range(4))
    return a, b, c, d


def _pairs_of_extremes() -> list[list[Stratum]]:
    """A few hundred pairs of tables of cells 0, 1, 7 and 10^9."""
    pairs = [list(pair) for pair in itertools.combinations_with_replacement(EXTREMES, 2)]
    return random.Random(5).sample(pairs, 250)


CASES = [*_drawn(seed=3, how_many=200), *_pairs_of_extremes()]

ESTIMATES: list[tuple[Callable[[Sequence[Counts]], float | Gap], Callable[[Sequence[Stratum]], mpf]]] = [
    (ours.pooled_odds_ratio, digits.odds_ratio),
    (ours.pooled_risk_ratio, digits.risk_ratio),
    (ours.pooled_risk_difference, digits.risk_difference),
]
INTERVALS: list[tuple[Callable[[Sequence[Counts], float], Interval | Gap], Callable[..., tuple[mpf, mpf]]]] = [
    (ours.robins_breslow_greenland, digits.robins_breslow_greenland),
    (ours.greenland_robins_ratio, digits.greenland_robins_ratio),
    (ours.sato_difference, digits.sato_difference),
    (ours.greenland_robins_difference, digits.greenland_robins_difference),
]


def _name(pair: Any) -> str:
    return str(pair[0].__name__)


@pytest.mark.parametrize("pair", ESTIMATES, ids=_name)
def test_pooled_estimates_have_every_digit(pair: tuple[Callable[..., Any], Callable[..., Any]]) -> None:
    """Each pooled estimate agrees with 90 digits to 1e-14 (of 1 for a difference); a gap or inf is a division by 0."""
    given = 0
    for strata in CASES:
        found = pair[0]([counts_of(t) for t in strata])
        if isinstance(found, Gap) or math.isinf(found):
            with pytest.raises(ZeroDivisionError):
                pair[1](strata)
            continue
        expected = pair[1](strata)
        scale = mpf(1) if pair[0] is ours.pooled_risk_difference else expected
        assert abs(found - expected) <= 1e-14 * scale, strata
        given += 1
    assert given > 300


@pytest.mark.parametrize("pair", INTERVALS, ids=_name)
def test_pooled_limits_have_every_digit(pair: tuple[Callable[..., Any], Callable[..., Any]]) -> None:
    """Each limit agrees with 90 digits to 1e-12, and a difference's half-width to 1e-7, with cells up to 10^9.

    Limits of ratios beyond 10^100 to either side are left out, and half-widths below 10^-8, of which limits keep too
    few digits.
    """
    level = 0.95
    ratio = pair[0] in (ours.robins_breslow_greenland, ours.greenland_robins_ratio)
    given = 0
    for strata in CASES:
        found = pair[0]([counts_of(t) for t in strata], level)
        if isinstance(found, Gap) or (ratio and not 1e-100 < found.low <= found.high < 1e100):
            continue
        low, high = pair[1](strata, level)
        within = 1e-12 * (abs(high) if ratio else 1)
        assert abs(found.high - high) <= within, strata
        assert abs(found.low - low) <= (1e-12 * abs(low) if ratio else within), strata
        if not ratio and high - low > 1e-8:
            assert found.high - found.low == pytest.approx(float(high - low), rel=1e-7), strata
        given += 1
    assert given > 240


@pytest.mark.parametrize("correction", [0.0, 0.5])
def test_the_tests_of_no_association_have_every_digit(correction: float) -> None:
    """Cochran-Mantel-Haenszel's p agrees with 90 digits to 1e-11 wherever a double holds it."""
    test = ours.cochran_mantel_haenszel_corrected if correction else ours.cochran_mantel_haenszel
    given = 0
    for strata in CASES:
        found = test([counts_of(t) for t in strata])
        if isinstance(found, Gap):
            continue
        expected = digits.cochran_mantel_haenszel(strata, correction)
        if expected > 1e-290:
            assert found == pytest.approx(float(expected), rel=1e-11), strata
            given += 1
    assert given > 200


@pytest.mark.parametrize("tarone", [False, True])
def test_the_tests_of_one_odds_ratio_have_every_digit(tarone: bool) -> None:
    """Breslow and Day's chi-square agrees with 90 digits to 1e-9, and its p wherever a double holds it."""
    test = homogeneity.breslow_day_tarone if tarone else homogeneity.breslow_day
    given = 0
    for strata in CASES:
        found = test([counts_of(t) for t in strata])
        if isinstance(found, Gap):
            continue
        chi_square, p = digits.breslow_day(strata, tarone)
        assert abs(found.chi_square - chi_square) <= 1e-9 * max(chi_square, mpf(1)), strata
        if p > 1e-290:
            assert found.p == pytest.approx(float(p), rel=1e-8), strata
        given += 1
    assert given > 150


def test_statsmodels_agrees_wherever_it_answers() -> None:
    """300 random sets of strata against statsmodels' StratifiedTable; the sets that it refuses are counted.

    It refuses by a warning or by a value that is not finite. A stratum without events, or with nothing else, is kept
    from its homogeneity test: it counts there as a degree of freedom, and its rounding error as a variance.
    """
    refused = {"pooled": 0, "homogeneity": 0}
    sets = [strata for strata in _drawn(seed=11, how_many=300) if max(max(t) for t in strata) <= 10**6]
    for strata in sets:
        counts = [counts_of(t) for t in strata]
        if not _pooled_agrees(strata, counts):
            refused["pooled"] += 1
        if not _homogeneity_agrees(strata, counts):
            refused["homogeneity"] += 1
    assert len(sets) == 258
    assert refused["pooled"] <= 8  # no pooled odds ratio, or one of 0 or infinity
    assert refused["homogeneity"] <= 35  # those, and fewer than two strata that tell anything


def _library(strata: Sequence[Stratum]) -> Any:
    return StratifiedTable(np.array(strata, dtype=float).reshape(-1, 2, 2).transpose(1, 2, 0))


def _pooled_agrees(strata: Sequence[Stratum], counts: Sequence[Counts]) -> bool:
    try:
        with warnings.catch_warnings():
            warnings.simplefilter("error")
            table = _library(strata)
            ratios = (table.oddsratio_pooled, table.riskratio_pooled)
            low, high = table.oddsratio_pooled_confint()
            plain = table.test_null_odds(correction=False).statistic
    except (RuntimeWarning, FloatingPointError):
        return False
    interval = ours.robins_breslow_greenland(counts, 0.95)
    if isinstance(interval, Gap):
        assert not (math.isfinite(low) and math.isfinite(high) and low > 0), strata
        return False
    assert (ours.pooled_odds_ratio(counts), ours.pooled_risk_ratio(counts)) == pytest.approx(ratios, rel=1e-9)
    assert (interval.low, interval.high) == pytest.approx((low, high), rel=1e-9)
    p = ours.cochran_mantel_haenszel(counts)
    assert p == pytest.approx(math.erfc(math.sqrt(plain / 2)), rel=1e-7, abs=1e-290)
    return True


def _homogeneity_agrees(strata: Sequence[Stratum], counts: Sequence[Counts]) -> bool:
    told = [(a, b, c, d) for a, b, c, d in strata if a + c and b + d]
    if len(told) < 2:
        return False
    try:
        with warnings.catch_warnings():
            warnings.simplefilter("error")
            table = _library(told)
            plain, tarone = table.test_equal_odds(), table.test_equal_odds(adjust=True)
    except (RuntimeWarning, FloatingPointError):
        return False
    if not math.isfinite(plain.statistic):
        return False
    found, corrected = homogeneity.breslow_day(counts), homogeneity.breslow_day_tarone(counts)
    assert isinstance(found, HomogeneityTest), strata
    assert isinstance(corrected, HomogeneityTest), strata
    assert found.chi_square == pytest.approx(plain.statistic, rel=1e-6, abs=1e-6), strata
    assert corrected.chi_square == pytest.approx(tarone.statistic, rel=1e-6, abs=1e-6), strata
    assert found.degrees == len(told) - 1
    assert found.p == pytest.approx(plain.pvalue, rel=1e-6, abs=1e-12)
    return True
