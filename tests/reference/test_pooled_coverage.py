"""Facts about pooled intervals that a small simulation already shows."""

from __future__ import annotations

import pytest

from fourcount.stats import homogeneity, strata
from reference_command import reference_command

simulation = reference_command("pooled_coverage")
LARGE = simulation.DESIGNS[0]
MATCHED = simulation.DESIGNS[4]
SETS = 600


@pytest.mark.parametrize("row", simulation.METHODS, ids=lambda row: f"{row[0]} {row[1]}")
def test_every_pooled_interval_covers_in_few_large_strata(row: tuple[str, str, object, tuple[float, ...]]) -> None:
    """3 strata of 100 v 100: each interval at 95% holds the common effect in 93% to 98% of 600 sets."""
    measure, _key, interval, effects = row
    for effect in effects:
        held, none = simulation.coverage(LARGE, measure, interval, effect, SETS)
        assert 0.93 < held < 0.98
        assert none == 0


def test_sato_s_variance_holds_in_many_small_strata_where_greenland_and_robins_s_does_not() -> None:
    """50 strata of 1 v 2: Sato's covers about 94%, the other about half."""
    held, _ = simulation.coverage(MATCHED, "pooled_risk_difference", strata.sato_difference, 0.15, SETS)
    assert held > 0.92
    held, _ = simulation.coverage(MATCHED, "pooled_risk_difference", strata.greenland_robins_difference, 0.15, SETS)
    assert held < 0.65


def test_breslow_and_day_err_in_strata_of_three_people() -> None:
    """In large strata about 5% of sets with one odds ratio fall below 0.05; in strata of 1 v 2 more than a third."""
    for test in (homogeneity.breslow_day, homogeneity.breslow_day_tarone):
        assert 0.03 < simulation.error(LARGE, test, 3.0, SETS)[0] < 0.08
        assert simulation.error(MATCHED, test, 3.0, SETS)[0] > 1 / 3


def test_cochran_mantel_haenszel_keeps_its_level_in_both() -> None:
    """Without an effect about 5% of sets fall below 0.05, in large strata and in strata of 1 v 2; corrected, fewer."""
    for design in (LARGE, MATCHED):
        plain, _ = simulation.error(design, strata.cochran_mantel_haenszel, 1.0, SETS)
        corrected, _ = simulation.error(design, strata.cochran_mantel_haenszel_corrected, 1.0, SETS)
        assert 0.03 < plain < 0.08
        assert corrected < plain
