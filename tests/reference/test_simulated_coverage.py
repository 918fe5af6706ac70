"""Facts about coverage that a short simulation with a fixed seed already shows."""

from __future__ import annotations

import pytest

from reference_command import reference_command

simulated = reference_command("simulated_coverage")

DRAWS = 4000


@pytest.mark.parametrize(
    ("people", "exposed", "risk", "ratio"),
    [(1000, 0.3, 0.1, 2.0), (1000, 0.6, 0.3, 1.5), (5000, 0.1, 0.02, 3.0), (200, 0.3, 0.3, 3.0)],
)
def test_population_interval_keeps_its_level(people: int, exposed: float, risk: float, ratio: float) -> None:
    """Where nearly every sample has an interval, it holds the fraction about as often as its level says."""
    point = simulated.Population(people=people, exposed=exposed, reference_risk=risk, ratio=ratio)
    found = simulated.of_population(point, DRAWS)
    assert found.none < 0.01
    assert 0.93 < found.held < 0.965


def test_population_interval_is_wide_for_groups_of_fixed_size() -> None:
    """With the exposure's share fixed there is less to vary, and the interval holds the fraction more often."""
    point = simulated.Population(people=1000, exposed=0.1, reference_risk=0.3, ratio=3.0)
    drawn, fixed = (simulated.of_population(point, DRAWS, fixed=way) for way in (False, True))
    assert drawn.held < 0.96
    assert fixed.held > 0.98


@pytest.mark.parametrize("trial", simulated.TRIALS)
def test_design_effect_mends_a_cluster_trial(trial: object) -> None:
    """The interval of plain counts holds the difference too seldom, that of divided counts as often as it should."""
    plain, divided = simulated.of_clusters(trial, DRAWS)
    assert plain.held < 0.86
    assert 0.93 < divided.held < 0.97
