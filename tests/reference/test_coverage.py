"""Facts about coverage that a small grid already shows, by full enumeration."""

from __future__ import annotations

import pytest

from fourcount.stats.methods import method
from reference_command import reference_command

real_coverage = reference_command("coverage")

RISKS = (0.05, 0.2, 0.4, 0.5, 0.7, 0.95)


@pytest.mark.parametrize("level", [0.8, 0.95, 0.99])
@pytest.mark.parametrize("total", [7, 20])
def test_clopper_pearson_never_covers_less_than_its_level(total: int, level: float) -> None:
    """Clopper and Pearson (1934): the exact interval of one risk keeps its level at every risk."""
    found = real_coverage.one_group(method("risk", "clopper-pearson"), total, real_coverage.FINE_RISKS, level)
    assert found.held.min() >= level


@pytest.mark.parametrize("level", [0.8, 0.95])
@pytest.mark.parametrize("sizes", [(6, 9), (12, 12)])
def test_conditional_exact_never_covers_less_than_its_level(sizes: tuple[int, int], level: float) -> None:
    """The exact interval of the odds ratio keeps its level at every pair of risks, since it does for every margin."""
    found = real_coverage.two_groups(method("odds_ratio", "conditional-exact"), sizes, RISKS, level)
    assert found.held.min() >= level


def test_wald_covers_badly_and_wilson_does_not() -> None:
    """Brown, Cai and DasGupta (2001) Stat Sci 16:101: Wald falls far short of 95% in small groups, Wilson holds it."""
    wald = real_coverage.one_group(method("risk", "wald"), 20, real_coverage.FINE_RISKS, 0.95)
    wilson = real_coverage.one_group(method("risk", "wilson"), 20, real_coverage.FINE_RISKS, 0.95)
    assert wald.held.min() < 0.86
    assert (wald.held < 0.93).mean() > 0.25
    assert wald.none.max() > 0.9
    assert wilson.held.mean() > 0.95
    assert wilson.none.max() < 1e-12


def test_difference_by_score_covers_better_than_wald() -> None:
    """Newcombe (1998) Stat Med 17:873: the score and square-and-add intervals hold 95% on average, Wald does not."""
    covered = {
        key: real_coverage.two_groups(method("risk_difference", key), (10, 10), RISKS, 0.95).held
        for key in ("wald", "newcombe", "miettinen-nurminen")
    }
    assert covered["wald"].mean() < 0.93
    assert covered["newcombe"].mean() > 0.945
    assert covered["miettinen-nurminen"].mean() > 0.945
    assert covered["miettinen-nurminen"].min() > covered["wald"].min() + 0.05


def test_jeffreys_average_and_least_coverage() -> None:
    """Brown, Cai and DasGupta (2001) Stat Sci 16:101: Jeffreys holds 95% on average and dips under 0.9 at edges."""
    parts = [
        real_coverage.one_group(method("risk", "jeffreys"), total, real_coverage.FINE_RISKS, 0.95)
        for total in real_coverage.SINGLE_SIZES
    ]
    for part in parts:
        assert 0.949 < part.held.mean() < 0.954
        assert 0.86 < part.held.min() < 0.9


@pytest.mark.parametrize("level", [0.8, 0.95])
def test_the_conditional_interval_of_pairs_never_covers_less_than_its_level(level: float) -> None:
    """It keeps its level for each number of discordant pairs, and so for all."""
    points = real_coverage.pair_points(RISKS, (0.0, 0.4))
    found = real_coverage.of_pairs(method("pair_odds_ratio", "conditional-exact"), 12, points, level)
    assert found.held.min() >= level


@pytest.mark.parametrize("level", [0.8, 0.95])
def test_exact_intervals_of_rates_never_cover_less_than_their_level(level: float) -> None:
    """Garwood's interval at each expectation; that of the ratio at each pair of them."""
    expected = (0.5, 2, 7, 20)
    assert real_coverage.one_rate(method("rate", "exact"), expected, level).held.min() >= level
    assert real_coverage.two_rates(method("rate_ratio", "exact"), (1.0, 2.5), expected, level).held.min() >= level


def test_wald_of_pairs_covers_worse_than_newcombe() -> None:
    """Newcombe (1998) Stat Med 17:2635: Wald's interval of pairs falls short of 95%, the hybrid score interval not."""
    points = real_coverage.pair_points(RISKS, (0.0, 0.4))
    wald, newcombe = (
        real_coverage.of_pairs(method("pair_difference", key), 15, points, 0.95) for key in ("wald", "newcombe")
    )
    assert wald.held.mean() < 0.94
    assert newcombe.held.mean() > 0.95
    assert wald.held.min() < newcombe.held.min()
